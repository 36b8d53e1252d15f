import { assignLeads, type Source } from "./assign-leads";
import { fact } from "./fit-lead";
import { orderSteps } from "./order-steps";
import { sayTurn } from "./say-step";
import { TYPICAL_PACE, type Changeover, type ChangeoverRequest, type Pace, type Step, type TurnStep } from "./types";

/**
 * The quickest way from one song's patch to the next: the true least number of ends touched, as steps in a safe order.
 *
 * `endMoves` counts jacks touched: a lead that stays 0, one end moved 1, both ends 2, put away 2, fetched and plugged 2; an end
 * pulled early to break a ring of swaps is the same end its own step plugs, and counts once. A knob counts as a turn where the new
 * patch gives it a position other than the one it has (or where that is not known); a knob the new patch does not mention stays.
 * `seconds` = endMoves · endS + knobTurns · knobS + leads fetched · fetchS.
 *
 * @param request the two patches; jacks are told apart by id, outputs and inputs separately; several leads may share an output (a
 *   mult) or an input (a diode OR). At most 200 connections each. `pace` in seconds, each part 0 or more; what is absent is typical.
 * @returns the plan; `steps` applied one by one with `applyStep` turn `from` into `to`. Without `leads` (the stock) any lead is taken to
 *   fit anywhere and there is always one to fetch; with it, connections no lead fits are in `shortages`, still counted as fetched.
 * @throws RangeError over 200 connections
 */
export function planChangeover(request: ChangeoverRequest): Changeover {
  const sources = assignLeads(request);
  const leadSteps = orderSteps(request, sources);
  const turns = findTurns(request);
  const endMoves = leadSteps.reduce((sum, step) => sum + step.ends, 0);
  const fetched = leadSteps.filter((step) => step.kind === "fetch").length;
  return {
    endMoves,
    knobTurns: turns.length,
    seconds: timeChangeover({ endMoves, knobTurns: turns.length, fetched }, request.pace),
    steps: [...leadSteps, ...turns],
    ...findShortages(request, sources),
    ...minDesk(request, leadSteps),
  };
}

/** Seconds a changeover takes at a pace; parts of the pace that are absent are typical. */
export function timeChangeover(counts: { endMoves: number; knobTurns: number; fetched: number }, pace: Partial<Pace> = {}): number {
  const { endS = TYPICAL_PACE.endS, knobS = TYPICAL_PACE.knobS, fetchS = TYPICAL_PACE.fetchS } = pace;
  return counts.endMoves * endS + counts.knobTurns * knobS + counts.fetched * fetchS;
}

function findTurns({ knobsFrom, knobsTo = {} }: ChangeoverRequest): TurnStep[] {
  return Object.entries(knobsTo).flatMap(([knob, to]) => {
    const from = fact(knobsFrom, knob) ?? null;
    return from === to ? [] : [{ kind: "turn" as const, knob, from, to, text: sayTurn(knob, from, to) }];
  });
}

function findShortages(request: ChangeoverRequest, sources: Source[]): Pick<Changeover, "shortages"> {
  const shortages = sources.flatMap((source, toRow) => {
    const want = request.to[toRow];
    if (!want || source.kind !== "any" || !source.isShort) return [];
    const output = fact(request.outputs, want.output)?.name ?? want.output;
    const input = fact(request.inputs, want.input)?.name ?? want.input;
    return [{ toRow, text: `No free lead fits from ${output} to ${input}.` }];
  });
  return shortages.length > 0 ? { shortages } : {};
}

/** Channels on which a touched lead is heard are turned down first and up again last. */
function minDesk(request: ChangeoverRequest, steps: Step[]): Pick<Changeover, "before" | "after"> {
  const touched = new Set(steps.flatMap((step) =>
    step.kind === "turn" ? [] : ["from" in step ? step.from.input : "", "to" in step ? step.to.input : ""]));
  const channels = (request.desk ?? []).filter((one) => one.inputs.some((input) => touched.has(input))).map((one) => one.channel);
  if (channels.length === 0) return {};
  return { before: channels.map((channel) => `Lower ${channel}`), after: channels.map((channel) => `Raise ${channel} again`) };
}
