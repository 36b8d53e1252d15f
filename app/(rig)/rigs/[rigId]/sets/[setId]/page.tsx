import type { Metadata } from "next";
import { SetEditor } from "@/components/set/set-editor";
import { PageHeader } from "@/components/ui/page-header";
import { requireActor } from "@/lib/auth/require-actor";
import { loadSet } from "@/lib/data/load-set";
import { loadSongList } from "@/lib/data/load-song-list";
import { orNotFound } from "@/lib/http/or-not-found";
import { paths } from "@/lib/paths";

export const metadata: Metadata = { title: "Set list" };

export default async function SetPage({ params }: { params: Promise<{ rigId: string; setId: string }> }) {
  const { rigId, setId } = await params;
  const actor = await requireActor(paths.set(rigId, setId));
  const [set, { songs, can }] = await orNotFound(Promise.all([loadSet(actor, rigId, setId), loadSongList(actor, rigId)]));
  return (
    <div className="mx-auto max-w-5xl">
      <PageHeader title={set.name}>The songs in the order you play them. {can.editSets ? "Drag a song by its tape, or use its buttons." : ""}</PageHeader>
      <SetEditor rigId={rigId} set={set} songs={songs.map(({ id, title, tempoBpm, leadCount, worst }) => ({ id, title, tempoBpm, leadCount, worst }))} canEdit={can.editSets} />
    </div>
  );
}
