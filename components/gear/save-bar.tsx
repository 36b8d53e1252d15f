"use client";

import { Button, ButtonLink } from "@/components/ui/button";

interface SaveBarProps {
  busy: boolean;
  dirty: boolean;
  isNew: boolean;
  backTo: string;
  /** True: the stored version was taken and what had been typed can still come back. */
  putAside: boolean;
  onBringBack: () => void;
}

/** Stays at the foot of the window, so that saving is never a scroll away. */
export function SaveBar({ busy, dirty, isNew, backTo, putAside, onBringBack }: SaveBarProps) {
  const state = busy ? "Saving…" : dirty ? "Not saved yet; kept on this device." : isNew ? "Nothing typed yet." : "No changes.";
  return (
    <div className="sticky bottom-0 z-10 -mx-4 flex flex-wrap items-center gap-x-4 gap-y-2 border-t-2 border-ink bg-floor px-4 py-3 md:-mx-6 md:px-6">
      <Button type="submit" tone="primary" disabled={busy}>{isNew ? "Add to the rig" : "Save"}</Button>
      <ButtonLink href={backTo}>Cancel</ButtonLink>
      {putAside ? <Button onClick={onBringBack}>Bring back what I typed</Button> : null}
      <p role="status" className="text-sm text-ink-soft">{state}</p>
    </div>
  );
}
