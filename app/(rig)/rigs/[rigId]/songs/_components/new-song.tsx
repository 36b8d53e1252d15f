"use client";
import { useRouter } from "next/navigation";
import { useState } from "react";
import { Button } from "@/components/ui/button";
import { fetchJson } from "@/lib/client/fetch-json";
import { paths } from "@/lib/paths";
import { SongForm } from "./song-form";

export function NewSong({ rigId, songs }: { rigId: string; songs: readonly { id: string; title: string }[] }) {
  const router = useRouter();
  const [open, setOpen] = useState(false);
  if (!open) return <div className="mb-5"><Button tone="primary" onClick={() => setOpen(true)}>Add a song</Button></div>;
  return (
    <section aria-label="A new song" className="mb-6 max-w-xl bg-bench p-4">
      <SongForm
        initial={{ title: "", tempoBpm: "", notes: "", copyFrom: "" }}
        copies={songs}
        submitLabel="Add this song"
        onCancel={() => setOpen(false)}
        onSend={async ({ copyFrom, ...fields }) => {
          const { song } = await fetchJson<{ song: { id: string } }>(paths.api.songs(rigId), { body: { ...fields, copyFrom: copyFrom || null } });
          router.push(paths.board(rigId, song.id));
        }}
      />
    </section>
  );
}
