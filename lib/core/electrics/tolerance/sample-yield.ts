import type { Choice } from "./find-corners";
import type { Part } from "./list-parts";
import { seededRandom } from "./seeded-random";

/**
 * Share of built circuits that work, from a seeded sample: every part anywhere in its range, all as likely, each for itself.
 * @param works whether the circuit with these values does its job.
 * @returns 0…1; the spread of the estimate is √(p(1 − p)/count).
 */
export function sampleYield(parts: readonly Part[], works: (choice: Choice) => boolean, count: number, seed: number): number {
  if (parts.length === 0) return works({}) ? 1 : 0;
  const next = seededRandom(seed);
  let good = 0;
  for (let i = 0; i < count; i += 1) {
    const choice: Record<string, number> = {};
    for (const { path, range } of parts) choice[path] = range.min + (range.max - range.min) * next();
    if (works(choice)) good += 1;
  }
  return good / count;
}
