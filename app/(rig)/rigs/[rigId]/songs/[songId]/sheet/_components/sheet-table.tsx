import { VerdictWord } from "@/components/chart/verdict-word";
import { Table, Td, Th } from "@/components/ui/table";
import type { LeadView } from "@/lib/paper/sheet-view";
import { End, LeadNumber } from "./lead-words";

/** Every lead with what to expect at its input. On a narrow screen the table scrolls in its own frame. */
export function SheetTable({ leads }: { leads: readonly LeadView[] }) {
  return (
    <div role="region" aria-label="Leads" tabIndex={0} className="overflow-x-auto print:overflow-visible">
      <Table className="min-w-[38rem] print:min-w-0">
        <thead><tr><Th>No.</Th><Th>Lead</Th><Th>From</Th><Th>To</Th><Th>At rest → struck</Th><Th>Verdict</Th></tr></thead>
        <tbody>{leads.map((lead) => <Row key={lead.id} lead={lead} />)}</tbody>
      </Table>
      {leads.some((lead) => lead.isAssumed) ? <p className="mt-1">* leans on a figure nobody has measured.</p> : null}
    </div>
  );
}

function Row({ lead }: { lead: LeadView }) {
  const volts = lead.struckVolts === null ? lead.noVolts : lead.restVolts === null ? lead.struckVolts : `${lead.restVolts} → ${lead.struckVolts}`;
  const cell = "border-line! py-1! print:py-0.5!";
  return (
    <tr className="break-inside-avoid">
      <Td className={cell}><LeadNumber lead={lead} /></Td>
      <Td className={cell}>{lead.colour}</Td>
      <Td className={cell}><End end={lead.from} /></Td>
      <Td className={cell}><End end={lead.to} />{lead.inline ? <strong className="block">{lead.inline}</strong> : null}</Td>
      <Td className={cell}>
        <span className={lead.struckVolts === null ? undefined : "font-mono text-[0.92em]"}>{volts}</span>
        {lead.pulse ? <span className="block font-mono text-[0.92em]">for {lead.pulse}</span> : null}
      </Td>
      <Td className={cell}>
        <span className="inline-flex items-center"><VerdictWord verdict={lead.verdict} />{lead.isAssumed ? <strong>*</strong> : null}</span>
        {lead.isDanger ? <strong className="block w-fit bg-ink px-1 text-[0.9em] text-bench print:[print-color-adjust:exact]">DO NOT PLUG</strong> : null}
      </Td>
    </tr>
  );
}
