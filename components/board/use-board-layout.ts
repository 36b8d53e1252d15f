"use client";
import { useMemo } from "react";
import { layoutChart, type ChartLayout } from "@/lib/core/chart";
import type { Gear } from "@/lib/schemas/gear";
import type { Lead } from "@/lib/schemas/patch";
import { toChartCards } from "./board-lanes";
import { fitScale, FOOT_HEIGHT, LEAST_SCALE, scaledMetrics } from "./board-metrics";

interface BoardLayout {
  layout: ChartLayout;
  scale: number;
  /** Tags without volts: all four lanes would not fit otherwise. */
  isCompact: boolean;
}

/** The chart of these cards and leads, at the scale that fits the frame (or full size). */
export function useBoardLayout(cards: readonly Gear[], leads: readonly Lead[], folded: ReadonlySet<string>, frameWidth: number, fits: boolean): BoardLayout {
  return useMemo(() => {
    const at = (scale: number, isCompact = false) => {
      const knobs = new Map(cards.map((card) => [card.id, card.knobs.length]));
      const chartCards = toChartCards(cards, { folded: (id) => folded.has(id), footHeight: (id) => ((knobs.get(id) ?? 0) > 0 ? FOOT_HEIGHT * scale : 0) });
      return layoutChart({ cards: chartCards, leads: leads.map((lead) => ({ id: lead.id, from: lead.outputId, to: lead.inputId })), metrics: scaledMetrics(scale, isCompact) });
    };
    const natural = at(1);
    const scale = fits ? fitScale(natural.width, frameWidth) : 1;
    if (scale > LEAST_SCALE || frameWidth <= 0) return { layout: scale === 1 ? natural : at(scale), scale, isCompact: false };
    const compactScale = fitScale(at(1, true).width, frameWidth);
    const isCompact = compactScale > LEAST_SCALE;
    return isCompact ? { layout: at(compactScale, true), scale: compactScale, isCompact } : { layout: at(scale), scale, isCompact };
  }, [cards, fits, folded, frameWidth, leads]);
}
