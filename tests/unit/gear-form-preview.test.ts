import { describe, expect, it } from "vitest";
import { toFormValues, type CircuitValues } from "@/components/gear/form-values";
import { ASSUMED_RAILS, previewQuestion } from "@/components/gear/preview-question";
import { startingGear } from "@/lib/core/electrics/starting-figures";
import { gearInputSchema, type Gear, type GearKind } from "@/lib/schemas/gear";

let n = 0;
const makeId = () => `id${(n += 1)}`;
const make = (kind: GearKind): Gear => ({ ...gearInputSchema.parse(startingGear(kind, undefined, makeId)), id: makeId(), kind, retired: false, revision: 1, position: 0 });
function circuitOf(): CircuitValues {
  const { details } = toFormValues(make("conditioner"));
  if (details.kind !== "conditioner" || !details.circuit) throw new Error("not a circuit");
  return details.circuit;
}

describe("the question a circuit in the form puts", () => {
  it("holds the parts as they are read, the rails and the pad's figures", () => {
    const circuit = circuitOf();
    circuit.coupling.farad = "0.22 µF";
    const question = previewQuestion(circuit, { highV: { nominal: 12, tol: 0.05 }, lowV: -12 }, make("pad"), 0.25);
    expect(question).toMatchObject({
      circuit: { supply: { highV: { nominal: 12, tol: 0.05 }, lowV: -12 }, coupling: { farad: 0.22e-6, ohm: 22e3 }, envelope: null },
      pad: { sensor: "resistive", restOhm: { min: 20e3, max: 50e3 }, riseS: 1e-3 },
      turn: 0.25,
      loadOhm: null,
    });
    expect(question?.pad).not.toHaveProperty("kind");
    expect(question?.pad).not.toHaveProperty("farad");
  });

  it("waits while a part cannot be read, and for gear that is no pad", () => {
    const circuit = circuitOf();
    circuit.divider.ohm = "ten";
    expect(previewQuestion(circuit, ASSUMED_RAILS, make("pad"), 0.5)).toBeNull();
    expect(previewQuestion(null, ASSUMED_RAILS, make("pad"), 0.5)).toBeNull();
    expect(previewQuestion(circuitOf(), ASSUMED_RAILS, make("voice"), 0.5)).toBeNull();
  });
});
