import type { Metadata } from "next";
import Link from "next/link";
import { VerdictWord } from "@/components/chart/verdict-word";
import { ButtonLink } from "@/components/ui/button";
import { EmptyState } from "@/components/ui/empty-state";
import { Notice } from "@/components/ui/notice";
import { PageHeader } from "@/components/ui/page-header";
import { requireActor } from "@/lib/auth/require-actor";
import { loadOverview, type Overview } from "@/lib/data/load-overview";
import { orNotFound } from "@/lib/http/or-not-found";
import { paths } from "@/lib/paths";

export const metadata: Metadata = { title: "Overview" };

const plural = (n: number, one: string, many: string) => `${n} ${n === 1 ? one : many}`;

export default async function OverviewPage({ params }: { params: Promise<{ rigId: string }> }) {
  const { rigId } = await params;
  const overview = await orNotFound(loadOverview(await requireActor(paths.rig(rigId)), rigId));
  const { rig, gearCounts: gear, songs, assumedCount } = overview;
  const wanting = songs.filter((song) => song.wanting.length > 0);
  const isEmpty = Object.values(gear).every((n) => n === 0) && songs.length === 0;
  return (
    <div className="mx-auto max-w-5xl">
      <PageHeader title={rig.name}>
        {plural(gear.pad, "pad", "pads")}, {plural(gear.conditioner, "conditioner", "conditioners")}, {plural(gear.shaper, "shaper", "shapers")}, {plural(gear.voice, "voice", "voices")}, {plural(gear["desk-channel"], "desk channel", "desk channels")}; {plural(songs.length, "song", "songs")}.
      </PageHeader>
      {isEmpty ? <FirstSteps overview={overview} /> : (
        <section aria-labelledby="attention" className="flex flex-col gap-4">
          <h2 id="attention" className="text-xl font-bold">What needs attention</h2>
          {wanting.length === 0 ? (
            <Notice tone="done">{songs.length === 0 ? "No song yet: add one to see its leads checked." : "Every lead of every song is good or tight."}</Notice>
          ) : wanting.map((song) => (
            <article key={song.id} className="bg-bench p-4">
              <h3 className="mb-2 text-lg font-bold"><Link className="underline" href={paths.board(rigId, song.id)}>{song.title}</Link></h3>
              <ul className="flex flex-col gap-2">
                {song.wanting.map((lead) => (
                  <li key={lead.leadId} className="grid grid-cols-[5rem_8rem_1fr] gap-x-3 max-sm:grid-cols-[4rem_1fr]">
                    <span className="font-semibold">Lead {lead.number}</span>
                    <VerdictWord verdict={lead.verdict} />
                    <span className="max-sm:col-span-2">{lead.text}</span>
                  </li>
                ))}
              </ul>
              {song.nextMeasurement ? <p className="mt-3 border-t border-line-soft pt-2"><span className="font-semibold">Measure next: </span>{song.nextMeasurement.text}</p> : null}
            </article>
          ))}
          {assumedCount > 0 ? (
            <p>{plural(assumedCount, "figure is", "figures are")} still assumed. <Link className="underline" href={`${paths.gearList(rigId)}?assumed=yes`}>See which gear</Link>.</p>
          ) : null}
        </section>
      )}
      <div className="mt-10">
        <Notice tone="caution" title="Before anything is plugged in">
          Low-voltage DC only: nothing here covers what is connected to the mains inside a box. Mains supplies, RCD protection and inspection at a venue follow local codes and a qualified person. Never short a battery or charge a primary cell. Keep phantom power off any channel that takes a home-made output unless a DI box isolates it. Protect your hearing at rehearsal level too.
        </Notice>
      </div>
    </div>
  );
}

function FirstSteps({ overview: { rig, can } }: { overview: Overview }) {
  if (!can.editGear) return <EmptyState title="Nothing here yet">Its performer or a collaborator adds gear first.</EmptyState>;
  const steps = [
    ["What do you hit?", "A foam pad, a piezo disc or a foot switch, with figures to start from.", "Add a pad", paths.newGear(rig.id, "pad")],
    ["What turns it into a pulse?", "A conditioner known by its parts, or a black box known by its readings.", "Add a conditioner", paths.newGear(rig.id, "conditioner")],
    ["What should sound?", "A drum voice and the input that waits for a pulse.", "Add a voice", paths.newGear(rig.id, "voice")],
    ["Where do they meet?", "A song's board, where you plug them and see each lead's verdict.", "Go to songs", paths.songs(rig.id)],
  ] as const;
  return (
    <section aria-labelledby="first" className="flex flex-col gap-4">
      <h2 id="first" className="text-xl font-bold">The first run, in four steps</h2>
      <ol className="grid gap-4 sm:grid-cols-2">
        {steps.map(([question, text, label, href], index) => (
          <li key={question} className="flex flex-col items-start gap-2 bg-bench p-4">
            <h3 className="text-lg font-bold">{index + 1}. {question}</h3>
            <p className="text-ink-soft">{text}</p>
            <ButtonLink tone={index === 0 ? "primary" : "plain"} href={href}>{label}</ButtonLink>
          </li>
        ))}
      </ol>
    </section>
  );
}
