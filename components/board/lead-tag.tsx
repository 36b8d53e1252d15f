"use client";
import { useDraggable } from "@dnd-kit/core";
import clsx from "clsx";
import { memo } from "react";
import { formatRange } from "@/lib/core/units/format-quantity";
import type { Tag } from "@/lib/core/chart";
import type { LeadCheck } from "@/lib/core/electrics/patch-types";
import type { Lead } from "@/lib/schemas/patch";
import { VERDICT_TONE } from "../chart/verdict-tone";
import type { DragData } from "./drag-data";

interface LeadTagProps {
  tag: Tag;
  leads: readonly Lead[];
  check: LeadCheck | undefined;
  /** `Kick trigger · Trig out → Low drum · Trig` */
  label: string;
  isDim: boolean;
  isPicked: boolean;
  canEdit: boolean;
  onPick: (leadId: string) => void;
  onUnplug: (leadIds: readonly string[]) => void;
}

/** A lead's tag at one of its ends; at the input it says number, volts and verdict. Dragged off, it unplugs. */
export const LeadTag = memo(function LeadTag({ tag, leads, check, label, isDim, isPicked, canEdit, onPick, onUnplug }: LeadTagProps) {
  const first = leads[0];
  const data: DragData = { type: "lead", leadId: first?.id ?? "" };
  const drag = useDraggable({ id: `tag:${tag.end}:${tag.jackId}`, data, disabled: !canEdit || tag.end === "out" || leads.length !== 1 });
  if (!first) return null;
  const numbers = leads.map((lead) => lead.number).join("+");
  const volts = check?.highV ? formatRange(check.highV, "V") : null;
  const isIn = tag.end === "in";
  const words = isIn && check ? `, ${volts ? `${volts} when struck, ` : ""}${check.verdict}` : "";
  return (
    <button
      ref={drag.setNodeRef}
      type="button"
      data-lead-tag={isIn ? first.id : undefined}
      aria-label={`Lead ${numbers}, ${label}${words}`}
      onPointerDown={drag.listeners?.onPointerDown as React.PointerEventHandler | undefined}
      onClick={() => onPick(first.id)}
      onKeyDown={(event) => {
        if (canEdit && (event.key === "Delete" || event.key === "Backspace")) {
          event.preventDefault();
          onUnplug(leads.map((lead) => lead.id));
        }
      }}
      style={{ left: tag.x, top: tag.y, width: tag.width, height: tag.height }}
      className={clsx("absolute flex touch-none items-center", isIn ? "justify-end pr-3" : "justify-start pl-2", isDim && "opacity-65", drag.isDragging && "opacity-40")}
    >
      <span className={clsx("flex h-full items-center gap-1 border bg-raised px-1 font-tape text-[1.12em] leading-none font-bold whitespace-nowrap", isPicked ? "border-ink bg-mark text-mark-ink" : "border-line text-ink")}>
        <span>{numbers}</span>
        {isIn && volts ? <span className="font-semibold">{volts}</span> : null}
        {isIn && check ? <span className={clsx(!isPicked && !isDim && VERDICT_TONE[check.verdict])}>{check.verdict}{check.assumed.length > 0 ? "*" : ""}</span> : null}
      </span>
    </button>
  );
});
