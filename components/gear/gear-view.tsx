import Link from "next/link";
import { ButtonLink } from "@/components/ui/button";
import { Notice } from "@/components/ui/notice";
import { Tape } from "@/components/ui/tape";
import { paths } from "@/lib/paths";
import type { Gear } from "@/lib/schemas/gear";
import type { Jack } from "@/lib/schemas/jack";
import { FigureList } from "./figure-list";
import { GearPageActions } from "./gear-page-actions";
import { BUILD_WORD, isPowered, KIND_WORD, LEG_WORD, POLARITY_WORD, SENSOR_WORD, SIGNAL_SHORT, SOURCE_WORD, TURNS_WORD } from "./gear-words";
import { detailFigures, jackFigures } from "./view-figures";

interface GearViewProps {
  rigId: string;
  gear: Gear;
  /** The rig's other gear, to name its supply and what it supplies. */
  others: Gear[];
  mayEdit: boolean;
  justSaved: boolean;
}

/** One piece of gear to read: what it is, its figures, its jacks. */
export function GearView({ rigId, gear, others, mayEdit, justSaved }: GearViewProps) {
  const supply = others.find((other) => other.id === gear.supplyId);
  const fed = others.filter((other) => other.supplyId === gear.id && !other.retired);
  const figures = detailFigures(gear);
  return (
    <article className="mx-auto flex max-w-5xl flex-col gap-6">
      <header className="flex flex-wrap items-start justify-between gap-x-6 gap-y-3">
        <div className="flex min-w-0 flex-col gap-1">
          <p className="text-ink-soft"><Link className="underline" href={paths.gearList(rigId)}>Gear</Link> · {KIND_WORD[gear.kind]}{gear.retired ? " · retired" : ""}</p>
          <Tape as="h1" size="large" className="self-start">{gear.name}</Tape>
          <p className="text-ink-soft">{factsOf(gear).join(" · ")}</p>
        </div>
        {mayEdit ? (
          <div className="flex flex-wrap gap-3" data-print="hide">
            <ButtonLink tone="primary" href={paths.editGear(rigId, gear.id)}>Edit</ButtonLink>
            <GearPageActions rigId={rigId} gear={gear} />
          </div>
        ) : null}
      </header>

      {justSaved ? <Notice tone="done" live>Saved · revision {gear.revision}</Notice> : null}
      {gear.retired ? <Notice>It is retired: it stays out of the list and the boards until somebody brings it back.</Notice> : null}
      {gear.assumed.length > 0 ? (
        <Notice title={gear.assumed.length === 1 ? "1 figure is assumed" : `${gear.assumed.length} figures are assumed`}>
          Nobody has measured them on this box, and every verdict that leans on one says so. {mayEdit ? "Measure, then edit: each figure says how." : ""}
        </Notice>
      ) : null}

      {figures.length > 0 ? (
        <section aria-labelledby="figures">
          <h2 id="figures" className="mb-2 text-xl font-bold">Figures</h2>
          <FigureList figures={figures} />
        </section>
      ) : null}

      {gear.kind === "supply" ? (
        <section aria-labelledby="fed">
          <h2 id="fed" className="mb-2 text-xl font-bold">What runs on it</h2>
          {fed.length === 0 ? <p className="text-ink-soft">Nothing yet: each box says in its own form what it runs on.</p> : (
            <ul className="flex flex-wrap gap-3">{fed.map((other) => <li key={other.id}><Link href={paths.gear(rigId, other.id)}><Tape size="small">{other.name}</Tape></Link></li>)}</ul>
          )}
        </section>
      ) : null}
      {isPowered(gear.kind) || supply ? (
        <section aria-labelledby="runs-on">
          <h2 id="runs-on" className="mb-2 text-xl font-bold">Runs on</h2>
          {supply ? <Link href={paths.gear(rigId, supply.id)}><Tape size="small">{supply.name}</Tape></Link> : <p className="text-ink-soft">Nothing recorded.</p>}
        </section>
      ) : null}

      {gear.kind === "supply" ? null : (
        <section aria-labelledby="jacks">
          <h2 id="jacks" className="mb-2 text-xl font-bold">Jacks</h2>
          {gear.jacks.length === 0 ? <p className="text-ink-soft">None recorded, so nothing can be patched into it.</p> : null}
          <ul className="flex flex-col gap-3">
            {gear.jacks.map((jack) => (
              <li key={jack.id} className="grid gap-x-6 gap-y-2 bg-bench px-4 py-3 md:grid-cols-[15rem_1fr]">
                <div>
                  <h3 className="text-lg font-bold">{jack.name}</h3>
                  <p className="text-ink-soft">{describeJack(jack, gear)}</p>
                </div>
                {isComputed(jack, gear) ? null : <FigureList figures={jackFigures(gear, jack)} narrow />}
              </li>
            ))}
          </ul>
        </section>
      )}

      {gear.knobs.length > 0 ? (
        <section aria-labelledby="knobs">
          <h2 id="knobs" className="mb-2 text-xl font-bold">Knobs</h2>
          <ul className="flex flex-wrap gap-x-6 gap-y-1">
            {gear.knobs.map((knob) => <li key={knob.id}>{knob.name}{knob.turns === "threshold" ? ` (turns ${TURNS_WORD.threshold.toLowerCase()})` : ""}</li>)}
          </ul>
        </section>
      ) : null}

      {gear.notes ? (
        <section aria-labelledby="notes">
          <h2 id="notes" className="mb-2 text-xl font-bold">Notes</h2>
          <p className="max-w-prose whitespace-pre-wrap">{gear.notes}</p>
        </section>
      ) : null}
    </article>
  );
}

function factsOf({ details, revision }: Gear): string[] {
  const facts: string[] = [];
  if (details.kind === "pad") facts.push(SENSOR_WORD[details.sensor]);
  if (details.kind === "conditioner") facts.push(BUILD_WORD[details.build]);
  if (details.kind === "conditioner" && details.circuit) facts.push(LEG_WORD[details.circuit.padLeg]);
  if (details.kind === "desk-channel") facts.push(`Channel ${details.channel}`);
  if (details.kind === "supply") facts.push(SOURCE_WORD[details.source]);
  return [...facts, `revision ${revision}`];
}

/** A circuit's own outputs follow from its parts; what may be typed at them does not count. */
function isComputed(jack: Jack, { details }: Gear): boolean {
  return details.kind === "conditioner" && details.build === "circuit" && (jack.role === "trigger-out" || jack.role === "envelope-out");
}

function describeJack(jack: Jack, gear: Gear): string {
  const parts: string[] = [jack.direction === "output" ? "Output" : "Input", jack.connector];
  if (jack.direction === "output") {
    parts.push(SIGNAL_SHORT[jack.output.signal]);
    if (jack.output.polarity === "falling") parts.push(POLARITY_WORD.falling.toLowerCase());
    if (jack.output.or) parts.push("through a diode");
    if (isComputed(jack, gear)) parts.push("computed from the circuit and the pad plugged in");
  } else {
    parts.push(`listens to ${jack.input.accepts.map((signal) => SIGNAL_SHORT[signal]).join(", ")}`);
    if (jack.input.polarity === "falling") parts.push(POLARITY_WORD.falling.toLowerCase());
    if (jack.input.phantom) parts.push("phantom power on");
    if (!jack.input.accepts.includes("sensor") && jack.input.loadOhm === null) parts.push("draws next to nothing");
  }
  return parts.join(" · ");
}
