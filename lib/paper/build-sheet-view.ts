import { clockText } from "@/lib/core/chart";
import { severityOf } from "@/lib/core/electrics/judge/order-verdicts";
import type { Verdict } from "@/lib/core/electrics/jacks";
import type { PatchCheck } from "@/lib/core/electrics/patch-types";
import { formatRange } from "@/lib/core/units/format-quantity";
import type { Range } from "@/lib/core/units/spread";
import { laneOf } from "@/lib/schemas/lane-of";
import type { Gear } from "@/lib/schemas/gear";
import type { Lead, Patch } from "@/lib/schemas/patch";
import type { Song } from "@/lib/schemas/song";
import { listCautions } from "./list-cautions";
import { listChangeover, type ChangeoverView } from "./list-changeover";
import { sayInline } from "./say-inline";
import type { ChartView, EndView, KnobView, LeadView, SheetView } from "./sheet-view";

/** What a patch sheet is made from; plain data, so that one view serves paper and screen. */
export interface SheetSource {
  rigName: string;
  song: Pick<Song, "title" | "tempoBpm" | "notes">;
  /** Where the song stands in its set list, counted from 1. */
  place: { set: string; position: number; of: number } | null;
  /** All gear the patch may name, in the rig's order. */
  gear: readonly Gear[];
  patch: Patch;
  revision: number;
  check: PatchCheck;
  /** The song before it in the set. */
  before: { title: string; patch: Patch } | null;
  printedAt: Date;
}

const FINE: readonly Verdict[] = ["good", "tight"];
/** Verdicts under which something may be damaged as soon as the lead is in. */
const DANGERS: readonly Verdict[] = ["hot", "clash", "overload"];
/** A song's patch as its sheet says it. */
export function buildSheetView(source: SheetSource): SheetView {
  const { song, gear, patch, check, place, before } = source;
  const names = namesOf(gear);
  const leads = [...patch.leads].sort((a, b) => a.number - b.number).map((lead) => leadView(lead, check, names));
  return {
    title: song.title,
    rigName: source.rigName,
    place: place && `Song ${place.position} of ${place.of} in ${place.set}`,
    tempo: song.tempoBpm === null ? null : `${Number(song.tempoBpm.toPrecision(3))} beats a minute`,
    notes: song.notes.split(/\r?\n/).map((line) => line.trim()).filter((line) => line !== ""),
    revision: source.revision,
    printedAt: source.printedAt,
    chart: chartView(gear, patch, leads),
    leads,
    dangers: leads.filter((lead) => lead.isDanger),
    unsettled: leads.filter((lead) => !lead.isDanger && !FINE.includes(lead.verdict)).sort((a, b) => severityOf(b.verdict) - severityOf(a.verdict) || a.number - b.number),
    nextMeasurement: check.nextMeasurement?.text ?? null,
    knobs: knobViews(gear, patch),
    changeover: before && holdBack(listChangeover(before, patch, { jack: names.end, knob: (gearId, knobId) => knobName(gear, gearId, knobId) }), leads),
    cautions: listCautions(gear, patch, check),
  };
}

/** A step must not tell anybody to plug what the same page says not to. */
function holdBack(changeover: ChangeoverView, leads: readonly LeadView[]): ChangeoverView {
  const dangers = new Set(leads.filter((lead) => lead.isDanger).map((lead) => lead.number));
  const steps = changeover.steps.map((step) => (step.number !== null && dangers.has(step.number) ? { ...step, parts: [...step.parts, { lead: "DO NOT PLUG: pull it and leave it out.", ends: [], text: "" }] } : step));
  return { ...changeover, steps };
}

interface Names {
  end: (jackId: string) => EndView;
  isSensor: (jackId: string) => boolean;
}

function namesOf(gear: readonly Gear[]): Names {
  const jacks = new Map(gear.flatMap((item) => item.jacks.map((jack) => [jack.id, { gear: item.name, jack: jack.name, isSensor: jack.direction === "output" && jack.output.signal === "sensor" }] as const)));
  const end = (jackId: string): EndView => {
    const found = jacks.get(jackId);
    return found ? { gear: found.gear, jack: found.jack } : { gear: "A jack that is no longer in the rig", jack: "" };
  };
  return {
    end,
    isSensor: (jackId) => jacks.get(jackId)?.isSensor ?? false,
  };
}

function leadView(lead: Lead, check: PatchCheck, names: Names): LeadView {
  const outcome = check.leads[lead.id];
  const verdict = outcome?.verdict ?? "unproven";
  return {
    id: lead.id,
    number: lead.number,
    colour: lead.colour,
    from: names.end(lead.outputId),
    to: names.end(lead.inputId),
    inline: lead.inline ? sayInline(lead.inline) : null,
    restVolts: outcome?.lowV ? sayVolts(outcome.lowV) : null,
    struckVolts: outcome?.highV ? sayVolts(outcome.highV) : null,
    noVolts: names.isSensor(lead.outputId) ? "bare contact" : "not known",
    pulse: outcome?.pulseS ? formatRange(outcome.pulseS, "s") : null,
    verdict,
    isAssumed: (outcome?.assumed.length ?? 0) > 0,
    isDanger: DANGERS.includes(verdict),
    reason: outcome?.reasons[0]?.text ?? null,
    remedy: outcome?.fixes[0] ? `Way out: ${outcome.fixes[0].text}` : outcome?.fixNote ?? null,
  };
}

/** Below half a millivolt nobody at the rig can tell a level from 0 V. */
const LEAST_V = 0.0005;

function sayVolts({ min, max }: Range): string {
  const plain = (volts: number) => (Math.abs(volts) < LEAST_V ? 0 : volts);
  return formatRange({ min: plain(min), max: plain(max) }, "V");
}

/** Only what is plugged in this song: its cards, and on them the jacks in use. Cards stand as on the board. */
function chartView(gear: readonly Gear[], patch: Patch, leads: readonly LeadView[]): ChartView {
  const used = new Set(patch.leads.flatMap((lead) => [lead.outputId, lead.inputId]));
  const rank = new Map(patch.lanes.flatMap((lane) => lane.map((id, index) => [id, index] as const)));
  const views = new Map(leads.map((lead) => [lead.id, lead]));
  const cards = gear
    .flatMap((item, index) => {
      const lane = laneOf(item.kind);
      const jacks = item.jacks.filter((jack) => used.has(jack.id));
      return lane === null || jacks.length === 0 ? [] : [{ item, jacks, lane, index, rank: rank.get(item.id) ?? Infinity }];
    })
    .sort((a, b) => a.lane - b.lane || (a.rank === b.rank ? a.index - b.index : a.rank - b.rank))
    .map(({ item, jacks, lane }) => ({
      id: item.id,
      name: item.name,
      lane,
      folded: false,
      jacks: jacks.map((jack) => ({ id: jack.id, side: jack.direction === "input" ? ("in" as const) : ("out" as const) })),
      jackNames: Object.fromEntries(jacks.map((jack) => [jack.id, jack.name])),
    }));
  return {
    cards,
    leads: patch.leads.map((lead) => ({
      id: lead.id, from: lead.outputId, to: lead.inputId, number: lead.number,
      verdict: views.get(lead.id)?.verdict ?? "unproven", isDanger: views.get(lead.id)?.isDanger ?? false,
    })),
  };
}

function knobViews(gear: readonly Gear[], patch: Patch): KnobView[] {
  const place = new Map(gear.map((item, index) => [item.id, index]));
  return [...patch.knobs]
    .sort((a, b) => (place.get(a.gearId) ?? Infinity) - (place.get(b.gearId) ?? Infinity))
    .flatMap(({ gearId, knobId, position }) => {
      const item = gear[place.get(gearId) ?? -1];
      return item ? [{ gear: item.name, knob: item.knobs.find((knob) => knob.id === knobId)?.name ?? "Knob", position, clock: clockText(position) }] : [];
    });
}

function knobName(gear: readonly Gear[], gearId: string, knobId: string): string {
  const item = gear.find((one) => one.id === gearId);
  return `${item?.name ?? "A box"}, ${item?.knobs.find((knob) => knob.id === knobId)?.name ?? "knob"}`;
}
