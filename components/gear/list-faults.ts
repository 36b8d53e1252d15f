import { figureInfo } from "./figure-catalogue";
import type { GearFormValues } from "./form-values";

export interface Fault {
  path: string;
  label: string;
  message: string;
}

/** The form's faults in one flat list, whatever depth they sit at. */
export function listFaults(errors: unknown, values: GearFormValues): Fault[] {
  const faults: Fault[] = [];
  const walk = (node: unknown, path: string): void => {
    if (typeof node !== "object" || node === null) return;
    if ("message" in node && typeof node.message === "string" && node.message !== "") {
      const at = path.replace(/\.root$/, "").replace(/^root\b\.?/, "");
      faults.push({ path: at, label: labelOf(at, values), message: node.message });
    }
    for (const [key, child] of Object.entries(node)) {
      if (key !== "ref" && key !== "message" && key !== "type" && key !== "types") walk(child, path === "" ? key : `${path}.${key}`);
    }
  };
  walk(errors, "");
  return faults;
}

const WORDS: Record<string, string> = {
  name: "Name", notes: "Notes", supplyId: "Supply", jacks: "Jacks", knobs: "Knobs", connector: "Connector", role: "What it is",
  channel: "Channel", accepts: "Listens to", direction: "Direction", turns: "Turns", threshold: "Threshold divider", circuit: "Circuit", kind: "Kind",
};

function labelOf(path: string, values: GearFormValues): string {
  const steps = path.split(".");
  const own = figureInfo(path)?.label ?? WORDS[steps.at(-1) ?? ""] ?? "";
  if (steps[0] === "jacks" && steps[1] !== undefined) return `Jack ${Number(steps[1]) + 1}${quoted(values.jacks[Number(steps[1])]?.name)}: ${own}`;
  if (steps[0] === "knobs" && steps[1] !== undefined) return `Knob ${Number(steps[1]) + 1}${quoted(values.knobs[Number(steps[1])]?.name)}: ${own}`;
  return own;
}

const quoted = (name: string | undefined): string => (name ? ` “${name}”` : "");

/** The DOM id of a field, from its path in the form. */
export const fieldId = (path: string): string => `gear-${path.replaceAll(".", "-")}`;
