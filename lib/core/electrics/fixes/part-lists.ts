import { preferredBetween, type SeriesName } from "@/lib/core/units/e-series";
import type { FixOptions } from "../connection-types";

export const RESISTOR_TOL = 0.05;
const LEAST_OHM = 100;
const MOST_OHM = 1e6;

/** Lists of resistors to choose from, the better liked first: the drawer alone where there is one, else E12, then E24. */
export function resistorLists(options: FixOptions): number[][] {
  if (options.drawerOhm) return [usable(options.drawerOhm)];
  return [series("E12"), series("E24")];
}

/** As {@link resistorLists} with the tolerance each is bought at; where ±5 % leaves too little room, E24 at ±1 %. */
export function closerResistorLists(options: FixOptions): { list: number[]; tol: number }[] {
  const tol = options.resistorTol ?? RESISTOR_TOL;
  const lists = resistorLists(options).map((list) => ({ list, tol }));
  return options.drawerOhm || options.resistorTol !== undefined ? lists : [...lists, { list: series("E24"), tol: 0.01 }];
}

/** Capacitors likewise: E6 first, as they are mostly sold, then E12. */
export function capacitorLists(options: FixOptions): number[][] {
  if (options.drawerFarad) return [usable(options.drawerFarad)];
  return (["E6", "E12"] as const).map((name) => preferredBetween(name, 10e-12, 1e-3));
}

const cache = new Map<SeriesName, number[]>();

function series(name: SeriesName): number[] {
  const known = cache.get(name) ?? preferredBetween(name, LEAST_OHM, MOST_OHM);
  cache.set(name, known);
  return known;
}

function usable(parts: readonly number[]): number[] {
  return [...new Set(parts)].filter((value) => Number.isFinite(value) && value > 0).sort((a, b) => a - b);
}

/** The parts of a rising list on either side of a wanted value. */
export function around(list: readonly number[], wanted: number): number[] {
  const above = list.findIndex((value) => value >= wanted);
  if (above === -1) return list.slice(-1);
  return list.slice(Math.max(0, above - 1), above + 1);
}
