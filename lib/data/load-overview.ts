import "server-only";
import type { Verdict } from "@/lib/core/electrics/jacks";
import { severityOf } from "@/lib/core/electrics/judge/order-verdicts";
import type { Measurement } from "@/lib/core/electrics/patch-types";
import type { Can } from "@/lib/rights/can";
import type { GearKind } from "@/lib/schemas/gear";
import { SongRow } from "@/models";
import type { Actor } from "./actor";
import { checkGearPatch } from "./check-gear-patch";
import { findAllGear } from "./find-gear";
import { findPatch } from "./find-song";
import { loadRig } from "./load-rig";
import { presentGear } from "./present-gear";

export interface SongAttention {
  id: string;
  title: string;
  tempoBpm: number | null;
  leadCount: number;
  worst: Verdict;
  /** Leads that are neither good nor tight, worst first. */
  wanting: { leadId: string; number: number; verdict: Verdict; text: string }[];
  nextMeasurement?: Measurement;
}

export interface Overview {
  rig: { id: string; name: string };
  can: Can;
  gearCounts: Record<GearKind, number>;
  assumedCount: number;
  songs: SongAttention[];
}

/** What in the rig needs attention: every song with its leads that are not yet fine. */
export async function loadOverview(actor: Actor, rigId: string): Promise<Overview> {
  const { rig, can } = await loadRig(actor, rigId);
  const [rows, songs] = await Promise.all([findAllGear(rigId), SongRow.findAll({ where: { rigId }, order: [["position", "ASC"], ["id", "ASC"]] })]);
  const gear = rows.map(presentGear);
  const inUse = gear.filter((item) => !item.retired);
  const gearCounts = { pad: 0, conditioner: 0, shaper: 0, voice: 0, "desk-channel": 0, supply: 0 };
  for (const item of inUse) gearCounts[item.kind] += 1;
  return {
    rig,
    can,
    gearCounts,
    assumedCount: inUse.reduce((sum, item) => sum + item.assumed.length, 0),
    songs: await Promise.all(songs.map((song) => attentionOf(song, gear))),
  };
}

async function attentionOf(song: SongRow, gear: ReturnType<typeof presentGear>[]): Promise<SongAttention> {
  const patch = await findPatch(song);
  const check = checkGearPatch(gear, patch);
  const wanting = patch.leads
    .flatMap((lead) => {
      const outcome = check.leads[lead.id];
      return outcome && outcome.verdict !== "good" && outcome.verdict !== "tight"
        ? [{ leadId: lead.id, number: lead.number, verdict: outcome.verdict, text: outcome.reasons[0]?.text ?? "" }]
        : [];
    })
    .sort((a, b) => severityOf(b.verdict) - severityOf(a.verdict));
  return {
    id: song.id,
    title: song.title,
    tempoBpm: song.tempoBpm,
    leadCount: patch.leads.length,
    worst: check.worst,
    wanting,
    ...(check.nextMeasurement ? { nextMeasurement: check.nextMeasurement } : {}),
  };
}
