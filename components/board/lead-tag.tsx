"use client";
import clsx from "clsx";
import { memo } from "react";
import { formatRange } from "@/lib/core/units/format-quantity";
import type { Tag } from "@/lib/core/chart";
import type { LeadCheck } from "@/lib/core/electrics/patch-types";
import type { Lead } from "@/lib/schemas/patch";
import { VERDICT_TONE } from "../chart/verdict-tone";

interface LeadTagProps {
  tag: Tag;
  leads: readonly Lead[];
  check: LeadCheck | undefined;
  /** `Kick trigger · Trig out → Low drum · Trig` */
  label: string;
  pickedLeadId: string | null;
  showsVolts: boolean;
  isDim: boolean;
  canEdit: boolean;
  onPick: (leadId: string) => void;
  onUnplug: (leadIds: readonly string[]) => void;
}

/** A lead's tag at one of its ends; at the input it says number, volts and verdict. Dragged off, it unplugs. */
export const LeadTag = memo(function LeadTag({ tag, leads, check, label, pickedLeadId, showsVolts, isDim, canEdit, onPick, onUnplug }: LeadTagProps) {
  const first = leads[0];
  if (!first) return null;
  const numbers = leads.map((lead) => lead.number).join("+");
  const volts = check?.highV ? formatRange(check.highV, "V") : null;
  const isIn = tag.end === "in";
  const picked = leads.findIndex((lead) => lead.id === pickedLeadId);
  const isPicked = picked >= 0;
  // Of leads that share a jack, each press picks the next.
  const next = leads[(picked + 1) % leads.length] ?? first;
  const words = isIn && check ? `, ${volts ? `${volts} when struck, ` : ""}${check.verdict}` : "";
  return (
    <button
      type="button"
      data-lead-tag={isIn && leads.length === 1 ? first.id : undefined}
      data-tag-of={isIn ? leads.map((lead) => lead.id).join(" ") : undefined}
      data-picked={isPicked || undefined}
      aria-label={`Lead ${numbers}, ${label}${words}`}
      onClick={() => onPick(next.id)}
      onKeyDown={(event) => {
        if (canEdit && (event.key === "Delete" || event.key === "Backspace")) {
          event.preventDefault();
          onUnplug(leads.map((lead) => lead.id));
        }
      }}
      style={{ left: tag.x, top: tag.y, width: tag.width, height: tag.height }}
      className={clsx("absolute flex scroll-mt-8 scroll-mb-[50dvh] touch-none items-center", isIn ? "justify-end pr-3" : "justify-start pl-2", isDim && "opacity-65")}
    >
      <span className={clsx("flex h-full items-center gap-1 border px-1 font-tape text-[1.12em] leading-none font-bold whitespace-nowrap", isPicked ? "border-ink bg-mark text-mark-ink" : "border-line bg-raised text-ink")}>
        <span>{numbers}</span>
        {isIn && volts && showsVolts ? <span className="font-semibold">{volts}</span> : null}
        {isIn && check ? <span className={clsx("group-data-checking/board:italic group-data-checking/board:after:content-['…']", !isPicked && !isDim && VERDICT_TONE[check.verdict])}>{check.verdict}{check.assumed.length > 0 ? "*" : ""}</span> : null}
      </span>
    </button>
  );
});
