"use client";

import { ConfirmDialog } from "@/components/ui/dialog";
import type { Gear } from "@/lib/schemas/gear";

interface RetireDialogProps {
  gear: Gear | null;
  busy: boolean;
  onRetire: (gear: Gear) => void;
  onCancel: () => void;
}

export function RetireDialog({ gear, busy, onRetire, onCancel }: RetireDialogProps) {
  return (
    <ConfirmDialog
      open={gear !== null}
      title={`Retire “${gear?.name ?? ""}”?`}
      confirmLabel="Retire it"
      danger
      busy={busy}
      onConfirm={() => gear && onRetire(gear)}
      onCancel={onCancel}
    >
      <p>It leaves the list and the boards. Nothing is deleted: songs keep the leads that use it, and you can bring it back at any time.</p>
    </ConfirmDialog>
  );
}
