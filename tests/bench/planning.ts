import loadHighs from "highs";
import { orderSet, planSet, type OrderRequest } from "@/lib/core/planning";
import { makePlanningSource } from "../factories/planning";
import { row, type BenchRow } from "./bench-row";

/** The solver is stopped here; what it took is then a lower bound. */
const SOLVER_LIMIT_S = 20;

/** Milliseconds of the work at its median over some runs, and its last answer. */
function time<T>(work: () => T, runs: number): { ms: number; answer: T } {
  const times: number[] = [];
  let answer = work();
  for (let run = 0; run < runs; run += 1) {
    const startedMs = performance.now();
    answer = work();
    times.push(performance.now() - startedMs);
  }
  return { ms: times.sort((a, b) => a - b)[Math.floor(runs / 2)] ?? 0, answer };
}

/** Changeovers and order at the sizes the product promises, beside a MIP solver (HiGHS) on the same set. */
export async function bench(): Promise<BenchRow[]> {
  const rows: BenchRow[] = [];
  const source = makePlanningSource(1);

  const songs = source.setOfSongs(40, 60, 6);
  const set = time(() => planSet(songs), 15);
  rows.push(row("39 changeovers of a 40-song, 60-lead set", set.ms, "ms", "< 50", set.ms < 50));

  for (const [n, limitS] of [[18, 0.5], [20, 1]] as const) {
    for (const kind of ["near", "any"] as const) {
      const request = source.orderOfTimes(n, kind);
      const { ms, answer } = time(() => orderSet(request), 3);
      rows.push(row(`order of ${n} songs, ${kind === "near" ? "nearly symmetric" : "any"} times, proven`, ms / 1000, "s", `< ${limitS}`, answer.ok && answer.provenOptimal && ms / 1000 < limitS));
    }
  }

  const large: [string, OrderRequest][] = [
    ["40 songs of a rig", source.orderOfSet(40, 30, 3)], ["60 songs of a rig", source.orderOfSet(60, 30, 4)],
    ["40 songs, nearly symmetric", source.orderOfTimes(40, "near")], ["60 songs, nearly symmetric", source.orderOfTimes(60, "near")],
  ];
  for (const [name, request] of large) {
    const { ms, answer } = time(() => orderSet(request, { now: () => performance.now(), budgetMs: 4800 }), 1);
    if (!answer.ok) throw new Error("a set without rules has an order");
    const gap = (100 * (answer.totalS - answer.lowerBoundS)) / answer.totalS;
    rows.push(row(`order of ${name}: time`, ms / 1000, "s", "< 5", ms < 5000));
    rows.push(row(`order of ${name}: gap`, gap, "%", "≤ 1", gap <= 1));
    const solver = await timeSolver(request);
    const least = solver.seconds * 1000 >= SOLVER_LIMIT_S * 1000 ? " (stopped: at least)" : "";
    rows.push(row(`order of ${name}: MIP solver's time ÷ ours${least}`, (solver.seconds * 1000) / ms, "×", "for comparison", answer.totalS <= solver.totalS * 1.000001));
  }
  return rows;
}

/** The same set as arcs with commodity flow (Gavish and Graves 1978), so that one call to the solver is enough; within 1 %. */
async function timeSolver(request: OrderRequest): Promise<{ seconds: number; totalS: number }> {
  const highs = await loadHighs();
  const n = request.songs.length;
  const nodes = Array.from({ length: n + 1 }, (_, k) => k);
  const cost = (i: number, j: number) => (j === n ? 0 : i === n ? request.setupS[request.songs[j]!]! : request.changeoverS[i]![j]!);
  const arcs = nodes.flatMap((i) => nodes.filter((j) => j !== i).map((j) => [i, j] as const));
  const join = (terms: string[]) => terms.reduce((text, term, k) => text + (k === 0 ? "" : term.startsWith("-") ? " " : " + ") + term + (k % 12 === 11 ? "\n" : ""), "");
  const lines = [
    "Minimize", `obj: ${join(arcs.map(([i, j]) => `${cost(i, j)} a_${i}_${j}`))}`, "Subject To",
    ...nodes.flatMap((i) => {
      const others = nodes.filter((j) => j !== i);
      return [
        `out_${i}: ${join(others.map((j) => `a_${i}_${j}`))} = 1`, `in_${i}: ${join(others.map((j) => `a_${j}_${i}`))} = 1`,
        ...(i < n ? [`flow_${i}: ${join([...others.map((j) => `f_${j}_${i}`), ...others.map((j) => `- f_${i}_${j}`)])} = 1`] : []),
      ];
    }),
    ...arcs.map(([i, j]) => `cap_${i}_${j}: f_${i}_${j} - ${n} a_${i}_${j} <= 0`),
    "Binary", ...arcs.map(([i, j]) => `a_${i}_${j}`), "End",
  ];
  const startedMs = performance.now();
  const result = highs.solve(lines.join("\n"), { output_flag: false, mip_rel_gap: 0.01, time_limit: SOLVER_LIMIT_S });
  return { seconds: (performance.now() - startedMs) / 1000, totalS: result.ObjectiveValue };
}
