import { formatQuantity } from "@/lib/core/units/format-quantity";
import { toRange } from "@/lib/core/units/spread";
import { buildNode, clampCurrentAt } from "../node/build-node";
import type { Connection } from "../connection-types";
import type { Caution, GearModel } from "../patch-types";

/** Drop of a protection diode where the supply it leads to is not known. Source: 0.6 V, common practice; 0.58 V at 1 mA in the 1N4148's model. */
const DIODE_V = 0.6;
/** Below this a dead rail takes no notice. */
const WORTH_SAYING_A = 1e-4;

/**
 * What would flow through an input's upper diode into the rail of its box while that is switched off (0 V) and the
 * output still drives.
 */
export function cautionUnpowered(connection: Connection, place: number, gear: GearModel): Caution[] {
  const input = connection.inputs[place];
  if (!input?.clamp) return [];
  const drop = gear.supplyV === undefined ? DIODE_V : Math.max(0, toRange(input.clamp.highV).min - toRange(gear.supplyV).max);
  const off = { ...input, clamp: { ...input.clamp, highV: drop, lowV: Math.min(toRange(input.clamp.lowV).min, drop) } };
  const inputs = connection.inputs.map((other, i) => (i === place ? off : other));
  const amps = clampCurrentAt(buildNode({ outputs: connection.outputs, inputs }), place);
  if (amps === null || amps < WORTH_SAYING_A) return [];
  const stands = amps > input.clamp.maxA ? `, more than the ${formatQuantity(input.clamp.maxA, "A")} they stand` : "";
  const text = `With ${gear.name} switched off, up to ${formatQuantity(amps, "A")} flows through its input diodes into the dead supply${stands}: switch it on first and off last.`;
  return [{ kind: "unpowered", text, measured: amps, unit: "A" }];
}
