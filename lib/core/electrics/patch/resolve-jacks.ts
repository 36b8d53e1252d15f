import { toRange, type Range } from "@/lib/core/units/spread";
import { SIGNALS, type Input, type Output } from "../jacks";
import type { ConditionerOutcome, JackModel } from "../patch-types";
import type { ConditionerAnswer, NoAnswer } from "./ask-conditioner";
import type { PlacedJack } from "./index-patch";

export interface ResolvedOutput {
  figures: Partial<Output>;
  /** Why its figures could not be computed, where they should have been. */
  missing?: NoAnswer;
}

/** An output's figures in this song: computed for a conditioner with known parts, else as recorded. */
export function resolveOutput({ jack, gear }: PlacedJack, ask: (gear: PlacedJack["gear"]) => ConditionerAnswer): ResolvedOutput {
  const stated = jack.output ?? {};
  const computed = jack.role === "trigger-out" || jack.role === "envelope-out";
  if (!computed || !gear.circuit) return { figures: stated };
  const answer = ask(gear);
  if (!("missing" in answer)) return { figures: conditionerOutput(jack, answer.outcome) ?? stated };
  return { figures: { ...signalOf(jack), ...pick(stated, KEPT) }, missing: answer.missing };
}

/** What a box's builder states and no circuit tells. */
const KEPT = ["signal", "polarity", "or"] as const;

/** A conditioner's output as its circuit makes it; null for a jack that is none of its computed ones. */
export function conditionerOutput(jack: JackModel, outcome: ConditionerOutcome): Partial<Output> | null {
  if (jack.role !== "trigger-out" && jack.role !== "envelope-out") return null;
  const stated = jack.output ?? {};
  const found = jack.role === "envelope-out" ? outcome.envelope : outcome.trigger;
  return { ...signalOf(jack), ...withoutBlanks(stated), ...withoutBlanks(found ?? {}), ...pick(stated, KEPT) };
}

function signalOf(jack: JackModel): Pick<Output, "signal"> {
  return { signal: jack.role === "envelope-out" ? "envelope" : "trigger" };
}

/** An input's figures; limits that follow its supply are taken at the supply's lowest. */
export function resolveInput({ jack, gear }: PlacedJack): Input {
  const stated = jack.input ?? { accepts: [...SIGNALS], loadOhm: null };
  const input: Input = { ...withoutBlanks(stated), accepts: stated.accepts, loadOhm: stated.loadOhm ?? null, id: jack.id };
  if (!jack.followsSupply) return input;
  const supply = gear.supplyV === undefined ? null : toRange(gear.supplyV).min;
  if (supply === null) return input;
  const follows: Range = { min: -jack.followsSupply.belowV, max: supply + jack.followsSupply.aboveV };
  const safeV = input.safeV
    ? { min: Math.max(input.safeV.min, follows.min), max: Math.min(input.safeV.max, follows.max) }
    : follows;
  return safeV.min > safeV.max ? input : { ...input, safeV };
}

function withoutBlanks<T extends object>(figures: T): T {
  return Object.fromEntries(Object.entries(figures).filter(([, value]) => value !== undefined && value !== null)) as T;
}

function pick<K extends keyof Output>(figures: Partial<Output>, keys: readonly K[]): Partial<Output> {
  return Object.fromEntries(keys.flatMap((key) => (figures[key] === undefined || figures[key] === null ? [] : [[key, figures[key]]])));
}
