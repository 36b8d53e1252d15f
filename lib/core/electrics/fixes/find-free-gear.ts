import { checkBare } from "../check-bare";
import type { Connection, FixOptions, ThroughGearFix } from "../connection-types";
import { worstVerdict } from "../judge/order-verdicts";
import { isFit } from "./try-lead";

/** A free box of the rig to lead this run through: one that the output can feed and that suits the input. The first that fits wholly, else the first that is tight. */
export function findFreeGear(connection: Connection, place: number, options: FixOptions): ThroughGearFix | null {
  const input = connection.inputs[place];
  if (!input) return null;
  let tight: ThroughGearFix | null = null;
  for (const { gearId, name, input: into, output, through } of options.freeGear ?? []) {
    const inputs = connection.inputs.map((other, i) => (i === place ? into : other));
    const feed = checkBare({ outputs: connection.outputs, inputs }).listeners[place] ?? null;
    const check = checkBare({ outputs: [output], inputs: [input] }).listeners[0] ?? null;
    if (!isFit(feed) || !isFit(check)) continue;
    const verdict = worstVerdict([feed.verdict, check.verdict]);
    const kind = connection.outputs.some((other) => other.signal === output.signal) ? "buffer" : "shaper";
    const fix: ThroughGearFix = {
      kind, gearId, name, verdict, feedVerdict: feed.verdict, highV: check.highV, lowV: check.lowV,
      text: `Lead it through ${name}, which is free in this song.`, ...(through ? { through } : {}),
    };
    if (verdict === "good") return fix;
    tight ??= fix;
  }
  return tight;
}
