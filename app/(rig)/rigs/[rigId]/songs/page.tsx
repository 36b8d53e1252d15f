import type { Metadata } from "next";
import Link from "next/link";
import { VerdictWord } from "@/components/chart/verdict-word";
import { EmptyState } from "@/components/ui/empty-state";
import { PageHeader } from "@/components/ui/page-header";
import { Tape } from "@/components/ui/tape";
import { requireActor } from "@/lib/auth/require-actor";
import { loadSongList } from "@/lib/data/load-song-list";
import { orNotFound } from "@/lib/http/or-not-found";
import { paths } from "@/lib/paths";
import { NewSong } from "./_components/new-song";
import { SongActions } from "./_components/song-actions";

export const metadata: Metadata = { title: "Songs" };

export default async function SongsPage({ params }: { params: Promise<{ rigId: string }> }) {
  const { rigId } = await params;
  const { songs, can } = await orNotFound(loadSongList(await requireActor(paths.songs(rigId)), rigId));
  return (
    <div className="mx-auto max-w-5xl">
      <PageHeader title="Songs">Each song has its own patch: which leads are plugged, and where the knobs stand.</PageHeader>
      {can.editSongs ? <NewSong rigId={rigId} songs={songs.map(({ id, title }) => ({ id, title }))} /> : null}
      {songs.length === 0 ? (
        <EmptyState title="No song yet">{can.editSongs ? "Name the first one above; then plug its leads on the board." : "The performer adds songs."}</EmptyState>
      ) : (
        <ul className="flex flex-col gap-2">
          {songs.map((song) => (
            <li key={song.id} data-song={song.title} className="flex flex-wrap items-center gap-x-5 gap-y-2 bg-bench p-3">
              <Link href={paths.board(rigId, song.id)} className="min-w-0 max-w-full"><Tape>{song.title}</Tape></Link>
              <span className="text-ink-soft">
                {song.tempoBpm === null ? "" : `${song.tempoBpm} bpm · `}{song.leadCount === 0 ? "no leads yet" : `${song.leadCount} ${song.leadCount === 1 ? "lead" : "leads"}`}
              </span>
              {song.leadCount > 0 ? <span className="flex items-center gap-1.5">worst: <VerdictWord verdict={song.worst} /></span> : null}
              <span className="ml-auto flex flex-wrap gap-4">
                <Link className="inline-flex min-h-9 items-center underline" href={paths.sheet(rigId, song.id)}>Patch sheet</Link>
                {can.editSongs ? <SongActions rigId={rigId} song={{ id: song.id, title: song.title, tempoBpm: song.tempoBpm, notes: song.notes }} /> : null}
              </span>
            </li>
          ))}
        </ul>
      )}
    </div>
  );
}
