import type { ChartMetrics } from "@/lib/core/chart";

/** Sizes at full scale, px. */
const FULL: ChartMetrics = { cardWidth: 196, tapeHeight: 26, jackPitch: 28, cardGap: 10, trackPitch: 12, outTagWidth: 34, inTagWidth: 152, gutterMin: 110, tagHeight: 20 };
/** The same where the frame is too narrow for those: tags without volts, shorter tape. */
const COMPACT: ChartMetrics = { ...FULL, cardWidth: 150, inTagWidth: 92, gutterMin: 60 };
export const FOOT_HEIGHT = 28;
export const FONT_PX = 14;
/** Below this the lettering would be too small to read; the board then scrolls sideways in its own frame. */
export const LEAST_SCALE = 0.72;

export function scaledMetrics(scale: number, isCompact = false): ChartMetrics {
  return Object.fromEntries(Object.entries(isCompact ? COMPACT : FULL).map(([name, value]) => [name, value * scale])) as unknown as ChartMetrics;
}

/** The scale at which a board of this natural width fits its frame. */
export function fitScale(naturalWidth: number, frameWidth: number): number {
  if (frameWidth <= 0) return 1;
  return Math.max(LEAST_SCALE, Math.min(1, frameWidth / naturalWidth));
}
