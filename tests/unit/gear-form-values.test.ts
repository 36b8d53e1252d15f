import { describe, expect, it } from "vitest";
import { assumedPath, listFigures, pruneAssumed } from "@/components/gear/assumed-paths";
import { DETAIL_FIGURES, figureInfo, INPUT_FIGURES, OUTPUT_FIGURES } from "@/components/gear/figure-catalogue";
import { readBack, showFigure } from "@/components/gear/figure-text";
import { emptyClamp, newJack, toFormValues } from "@/components/gear/form-values";
import { startingGear, startingVariants } from "@/lib/core/electrics/starting-figures";
import { GEAR_KINDS, gearInputSchema, type GearInput } from "@/lib/schemas/gear";

const counter = () => {
  let n = 0;
  return () => `id${(n += 1)}`;
};
const start = (kind: (typeof GEAR_KINDS)[number], variant?: string): GearInput => gearInputSchema.parse(startingGear(kind, variant, counter()));
const everyVariant = GEAR_KINDS.flatMap((kind) => startingVariants(kind).map(({ variant }) => ({ kind, variant })));

describe("what the form holds", () => {
  it.each(everyVariant)("$kind/$variant goes into text and comes back to the very same figures", ({ kind, variant }) => {
    const gear = start(kind, variant);
    expect(gearInputSchema.parse(toFormValues(gear))).toEqual(gear);
  });

  it("keeps figures exact that do not fit in three digits", () => {
    const gear = start("pad", "foam");
    if (gear.details.kind !== "pad") throw new Error("not a pad");
    gear.details.restOhm = { min: 20_123.4, max: 50_987.6 };
    gear.details.hitOhm = { nominal: 9_871, tol: 0.0125 };
    gear.details.riseS = 1.23456e-3;
    expect(gearInputSchema.parse(toFormValues(gear))).toEqual(gear);
  });

  it("writes ranges and tolerances as people do", () => {
    const values = toFormValues(start("pad", "foam"));
    expect(values.details).toMatchObject({ restOhm: "20–50 kΩ", hitOhm: "10 kΩ ±20 %", riseS: "1 ms" });
  });

  it("reads what people type", () => {
    const values = toFormValues(start("pad", "foam"));
    Object.assign(values.details, { restOhm: "20k–50k", hitOhm: "10k ±5%", riseS: "2.5 ms", holdS: "  " });
    expect(gearInputSchema.parse(values).details).toMatchObject({
      restOhm: { min: 20e3, max: 50e3 }, hitOhm: { nominal: 10e3, tol: 0.05 }, riseS: 2.5e-3, holdS: null,
    });
  });

  it("names the field of a value that cannot be read", () => {
    const values = toFormValues(start("conditioner"));
    if (values.details.kind !== "conditioner" || !values.details.circuit) throw new Error("not a circuit");
    values.details.circuit.coupling.farad = "ten nano";
    const result = gearInputSchema.safeParse(values);
    expect(result.error?.issues.map((issue) => issue.path.join("."))).toEqual(["details.circuit.coupling.farad"]);
  });

  it("reads a desk level with or without its unit and refuses words", () => {
    const values = toFormValues(start("desk-channel"));
    const withLevel = (text: string) => {
      const jack = values.jacks[0];
      if (jack?.direction !== "input") throw new Error("not an input");
      return gearInputSchema.safeParse({ ...values, jacks: [{ ...jack, input: { ...jack.input, maxDbu: text } }] });
    };
    const level = (text: string) => {
      const jack = withLevel(text).data?.jacks[0];
      return jack?.direction === "input" ? jack.input.maxDbu : undefined;
    };
    expect([level("22"), level("+22 dBu"), level("−10"), level("")]).toEqual([22, 22, -10, null]);
    expect(withLevel("loud").error?.issues[0]).toMatchObject({ path: ["jacks", 0, "input", "maxDbu"], message: expect.stringContaining("dBu") });
    expect(withLevel("61").success).toBe(false);
  });

  it.each(GEAR_KINDS.filter((kind) => kind !== "supply"))("a jack added to a %s parses once it has a name", (kind) => {
    for (const direction of ["input", "output"] as const) {
      const values = toFormValues(start(kind));
      values.jacks.push({ ...newJack(kind, direction, "extra"), name: "Extra" });
      expect(gearInputSchema.safeParse(values).error).toBeUndefined();
    }
  });
});

describe("assumed figures", () => {
  it("are named by the jack's id, whatever its place in the form", () => {
    const jacks = [{ id: "a" }, { id: "b" }];
    expect(assumedPath("jacks.1.input.onV", jacks)).toBe("jacks.b.onV");
    expect(assumedPath("jacks.0.input.clamp.seriesOhm", jacks)).toBe("jacks.a.clamp.seriesOhm");
    expect(assumedPath("details.circuit.divider.ohm", jacks)).toBe("details.circuit.divider.ohm");
  });

  it.each(everyVariant)("of $kind/$variant are all figures that the form shows and explains", ({ kind, variant }) => {
    const values = toFormValues(start(kind, variant));
    const shown = new Set(listFigures(values).map((figure) => figure.path));
    expect(values.assumed.filter((path) => !shown.has(path))).toEqual([]);
    expect(pruneAssumed(values)).toEqual(values.assumed);
  });

  it("go when their jack goes or their box is emptied", () => {
    const values = toFormValues(start("voice", "trigger"));
    if (values.details.kind !== "voice") throw new Error("not a voice");
    const gone = values.jacks[0]?.id ?? "";
    values.jacks = values.jacks.slice(1);
    expect(pruneAssumed(values).some((path) => path.startsWith(`jacks.${gone}.`))).toBe(false);
    expect(pruneAssumed(values).length).toBeGreaterThan(0);
    const jack = values.jacks[0];
    if (jack?.direction !== "output") throw new Error("not an output");
    jack.output.activeV = " ";
    expect(pruneAssumed(values)).not.toContain(`jacks.${jack.id}.activeV`);
  });
});

describe("the catalogue of figures", () => {
  it("knows every figure of a jack and nothing else", () => {
    const output = newJack("voice", "output", "o");
    const input = newJack("voice", "input", "i");
    if (output.direction !== "output" || input.direction !== "input") throw new Error("wrong way round");
    const texts = (side: object) => Object.entries(side).filter(([, value]) => value === "").map(([key]) => key).sort();
    expect([...OUTPUT_FIGURES].sort()).toEqual(texts(output.output));
    expect([...INPUT_FIGURES].sort()).toEqual([...texts(input.input), ...Object.keys(emptyClamp()).map((key) => `clamp.${key}`)].sort());
    expect(figureInfo("jacks.0.input.accepts")).toBeNull();
    expect(figureInfo("name")).toBeNull();
  });

  it("explains each figure in one sentence", () => {
    const all = [
      ...DETAIL_FIGURES.map((key) => `details.${key}`),
      ...OUTPUT_FIGURES.map((key) => `jacks.0.output.${key}`),
      ...INPUT_FIGURES.map((key) => `jacks.0.input.${key}`),
    ];
    for (const path of all) expect(figureInfo(path)?.help).toMatch(/^.{20,170}\.$/);
  });
});

describe("reading back", () => {
  it("says what a text is taken for, and nothing while it cannot be read", () => {
    const ohm = { unit: "Ohm", spread: true } as const;
    expect(readBack("4k7", ohm)).toBe("= 4.7 kΩ");
    expect(readBack("20k–50k", ohm)).toBe("= 20–50 kΩ");
    expect(readBack("0.01 µF", { unit: "F", spread: false })).toBe("= 10 nF");
    expect(readBack("10k ±5%", ohm)).toBe("= 10 kΩ ±5 %");
    expect(readBack("10 kΩ", ohm)).toBe("");
    expect(readBack("4k7 volts", ohm)).toBe("");
    expect(readBack("20k–50k", { unit: "Ohm", spread: false })).toBe("");
    expect(readBack("-10 dBu", { unit: "dBu", spread: false })).toBe("= −10 dBu");
  });

  it("prints at most three significant figures", () => {
    expect(showFigure(12_345, "Ohm")).toBe("12.3 kΩ");
    expect(showFigure(null, "V")).toBe("—");
  });
});
