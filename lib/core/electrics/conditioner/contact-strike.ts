import type { ConditionerSpec } from "./conditioner-types";

/** A switch contact as it closes, bounces, holds and opens. */
export interface Contact {
  openOhm: number;
  closedOhm: number;
  /** How often it opens again before it holds; 0: a clean contact. */
  bounces: number;
  /** From first touch to the last bounce, s. */
  bounceS: number;
  /** Held from there, s. */
  holdS: number;
}

/** A contact's own edge, s: faster than any circuit here. */
const EDGE_S = 1e-7;
const MOST_BOUNCES = 1000;

/**
 * A switch contact as a strike for `simulateConditioner`: closed and open by turns, each turn half as long again closed as
 * open, over the time it bounces. Common practice, no source; contacts differ, and a capture of yours is better.
 * @throws RangeError on figures that are no contact.
 */
export function contactStrike({ openOhm, closedOhm, bounces, bounceS, holdS }: Contact): ConditionerSpec["strike"] {
  if (!(closedOhm > 0 && openOhm > closedOhm && Number.isFinite(openOhm))) throw new RangeError(`a contact is open at more than it is closed, above 0 Ω: ${openOhm}, ${closedOhm}`);
  if (!(Number.isInteger(bounces) && bounces >= 0 && bounces <= MOST_BOUNCES)) throw new RangeError(`bounces must be a whole number up to ${MOST_BOUNCES}: ${bounces}`);
  const turnS = bounces > 0 ? bounceS / bounces : 0;
  if (!(holdS >= 10 * EDGE_S && holdS <= 3600) || (bounces > 0 && !(turnS >= 10 * EDGE_S && bounceS <= 3600))) throw new RangeError(`bounces and hold must last: ${bounceS} s, ${holdS} s`);
  const samples: [number, number][] = [[0, openOhm], [EDGE_S, closedOhm]];
  const turnAt = (timeS: number, ohm: number) => samples.push([timeS, samples.at(-1)?.[1] ?? openOhm], [timeS + EDGE_S, ohm]);
  for (let i = 0; i < bounces; i += 1) {
    turnAt((i + 0.6) * turnS, openOhm);
    turnAt((i + 1) * turnS, closedOhm);
  }
  turnAt(bounceS * Math.sign(bounces) + holdS, openOhm);
  return { samples };
}
