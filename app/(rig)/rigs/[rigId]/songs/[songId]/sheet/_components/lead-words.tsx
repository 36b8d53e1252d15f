import type { EndView, LeadView } from "@/lib/paper/sheet-view";

export function End({ end }: { end: EndView }) {
  return <><span className="font-tape text-[1.25em] font-bold leading-none">{end.gear}</span> {end.jack}</>;
}

export function LeadNumber({ lead }: { lead: Pick<LeadView, "number"> }) {
  return <span className="w-8 shrink-0 font-tape text-[1.6em] font-extrabold leading-none">{lead.number}</span>;
}
