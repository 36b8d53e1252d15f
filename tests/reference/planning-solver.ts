import loadHighs from "highs";
import type { Connection, OrderRequest } from "@/lib/core/planning";

/** HiGHS, an open MIP solver, as the independent judge of planning; models are written here in its LP text. */
const highs = await loadHighs();

function solve(lines: string[]): { value: number; isOn: (name: string) => boolean } | null {
  const result = highs.solve(lines.join("\n"), { output_flag: false, mip_rel_gap: 0, mip_abs_gap: 1e-6 });
  if (result.Status === "Infeasible") return null;
  if (result.Status !== "Optimal") throw new Error(`the solver ended with ${result.Status}`);
  const columns = result.Columns as Record<string, { Primal?: number }>;
  return { value: result.ObjectiveValue, isOn: (name) => (columns[name]?.Primal ?? 0) > 0.5 };
}

/** Long sums over several lines: LP text has a limit on line length. */
function sum(terms: string[]): string {
  const lines: string[] = [];
  for (let k = 0; k < terms.length; k += 12) lines.push(terms.slice(k, k + 12).join(" + "));
  return lines.join("\n + ");
}

/**
 * Least end moves as a binary programme: every new connection gets one old lead or a fetched one, an old lead serves one or is put away.
 * @param fits whether old lead i may serve new connection j; absent: always
 */
export function leastEndMoves(from: Connection[], to: Connection[], fits: (i: number, j: number) => boolean = () => true): number {
  if (from.length + to.length === 0) return 0;
  const pairs = from.flatMap((_, i) => to.flatMap((__, j) => (fits(i, j) ? [[i, j] as const] : [])));
  const ends = (i: number, j: number) => Number(from[i]!.output !== to[j]!.output) + Number(from[i]!.input !== to[j]!.input);
  const objective = [
    ...pairs.map(([i, j]) => `${ends(i, j)} x_${i}_${j}`),
    ...from.map((_, i) => `2 away_${i}`),
    ...to.map((_, j) => `2 fetch_${j}`),
  ];
  const found = solve([
    "Minimize", `obj: ${sum(objective)}`, "Subject To",
    ...from.map((_, i) => `old_${i}: ${sum([`away_${i}`, ...pairs.filter((pair) => pair[0] === i).map(([, j]) => `x_${i}_${j}`)])} = 1`),
    ...to.map((_, j) => `new_${j}: ${sum([`fetch_${j}`, ...pairs.filter((pair) => pair[1] === j).map(([i]) => `x_${i}_${j}`)])} = 1`),
    "Binary", ...pairs.map(([i, j]) => `x_${i}_${j}`), ...from.map((_, i) => `away_${i}`), ...to.map((_, j) => `fetch_${j}`), "End",
  ]);
  if (!found) throw new Error("an assignment is always possible");
  return Math.round(found.value);
}

/**
 * The least total of an order: arcs between songs and the stage, with subtours cut off as they show (Dantzig, Fulkerson and Johnson 1954)
 * and, where songs are pinned, positions tied to the arcs (Miller, Tucker and Zemlin 1960).
 * @returns null where no order keeps the rules
 */
export function leastOrder(request: OrderRequest): number | null {
  const n = request.songs.length;
  const at = new Map(request.songs.map((id, index) => [id, index]));
  const stage = n;
  const nodes = Array.from({ length: n + 1 }, (_, index) => index);
  const costOf = (i: number, j: number) => (j === stage ? 0 : i === stage ? request.setupS[request.songs[j]!]! : request.changeoverS[i]![j]!);
  const arcs = nodes.flatMap((i) => nodes.filter((j) => j !== i).map((j) => [i, j] as const));
  const rules: string[] = [];
  (request.together ?? []).forEach(([a, b], k) => rules.push(`tog_${k}: a_${at.get(a)}_${at.get(b)} = 1`));
  (request.apart ?? []).forEach(([a, b], k) => rules.push(`apart_${k}: a_${at.get(a)}_${at.get(b)} + a_${at.get(b)}_${at.get(a)} = 0`));
  const pins = Object.entries(request.pinned ?? {});
  if (pins.length > 0) {
    for (const [i, j] of arcs) {
      if (i === stage || j === stage) continue;
      rules.push(`up_${i}_${j}: u_${j} - u_${i} - ${n} a_${i}_${j} >= ${1 - n}`, `dn_${i}_${j}: u_${j} - u_${i} + ${n} a_${i}_${j} <= ${1 + n}`);
    }
    for (let j = 0; j < n; j += 1) rules.push(`first_${j}: u_${j} + ${n} a_${stage}_${j} <= ${n}`, `last_${j}: u_${j} - ${n} a_${j}_${stage} >= ${-1}`);
  }
  const cuts: string[] = [];
  for (;;) {
    const found = solve([
      "Minimize", `obj: ${sum(arcs.map(([i, j]) => `${costOf(i, j)} a_${i}_${j}`))}`, "Subject To",
      ...nodes.map((i) => `out_${i}: ${sum(nodes.filter((j) => j !== i).map((j) => `a_${i}_${j}`))} = 1`),
      ...nodes.map((j) => `in_${j}: ${sum(nodes.filter((i) => i !== j).map((i) => `a_${i}_${j}`))} = 1`),
      ...rules, ...cuts,
      ...(pins.length > 0
        ? ["Bounds", ...request.songs.map((id, j) => (request.pinned && id in request.pinned ? `u_${j} = ${request.pinned[id]}` : `0 <= u_${j} <= ${n - 1}`))]
        : []),
      "Binary", ...arcs.map(([i, j]) => `a_${i}_${j}`), "End",
    ]);
    if (!found) return null;
    const rings = findRings(nodes, found.isOn);
    if (rings.length === 1) return found.value;
    for (const ring of rings) {
      const inside = ring.flatMap((i) => ring.filter((j) => j !== i).map((j) => `a_${i}_${j}`));
      cuts.push(`cut_${cuts.length}: ${sum(inside)} <= ${ring.length - 1}`);
    }
  }
}

function findRings(nodes: number[], isOn: (name: string) => boolean): number[][] {
  const seen = new Set<number>();
  const rings: number[][] = [];
  for (const start of nodes) {
    if (seen.has(start)) continue;
    const ring: number[] = [];
    for (let node: number | undefined = start; node !== undefined && !seen.has(node); ) {
      seen.add(node);
      ring.push(node);
      const here: number = node;
      node = nodes.find((j) => j !== here && isOn(`a_${here}_${j}`));
    }
    rings.push(ring);
  }
  return rings;
}
