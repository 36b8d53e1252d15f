import { conditionerTemplates } from "./starting/conditioners";
import { deskTemplates, supplyTemplates } from "./starting/desk-and-supplies";
import { shaperTemplates, voiceTemplates } from "./starting/listeners";
import { padTemplates } from "./starting/pads";
import type { Assumed, DetailsTemplate, GearTemplate, InputTemplate, OutputTemplate } from "./starting/template";

export type StartingKind = GearTemplate["kind"];

type Plain<T> = T extends Assumed<infer V> ? V : T extends object ? { [K in keyof T]: Plain<T[K]> } : T;
/** Distributes over the union so that `details.kind` still tells the members apart. */
type PlainEach<T> = T extends unknown ? Plain<T> : never;

/** A piece of gear to begin from; it parses as `GearInput`. */
export interface StartingGear {
  name: string;
  notes: string;
  supplyId: string | null;
  details: PlainEach<DetailsTemplate>;
  jacks: (Omit<PlainEach<OutputTemplate>, "key"> & { id: string } | Omit<PlainEach<InputTemplate>, "key"> & { id: string })[];
  knobs: { id: string; name: string; turns: "threshold" | "nothing" }[];
  assumed: string[];
}

const TEMPLATES: readonly GearTemplate[] = [
  ...padTemplates, ...conditionerTemplates, ...shaperTemplates, ...voiceTemplates, ...deskTemplates, ...supplyTemplates,
];

/** What there is to begin from, for a chooser. `wants` is the supply a box of this sort runs on. */
export interface StartingVariant {
  kind: StartingKind;
  variant: string;
  label: string;
  hint: string;
  wants: { highV: number; lowV: number } | null;
}

/** The variants of one kind, the usual one first. */
export function startingVariants(kind: StartingKind): StartingVariant[] {
  return TEMPLATES.filter((template) => template.kind === kind).map(({ variant, label, hint, wants }) => ({ kind, variant, label, hint, wants }));
}

/**
 * A piece of gear filled with figures to begin from, every electrical one listed in `assumed`
 * (`details.restOhm`, `details.circuit.divider.ohm`, `jacks.<jackId>.onV`) until somebody measures it.
 * @param kind what it is.
 * @param variant one of `startingVariants(kind)`; absent: the first.
 * @param makeId gives a new id at each call, letters, figures, `-` and `_` only; this room makes no random numbers.
 * @returns SI figures; unknown ones are null. `supplyId` is null: the caller knows the rig's supplies.
 * @throws RangeError for a variant that the kind does not have.
 * Source: each figure's own, in `startingFigureSources`. Limits: a place to begin, never a reading.
 */
export function startingGear(kind: StartingKind, variant: string | undefined, makeId: () => string): StartingGear {
  const template = templateOf(kind, variant);
  const assumed: string[] = [];
  const note = (path: string) => assumed.push(path);
  const details = stripSources(template.details, "details", note);
  const jacks = template.jacks.map((jack) => {
    const id = makeId();
    const { name, connector, role, direction } = jack;
    const figures = stripSources(direction === "output" ? jack.output : jack.input, `jacks.${id}`, note);
    return { id, name, connector, role, direction, [direction]: figures };
  });
  const knobs = template.knobs.map((knob) => ({ ...knob, id: makeId() }));
  // stripSources replaces each {value, source} by its value, which is what `Plain` says; the walk itself cannot be typed.
  return { name: template.name, notes: "", supplyId: null, details, jacks, knobs, assumed } as StartingGear;
}

/**
 * Where each starting figure is from: `kind/variant` → path → source. A jack's path names it by its
 * key in the template (`jacks.trigger.activeV`), since ids are made anew.
 */
export const startingFigureSources: Readonly<Record<string, Readonly<Record<string, string>>>> = Object.fromEntries(
  TEMPLATES.map((template) => {
    const sources: Record<string, string> = {};
    const note = (path: string, source: string) => { sources[path] = source; };
    stripSources(template.details, "details", note);
    for (const jack of template.jacks) stripSources(jack.direction === "output" ? jack.output : jack.input, `jacks.${jack.key}`, note);
    return [`${template.kind}/${template.variant}`, sources];
  }),
);

/**
 * The same sources by the assumed paths of one piece of starting gear, to show beside its figures.
 * @param jackIds ids of that gear's jacks, in the order `startingGear` gave them.
 * @throws RangeError for a variant that the kind does not have.
 */
export function startingSourcesOf(kind: StartingKind, variant: string | undefined, jackIds: readonly string[]): Record<string, string> {
  const template = templateOf(kind, variant);
  const sources = startingFigureSources[`${kind}/${template.variant}`] ?? {};
  return Object.fromEntries(
    Object.entries(sources).map(([path, source]) => {
      const [root, key, ...rest] = path.split(".");
      const id = root === "jacks" ? jackIds[template.jacks.findIndex((jack) => jack.key === key)] : undefined;
      return [id === undefined ? path : ["jacks", id, ...rest].join("."), source];
    }),
  );
}

function templateOf(kind: StartingKind, variant: string | undefined): GearTemplate {
  const found = TEMPLATES.find((template) => template.kind === kind && (variant === undefined || template.variant === variant));
  if (!found) throw new RangeError(`no starting figures for ${kind}/${variant}`);
  return found;
}

function stripSources(node: unknown, path: string, note: (path: string, source: string) => void): unknown {
  if (typeof node !== "object" || node === null) return node;
  if (isAssumed(node)) {
    note(path, node.source);
    return structuredClone(node.value);
  }
  if (Array.isArray(node)) return [...node];
  return Object.fromEntries(Object.entries(node).map(([key, child]) => [key, stripSources(child, `${path}.${key}`, note)]));
}

function isAssumed(node: object): node is Assumed<unknown> {
  return "value" in node && "source" in node && typeof node.source === "string";
}
