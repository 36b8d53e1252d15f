import type { Range } from "@/lib/core/units/spread";
import type { Part } from "./list-parts";

/** Values chosen for some parts, by path; the others are nominal. */
export type Choice = Readonly<Record<string, number>>;

export interface Corner {
  value: number;
  choice: Choice;
}

export interface MetricCorners {
  nominal: number;
  least: Corner;
  most: Corner;
  /** How far the metric moves as one part goes through its range, the others nominal; in the parts' order. */
  swings: number[];
}

/**
 * Least and most of several figures of a circuit over its parts' ranges. Each figure is monotone in each part, so its
 * extremes lie at corners; which corner follows from moving one part at a time.
 * @param measure the figures for a choice, always as many and in one order.
 * @param passes how often each found corner is tried part by part for a better neighbour; 0 trusts the first guess.
 * Limits: exact where each figure is monotone in each part over the whole range; a local extreme otherwise.
 */
export function findCorners(parts: readonly Part[], measure: (choice: Choice) => readonly number[], passes: number): MetricCorners[] {
  const known = new Map<string, readonly number[]>();
  const look = (choice: Choice) => {
    const key = parts.map(({ path, nominal }) => choice[path] ?? nominal).join();
    const earlier = known.get(key);
    if (earlier) return earlier;
    const found = measure(choice);
    known.set(key, found);
    return found;
  };
  const nominal = look({});
  const lows = parts.map(({ path, range }) => look({ [path]: range.min }));
  const highs = parts.map(({ path, range }) => look({ [path]: range.max }));
  return nominal.map((value, metric) => {
    const at = (choice: Choice) => look(choice)[metric] ?? NaN;
    const swings = parts.map((_, i) => (highs[i]?.[metric] ?? NaN) - (lows[i]?.[metric] ?? NaN));
    const extreme = (wanted: 1 | -1): Corner => {
      const choice: Record<string, number> = {};
      parts.forEach(({ path, range }, i) => {
        choice[path] = (swings[i] ?? 0) * wanted >= 0 ? range.max : range.min;
      });
      let best = at(choice);
      for (let pass = 0; pass < passes; pass += 1) {
        let better = false;
        for (const { path, range } of parts) {
          const other = { ...choice, [path]: choice[path] === range.max ? range.min : range.max };
          const found = at(other);
          if ((found - best) * wanted > 1e-12 * Math.abs(best)) {
            best = found;
            choice[path] = other[path] as number;
            better = true;
          }
        }
        if (!better) break;
      }
      // The nominal circuit and each part moved alone are circuits too.
      return { value: best, choice };
    };
    return { nominal: value, least: extreme(-1), most: extreme(1), swings };
  });
}

export function rangeOf({ least, most, nominal }: MetricCorners): Range {
  return { min: Math.min(least.value, nominal, most.value), max: Math.max(most.value, nominal, least.value) };
}
