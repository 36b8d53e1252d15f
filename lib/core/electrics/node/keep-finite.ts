import { toRange, type Range, type Spread } from "@/lib/core/units/spread";
import type { Connection } from "../connection-types";
import { clampBranches, loadBranch, outputBranch, type Branch } from "./branch";

/** A lead's own resistance, Ω. */
const LEAD_OHM = 1e-3;

/**
 * Where two branches without resistance could pull the node to different levels, each branch gets a lead's own milliohm
 * at least, so that levels and currents stay finite. Otherwise the connection is left exact.
 */
export function keepFinite(connection: Connection): Connection {
  const bare = bareBranches(connection);
  const fight = bare.some((up) => up.flow !== "outOf" && bare.some((down) => down !== up && down.flow !== "into" && up.volt.max > down.volt.min));
  if (!fight) return connection;
  return {
    outputs: connection.outputs.map((output) => (output.sourceOhm === undefined ? output : { ...output, sourceOhm: atLeast(output.sourceOhm) })),
    inputs: connection.inputs.map((input) => ({
      ...input,
      ...(input.loadOhm === null || input.loadOhm === undefined ? {} : { loadOhm: atLeast(input.loadOhm) }),
      ...(input.clamp ? { clamp: { ...input.clamp, seriesOhm: atLeast(input.clamp.seriesOhm) } } : {}),
    })),
  };
}

function bareBranches({ outputs, inputs }: Connection): Branch[] {
  const driving = outputs.map((output) => (output.signal === "sensor" ? null : outputBranch(output, "any")));
  const passive = inputs.flatMap((input) => [loadBranch(input), ...(input.clamp ? Object.values(clampBranches(input.clamp)) : [])]);
  return [...driving, ...passive].filter((branch): branch is Branch => branch !== null && branch.ohm.min < LEAD_OHM);
}

function atLeast(ohm: Spread): Range {
  const { min, max } = toRange(ohm);
  return { min: Math.max(min, LEAD_OHM), max: Math.max(max, LEAD_OHM) };
}
