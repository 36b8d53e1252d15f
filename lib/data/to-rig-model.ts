import type { ConditionerCircuit, GearModel, JackModel, PadModel, RigModel } from "@/lib/core/electrics/patch-types";
import type { Spread } from "@/lib/core/units/spread";
import type { Gear, GearDetails } from "@/lib/schemas/gear";
import type { InputJack, Jack, OutputJack } from "@/lib/schemas/jack";

/** A conditioner whose supply nobody named is taken to run on a 9 V battery over its life: electrics, tolerances; common practice, no source. */
const ASSUMED_SUPPLY = { highV: { min: 6, max: 9.6 }, lowV: 0 } as const;

/** Stored gear as the electrics want it: unknown figures absent, a box's supply looked up, assumed paths renamed to the model's. */
export function toRigModel(gear: readonly Gear[]): RigModel {
  const supplies = new Map(gear.filter((item) => item.details.kind === "supply").map((item) => [item.id, item]));
  return { gear: gear.map((item) => toGearModel(item, item.supplyId === null ? undefined : supplies.get(item.supplyId))) };
}

function toGearModel(gear: Gear, supply: Gear | undefined): GearModel {
  const rails = railsOf(supply);
  const circuit = circuitOf(gear.details, rails);
  const supplyPaths = supplyIsAssumed(supply) ? ["circuit.supply"] : [];
  return {
    id: gear.id,
    kind: gear.kind,
    name: gear.name,
    jacks: gear.jacks.map(toJackModel),
    ...(gear.details.kind === "pad" ? { pad: padOf(gear.details) } : {}),
    ...(circuit ? { circuit } : {}),
    ...(rails ? { supplyV: rails.highV } : {}),
    knobs: gear.knobs.map(({ id, turns }) => ({ id, turns })),
    assumed: [...gear.assumed.map(toModelPath), ...(circuit ? supplyPaths : [])],
  };
}

function railsOf(supply: Gear | undefined): { highV: Spread; lowV: Spread } | undefined {
  return supply?.details.kind === "supply" ? { highV: supply.details.highV, lowV: supply.details.lowV } : undefined;
}

function supplyIsAssumed(supply: Gear | undefined): boolean {
  return !supply || supply.assumed.some((path) => path === "details.highV" || path === "details.lowV");
}

function circuitOf(details: GearDetails, rails: { highV: Spread; lowV: Spread } | undefined): ConditionerCircuit | undefined {
  if (details.kind !== "conditioner" || details.build !== "circuit" || !details.circuit) return undefined;
  return { supply: rails ?? ASSUMED_SUPPLY, ...details.circuit };
}

function padOf(details: Extract<GearDetails, { kind: "pad" }>): PadModel {
  const { kind: _kind, ...figures } = details;
  return known(figures) as PadModel;
}

function toJackModel(jack: Jack): JackModel {
  const shared = { id: jack.id, name: jack.name, role: jack.role };
  return jack.direction === "output"
    ? { ...shared, direction: "output", output: outputOf(jack.output) }
    : { ...shared, direction: "input", input: inputOf(jack.input) };
}

function outputOf(output: OutputJack["output"]): NonNullable<JackModel["output"]> {
  return known(output) as NonNullable<JackModel["output"]>;
}

function inputOf(input: InputJack["input"]): NonNullable<JackModel["input"]> {
  const { safeLowV, safeHighV, pulseMinS, pulseMaxS, decayMinS, loadOhm, ...rest } = input;
  return {
    ...(known(rest) as Pick<NonNullable<JackModel["input"]>, "accepts">),
    loadOhm,
    ...(safeLowV !== null && safeHighV !== null ? { safeV: { min: safeLowV, max: safeHighV } } : {}),
    ...(pulseMinS !== null || pulseMaxS !== null ? { pulseS: known({ min: pulseMinS, max: pulseMaxS }) } : {}),
    ...(decayMinS !== null ? { decayS: { min: decayMinS } } : {}),
  };
}

/** Leaves out what is null: an absent figure is an unknown one. */
function known<T extends object>(figures: T): { [K in keyof T]?: Exclude<T[K], null> } {
  return Object.fromEntries(Object.entries(figures).filter(([, value]) => value !== null)) as { [K in keyof T]?: Exclude<T[K], null> };
}

const JACK_FIGURES: Record<string, string> = { safeLowV: "safeV", safeHighV: "safeV", pulseMinS: "pulseS", pulseMaxS: "pulseS", decayMinS: "decayS" };

/** `details.circuit.divider.ohm` → `circuit.divider.ohm`, `details.restOhm` → `pad.restOhm`, `jacks.x.safeLowV` → `jacks.x.safeV`. */
export function toModelPath(path: string): string {
  if (path.startsWith("details.circuit.")) return path.slice("details.".length);
  if (path.startsWith("details.")) return `pad.${path.slice("details.".length)}`;
  const [root, jackId, figure = "", ...rest] = path.split(".");
  return root === "jacks" ? [root, jackId, JACK_FIGURES[figure] ?? figure, ...rest].join(".") : path;
}
