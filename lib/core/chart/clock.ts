/** A knob turns from 7 o'clock round to 5 o'clock: 300° of the dial, common practice, no source. */
const FIRST_HOUR = 7;
const HOURS = 10;

/**
 * A knob's position as a person says it, to the half hour.
 * @param position 0 = fully anticlockwise … 1 = fully clockwise.
 */
export function clockText(position: number): string {
  const halves = Math.round(position * HOURS * 2);
  const hours = Math.floor(halves / 2);
  const hour = ((FIRST_HOUR + hours - 1) % 12) + 1;
  return halves % 2 === 1 ? `half past ${hour}` : `${hour} o’clock`;
}

/** Degrees clockwise from 12 o'clock, −150…150. */
export function clockDegrees(position: number): number {
  return -150 + 300 * position;
}

/** The positions a person can name, every half hour, 0…1. */
export const CLOCK_STEPS: readonly number[] = Array.from({ length: HOURS * 2 + 1 }, (_, i) => i / (HOURS * 2));
