import type { Source } from "./assign-leads";
import { warnOfShort } from "./warn-of-short";
import { speakOf, type Speech } from "./say-step";
import type { ChangeoverRequest, Connection, FetchStep, LeadId, MoveStep, PullFirst, PutAwayStep } from "./types";

interface Moving {
  fromRow: number;
  toRow: number;
  lead: LeadId | null;
  from: Connection;
  to: Connection;
  /** Ends already pulled for an earlier step. */
  hanging: Set<"output" | "input">;
}

type End = "output" | "input";
type Count = Map<string, number>;

/**
 * Puts the touched leads in a safe order, one step a lead: first what is put away, then moves, each once the jacks it goes to are
 * free, then what is fetched. Where leads wait for each other in a ring, the step that breaks the ring names the end to pull and
 * let hang first; that end is plugged in its own lead's step, so no end is counted twice.
 * No jack ever holds more plugs on the way than the fuller of the two patches puts into it (at least one): where neither patch puts two
 * outputs on an input, no moment between does.
 */
export function orderSteps(request: ChangeoverRequest, sources: Source[]): (MoveStep | PutAwayStep | FetchStep)[] {
  const { from, to } = request;
  const speech = speakOf(request);
  const servedBy = new Map(sources.flatMap((source, toRow) => (source.kind === "on-rig" ? [[source.fromRow, toRow] as const] : [])));
  const plugs = { output: countPlugs(from, "output"), input: countPlugs(from, "input") };
  const most = { output: mostPlugs(from, to, "output"), input: mostPlugs(from, to, "input") };
  const steps: (MoveStep | PutAwayStep | FetchStep)[] = [];
  const waiting: Moving[] = [];

  from.forEach((have, fromRow) => {
    const lead = have.lead ?? null;
    const here = { output: have.output, input: have.input };
    const toRow = servedBy.get(fromRow);
    if (toRow === undefined) {
      change(plugs.output, have.output, -1);
      change(plugs.input, have.input, -1);
      steps.push(putAway(fromRow, lead, here, speech, request));
      return;
    }
    const want = to[toRow]!;
    if (want.output === have.output && want.input === have.input) return;
    waiting.push({ fromRow, toRow, lead, from: here, to: { output: want.output, input: want.input }, hanging: new Set() });
  });

  const isFree = (move: Moving, end: End) =>
    move.from[end] === move.to[end] || (plugs[end].get(move.to[end]) ?? 0) < (most[end].get(move.to[end]) ?? 1);
  while (waiting.length > 0) {
    const ready = waiting.findIndex((move) => isFree(move, "input") && isFree(move, "output"));
    const [move] = waiting.splice(Math.max(ready, 0), 1);
    if (!move) break;
    const pullFirst: PullFirst[] = [];
    for (const end of ["input", "output"] as const) {
      if (isFree(move, end)) continue;
      const jack = move.to[end];
      const inTheWay = waiting.find((other) => other.from[end] === jack && other.to[end] !== jack && !other.hanging.has(end));
      if (!inTheWay) throw new Error(`nothing to pull from ${jack}`);
      inTheWay.hanging.add(end);
      change(plugs[end], jack, -1);
      pullFirst.push({ fromRow: inTheWay.fromRow, lead: inTheWay.lead, end, jack });
    }
    for (const end of ["output", "input"] as const) {
      if (move.from[end] === move.to[end]) continue;
      if (!move.hanging.has(end)) change(plugs[end], move.from[end], -1);
      change(plugs[end], move.to[end], 1);
    }
    steps.push(moveStep(move, sources[move.toRow], pullFirst, speech, request));
  }

  sources.forEach((source, toRow) => {
    if (source.kind !== "on-rig") steps.push(fetch(toRow, source, to[toRow]!, speech, request));
  });
  return steps;
}

function putAway(fromRow: number, lead: LeadId | null, from: Connection, speech: Speech, request: ChangeoverRequest): PutAwayStep {
  const text = `${speech.lead(lead, from)}: pull from ${speech.input(from.input)}, then from ${speech.output(from.output)} · put away`;
  return { kind: "put-away", lead, fromRow, from, ends: 2, ...warnOfShort([from.output], request), text };
}

function fetch(toRow: number, source: Exclude<Source, { kind: "on-rig" }>, want: Connection, speech: Speech, request: ChangeoverRequest): FetchStep {
  const lead = source.kind === "stock" ? source.lead.lead : null;
  const to = { output: want.output, input: want.input };
  const adapters = source.kind === "stock" ? source.adapters : [];
  const text = `${speech.lead(lead)}: fetch · plug into ${speech.output(to.output)}, then into ${speech.input(to.input)}`;
  return {
    kind: "fetch", lead, toRow, to, ends: 2,
    ...(adapters.length > 0 ? { adapters } : {}),
    ...warnOfShort([to.output], request),
    text: text + sayAdapters(adapters),
  };
}

function moveStep(move: Moving, source: Source | undefined, pullFirst: PullFirst[], speech: Speech, request: ChangeoverRequest): MoveStep {
  const { from, to, hanging, lead, fromRow, toRow } = move;
  const movesOutput = from.output !== to.output;
  const movesInput = from.input !== to.input;
  const adapters = source?.kind === "on-rig" ? source.adapters : [];
  const name = speech.lead(lead, from);
  const go = (end: End) => {
    const [old, next] = end === "output" ? [speech.output(from.output), speech.output(to.output)] : [speech.input(from.input), speech.input(to.input)];
    return hanging.has(end) ? `plug the end left hanging (it was in ${old}) into ${next}` : `move from ${old} to ${next}`;
  };
  let words: string;
  if (movesOutput && movesInput) {
    const pulls = [hanging.has("input") ? "" : speech.input(from.input), hanging.has("output") ? "" : speech.output(from.output)].filter((jack) => jack !== "");
    const pull = pulls.length > 0 ? `pull from ${pulls.join(", then from ")} · ` : "";
    words = `${name}: ${pull}plug into ${speech.output(to.output)}, then into ${speech.input(to.input)}`;
  } else if (movesInput) words = `${name}: leave in ${speech.output(from.output)} · ${go("input")}`;
  else words = `${name}: leave in ${speech.input(from.input)} · ${go("output")}`;
  return {
    kind: movesOutput && movesInput ? "move-both" : movesInput ? "move-input" : "move-output",
    lead, fromRow, toRow, from, to,
    ends: Number(movesOutput) + Number(movesInput),
    ...(pullFirst.length > 0 ? { pullFirst } : {}),
    ...(adapters.length > 0 ? { adapters } : {}),
    ...warnOfShort([from.output, to.output], request),
    text: [...pullFirst.map(speech.pull), words].join(" · ") + sayAdapters(adapters),
  };
}

function sayAdapters(adapters: { plug: string; jack: string }[]): string {
  return adapters.map(({ plug, jack }) => ` · adapter ${plug} to ${jack}`).join("");
}

function countPlugs(connections: Connection[], end: End): Count {
  const count: Count = new Map();
  for (const connection of connections) change(count, connection[end], 1);
  return count;
}

function mostPlugs(from: Connection[], to: Connection[], end: End): Count {
  const most = countPlugs(from, end);
  for (const [jack, plugs] of countPlugs(to, end)) most.set(jack, Math.max(plugs, most.get(jack) ?? 1));
  return most;
}

function change(count: Count, jack: string, by: number): void {
  count.set(jack, (count.get(jack) ?? 0) + by);
}
