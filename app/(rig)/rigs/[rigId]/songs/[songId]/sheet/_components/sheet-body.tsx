import { ClockDial } from "@/components/chart/clock-dial";
import { Tape } from "@/components/ui/tape";
import { groupDangers } from "@/lib/paper/group-dangers";
import { sayDate } from "@/lib/paper/say-date";
import { sayEnd } from "@/lib/paper/say-end";
import type { LeadView, SheetView } from "@/lib/paper/sheet-view";
import { End, LeadNumber } from "./lead-words";
import { SheetChangeover } from "./sheet-changeover";
import { SheetChart } from "./sheet-chart";
import { SheetTable } from "./sheet-table";

/** A patch sheet as a page: what the PDF says, in the same order, and as good when a browser prints it. */
export function SheetBody({ view }: { view: SheetView }) {
  return (
    <article className="flex max-w-[46rem] flex-col gap-4 bg-raised p-4 text-[0.95rem] md:p-6 print:max-w-none print:gap-3 print:p-0 print:text-[10pt]">
      <header className="flex flex-wrap items-start justify-between gap-x-6 gap-y-2">
        <div className="max-w-full drop-shadow-[0_0_1px_var(--ink)] print:drop-shadow-none">
          <Tape as="h3" size="large" className="print:border-2 print:[clip-path:none]">{view.title}</Tape>
        </div>
        <div className="text-right max-md:text-left">
          <p className="font-tape text-2xl font-bold leading-tight">{view.rigName}</p>
          {view.place ? <p>{view.place}</p> : null}
          {view.tempo ? <p className="font-bold">{view.tempo}</p> : null}
        </div>
      </header>
      {view.notes.length > 0 ? <div>{view.notes.map((note) => <p key={note}>{note}</p>)}</div> : null}
      {view.dangers.length > 0 ? <Dangers leads={view.dangers} /> : null}
      {view.chart.cards.length > 0 ? <SheetChart chart={view.chart} /> : <p>Nothing is patched in this song.</p>}
      {view.leads.length > 0 ? <SheetTable leads={view.leads} /> : null}
      {view.knobs.length > 0 ? (
        <Part title="Knobs">
          <ul className="grid gap-x-6 gap-y-2 sm:grid-cols-2 md:grid-cols-3 print:grid-cols-3">
            {view.knobs.map((knob) => (
              <li key={`${knob.gear}/${knob.knob}`} className="flex items-center gap-2">
                <ClockDial position={knob.position} size={30} className="shrink-0" />
                <span><End end={{ gear: knob.gear, jack: knob.knob }} /><br /><strong>{knob.clock}</strong></span>
              </li>
            ))}
          </ul>
        </Part>
      ) : null}
      {view.unsettled.length > 0 || view.nextMeasurement ? (
        <Part title={view.unsettled.length > 0 ? `Not settled: ${view.unsettled.length} of ${view.leads.length} leads` : "To measure"}>
          <ul className="flex flex-col gap-1">
            {view.unsettled.map((lead) => (
              <li key={lead.id} className="flex gap-3"><LeadNumber lead={lead} /><span><strong>{lead.verdict}:</strong> {lead.reason} {lead.remedy}</span></li>
            ))}
          </ul>
          {view.nextMeasurement ? <p><strong>Measure next:</strong> {view.nextMeasurement}</p> : null}
        </Part>
      ) : null}
      <Part title="Take care">
        {view.cautions.map((caution) => <p key={caution.about + caution.text}><strong>{caution.about}:</strong> {caution.text}</p>)}
      </Part>
      {view.changeover ? <Part title={`From ${view.changeover.from}`}><SheetChangeover changeover={view.changeover} /></Part> : null}
      <footer className="flex flex-wrap justify-between gap-x-4 border-t-2 border-ink pt-1">
        <strong>{view.rigName} · {view.title}</strong>
        <span>revision {view.revision} · {sayDate(view.printedAt)}</span>
      </footer>
    </article>
  );
}

function Part({ title, children }: { title: string; children: React.ReactNode }) {
  return (
    <section className="break-inside-avoid">
      <h4 className="mb-1 border-b-2 border-ink font-tape text-xl font-extrabold leading-tight">{title}</h4>
      {children}
    </section>
  );
}

function Dangers({ leads }: { leads: readonly LeadView[] }) {
  return (
    <ul className="border-2 border-ink">
      {groupDangers(leads).map(([lead, ...others]) => (
        <li key={lead.id} className="flex border-b-2 border-ink last:border-b-0">
          <strong className="flex w-20 shrink-0 items-center bg-ink px-2 sm:w-auto text-bench print:[print-color-adjust:exact]">DO NOT PLUG</strong>
          <span className="flex flex-wrap gap-x-2 p-2 sm:flex-nowrap">
            <span className="shrink-0 font-tape text-[1.6em] font-extrabold leading-none">{[lead, ...others].map((one) => one.number).join(" + ")}</span>
            <span><strong>{[lead, ...others].map((one) => sayEnd(one.from)).join(" and ")} to {sayEnd(lead.to)}: {lead.verdict}.</strong> {lead.reason} {lead.remedy}</span>
          </span>
        </li>
      ))}
    </ul>
  );
}
