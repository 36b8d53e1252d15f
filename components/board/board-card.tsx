"use client";
import { useSortable } from "@dnd-kit/sortable";
import { CSS } from "@dnd-kit/utilities";
import clsx from "clsx";
import { memo } from "react";
import { clockText, type PlacedCard, type PlacedJack } from "@/lib/core/chart";
import type { Gear } from "@/lib/schemas/gear";
import { ClockDial } from "../chart/clock-dial";
import type { DragData } from "./drag-data";
import { JackTag } from "./jack-tag";

interface BoardCardProps {
  gear: Gear;
  box: PlacedCard;
  /** Places of its jacks; empty while folded. */
  jacks: readonly PlacedJack[];
  plugged: ReadonlySet<string>;
  knobs: readonly { knobId: string; position: number }[];
  isDim: boolean;
  isPicked: boolean;
  canEdit: boolean;
  tapeHeight: number;
  rowHeight: number;
  footHeight: number;
  onPick: (gearId: string) => void;
  onKnobs: (gearId: string) => void;
}

/** A card: a strip of tape with its name over its jacks, inputs left, outputs right, knobs of this song in the foot. */
export const BoardCard = memo(function BoardCard({ gear, box, jacks, plugged, knobs, isDim, isPicked, canEdit, tapeHeight, rowHeight, footHeight, onPick, onKnobs }: BoardCardProps) {
  const data: DragData = { type: "card", cardId: gear.id, lane: box.lane };
  const { attributes, listeners, setNodeRef, setActivatorNodeRef, transform, transition, isDragging } = useSortable({ id: gear.id, data, disabled: !canEdit });
  const at = new Map(jacks.map((jack) => [jack.id, jack]));
  return (
    <div
      ref={setNodeRef}
      data-card={gear.id}
      style={{ left: box.x, top: box.y, width: box.width, height: box.height, transform: CSS.Translate.toString(transform), transition: transition }}
      className={clsx("absolute bg-bench", !isPicked && "border-b-2 border-line-soft", isPicked && "outline-3 outline-mark", isDim && "opacity-65", isDragging && "opacity-40", "has-[>.tape:focus-visible]:z-[2]")}
    >
      <button
        type="button"
        ref={setActivatorNodeRef}
        {...(canEdit ? attributes : {})}
        {...(canEdit ? listeners : {})}
        aria-roledescription="card"
        aria-disabled={undefined}
        onClick={() => onPick(gear.id)}
        style={{ height: tapeHeight }}
        className="tape block w-full touch-none truncate px-2 text-left text-[1.3em] leading-none"
        title={gear.retired ? `${gear.name} (retired)` : gear.name}
      >
        {gear.name}{gear.retired ? " (retired)" : ""}
      </button>
      {gear.jacks.map((jack) => {
        const place = at.get(jack.id);
        return place ? <JackTag key={jack.id} jack={jack} cardName={gear.name} isPlugged={plugged.has(jack.id)} middle={place.y - box.y} height={rowHeight - 4} /> : null;
      })}
      {footHeight > 0 && jacks.length > 0 ? (
        <button
          type="button"
          onClick={() => onKnobs(gear.id)}
          style={{ height: footHeight }}
          aria-label={`Knobs of ${gear.name}: ${knobs.length === 0 ? "none set in this song" : knobs.map((knob) => `${nameOf(gear, knob.knobId)} at ${clockText(knob.position)}`).join(", ")}`}
          className="absolute bottom-0 flex w-full items-center gap-2 overflow-hidden border-t border-line-soft px-1.5 text-[0.8em] text-ink hover:underline"
        >
          {knobs.length === 0 ? <span>{canEdit ? "Set a knob" : "No knob set"}</span> : knobs.map((knob) => (
            <span key={knob.knobId} className="flex items-center gap-1 whitespace-nowrap" aria-hidden="true">
              <ClockDial position={knob.position} size={Math.round(footHeight * 0.68)} />
              {nameOf(gear, knob.knobId)}
            </span>
          ))}
        </button>
      ) : null}
    </div>
  );
});

function nameOf(gear: Gear, knobId: string): string {
  return gear.knobs.find((knob) => knob.id === knobId)?.name ?? "Knob";
}
