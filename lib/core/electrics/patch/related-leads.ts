import { drivenNodes, padNodes } from "./ask-conditioner";
import type { PatchIndex, PatchNode } from "./index-patch";

/** The node's own leads, and those that decide what the conditioners on it do. */
export function relatedLeads(index: PatchIndex, node: PatchNode): string[] {
  const ids = new Set(node.leads.map((lead) => lead.id));
  const add = (nodes: readonly PatchNode[]) => nodes.forEach((other) => other.leads.forEach((lead) => ids.add(lead.id)));
  for (const { gear } of [...node.outputs, ...node.inputs.filter(({ jack }) => jack.role === "pad-in")]) {
    if (!gear.circuit) continue;
    add(padNodes(index, gear));
    add(drivenNodes(index, gear));
  }
  return [...ids].sort();
}
