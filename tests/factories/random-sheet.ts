import { VERDICTS } from "@/lib/core/electrics/jacks";
import type { LeadCheck, PatchCheck } from "@/lib/core/electrics/patch-types";
import { startingGear } from "@/lib/core/electrics/starting-figures";
import type { SheetSource } from "@/lib/paper/build-sheet-view";
import { gearInputSchema, type Gear, type GearKind } from "@/lib/schemas/gear";
import type { Jack } from "@/lib/schemas/jack";
import { LEAD_COLOURS, type Patch } from "@/lib/schemas/patch";
import { seededRandom } from "@/lib/core/electrics/tolerance/seeded-random";

const ALPHABETS = [
  "abcdefghijklmnopqrstuvwxyz ", "WMQ@%& ", "ÀÉÎÕÜłżčğşøåß ", "10 kΩ µF ±½ ", "Большой малый ", "Ωμέγα δέλτα ", "שלום תוף ", "太鼓パッド 鼓 ", "W",
] as const;

/** A name of 1 to 60 characters in one of many scripts. */
function randomName(next: () => number, most = 60): string {
  const alphabet = [...(ALPHABETS[Math.floor(next() * ALPHABETS.length)] ?? "x")];
  const length = 1 + Math.floor(next() * most);
  const name = Array.from({ length }, () => alphabet[Math.floor(next() * alphabet.length)]).join("").trim();
  return name === "" ? "x" : name;
}

interface Sizes {
  leads: number;
  knobs: number;
  noteLength: number;
  nameLength?: number;
}

const KINDS: readonly GearKind[] = ["pad", "conditioner", "shaper", "voice", "desk-channel"];

/** A rig nobody would build: any box into any box, names of every kind, verdicts dealt at random. Same seed, same sheet. */
export function randomSheet(seed: number, sizes: Sizes): SheetSource {
  const next = seededRandom(seed);
  const int = (below: number) => Math.floor(next() * below);
  const name = () => randomName(next, sizes.nameLength);
  const gear = Array.from({ length: Math.max(4, Math.ceil(sizes.leads * 0.9)) }, (_, index) => randomGear(index, KINDS[int(KINDS.length)] as GearKind, name, int));
  const outs = gear.flatMap((item) => item.jacks.filter((jack) => jack.direction === "output"));
  const ins = gear.flatMap((item) => item.jacks.filter((jack) => jack.direction === "input"));
  const pairs = new Set<string>();
  for (let tries = 0; pairs.size < sizes.leads && tries < sizes.leads * 50; tries += 1) pairs.add(`${outs[int(outs.length)]?.id}>${ins[int(ins.length)]?.id}`);
  const patch: Patch = {
    leads: [...pairs].map((pair, index) => {
      const [outputId = "", inputId = ""] = pair.split(">");
      return { id: `lead-${index}`, number: index + 1, colour: LEAD_COLOURS[index % LEAD_COLOURS.length] ?? "black", outputId, inputId, ...(next() < 0.15 ? { inline: { kind: "divider" as const, seriesOhm: 4700, shuntOhm: 10000, tol: 0.05 } } : {}) };
    }),
    knobs: Array.from({ length: sizes.knobs }, (_, index) => ({ gearId: gear[index % gear.length]?.id ?? "", knobId: `knob-${Math.floor(index / gear.length)}`, position: next() })),
    lanes: [[], [], [], []],
  };
  return {
    rigName: name(),
    song: { title: name(), tempoBpm: next() < 0.2 ? null : 60 + int(120), notes: "A note that goes on and on about how it feels. ".repeat(50).slice(0, sizes.noteLength) },
    place: next() < 0.2 ? null : { set: name(), position: 2, of: 12 },
    gear,
    patch,
    revision: int(500),
    check: randomCheck(patch, next),
    before: next() < 0.5 ? null : { title: name(), patch: { ...patch, leads: patch.leads.slice(1).map((lead, index) => ({ ...lead, inputId: patch.leads[index]?.inputId ?? lead.inputId })), knobs: [] } },
    printedAt: new Date("2026-12-01T13:05:00Z"),
  };
}

function randomGear(index: number, kind: GearKind, name: () => string, int: (below: number) => number): Gear {
  let fresh = 0;
  const start = gearInputSchema.parse(startingGear(kind, undefined, () => `fresh-${(fresh += 1)}`));
  const jacks = start.jacks.map((jack, at): Jack => ({ ...jack, id: `g${index}-${at}`, name: name() }));
  return {
    ...start, id: `g${index}`, kind, name: name(), jacks, supplyId: null, retired: false, revision: 1, position: index,
    knobs: Array.from({ length: 1 + int(3) }, (_, knob) => ({ id: `knob-${knob}`, name: name(), turns: "nothing" as const })),
  };
}

function randomCheck(patch: Patch, next: () => number): PatchCheck {
  const leads = Object.fromEntries(patch.leads.map((lead): [string, LeadCheck] => {
    const verdict = VERDICTS[Math.floor(next() * next() * VERDICTS.length)] ?? "good";
    const low = next() * 10 - 4;
    return [lead.id, {
      leadId: lead.id, verdict,
      lowV: next() < 0.2 ? null : { min: low / 77, max: low / 77 + 0.0123 },
      highV: next() < 0.2 ? null : { min: low, max: low + next() * 5 },
      currentA: null,
      ...(next() < 0.5 ? { pulseS: { min: 0.00123, max: 0.0123 } } : {}),
      reasons: [{ verdict, text: "At rest the level can stay at 1.08 V; the input may let go only below 0.8 V, so it may never let go." }],
      fixes: [], cautions: [], assumed: next() < 0.3 ? ["g0:pad.restOhm"] : [], relatedLeadIds: [lead.id],
    }];
  }));
  return { leads, runs: [], worst: "good", counts: {} as PatchCheck["counts"], freeGearIds: [] };
}

/** A song as crowded as a real one gets: so many runs from pad to desk, every third voice fired through a mult as well. */
export function denseSheet(runs: number): SheetSource {
  const gear: Gear[] = [];
  const pairs: [string, string][] = [];
  const add = (kind: GearKind, id: string, name: string, jackNames: readonly string[]): Gear => {
    let fresh = 0;
    const start = gearInputSchema.parse(startingGear(kind, undefined, () => `${id}-${(fresh += 1)}`));
    const jacks = start.jacks.slice(0, 2).map((jack, at): Jack => ({ ...jack, name: jackNames[at] ?? jack.name }));
    const made: Gear = { ...start, id, kind, name, jacks, supplyId: null, retired: false, revision: 1, position: gear.length };
    gear.push(made);
    return made;
  };
  const jackOf = (item: Gear, direction: "input" | "output") => item.jacks.find((jack) => jack.direction === direction)?.id ?? "";
  const rows = Array.from({ length: runs }, (_, index) => ({
    pad: add("pad", `pad-${index}`, `Tile ${index + 1}, ${["left", "right", "low", "high"][index % 4]}`, ["Pad"]),
    cond: add("conditioner", `cond-${index}`, `Trigger box ${index + 1}`, ["Pad in", "Trig out"]),
    voice: add("voice", `voice-${index}`, `${["Low", "Tin", "Hiss", "Wood"][index % 4]} drum ${index + 1}`, ["Trig", "Audio out"]),
    desk: add("desk-channel", `desk-${index}`, `Ch ${index + 1}`, ["Line in"]),
  }));
  for (const { pad, cond, voice, desk } of rows) pairs.push([jackOf(pad, "output"), jackOf(cond, "input")], [jackOf(cond, "output"), jackOf(voice, "input")], [jackOf(voice, "output"), jackOf(desk, "input")]);
  rows.forEach(({ cond }, index) => {
    const next = rows[index + 1];
    if (index % 3 === 0 && next) pairs.push([jackOf(cond, "output"), jackOf(next.voice, "input")]);
  });
  const patch: Patch = {
    leads: pairs.map(([outputId, inputId], index) => ({ id: `lead-${index}`, number: index + 1, colour: LEAD_COLOURS[index % LEAD_COLOURS.length] ?? "black", outputId, inputId })),
    knobs: [],
    lanes: [[], [], [], []],
  };
  return { ...randomSheet(1, { leads: 1, knobs: 0, noteLength: 0 }), rigName: "Two trolleys", song: { title: "Everything at once", tempoBpm: 120, notes: "" }, place: null, gear, patch, check: randomCheck(patch, seededRandom(5)), before: null };
}
