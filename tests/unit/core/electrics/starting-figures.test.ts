import { describe, expect, it } from "vitest";
import { startingFigureSources, startingGear, startingSourcesOf, startingVariants, type StartingKind } from "@/lib/core/electrics/starting-figures";
import { GEAR_KINDS, gearInputSchema, type GearInput } from "@/lib/schemas/gear";
import { toRange } from "@/lib/core/units/spread";

const counter = () => {
  let n = 0;
  return () => `id${(n += 1)}`;
};
const everyVariant = GEAR_KINDS.flatMap((kind: StartingKind) => startingVariants(kind).map(({ variant }) => ({ kind, variant })));

/** Every electrical figure that is set, by the path convention of `assumed`; written apart from the code under test. */
function figuresSet(gear: GearInput): string[] {
  const notElectrical = new Set(["kind", "sensor", "build", "padLeg", "source", "channel", "signal", "polarity", "accepts", "or", "phantom"]);
  const found: string[] = [];
  const walk = (node: unknown, path: string): void => {
    if (node === null || node === undefined) return;
    if (typeof node === "number" || (typeof node === "object" && ("nominal" in node || "max" in node))) {
      found.push(path);
      return;
    }
    if (typeof node !== "object") return;
    for (const [key, child] of Object.entries(node)) if (!notElectrical.has(key)) walk(child, `${path}.${key}`);
  };
  walk(gear.details, "details");
  for (const jack of gear.jacks) walk(jack.direction === "output" ? jack.output : jack.input, `jacks.${jack.id}`);
  return found.sort();
}

describe("startingGear", () => {
  it.each(everyVariant)("$kind/$variant parses as gear and marks exactly its electrical figures as assumed", ({ kind, variant }) => {
    const gear = startingGear(kind, variant, counter());
    const parsed = gearInputSchema.parse(gear);
    expect([...parsed.assumed].sort()).toEqual(figuresSet(parsed));
    expect(new Set(parsed.assumed).size).toBe(parsed.assumed.length);
    expect(parsed.details.kind).toBe(kind);
  });

  it.each(everyVariant)("$kind/$variant names a source for every figure", ({ kind, variant }) => {
    const gear = startingGear(kind, variant, counter());
    const sources = startingFigureSources[`${kind}/${variant}`] ?? {};
    expect(Object.keys(sources)).toHaveLength(gear.assumed.length);
    for (const source of Object.values(sources)) expect(source.length).toBeGreaterThan(10);
    const byPath = startingSourcesOf(kind, variant, gear.jacks.map((jack) => jack.id));
    expect(Object.keys(byPath).sort()).toEqual([...gear.assumed].sort());
    expect(new Set(Object.values(byPath))).toEqual(new Set(Object.values(sources)));
  });

  it("takes the first variant when none is named, and ids only from the maker", () => {
    const gear = startingGear("conditioner", undefined, counter());
    expect(gear.details).toMatchObject({ build: "circuit" });
    expect([...gear.jacks, ...gear.knobs].map((item) => item.id)).toEqual(["id1", "id2", "id3"]);
    expect(startingGear("conditioner", undefined, counter())).toEqual(gear);
  });

  it("shares nothing between two pieces made from one template", () => {
    const first = startingGear("pad", "foam", counter());
    const second = startingGear("pad", "foam", counter());
    if (first.details.kind !== "pad") throw new Error("not a pad");
    Object.assign(first.details.restOhm as object, { min: 1 });
    first.jacks[0]!.name = "changed";
    expect(second.details).toMatchObject({ restOhm: { min: 20e3, max: 50e3 } });
    expect(second.jacks[0]?.name).toBe("Pad out");
  });

  it("refuses a variant the kind does not have", () => {
    expect(() => startingGear("pad", "line", counter())).toThrow(RangeError);
  });
});

describe("the figures themselves", () => {
  it("has the foam pad of common practice: 20–50 kΩ at rest, about 10 kΩ pressed (common practice, no source)", () => {
    const { details } = startingGear("pad", "foam", counter());
    expect(details).toMatchObject({ restOhm: { min: 20e3, max: 50e3 }, hitOhm: { nominal: 10e3 } });
  });

  it("has the piezo disc of the CUI CEB-27D44 data sheet: 16 nF ± 30 %", () => {
    expect(startingGear("pad", "piezo", counter()).details).toMatchObject({ farad: { nominal: 16e-9, tol: 0.3 } });
  });

  it("has the conditioner whose coupling gives a pulse inside 1–5 ms (common practice, no source)", () => {
    const { details } = startingGear("conditioner", "single-9v", counter());
    if (details.kind !== "conditioner" || !details.circuit) throw new Error("not a circuit");
    const { farad, ohm } = details.circuit.coupling;
    expect(farad * ohm).toBeCloseTo(2.2e-3, 9);
  });

  it("has a bare logic input that a 9 V pulse would hurt (CD40106B, TI SCHS097F: V_DD + 0.5 V)", () => {
    const jack = startingGear("voice", "logic-5v", counter()).jacks[0];
    if (jack?.direction !== "input") throw new Error("not an input");
    expect(jack.input.safeHighV).toBe(5.5);
    // UTC CD40106B at 5 V: VT+ 2.2–3.6 V, VT− 0.9–2.8 V.
    expect(jack.input.onV).toEqual({ min: 2.2, max: 3.6 });
    expect(jack.input.offV).toEqual({ min: 0.9, max: 2.8 });
  });

  it("has a 9 V battery that runs from 9.6 to 6 V over its life", () => {
    const { details } = startingGear("supply", "battery-9v", counter());
    if (details.kind !== "supply") throw new Error("not a supply");
    expect(toRange(details.highV)).toEqual({ min: 6, max: 9.6 });
  });

  it("gives an envelope circuit an envelope jack, and a bare trigger circuit none", () => {
    const roles = (variant: string) => startingGear("conditioner", variant, counter()).jacks.map((jack) => jack.role);
    expect(roles("single-9v-envelope")).toContain("envelope-out");
    expect(roles("single-9v")).not.toContain("envelope-out");
  });
});
