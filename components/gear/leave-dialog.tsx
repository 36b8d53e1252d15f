"use client";

import { ConfirmDialog } from "@/components/ui/dialog";

/** The question before a link is followed away from unsaved typing. */
export function LeaveDialog({ to, onStay, onLeave }: { to: string | null; onStay: () => void; onLeave: (href: string) => void }) {
  return (
    <ConfirmDialog
      open={to !== null}
      title="Leave without saving?"
      confirmLabel="Leave"
      onConfirm={() => to !== null && onLeave(to)}
      onCancel={onStay}
    >
      <p>What you typed stays on this device for a fortnight and is offered to you when you come back. Nobody else sees it until you save.</p>
    </ConfirmDialog>
  );
}
