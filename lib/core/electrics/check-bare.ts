import type { Connection, ConnectionCheck, ListenerCheck } from "./connection-types";
import type { Input } from "./jacks";
import { judgeListener } from "./judge/judge-listener";
import { worstVerdict } from "./judge/order-verdicts";
import type { Scene } from "./judge/scene";
import { buildNode, clampCurrentAt, type Node } from "./node/build-node";

/** The check without its fixes: what a fix is itself put through. See `checkConnection`. */
export function checkBare(connection: Connection): ConnectionCheck {
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
