import { describe, expect, it } from "vitest";
import { findConditionerIssues, simulateConditioner, type ConditionerSpec } from "@/lib/core/electrics";
import { seededRandom } from "@/lib/core/electrics/tolerance/seeded-random";

const example: ConditionerSpec = {
  supply: { highV: 9, lowV: 0 }, pad: { kind: "resistive", restOhm: 47e3, hitOhm: 9100, leg: "upper" }, strike: { riseS: 1e-3, holdS: 5e-3, fallS: 30e-3 },
  divider: { ohm: 22e3 }, coupling: { farad: 1e-7, ohm: 22e3 }, threshold: { topOhm: 100e3, potOhm: 10e3, bottomOhm: 1e3, turn: 0.5 },
  comparator: { highDropV: 1.5, lowDropV: 0.02, limitA: 0.02 }, output: { seriesOhm: 2200, shuntOhm: 4700 },
  envelope: { seriesOhm: 100, farad: 1e-6, ohm: 100e3, emitterOhm: 10e3 }, load: { ohm: 100e3 },
};

/** Every number of a request, by path. */
function paths(value: unknown, at: string[] = []): string[][] {
  if (typeof value === "number") return [at];
  return value && typeof value === "object" ? Object.entries(value).flatMap(([key, inner]) => paths(inner, [...at, key])) : [];
}

function withValue(path: string[], value: unknown): ConditionerSpec {
  const copy = structuredClone(example) as unknown as Record<string, unknown>;
  let node = copy;
  for (const key of path.slice(0, -1)) node = node[key] as Record<string, unknown>;
  node[path.at(-1) as string] = value;
  return copy as unknown as ConditionerSpec;
}

/** Everything in an answer is a number one can print. */
function isPrintable(value: unknown): boolean {
  if (typeof value === "number") return Number.isFinite(value);
  if (typeof value === "string") return !/NaN|Infinity|undefined|—/.test(value);
  return value === null || typeof value !== "object" ? true : Object.values(value).every(isPrintable);
}

function answerOrRefusal(spec: ConditionerSpec): "answer" | "refusal" {
  const startedMs = performance.now();
  try {
    const result = simulateConditioner(spec);
    expect(isPrintable(result), JSON.stringify(spec)).toBe(true);
    return "answer";
  } catch (error) {
    expect(error, JSON.stringify(spec)).toBeInstanceOf(RangeError);
    return "refusal";
  } finally {
    expect(performance.now() - startedMs, JSON.stringify(spec)).toBeLessThan(3000);
  }
}

const numbers = paths(example);

describe("hostile figures", () => {
  it.each(numbers.map((path) => [path.join(".")]))("%s: not a number and infinite are refused by name", (name) => {
    for (const value of [NaN, Infinity, -Infinity, 1e300, -1]) {
      const spec = withValue(name.split("."), value);
      if (name === "supply.lowV" && value === -1) continue;
      expect(() => simulateConditioner(spec)).toThrow(RangeError);
      expect(findConditionerIssues(spec)[0]?.path.join(".")).toBe(name);
    }
  });

  it.each(numbers.map((path) => [path.join(".")]))("%s: tiny, zero and huge are answered or refused in bounded time", (name) => {
    for (const value of [0, 1e-300, 1e-15, 1e-9, 1e-3, 1, 1e3, 1e6, 1e9, 1e12, 1e15]) answerOrRefusal(withValue(name.split("."), value));
  });

  it("two figures at once at the ends of what is allowed (seeded)", { timeout: 120_000 }, () => {
    const next = seededRandom(7);
    const ends: Record<string, [number, number]> = { Ohm: [1e-3, 1e15], ohm: [1e-3, 1e15], farad: [1e-15, 1], V: [1e-3, 1e4], A: [1e-9, 1e3], S: [0, 86_400], turn: [0, 1] };
    let answers = 0;
    for (let i = 0; i < 150; i += 1) {
      let spec: unknown = example;
      for (let k = 0; k < 2; k += 1) {
        const path = numbers[Math.floor(next() * numbers.length)] as string[];
        const name = path.at(-1) as string;
        const [low, high] = ends[name] ?? ends[Object.keys(ends).find((end) => name.endsWith(end)) as string] ?? [0, 1];
        const copy = structuredClone(spec) as Record<string, unknown>;
        let node = copy;
        for (const key of path.slice(0, -1)) node = node[key] as Record<string, unknown>;
        node[name] = path.join(".") === "supply.lowV" ? -high : next() < 0.5 ? low : high;
        spec = copy;
      }
      if (answerOrRefusal(spec as ConditionerSpec) === "answer") answers += 1;
    }
    expect(answers).toBeGreaterThan(60);
  });

  it("ranges upside down and tolerances of 1 or more are refused", () => {
    for (const ohm of [{ min: 2, max: 1 }, { nominal: 1e4, tol: 1 }, { nominal: 1e4, tol: -0.1 }, { nominal: NaN, tol: 0.1 }]) {
      expect(() => simulateConditioner({ ...example, divider: { ohm } })).toThrow(/divider\.ohm/);
    }
  });

  it("captures that stand still, run backwards or hold a short are refused by their sample", () => {
    const capture = (samples: [number, number][]) => findConditionerIssues({ ...example, strike: { samples } })[0]?.path.join(".");
    expect(capture([[0, 1e4]])).toBe("strike.samples");
    expect(capture([[0, 1e4], [0, 1e4]])).toBe("strike.samples.1.0");
    expect(capture([[0, 1e4], [1, 0]])).toBe("strike.samples.1.1");
    expect(capture([[0, 1e4], [NaN, 1e4]])).toBe("strike.samples.1.0");
    expect(capture([[0, 1e4], [1, 1e4]])).toBeUndefined();
  });

  it("a capture of 10,000 points is answered whole in a few seconds", () => {
    const samples = Array.from({ length: 10_000 }, (_, i) => [i * 1e-5, 9100 + 20e3 * Math.abs(Math.sin(i * 0.37)) + (i % 7) * 10] as const);
    expect(answerOrRefusal({ ...example, strike: { samples } })).toBe("answer");
  });
});
