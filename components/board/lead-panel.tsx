"use client";
import Link from "next/link";
import { useId } from "react";
import { formatQuantity, formatRange } from "@/lib/core/units/format-quantity";
import { VerdictWord } from "../chart/verdict-word";
import { Button } from "../ui/button";
import { Select, TextInput } from "../ui/inputs";
import { Notice } from "../ui/notice";
import type { Fix } from "@/lib/core/electrics/connection-types";
import type { LeadCheck } from "@/lib/core/electrics/patch-types";
import { paths } from "@/lib/paths";
import type { Gear } from "@/lib/schemas/gear";
import type { InputJack } from "@/lib/schemas/jack";
import { LEAD_COLOURS, type Lead } from "@/lib/schemas/patch";
import { describeFigures } from "./describe-figures";
import { describeInline, inlineOf } from "./describe-inline";
import { LevelPlot } from "./level-plot";
import type { PatchEdit } from "./patch-reducer";

interface LeadPanelProps {
  rigId: string;
  gear: readonly Gear[];
  lead: Lead;
  from: string;
  to: string;
  check: LeadCheck | undefined;
  isChecking: boolean;
  input: InputJack["input"] | undefined;
  canEdit: boolean;
  edit: (edit: PatchEdit) => void;
  onUnplug: (leadIds: readonly string[]) => void;
  onClose: () => void;
}

/** What the server says of one lead: verdict, sentences, numbers, and what would mend it. */
export function LeadPanel({ rigId, gear, lead, from, to, check, isChecking, input, canEdit, edit, onUnplug, onClose }: LeadPanelProps) {
  const id = useId();
  return (
    <section
      aria-labelledby={`${id}-title`}
      onKeyDown={(event) => {
        if (event.key === "Escape") onClose();
      }}
      className="fixed inset-x-0 bottom-0 z-20 max-h-[48dvh] overflow-y-auto border-t-4 border-ink bg-bench px-4 py-4 md:px-6"
      data-lead-panel-frame
      data-print="hide"
    >
      <div className="mb-3 flex flex-wrap items-start justify-between gap-3">
        <div className="min-w-0">
          <h2 id={`${id}-title`} tabIndex={-1} data-lead-panel className="text-xl font-bold">Lead {lead.number}, {lead.colour}</h2>
          <p className="break-words">{from} → {to}</p>
        </div>
        <div className="flex flex-wrap items-center gap-3">
          {check ? <VerdictWord verdict={check.verdict} className="text-xl" /> : null}
          {isChecking ? <span className="text-ink-soft">checking…</span> : null}
          {canEdit ? <Button tone="danger" onClick={() => onUnplug([lead.id])}>Unplug</Button> : null}
          <Button onClick={onClose}>Close</Button>
        </div>
      </div>
      <div className="grid gap-x-8 gap-y-5 lg:grid-cols-[1fr_1fr_1fr]">
        <div className="flex flex-col gap-3">
          <ul className="flex flex-col gap-2">
            {check?.reasons.map((reason) => (
              <li key={`${reason.verdict}${reason.text}`}><strong>{reason.verdict}</strong>: {reason.text}</li>
            ))}
          </ul>
          {check?.cautions.map((caution) => <Notice key={caution.text} tone="caution">{caution.text}</Notice>)}
          {lead.inline ? <p>In this lead: {describeInline(lead.inline)}.</p> : null}
          {check?.nextMeasurement ? <p><strong>Measure next:</strong> {check.nextMeasurement.text}</p> : null}
          {check && check.assumed.length > 0 ? <Assumed keys={check.assumed} gear={gear} rigId={rigId} /> : null}
        </div>
        <div className="flex flex-col gap-3">
          {check ? <LevelPlot check={check} input={input} /> : null}
          {check ? <Figures check={check} input={input} /> : null}
        </div>
        <div className="flex flex-col gap-4">
          <Fixes lead={lead} check={check} canEdit={canEdit} edit={edit} />
          {canEdit ? <LeadFields key={`${lead.id}:${lead.number}`} lead={lead} edit={edit} /> : null}
        </div>
      </div>
    </section>
  );
}

/** Which figures nobody has measured yet, box by box, each box a way to go and put its reading in. */
function Assumed({ keys, gear, rigId }: { keys: readonly string[]; gear: readonly Gear[]; rigId: string }) {
  return (
    <details>
      <summary className="min-h-9 py-1 text-ink-soft underline">* Leans on {keys.length} assumed {keys.length === 1 ? "figure" : "figures"}</summary>
      <ul className="flex flex-col gap-1">
        {describeFigures(keys, gear).map((box) => (
          <li key={box.gearId}><Link href={paths.gear(rigId, box.gearId)} className="font-semibold underline">{box.gearName}</Link>: {box.figures.join("; ")}</li>
        ))}
      </ul>
    </details>
  );
}

function Figures({ check, input }: { check: LeadCheck; input: InputJack["input"] | undefined }) {
  const rows: [string, string][] = [];
  if (check.pulseS) rows.push(["Pulse it sees", formatRange(check.pulseS, "s")]);
  if (input && (input.pulseMinS !== null || input.pulseMaxS !== null)) {
    const min = input.pulseMinS === null ? null : `at least ${formatQuantity(input.pulseMinS, "s")}`;
    const max = input.pulseMaxS === null ? null : `at most ${formatQuantity(input.pulseMaxS, "s")}`;
    rows.push(["Pulse it wants", [min, max].filter(Boolean).join(", ")]);
  }
  if (check.currentA) rows.push(["Current from the output", formatRange(check.currentA, "A")]);
  if (check.clampA !== undefined && check.clampA > 0) rows.push(["Through its protection diodes", formatQuantity(check.clampA, "A")]);
  if (rows.length === 0) return null;
  return (
    <dl className="grid grid-cols-[auto_1fr] gap-x-4 gap-y-1">
      {rows.map(([name, value]) => (
        <div key={name} className="contents"><dt>{name}</dt><dd className="font-mono">{value}</dd></div>
      ))}
    </dl>
  );
}

function Fixes({ lead, check, canEdit, edit }: { lead: Lead; check: LeadCheck | undefined; canEdit: boolean; edit: (edit: PatchEdit) => void }) {
  if (lead.inline) {
    return canEdit ? <Button className="self-start" onClick={() => edit({ type: "inline", leadId: lead.id, inline: null })}>Take the parts out again</Button> : null;
  }
  if (!check || (check.fixes.length === 0 && !check.fixNote)) return null;
  return (
    <div className="flex flex-col gap-3">
      <h3 className="font-bold">What would mend it</h3>
      {check.fixNote && check.fixes.length === 0 ? <p>{check.fixNote}</p> : null}
      <ul className="flex flex-col gap-3">
        {check.fixes.map((fix) => <FixItem key={fix.text} fix={fix} lead={lead} canEdit={canEdit} edit={edit} />)}
      </ul>
    </div>
  );
}

function FixItem({ fix, lead, canEdit, edit }: { fix: Fix; lead: Lead; canEdit: boolean; edit: (edit: PatchEdit) => void }) {
  const use = editOf(fix, lead.id);
  return (
    <li className="flex flex-col items-start gap-1.5 border-l-4 border-line pl-3">
      <span>{fix.text}</span>
      <span className="flex items-center gap-2">checked: <VerdictWord verdict={fix.verdict} /></span>
      {use && canEdit ? <Button tone="primary" onClick={() => edit(use)}>Use this fix</Button> : null}
    </li>
  );
}

/** The edit that puts a fix into this song's patch; null where it asks for something outside it, as another part in a box. */
function editOf(fix: Fix, leadId: string): PatchEdit | null {
  if ("through" in fix && fix.through) return { type: "through", leadId, newId: crypto.randomUUID(), ...fix.through };
  const inline = inlineOf(fix);
  return inline && { type: "inline", leadId, inline };
}

function LeadFields({ lead, edit }: { lead: Lead; edit: (edit: PatchEdit) => void }) {
  const id = useId();
  return (
    <div className="flex flex-wrap gap-4">
      <div className="flex w-24 flex-col gap-1">
        <label htmlFor={`${id}-number`} className="font-semibold">Number</label>
        <TextInput
          id={`${id}-number`} type="number" min={1} max={999} defaultValue={lead.number}
          onBlur={(event) => edit({ type: "renumber", leadId: lead.id, number: event.target.valueAsNumber })}
          onKeyDown={(event) => {
            if (event.key === "Enter") edit({ type: "renumber", leadId: lead.id, number: event.currentTarget.valueAsNumber });
          }}
        />
      </div>
      <div className="flex w-36 flex-col gap-1">
        <label htmlFor={`${id}-colour`} className="font-semibold">Colour</label>
        <Select id={`${id}-colour`} value={lead.colour} onChange={(event) => edit({ type: "recolour", leadId: lead.id, colour: event.target.value as Lead["colour"] })}>
          {LEAD_COLOURS.map((colour) => <option key={colour}>{colour}</option>)}
        </Select>
      </div>
    </div>
  );
}
