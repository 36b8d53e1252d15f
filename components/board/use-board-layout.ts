"use client";
import { useMemo } from "react";
import { layoutChart, type ChartLayout } from "@/lib/core/chart";
import type { Gear } from "@/lib/schemas/gear";
import type { Lead } from "@/lib/schemas/patch";
import { toChartCards } from "./board-lanes";
import { fitScale, FOOT_HEIGHT, scaledMetrics } from "./board-metrics";

interface BoardLayout {
  layout: ChartLayout;
  scale: number;
}

/** The chart of these cards and leads, at the scale that fits the frame (or full size). */
export function useBoardLayout(cards: readonly Gear[], leads: readonly Lead[], folded: ReadonlySet<string>, frameWidth: number, fits: boolean): BoardLayout {
  return useMemo(() => {
    const at = (scale: number) => {
      const knobs = new Map(cards.map((card) => [card.id, card.knobs.length]));
      const chartCards = toChartCards(cards, { folded: (id) => folded.has(id), footHeight: (id) => ((knobs.get(id) ?? 0) > 0 ? FOOT_HEIGHT * scale : 0) });
      return layoutChart({ cards: chartCards, leads: leads.map((lead) => ({ id: lead.id, from: lead.outputId, to: lead.inputId })), metrics: scaledMetrics(scale) });
    };
    const natural = at(1);
    const scale = fits ? fitScale(natural.width, frameWidth) : 1;
    return { layout: scale === 1 ? natural : at(scale), scale };
  }, [cards, fits, folded, frameWidth, leads]);
}
