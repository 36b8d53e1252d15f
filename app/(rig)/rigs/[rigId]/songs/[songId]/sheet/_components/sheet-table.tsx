import { VerdictWord } from "@/components/chart/verdict-word";
import { Table, Td, Th } from "@/components/ui/table";
import type { LeadView } from "@/lib/paper/sheet-view";
import { End, LeadNumber } from "./lead-words";

/** Every lead with what to expect at its input: a table, and on a phone a list. */
export function SheetTable({ leads }: { leads: readonly LeadView[] }) {
  return (
    <div>
      <ul className="sm:hidden print:hidden">{leads.map((lead) => <Item key={lead.id} lead={lead} />)}</ul>
      <Table className="hidden sm:table print:table">
        <thead><tr><Th>No.</Th><Th>Lead</Th><Th>From</Th><Th>To</Th><Th>At rest → struck</Th><Th>Verdict</Th></tr></thead>
        <tbody>{leads.map((lead) => <Row key={lead.id} lead={lead} />)}</tbody>
      </Table>
      {leads.some((lead) => lead.isAssumed) ? <p className="mt-1">* leans on a figure nobody has measured.</p> : null}
    </div>
  );
}

function Row({ lead }: { lead: LeadView }) {
  const cell = "border-line! py-1! print:py-0.5!";
  return (
    <tr className="break-inside-avoid">
      <Td className={cell}><LeadNumber lead={lead} /></Td>
      <Td className={cell}>{lead.colour}</Td>
      <Td className={cell}><End end={lead.from} /></Td>
      <Td className={cell}><End end={lead.to} />{lead.inline ? <strong className="block">{lead.inline}</strong> : null}</Td>
      <Td className={cell}>
        <Expected lead={lead} />
      </Td>
      <Td className={cell}><Verdict lead={lead} /></Td>
    </tr>
  );
}

function Item({ lead }: { lead: LeadView }) {
  return (
    <li className="flex gap-2 border-b border-line py-2">
      <LeadNumber lead={lead} />
      <span className="flex min-w-0 flex-col gap-0.5">
        <span><End end={lead.from} /> → <End end={lead.to} /></span>
        {lead.inline ? <strong>{lead.inline}</strong> : null}
        <span>{lead.colour} · <Expected lead={lead} /></span>
        <Verdict lead={lead} />
      </span>
    </li>
  );
}

function Expected({ lead }: { lead: LeadView }) {
  if (lead.struckVolts === null) return lead.noVolts;
  return (
    <span className="font-mono text-[0.92em]">
      {lead.restVolts === null ? null : <><span className="whitespace-nowrap">{lead.restVolts} →</span> </>}
      <span className="whitespace-nowrap">{lead.struckVolts}</span>
      {lead.pulse ? <span className="block">for {lead.pulse}</span> : null}
    </span>
  );
}

function Verdict({ lead }: { lead: LeadView }) {
  return (
    <>
      <span className="inline-flex items-center"><VerdictWord verdict={lead.verdict} />{lead.isAssumed ? <strong>*</strong> : null}</span>
      {lead.isDanger ? <strong className="block w-fit bg-ink px-1 text-[0.9em] whitespace-nowrap text-bench print:[print-color-adjust:exact]">DO NOT PLUG</strong> : null}
    </>
  );
}
