"use client";
import { clockText } from "@/lib/core/chart";
import { ClockDial } from "../chart/clock-dial";
import { Button } from "../ui/button";
import { Dialog } from "../ui/dialog";
import type { Gear } from "@/lib/schemas/gear";
import type { KnobPosition } from "@/lib/schemas/patch";
import type { PatchEdit } from "./patch-reducer";

interface KnobDialogProps {
  gear: Gear | null;
  knobs: readonly KnobPosition[];
  canEdit: boolean;
  edit: (edit: PatchEdit) => void;
  onClose: () => void;
}

const MIDDLE = 0.5;

/** The knobs of one box in this song, as clock positions. */
export function KnobDialog({ gear, knobs, canEdit, edit, onClose }: KnobDialogProps) {
  return (
    <Dialog open={gear !== null} title={`Knobs of ${gear?.name ?? ""}`} onClose={onClose} footer={<Button tone="primary" onClick={onClose}>Done</Button>}>
      <ul className="flex flex-col gap-4">
        {gear?.knobs.map((knob) => {
          const set = knobs.find((item) => item.gearId === gear.id && item.knobId === knob.id);
          const turn = (position: number | null) => edit({ type: "knob", gearId: gear.id, knobId: knob.id, position });
          const sliderId = `knob-${knob.id}`;
          return (
            <li key={knob.id} className="flex flex-wrap items-center gap-3">
              <ClockDial position={set?.position ?? MIDDLE} size={40} className={set ? "" : "opacity-30"} />
              {set ? <label htmlFor={sliderId} className="min-w-24 font-semibold">{knob.name}</label> : <span className="min-w-24 font-semibold">{knob.name}</span>}
              {set ? (
                <>
                  <input
                    id={sliderId} type="range" min={0} max={20} step={1} disabled={!canEdit} value={Math.round(set.position * 20)} aria-valuetext={clockText(set.position)}
                    onChange={(event) => turn(event.target.valueAsNumber / 20)} className="h-8 min-w-40 flex-1 accent-ink"
                  />
                  <span className="min-w-28">{clockText(set.position)}</span>
                  {canEdit ? <Button onClick={() => turn(null)}>Leave alone</Button> : null}
                </>
              ) : (
                <>
                  <span className="flex-1 text-ink-soft">left alone in this song</span>
                  {canEdit ? <Button aria-label={`Set ${knob.name}`} onClick={() => turn(MIDDLE)}>Set it</Button> : null}
                </>
              )}
            </li>
          );
        })}
      </ul>
    </Dialog>
  );
}
