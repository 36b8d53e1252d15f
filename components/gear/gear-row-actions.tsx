"use client";

import { Button } from "@/components/ui/button";
import type { Gear } from "@/lib/schemas/gear";

export interface RowActions {
  rigId: string;
  busyId: string | null;
  mayEdit: (gear: Gear) => boolean;
  onCopy: (gear: Gear) => void;
  onRetire: (gear: Gear) => void;
  onBringBack: (gear: Gear) => void;
}

export function GearRowActions({ gear, actions }: { gear: Gear; actions: RowActions }) {
  if (!actions.mayEdit(gear)) return null;
  const busy = actions.busyId === gear.id;
  return (
    <div className="flex gap-2">
      <Button tone="quiet" className="px-1.5!" disabled={busy} aria-label={`Copy ${gear.name}`} onClick={() => actions.onCopy(gear)}>Copy</Button>
      {gear.retired
        ? <Button tone="quiet" className="px-1.5!" disabled={busy} aria-label={`Bring back ${gear.name}`} onClick={() => actions.onBringBack(gear)}>Bring back</Button>
        : <Button tone="quiet" className="px-1.5!" disabled={busy} aria-label={`Retire ${gear.name}`} onClick={() => actions.onRetire(gear)}>Retire</Button>}
    </div>
  );
}
