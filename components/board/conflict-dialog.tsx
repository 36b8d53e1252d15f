"use client";
import { useState } from "react";
import { Button } from "../ui/button";
import { Dialog } from "../ui/dialog";
import { describeChanges, describeKnob, describeLead, type Names } from "./describe-changes";
import type { Conflict } from "./merge-patches";
import type { OpenConflict } from "./use-patch-editor";

interface ConflictDialogProps {
  conflict: OpenConflict | null;
  isOpen: boolean;
  names: Names;
  onSettle: (takeMine: ReadonlySet<string>) => void;
  /** Nothing is chosen yet, and nothing saved. */
  onPutOff: () => void;
}

/** Two people changed the same thing: asks, one by one, whose stays. Everything else is already kept from both. */
export function ConflictDialog({ conflict, isOpen, names, onSettle, onPutOff }: ConflictDialogProps) {
  const open = isOpen && conflict !== null && conflict.merge.conflicts.length > 0;
  return (
    <Dialog open={open} title="Somebody else changed the same thing" onClose={onPutOff}>
      {open ? <Choices key={conflict.theirs.revision} conflict={conflict} names={names} onSettle={onSettle} onPutOff={onPutOff} /> : null}
    </Dialog>
  );
}

function Choices({ conflict, names, onSettle, onPutOff }: Omit<ConflictDialogProps, "conflict" | "isOpen"> & { conflict: OpenConflict }) {
  const [mine, setMine] = useState<ReadonlySet<string>>(new Set());
  const { conflicts } = conflict.merge;
  const choose = (id: string, takeMine: boolean) => setMine((before) => {
    const next = new Set(before);
    if (takeMine) next.add(id);
    else next.delete(id);
    return next;
  });
  return (
    <>
      <p className="mb-4">Their save is revision {conflict.theirs.revision}. What only one of you changed is kept from both; choose for the rest.</p>
      <ul className="mb-4 flex flex-col gap-4">
        {conflicts.map((item) => (
          <li key={item.id}>
            <fieldset className="border border-line p-3">
              <legend className="px-1 font-semibold">{titleOf(item, names)}</legend>
              {([false, true] as const).map((isMine) => (
                <label key={String(isMine)} className="flex min-h-9 items-center gap-2">
                  <input type="radio" name={`conflict-${item.id}`} checked={mine.has(item.id) === isMine} onChange={() => choose(item.id, isMine)} className="size-5 accent-ink" />
                  <span>{isMine ? "Mine" : "Theirs"}: {sayOf(item, isMine ? "mine" : "theirs", names)}</span>
                </label>
              ))}
            </fieldset>
          </li>
        ))}
      </ul>
      <details className="mb-4">
        <summary className="min-h-9 py-1 underline">All that each of you changed</summary>
        <Changes title="Mine" changes={describeChanges(conflict.base, conflict.mine, names)} />
        <Changes title="Theirs" changes={describeChanges(conflict.base, conflict.theirs.patch, names)} />
      </details>
      <div className="flex flex-wrap justify-end gap-3">
        <Button onClick={onPutOff}>Not now</Button>
        <Button onClick={() => onSettle(new Set())}>Take all of theirs</Button>
        <Button onClick={() => onSettle(new Set(conflicts.map((item) => item.id)))}>Keep all of mine</Button>
        <Button tone="primary" onClick={() => onSettle(mine)}>Go on with this choice</Button>
      </div>
    </>
  );
}

function Changes({ title, changes }: { title: string; changes: readonly string[] }) {
  return (
    <>
      <h3 className="mt-2 font-semibold">{title}</h3>
      <ul className="list-disc pl-6">{changes.length === 0 ? <li>Only the order of cards.</li> : changes.map((text) => <li key={text}>{text}</li>)}</ul>
    </>
  );
}

function titleOf(item: Conflict, names: Names): string {
  if (item.kind === "lead") return `Lead ${(item.mine ?? item.theirs)?.number ?? ""}`;
  const knob = item.mine ?? item.theirs;
  return knob ? names.knob(knob.gearId, knob.knobId) : "A knob";
}

function sayOf(item: Conflict, side: "mine" | "theirs", names: Names): string {
  return item.kind === "lead" ? describeLead(item[side], names) : describeKnob(item[side]);
}
