import type { GearModel, JackModel, PatchModel, RigModel } from "../patch-types";

export interface PlacedJack {
  jack: JackModel;
  gear: GearModel;
}

export type Lead = PatchModel["leads"][number];

/** Jacks joined by leads, all at one level: a mult, or several outputs on one input, or both. */
export interface PatchNode {
  outputs: PlacedJack[];
  inputs: PlacedJack[];
  leads: Lead[];
}

export interface PatchIndex {
  rig: RigModel;
  patch: PatchModel;
  jacks: ReadonlyMap<string, PlacedJack>;
  nodes: PatchNode[];
  nodeOfJack: ReadonlyMap<string, PatchNode>;
  /** Leads with an end on a jack that the rig does not have, or the wrong way round. */
  loose: Lead[];
}

/** Looks up every jack once and gathers the leads into nodes. */
export function indexPatch(rig: RigModel, patch: PatchModel): PatchIndex {
  const jacks = new Map<string, PlacedJack>();
  for (const gear of rig.gear) for (const jack of gear.jacks) jacks.set(jack.id, { jack, gear });
  const fits = (lead: Lead) => jacks.get(lead.outputId)?.jack.direction === "output" && jacks.get(lead.inputId)?.jack.direction === "input";
  const leads = patch.leads.filter(fits);
  const { nodes, nodeOfJack } = groupNodes(leads, jacks);
  return { rig, patch, jacks, nodes, nodeOfJack, loose: patch.leads.filter((lead) => !fits(lead)) };
}

function groupNodes(leads: readonly Lead[], jacks: ReadonlyMap<string, PlacedJack>) {
  const leader = new Map<string, string>();
  const find = (id: string): string => {
    let root = id;
    for (let up = leader.get(root); up !== undefined && up !== root; up = leader.get(root)) root = up;
    leader.set(id, root);
    return root;
  };
  for (const { outputId, inputId } of leads) leader.set(find(outputId), find(inputId));
  const byRoot = new Map<string, PatchNode>();
  const nodeOfJack = new Map<string, PatchNode>();
  for (const lead of leads) {
    const root = find(lead.outputId);
    const node = byRoot.get(root) ?? { outputs: [], inputs: [], leads: [] };
    byRoot.set(root, node);
    node.leads.push(lead);
    for (const [id, list] of [[lead.outputId, node.outputs], [lead.inputId, node.inputs]] as const) {
      const placed = jacks.get(id);
      if (placed && !nodeOfJack.has(id)) {
        nodeOfJack.set(id, node);
        list.push(placed);
      }
    }
  }
  return { nodes: [...byRoot.values()], nodeOfJack };
}
