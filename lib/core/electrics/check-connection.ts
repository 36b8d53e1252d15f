import type { Connection, ConnectionCheck, FixOptions, ListenerCheck } from "./connection-types";
import type { Input } from "./jacks";
import { judgeListener } from "./judge/judge-listener";
import { worstVerdict } from "./judge/order-verdicts";
import type { Scene } from "./judge/scene";
import { buildNode, clampCurrentAt, type Node } from "./node/build-node";

/**
 * Says of outputs joined to inputs — a lead, or a passive mult — whether each input is safe and will fire,
 * at the worst its figures allow, and why.
 *
 * @param connection outputs (figures may be blank in a patch) and inputs, all at one node; SI. Call
 *   `findConnectionIssues` first: a figure that is not one is a broken precondition.
 * @returns a verdict for each listener with every reason that applies, the exact range of the level at rest and while
 *   active, the exact range of the current each output gives, and the greatest current through each input's diodes.
 * @throws RangeError on a spread that is upside down, not finite, or has a tolerance outside 0…1.
 *
 * Sources: Millman's theorem and Kirchhoff's current law for the levels; the verdict table and its margins are this
 * project's own, from common practice. Limits: resistive at each instant (no cable or input capacitance), ideal diodes
 * whose drop is part of the clamp's voltage, an OR output's drop part of its stated level. Two ideal outputs that fight are
 * taken as 1 mΩ each.
 */
export function checkConnection(connection: Connection): ConnectionCheck {
  const node = buildNode(connection);
  const listeners = connection.inputs.map((input, place) => checkListener(connection, node, input, place));
  return {
    verdict: worstVerdict(listeners.map((listener) => listener.verdict)),
    source: { currentA: node.currentA },
    listeners,
  };
}

function checkListener({ outputs }: Connection, node: Node, input: Input, place: number): ListenerCheck {
  const clampA = clampCurrentAt(node, place);
  const scene: Scene = { input, outputs, ...node, clampA };
  const { verdict, reasons, pulseS } = judgeListener(scene);
  return {
    id: input.id,
    verdict,
    highV: node.highV,
    lowV: node.lowV,
    ...(clampA === null ? {} : { clampA }),
    ...(pulseS && Number.isFinite(pulseS.max) ? { pulseS } : {}),
    reasons,
    fixes: [],
  };
}

export type { FixOptions };
