import type { Metadata } from "next";
import Link from "next/link";
import { EmptyState } from "@/components/ui/empty-state";
import { PageHeader } from "@/components/ui/page-header";
import { Tape } from "@/components/ui/tape";
import { requireActor } from "@/lib/auth/require-actor";
import { listRigs } from "@/lib/data/list-rigs";
import { paths } from "@/lib/paths";
import { NewRigForm } from "./_components/new-rig-form";

export const metadata: Metadata = { title: "Your rigs" };

const ROLE_WORDS = { performer: "performer, owns it", collaborator: "collaborator", "sound-helper": "sound helper" } as const;
const count = (n: number, one: string, many: string) => `${n} ${n === 1 ? one : many}`;

export default async function RigsPage() {
  const rigs = await listRigs(await requireActor(paths.rigs()));
  return (
    <main id="main" className="mx-auto w-full max-w-4xl px-4 py-8 md:px-6">
      <PageHeader title="Your rigs">A rig holds its gear, its songs and the people who play, build and mix it.</PageHeader>
      {rigs.length > 0 ? (
        <ul className="mb-10 flex flex-col gap-3">
          {rigs.map((rig) => (
            <li key={rig.id} className="flex flex-wrap items-center gap-x-5 gap-y-1 border-b border-line-soft bg-bench p-4">
              <Link href={paths.rig(rig.id)} className="min-w-0"><Tape>{rig.name}</Tape></Link>
              <span className="text-ink-soft">{count(rig.gearCount, "piece of gear", "pieces of gear")} · {count(rig.songCount, "song", "songs")} · you are its {ROLE_WORDS[rig.role]}</span>
            </li>
          ))}
        </ul>
      ) : (
        <div className="mb-10">
          <EmptyState title="No rig yet">Name one below. Then add what you hit, what turns the hit into a pulse, and what should sound.</EmptyState>
        </div>
      )}
      <NewRigForm />
    </main>
  );
}
