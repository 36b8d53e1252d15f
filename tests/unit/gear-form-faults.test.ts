import { describe, expect, it } from "vitest";
import { zodResolver } from "@hookform/resolvers/zod";
import { figuresOfJack, figuresOfPad } from "@/components/gear/jack-figures";
import { fieldId, listFaults } from "@/components/gear/list-faults";
import { newJack, toFormValues, type GearFormValues } from "@/components/gear/form-values";
import { startingGear } from "@/lib/core/electrics/starting-figures";
import { gearInputSchema, type GearKind } from "@/lib/schemas/gear";

let n = 0;
const values = (kind: GearKind, variant?: string): GearFormValues =>
  toFormValues(gearInputSchema.parse(startingGear(kind, variant, () => `id${(n += 1)}`)));

/** The faults as the form's resolver would hold them. */
async function faultsOf(form: GearFormValues) {
  const resolver = zodResolver(gearInputSchema);
  const result = await resolver(form as never, undefined, { fields: {}, shouldUseNativeValidation: false });
  return listFaults(result.errors, form);
}

describe("the list of faults", () => {
  it("is empty for gear that can be saved", async () => {
    expect(await faultsOf(values("voice"))).toEqual([]);
  });

  it("names the field of each fault, jacks by their number and name", async () => {
    const form = values("voice");
    form.name = "  ";
    const jack = form.jacks[0];
    if (jack?.direction !== "input") throw new Error("not an input");
    jack.input.onV = "3 ohm";
    jack.input.accepts = [];
    jack.input.safeHighV = "";
    expect(await faultsOf(form)).toEqual([
      { path: "name", label: "Name", message: "Give it a name." },
      { path: "jacks.0.input.accepts", label: "Jack 1 “Trigger in”: Listens to", message: "Say what this input listens to." },
      { path: "jacks.0.input.onV", label: "Jack 1 “Trigger in”: Fires at", message: expect.stringContaining("volts") },
    ]);
  });

  it("finds a fault of a whole group, and of a list", async () => {
    const form = values("conditioner");
    if (form.details.kind !== "conditioner" || !form.details.circuit) throw new Error("not a circuit");
    form.details.circuit.threshold = { topOhm: "0", potOhm: "0", bottomOhm: "0" };
    for (let extra = 0; extra < 23; extra += 1) form.jacks.push({ ...newJack("conditioner", "output", `x${extra}`), name: "Extra" });
    const faults = await faultsOf(form);
    expect(faults.map((fault) => fault.path)).toContain("details.circuit.threshold");
    expect(faults.map((fault) => fault.message)).toContain("At most 24 jacks on one box.");
  });

  it("has DOM ids that a link can point to", () => {
    expect(fieldId("jacks.0.input.onV")).toBe("gear-jacks-0-input-onV");
  });
});

describe("which figures a jack shows", () => {
  it("shows or folds every figure exactly once", () => {
    for (const signal of ["sensor", "trigger", "gate", "envelope", "control", "audio"] as const) {
      const output = newJack("voice", "output", "o");
      if (output.direction !== "output") throw new Error("not an output");
      output.output.signal = signal;
      const shown = figuresOfJack(output, { kind: "voice" });
      expect([...shown.main, ...shown.more].sort()).toEqual(["activeV", "decayS", "limitA", "pulseS", "restV", "sourceOhm"]);
      const input = newJack("voice", "input", "i");
      if (input.direction !== "input") throw new Error("not an input");
      input.input.accepts = [signal];
      const heard = figuresOfJack(input, { kind: "voice" });
      expect([...heard.main, ...heard.more].sort()).toEqual(
        ["biasV", "decayMinS", "loadOhm", "maxDbu", "offV", "onV", "pulseMaxS", "pulseMinS", "safeHighV", "safeLowV"],
      );
    }
    for (const sensor of ["resistive", "piezo", "switch"] as const) {
      const { main, more } = figuresOfPad(sensor);
      expect(new Set([...main, ...more]).size).toBe(7);
      expect(main.length + more.length).toBe(7);
    }
  });

  it("folds the figures of a circuit's own outputs, but not of a black box", () => {
    const circuit = values("conditioner", "single-9v");
    const box = values("conditioner", "black-box");
    const trigger = (form: GearFormValues) => figuresOfJack(form.jacks[1]!, form.details);
    expect(trigger(circuit)).toMatchObject({ main: [], note: expect.stringContaining("Computed") });
    expect(trigger(box).main).toContain("activeV");
    expect(trigger(box).note).toBeNull();
  });
});
