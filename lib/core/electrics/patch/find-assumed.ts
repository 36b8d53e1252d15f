import type { GearModel } from "../patch-types";
import { padNodes } from "./ask-conditioner";
import type { PatchIndex, PatchNode, PlacedJack } from "./index-patch";

/** What another listener on the same node adds to this one's verdict. */
const SHARED_FIGURES = ["loadOhm", "biasV", "clamp"];

/** Assumed figures one lead's verdict leans on, as `<gearId>:<path>`: of its jacks, of what shares its node, of what feeds it. */
export function findAssumed(index: PatchIndex, node: PatchNode, input: PlacedJack): string[] {
  const found = new Set<string>();
  const note = ({ id, assumed }: GearModel, wanted: (path: string) => boolean) => {
    for (const path of assumed) if (wanted(path)) found.add(`${id}:${path}`);
  };
  for (const output of node.outputs) noteOutput(index, output, note);
  for (const other of node.inputs) {
    const at = `jacks.${other.jack.id}.`;
    note(other.gear, (path) => path.startsWith(at) && (other === input || SHARED_FIGURES.some((f) => path.slice(at.length).startsWith(f))));
    if (other.jack.role === "pad-in" && other === input) noteConditioner(index, other.gear, note);
  }
  return [...found].sort();
}

type Note = (gear: GearModel, wanted: (path: string) => boolean) => void;

function noteOutput(index: PatchIndex, { jack, gear }: PlacedJack, note: Note): void {
  if (gear.pad) note(gear, isOfPad);
  const computed = gear.circuit !== undefined && (jack.role === "trigger-out" || jack.role === "envelope-out");
  if (computed) noteConditioner(index, gear, note);
  else note(gear, (path) => path.startsWith(`jacks.${jack.id}.`));
}

function noteConditioner(index: PatchIndex, gear: GearModel, note: Note): void {
  note(gear, (path) => /^(details\.)?(circuit|supply)/.test(path));
  for (const node of padNodes(index, gear)) for (const from of node.outputs) if (from.gear.pad) note(from.gear, isOfPad);
}

function isOfPad(path: string): boolean {
  return path.startsWith("pad.") || (path.startsWith("details.") && !path.startsWith("details.circuit"));
}
