import { toRange, type Range, type Spread } from "@/lib/core/units/spread";

/** Usual tolerances of parts stated as one number. Source: electrics §3; IEC 60063 practice. */
const RESISTOR = 0.05;
const FILM = 0.1;
const ELECTROLYTIC = 0.2;
/** From here up a capacitor is taken to be an electrolytic. Common practice, no source. */
const ELECTROLYTIC_F = 1e-6;

const PART = /^(divider|coupling|threshold|output|envelope)\./;

/** The range a part can have: its stated spread, or the usual tolerance around one number. Other figures keep their own. */
export function partRange(spread: Spread, path: string): Range {
  if (typeof spread !== "number" || !PART.test(path)) return toRange(spread);
  const tol = path.endsWith("farad") ? (spread >= ELECTROLYTIC_F ? ELECTROLYTIC : FILM) : RESISTOR;
  return toRange({ nominal: spread, tol });
}
