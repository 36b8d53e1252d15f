import type { OrderRequest } from "./types";

/** One rule of the performer's, as it can be kept or dropped. */
export type Rule =
  | { kind: "pin"; song: number; position: number }
  | { kind: "together"; a: number; b: number }
  | { kind: "apart"; a: number; b: number };

/** What a forbidden neighbour or opener costs. */
export const FORBIDDEN = Infinity;

/** Songs joined by `together` rules are one block; the search orders blocks. */
export interface OrderModel {
  /** Songs of each block, first to last; blocks stand in the order of their first song in the performer's list. */
  blocks: number[][];
  /** Songs in each block. */
  size: Int32Array;
  /** Position of each block's first song; −1: not pinned. */
  start: Int32Array;
  /** Row-major, blocks + 1 square: seconds from block to block; the last row and column are the stage before and after the set. */
  cost: Float64Array;
  songs: number;
  /** Seconds inside the blocks, the same in every order. */
  insideS: number;
}

export function rulesOf(request: OrderRequest): Rule[] {
  const at = new Map(request.songs.map((id, index) => [id, index]));
  const song = (id: string) => at.get(id)!;
  return [
    ...Object.entries(request.pinned ?? {}).map(([id, position]): Rule => ({ kind: "pin", song: song(id), position })),
    ...(request.together ?? []).map(([a, b]): Rule => ({ kind: "together", a: song(a), b: song(b) })),
    ...(request.apart ?? []).map(([a, b]): Rule => ({ kind: "apart", a: song(a), b: song(b) })),
  ];
}

/**
 * Contracts the songs into blocks and writes every rule that speaks of neighbours into the costs.
 * @param rules none of which may contradict another in the ways `findPlainConflicts` names
 */
export function modelOrder(request: OrderRequest, rules: Rule[]): OrderModel {
  const n = request.songs.length;
  const next = new Int32Array(n).fill(-1);
  const before = new Int32Array(n).fill(-1);
  const pin = new Int32Array(n).fill(-1);
  const apart = new Set<number>();
  for (const rule of rules) {
    if (rule.kind === "pin") pin[rule.song] = rule.position;
    else if (rule.kind === "apart") apart.add(rule.a * n + rule.b).add(rule.b * n + rule.a);
    else joinSongs(rule.a, rule.b);
  }
  // Songs pinned to neighbouring positions are neighbours.
  const pinnedAt = new Map<number, number>();
  pin.forEach((position, song) => position >= 0 && pinnedAt.set(position, song));
  for (const [position, song] of pinnedAt) {
    const follower = pinnedAt.get(position + 1);
    if (follower !== undefined) joinSongs(song, follower);
  }
  const blocks: number[][] = [];
  for (let song = 0; song < n; song += 1) {
    if (before[song] !== -1) continue;
    const block = [song];
    for (let last = song; next[last] !== -1; last = next[last]!) block.push(next[last]!);
    blocks.push(block);
  }
  const m = blocks.length;
  const size = Int32Array.from(blocks, (block) => block.length);
  const start = Int32Array.from(blocks, (block) => {
    const offset = block.findIndex((song) => pin[song] !== -1);
    return offset === -1 ? -1 : pin[block[offset]!]! - offset;
  });
  const seconds = (from: number, to: number) => request.changeoverS[from]![to]!;
  const cost = new Float64Array((m + 1) * (m + 1));
  blocks.forEach((from, i) => {
    const last = from[from.length - 1]!;
    cost[m * (m + 1) + i] = start[i]! > 0 ? FORBIDDEN : request.setupS[request.songs[from[0]!]!]!;
    cost[i * (m + 1) + m] = start[i]! >= 0 && start[i]! + size[i]! < n ? FORBIDDEN : 0;
    blocks.forEach((to, j) => {
      const mayFollow = i !== j && !apart.has(last * n + to[0]!) && (start[i]! < 0 || start[j]! < 0 || start[i]! + size[i]! === start[j]!);
      cost[i * (m + 1) + j] = mayFollow ? seconds(last, to[0]!) : FORBIDDEN;
    });
  });
  forbidEnds();
  cost[m * (m + 1) + m] = FORBIDDEN;
  let insideS = 0;
  for (const block of blocks) block.forEach((song, k) => (insideS += k > 0 ? seconds(block[k - 1]!, song) : 0));
  return { blocks, size, start, cost, songs: n, insideS };

  function joinSongs(a: number, b: number) {
    next[a] = b;
    before[b] = a;
  }

  /** Where one block is pinned to open or to close, no other opens or closes. */
  function forbidEnds() {
    for (let i = 0; i < m; i += 1) {
      if (start[i] === 0) for (let j = 0; j < m; j += 1) if (j !== i) cost[m * (m + 1) + j] = FORBIDDEN;
      if (start[i]! >= 0 && start[i]! + size[i]! === n) for (let j = 0; j < m; j += 1) if (j !== i) cost[j * (m + 1) + m] = FORBIDDEN;
    }
  }
}

/** Total seconds of a sequence of blocks (pins not looked at); `FORBIDDEN` where neighbours may not be. */
export function costOf(model: OrderModel, sequence: ArrayLike<number>): number {
  const m = model.blocks.length;
  let sum = 0;
  let last = m;
  for (let k = 0; k < sequence.length; k += 1) {
    sum += model.cost[last * (m + 1) + sequence[k]!]!;
    last = sequence[k]!;
  }
  return sum + model.cost[last * (m + 1) + m]!;
}

/** Whether every pinned block starts where it must. */
export function keepsPins(model: OrderModel, sequence: ArrayLike<number>): boolean {
  let position = 0;
  for (let k = 0; k < sequence.length; k += 1) {
    const block = sequence[k]!;
    if (model.start[block]! >= 0 && model.start[block] !== position) return false;
    position += model.size[block]!;
  }
  return true;
}
