import { checkConnection } from "../check-connection";
import type { Connection, ListenerCheck } from "../connection-types";
import type { Reason } from "../jacks";
import { orderReasons } from "../judge/order-verdicts";
import type { LeadCheck } from "../patch-types";
import { checkBehind, inlineOf, withInlineLoads } from "./check-inline";
import { cautionUnpowered } from "./caution-unpowered";
import { findAssumed } from "./find-assumed";
import { findCircuitPulse } from "./find-circuit-pulse";
import { findFreeConditioner } from "./find-free-conditioner";
import type { Lead, PatchNode, PlacedJack } from "./index-patch";
import type { NodeContext } from "./node-context";
import { relatedLeads } from "./related-leads";
import { resolveInput, resolveOutput, type ResolvedOutput } from "./resolve-jacks";
import { sayMissing } from "./say-missing";

/** Checks every lead of one node. */
export function checkNode(context: NodeContext, node: PatchNode): LeadCheck[] {
  const onlyPads = node.outputs.every(({ gear }) => gear.pad !== undefined);
  const electric = onlyPads && node.inputs.every(isPadInput) ? null : checkElectric(context, node);
  return node.leads.map((lead) => {
    const input = node.inputs.find(({ jack }) => jack.id === lead.inputId) as PlacedJack;
    const check = onlyPads && isPadInput(input) ? checkPadLead(context, lead, input) : electric?.get(input.jack.id)?.(lead.id);
    return { ...(check as LeadCheck), assumed: findAssumed(context.index, node, input), relatedLeadIds: relatedLeads(context.index, node) };
  });
}

type Bare = Omit<LeadCheck, "assumed" | "relatedLeadIds">;

function isPadInput({ jack }: PlacedJack): boolean {
  return jack.role === "pad-in";
}

/** A pad on its conditioner: the circuit decides. */
function checkPadLead({ ask }: NodeContext, lead: Lead, { gear }: PlacedJack): Bare {
  const answer = ask(gear);
  const blank = { leadId: lead.id, highV: null, lowV: null, currentA: null, fixes: [], cautions: [] };
  if ("missing" in answer) return { ...blank, verdict: "unproven", reasons: [sayMissing(answer.missing, gear.name)] };
  return { ...blank, verdict: answer.outcome.verdict, reasons: answer.outcome.reasons };
}

/** Everything else is a connection; the answer for each input, ready for each of its leads. */
function checkElectric(context: NodeContext, node: PatchNode): Map<string, (leadId: string) => Bare> {
  const resolved = node.outputs.map((output) => resolveOutput(output, context.ask));
  const connection: Connection = { outputs: resolved.map((r) => r.figures), inputs: node.inputs.map(resolveInput) };
  const inline = inlineOf(node);
  const plain = inline.size === 0;
  const check = checkConnection(withInlineLoads(connection, inline), plain ? context.fixOptions : { ...context.fixOptions, fixes: false });
  return new Map(check.listeners.map((seen, place) => {
    // Parts that cannot be followed are taken as not there, which the sentences then speak of.
    const listener = inline.has(place) ? (checkBehind(connection, place, inline) ?? checkConnection(connection, { fixes: false }).listeners[place] ?? seen) : seen;
    const { gear } = node.inputs[place] as PlacedJack;
    const reasons = explainBlanks(node, resolved, listener.reasons);
    const fixes = [...listener.fixes, ...findCircuitPulse(context, node, connection, place, listener), ...findFreeConditioner(context, node, connection, place, listener)];
    const cautions = cautionUnpowered(connection, place, gear);
    return [listener.id, (leadId: string): Bare => ({ ...present(listener), leadId, reasons, fixes, cautions, currentA: check.source.currentA })];
  }));
}

function present({ verdict, highV, lowV, clampA, pulseS, fixNote }: ListenerCheck) {
  return {
    verdict, highV, lowV,
    ...(clampA === undefined ? {} : { clampA }),
    ...(pulseS === undefined ? {} : { pulseS }),
    ...(fixNote === undefined ? {} : { fixNote }),
  };
}

/** Where an output is blank because nothing feeds it, says that once instead of asking to measure each figure. */
function explainBlanks(node: PatchNode, resolved: readonly ResolvedOutput[], reasons: readonly Reason[]): Reason[] {
  let shown = [...reasons];
  resolved.forEach(({ missing }, i) => {
    const name = node.outputs[i]?.gear.name;
    if (!missing || name === undefined) return;
    shown = shown.filter((reason) => !reason.figure?.startsWith(`outputs.${i}.`));
    shown.push(sayMissing(missing, name));
  });
  return orderReasons(shown);
}
