/** Preferred numbers for resistors and capacitors: IEC 60063:2015. */
export type SeriesName = "E3" | "E6" | "E12" | "E24" | "E48" | "E96";

const E12 = [10, 12, 15, 18, 22, 27, 33, 39, 47, 56, 68, 82];
// Not round(10·10^(i/24)): eight values differ by tradition.
const E24 = [10, 11, 12, 13, 15, 16, 18, 20, 22, 24, 27, 30, 33, 36, 39, 43, 47, 51, 56, 62, 68, 75, 82, 91];
const computed = (steps: number): number[] => Array.from({ length: steps }, (_, i) => Math.round(100 * 10 ** (i / steps)));

/** The values of one decade, as whole numbers: two figures to E24, three from E48. */
export const E_SERIES: Readonly<Record<SeriesName, readonly number[]>> = {
  E3: [10, 22, 47],
  E6: [10, 15, 22, 33, 47, 68],
  E12,
  E24,
  E48: computed(48),
  E96: computed(96),
};

/**
 * All preferred values between two bounds, both included, rising.
 * @param series which series.
 * @param min least value wanted, SI, above 0.
 * @param max greatest value wanted, SI.
 * @throws RangeError unless 0 < min, max finite.
 */
export function preferredBetween(series: SeriesName, min: number, max: number): number[] {
  requirePositive(min);
  requirePositive(max);
  const values: number[] = [];
  for (let decade = Math.floor(Math.log10(min)); decade <= Math.ceil(Math.log10(max)); decade += 1) {
    for (const figure of E_SERIES[series]) {
      const value = inDecade(series, figure, decade);
      if (value >= min && value <= max) values.push(value);
    }
  }
  return values;
}

/** The preferred value nearest by ratio: 42.6 kΩ is 39 kΩ in E12 and 43 kΩ in E24. @throws RangeError unless value is finite and above 0. */
export function nearestPreferred(value: number, series: SeriesName): number {
  const below = preferredBelow(value, series);
  const above = preferredAbove(value, series);
  return value / below <= above / value ? below : above;
}

/** The least preferred value at or above `value`. @throws RangeError unless value is finite and above 0. */
export function preferredAbove(value: number, series: SeriesName): number {
  requirePositive(value);
  return preferredBetween(series, value, value * 11)[0] ?? value;
}

/** The greatest preferred value at or below `value`. @throws RangeError unless value is finite and above 0. */
export function preferredBelow(value: number, series: SeriesName): number {
  requirePositive(value);
  return preferredBetween(series, value / 11, value).at(-1) ?? value;
}

function inDecade(series: SeriesName, figure: number, decade: number): number {
  const figures = series === "E48" || series === "E96" ? 2 : 1;
  return Number(`${figure}e${decade - figures}`);
}

function requirePositive(value: number): void {
  if (!(value > 0) || !Number.isFinite(value)) throw new RangeError(`needs a finite value above 0: ${value}`);
}
