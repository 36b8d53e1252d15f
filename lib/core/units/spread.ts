/**
 * Quantities that are not known exactly. Everything is SI; the unit stands in
 * the name of the field that holds a spread (`loadOhm`, `safeV`).
 */

/** A closed interval, min ≤ max, SI. */
export interface Range {
  min: number;
  max: number;
}

/** A nominal value and a relative tolerance, 0 ≤ tol < 1 (0.05 = ±5 %). */
export interface Toleranced {
  nominal: number;
  tol: number;
}

/** An exact value, a range, or a nominal value with a relative tolerance. */
export type Spread = number | Range | Toleranced;

/** Limits of which either side may be absent (a pulse no shorter than…). */
export interface Limits {
  min?: number;
  max?: number;
}

/**
 * The interval a spread stands for.
 * @throws RangeError when it is not finite, is upside down, or tol is outside 0…1.
 */
export function toRange(spread: Spread): Range {
  if (typeof spread === "number") {
    if (!Number.isFinite(spread)) throw new RangeError(`not a finite number: ${spread}`);
    return { min: spread, max: spread };
  }
  if ("nominal" in spread) {
    const { nominal, tol } = spread;
    if (!Number.isFinite(nominal)) throw new RangeError(`not a finite number: ${nominal}`);
    if (!(tol >= 0 && tol < 1)) throw new RangeError(`tolerance must lie in 0…1 (exclusive): ${tol}`);
    const half = Math.abs(nominal) * tol;
    return { min: nominal - half, max: nominal + half };
  }
  const { min, max } = spread;
  if (!Number.isFinite(min) || !Number.isFinite(max)) throw new RangeError(`not a finite range: ${min}…${max}`);
  if (min > max) throw new RangeError(`range is upside down: ${min}…${max}`);
  return { min, max };
}

/** The middle of a spread: the nominal value where one is stated, else the midpoint. */
export function nominalOf(spread: Spread): number {
  if (typeof spread === "number") return spread;
  return "nominal" in spread ? spread.nominal : (spread.min + spread.max) / 2;
}
