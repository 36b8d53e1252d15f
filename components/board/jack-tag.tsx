"use client";
import clsx from "clsx";
import { memo, type KeyboardEvent } from "react";
import type { Jack } from "@/lib/schemas/jack";
import { VERDICT_TONE } from "../chart/verdict-tone";
import { usePlugging } from "./board-context";
import { sideOf } from "./board-lanes";

interface JackTagProps {
  jack: Jack;
  cardName: string;
  isPlugged: boolean;
  /** From the card's top to the middle of its row. */
  middle: number;
  height: number;
}

/** A jack's label (the canvas watches for drags): drag it onto another, tap it and then the other, or press Enter for the list of free jacks. */
export const JackTag = memo(function JackTag({ jack, cardName, isPlugged, middle, height }: JackTagProps) {
  const side = sideOf(jack.direction);
  const { from, would, canEdit, tap, openList, unplugJack } = usePlugging();
  const isFrom = from?.jackId === jack.id;
  const isTarget = from !== null && from.side !== side;
  const outcome = isTarget ? would.get(jack.id) : undefined;

  function onKeyDown(event: KeyboardEvent) {
    if (!canEdit) return;
    if (event.key === "Enter" || event.key === " ") {
      event.preventDefault();
      openList(jack.id);
    } else if (event.key === "Delete" || event.key === "Backspace") {
      event.preventDefault();
      unplugJack(jack.id);
    }
  }

  return (
    <button
      type="button"
      data-jack={jack.id}
      data-side={side}
      aria-label={`${cardName}, ${jack.name}, ${jack.direction}${isPlugged ? ", plugged" : ", free"}${outcome ? `, would be ${outcome.verdict}` : ""}`}
      aria-pressed={isFrom}
      disabled={!canEdit}
      onKeyDown={onKeyDown}
      onClick={() => tap(jack.id)}
      style={{ top: middle - height / 2, height }}
      className={clsx(
        "absolute flex touch-none items-center gap-1 px-1.5 text-[0.86em] leading-none whitespace-nowrap disabled:opacity-100",
        side === "in" ? "left-0 border-l-4 text-left" : "right-0 border-r-4 flex-row-reverse text-right",
        isPlugged ? "border-ink font-semibold" : "border-line",
        outcome ? "z-[1] max-w-full" : "max-w-[52%]",
        isFrom ? "bg-mark text-mark-ink" : "bg-floor",
        isTarget && "data-[over]:outline-3 data-[over]:outline-offset-1 data-[over]:outline-ink",
        from !== null && !isTarget && !isFrom && "opacity-50",
      )}
    >
      <span className="truncate">{jack.name}</span>
      {outcome ? <span className={clsx("font-bold", VERDICT_TONE[outcome.verdict])}>{outcome.verdict}</span> : null}
    </button>
  );
});
