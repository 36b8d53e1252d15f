import type { Range, Spread } from "@/lib/core/units/spread";
import type { Input, Output } from "@/lib/core/electrics/jacks";

/**
 * A second, slow way to the same numbers: every corner of every spread, each
 * solved by halving an interval until Kirchhoff's current law holds. Shares no
 * code with the check.
 */
type Branch = { kind: "source" | "load" | "or-up" | "or-down" | "clamp-high" | "clamp-low"; volt: number; ohm: number };

export function ends(spread: Spread): number[] {
  if (typeof spread === "number") return [spread];
  if ("nominal" in spread) return [spread.nominal * (1 - spread.tol), spread.nominal * (1 + spread.tol)];
  return [spread.min, spread.max];
}

function flow(branch: Branch, level: number): number {
  const amps = (branch.volt - level) / branch.ohm;
  if (branch.kind === "or-up" || branch.kind === "clamp-low") return Math.max(0, amps);
  if (branch.kind === "or-down" || branch.kind === "clamp-high") return Math.min(0, amps);
  return amps;
}

export function bisect(branches: readonly Branch[]): number {
  let low = Math.min(...branches.map((b) => b.volt)) - 1;
  let high = Math.max(...branches.map((b) => b.volt)) + 1;
  for (let i = 0; i < 90; i += 1) {
    const middle = (low + high) / 2;
    const sum = branches.reduce((total, b) => total + flow(b, middle), 0);
    if (sum > 0) low = middle;
    else high = middle;
  }
  return (low + high) / 2;
}

/** Every choice of one end from each list. */
export function* corners(lists: readonly (readonly number[])[]): Generator<number[]> {
  const place = lists.map(() => 0);
  for (;;) {
    yield place.map((p, i) => (lists[i] as number[])[p] as number);
    let i = 0;
    while (i < lists.length && ++place[i]! >= (lists[i] as number[]).length) place[i++] = 0;
    if (i === lists.length) return;
  }
}

export interface OracleAnswer {
  highV: Range;
  lowV: Range;
  anyV: Range;
  /** By output. */
  currentA: Range[];
  /** By input. */
  clampA: number[];
}

const none = (): Range => ({ min: Infinity, max: -Infinity });
const widen = (range: Range, value: number) => {
  range.min = Math.min(range.min, value);
  range.max = Math.max(range.max, value);
};

export function oracle(outputs: readonly Output[], inputs: readonly Input[]): OracleAnswer {
  const answer: OracleAnswer = {
    highV: none(), lowV: none(), anyV: none(), currentA: outputs.map(none), clampA: inputs.map(() => 0),
  };
  const passive: number[][] = inputs.flatMap((input) => [
    ...(input.loadOhm === null ? [] : [ends(input.biasV ?? 0), ends(input.loadOhm)]),
    ...(input.clamp ? [ends(input.clamp.lowV), ends(input.clamp.highV), ends(input.clamp.seriesOhm)] : []),
  ]);
  const states = [...corners(outputs.map(() => [0, 1]))];
  for (const state of states) {
    const drive = outputs.flatMap((o, i) => [ends(state[i] ? o.activeV : o.restV), ends(o.sourceOhm)]);
    for (const values of corners([...drive, ...passive])) {
      let next = 0;
      const take = () => values[next++] as number;
      const sources = outputs.map((o): Branch => ({
        kind: o.or ? (o.polarity === "falling" ? "or-down" : "or-up") : "source", volt: take(), ohm: take(),
      }));
      const clampsAt: (readonly [Branch, Branch] | null)[] = [];
      const rest = inputs.flatMap((input): Branch[] => {
        const load: Branch[] = input.loadOhm === null ? [] : [{ kind: "load", volt: take(), ohm: take() }];
        if (!input.clamp) {
          clampsAt.push(null);
          return load;
        }
        const [low, high, ohm] = [take(), take(), take()];
        const pair = [{ kind: "clamp-low", volt: low, ohm }, { kind: "clamp-high", volt: high, ohm }] as const;
        clampsAt.push(pair);
        return [...load, ...pair];
      });
      const level = bisect([...sources, ...rest]);
      widen(answer.anyV, level);
      if (state.every((s) => s === 1)) widen(answer.highV, level);
      if (state.every((s) => s === 0)) widen(answer.lowV, level);
      sources.forEach((source, i) => widen(answer.currentA[i] as Range, flow(source, level)));
      clampsAt.forEach((pair, i) => {
        if (pair) answer.clampA[i] = Math.max(answer.clampA[i] as number, ...pair.map((b) => Math.abs(flow(b, level))));
      });
    }
  }
  return answer;
}
