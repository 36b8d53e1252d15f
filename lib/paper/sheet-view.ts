import type { ChartCard, ChartLead, LaneIndex } from "@/lib/core/chart";
import type { Verdict } from "@/lib/core/electrics/jacks";
import type { Caution } from "./list-cautions";
import type { ChangeoverView } from "./list-changeover";

/** One end of a lead in words. */
export interface EndView {
  gear: string;
  jack: string;
}

export interface LeadView {
  id: string;
  number: number;
  colour: string;
  from: EndView;
  to: EndView;
  /** Parts soldered into the lead, where there are any. */
  inline: string | null;
  /** Level at rest and while struck, with units; null where it is not known. */
  restVolts: string | null;
  struckVolts: string | null;
  /** What stands in place of volts that are not known. */
  noVolts: string;
  pulse: string | null;
  verdict: Verdict;
  /** The verdict leans on a figure nobody has measured. */
  isAssumed: boolean;
  isDanger: boolean;
  /** The reason behind the verdict, and what to do about it (or why nothing can be). */
  reason: string | null;
  remedy: string | null;
}

export interface KnobView {
  gear: string;
  knob: string;
  /** 0…1. */
  position: number;
  clock: string;
}

export interface ChartView {
  cards: (ChartCard & { name: string; lane: LaneIndex; jackNames: Record<string, string> })[];
  leads: (ChartLead & { number: number; verdict: Verdict; isDanger: boolean })[];
}

/** Everything a patch sheet says, in the words it says it in; what page it lands on is the renderer's affair. */
export interface SheetView {
  title: string;
  rigName: string;
  /** `Song 3 of 7 in Pump House, Thursday`; null where no set list holds the song. */
  place: string | null;
  tempo: string | null;
  /** Feel notes, one entry a paragraph. */
  notes: string[];
  revision: number;
  printedAt: Date;
  chart: ChartView;
  leads: LeadView[];
  dangers: LeadView[];
  /** Leads that are neither fine nor dangerous, worst first. */
  unsettled: LeadView[];
  /** The one figure to measure next. */
  nextMeasurement: string | null;
  knobs: KnobView[];
  changeover: ChangeoverView | null;
  cautions: Caution[];
}
