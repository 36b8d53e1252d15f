import type { GearInput } from "@/lib/schemas/gear";
import { figureInfo } from "./figure-catalogue";
import { showFigure } from "./figure-text";
import { SIGNAL_SHORT } from "./gear-words";

/** One thing in which two versions of a piece of gear differ. */
export interface Difference {
  label: string;
  mine: string;
  stored: string;
  /** Who changed it since both began; null where that is not known. */
  changedBy: "you" | "the other" | "both" | null;
}

type Spoken = Map<string, { label: string; text: string }>;

/** What differs between what is in the form and what is stored, in words, in the order of the form. */
export function describeDifference(mine: GearInput, stored: GearInput, supplyName: (id: string | null) => string, base: GearInput | null = null): Difference[] {
  const left = speak(mine, supplyName);
  const right = speak(stored, supplyName);
  const start = base ? speak(base, supplyName) : null;
  const keys = [...left.keys(), ...[...right.keys()].filter((key) => !left.has(key))];
  return keys.flatMap((key) => {
    const a = left.get(key);
    const b = right.get(key);
    if (a?.text === b?.text) return [];
    const before = start?.get(key)?.text;
    const changedBy = !start ? null : before === b?.text ? "you" : before === a?.text ? "the other" : "both";
    return [{ label: a?.label ?? b?.label ?? key, mine: a?.text ?? "—", stored: b?.text ?? "—", changedBy }];
  });
}

function speak(gear: GearInput, supplyName: (id: string | null) => string): Spoken {
  const spoken: Spoken = new Map();
  const say = (key: string, label: string, text: string) => spoken.set(key, { label, text });
  say("name", "Name", gear.name);
  say("notes", "Notes", gear.notes || "—");
  say("supplyId", "Supply", supplyName(gear.supplyId));
  sayFigures(gear.details, "details", "", "details", say);
  for (const jack of gear.jacks) {
    const key = `jacks.${jack.id}`;
    say(key, `Jack “${jack.name}”`, `${jack.direction}, ${jack.connector}`);
    say(`${key}.name`, `Jack “${jack.name}”, name`, jack.name);
    const side = jack.direction === "output" ? jack.output : jack.input;
    sayFigures(side, `jacks.0.${jack.direction}`, `${jack.name}: `, key, say);
  }
  for (const knob of gear.knobs) say(`knobs.${knob.id}`, `Knob “${knob.name}”`, `${knob.name}, turns ${knob.turns}`);
  say("assumed", "Figures assumed", String(gear.assumed.length));
  return spoken;
}

const PLAIN_WORDS: Record<string, string> = {
  sensor: "Sensor", build: "Build", padLeg: "Pad's place", source: "Source", channel: "Channel",
  signal: "Signal", accepts: "Listens to", polarity: "Polarity", or: "Through a diode", phantom: "Phantom power",
};

function sayFigures(node: unknown, infoPath: string, before: string, key: string, say: (key: string, label: string, text: string) => void): void {
  if (typeof node !== "object" || node === null) return;
  for (const [name, value] of Object.entries(node)) {
    const info = figureInfo(`${infoPath}.${name}`);
    const word = PLAIN_WORDS[name];
    if (info) say(`${key}.${name}`, `${before}${info.label}`, showFigure(value as Parameters<typeof showFigure>[0], info.unit));
    else if (word !== undefined && !(typeof value === "object" && value !== null && !Array.isArray(value))) say(`${key}.${name}`, `${before}${word}`, plain(value));
    else sayFigures(value, `${infoPath}.${name}`, before, `${key}.${name}`, say);
  }
}

function plain(value: unknown): string {
  if (typeof value === "boolean") return value ? "yes" : "no";
  if (Array.isArray(value)) return value.map((item) => SIGNAL_SHORT[item as keyof typeof SIGNAL_SHORT] ?? String(item)).join(", ");
  return String(value);
}
