import type { Metadata } from "next";
import Link from "next/link";
import { VerdictWord } from "@/components/chart/verdict-word";
import { Notice } from "@/components/ui/notice";
import { PageHeader } from "@/components/ui/page-header";
import { requireActor } from "@/lib/auth/require-actor";
import { loadOverview } from "@/lib/data/load-overview";
import { orNotFound } from "@/lib/http/or-not-found";
import { paths } from "@/lib/paths";
import { FirstSteps } from "./_components/first-steps";

export const metadata: Metadata = { title: "Overview" };

const plural = (n: number, one: string, many: string) => `${n} ${n === 1 ? one : many}`;

export default async function OverviewPage({ params }: { params: Promise<{ rigId: string }> }) {
  const { rigId } = await params;
  const overview = await orNotFound(loadOverview(await requireActor(paths.rig(rigId)), rigId));
  const { rig, gearCounts: gear, songs, assumedCount } = overview;
  const wanting = songs.filter((song) => song.wanting.length > 0);
  const hasLeads = songs.some((song) => song.leadCount > 0);
  return (
    <div className="mx-auto max-w-5xl">
      <PageHeader title={rig.name}>
        {plural(gear.pad, "pad", "pads")}, {plural(gear.conditioner, "conditioner", "conditioners")}, {plural(gear.shaper, "shaper", "shapers")}, {plural(gear.voice, "voice", "voices")}, {plural(gear["desk-channel"], "desk channel", "desk channels")}; {plural(songs.length, "song", "songs")}.
      </PageHeader>
      {!hasLeads ? <FirstSteps overview={overview} /> : (
        <section aria-labelledby="attention" className="flex flex-col gap-4">
          <h2 id="attention" className="text-xl font-bold">What needs attention</h2>
          {wanting.length === 0 ? (
            <Notice tone="done">Every lead of every song is good or tight.</Notice>
          ) : wanting.map((song) => (
            <article key={song.id} className="bg-bench p-4 print:break-inside-avoid">
              <h3 className="mb-2 text-lg font-bold"><Link className="underline" href={paths.board(rigId, song.id)}>{song.title}</Link></h3>
              <ul className="flex flex-col gap-2">
                {song.wanting.map((lead) => (
                  <li key={lead.leadId} className="grid grid-cols-[5rem_8rem_1fr] gap-x-3 max-sm:grid-cols-[4rem_1fr]">
                    <span className="font-semibold">Lead {lead.number}</span>
                    <VerdictWord verdict={lead.verdict} className="self-start" />
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
