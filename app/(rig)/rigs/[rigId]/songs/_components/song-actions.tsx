"use client";
import { useRouter } from "next/navigation";
import { useState } from "react";
import { Button } from "@/components/ui/button";
import { ConfirmDialog, Dialog } from "@/components/ui/dialog";
import { Notice } from "@/components/ui/notice";
import { fetchJson, ProblemError } from "@/lib/client/fetch-json";
import { paths } from "@/lib/paths";
import { SongForm } from "./song-form";

interface SongActionsProps {
  rigId: string;
  song: { id: string; title: string; tempoBpm: number | null; notes: string };
}

/** Rename, re-note and delete one song. */
export function SongActions({ rigId, song }: SongActionsProps) {
  const router = useRouter();
  const [open, setOpen] = useState<"edit" | "delete" | null>(null);
  const [refusal, setRefusal] = useState<string | null>(null);
  const [busy, setBusy] = useState(false);
  const close = () => setOpen(null);

  async function remove() {
    setBusy(true);
    try {
      await fetchJson(paths.api.song(rigId, song.id), { method: "DELETE" });
      setOpen(null);
      router.refresh();
    } catch (error) {
      if (!(error instanceof ProblemError)) throw error;
      setRefusal(error.problem.detail);
    } finally {
      setBusy(false);
    }
  }

  return (
    <>
      <Button tone="quiet" className="!px-0" aria-label={`Edit ${song.title}`} onClick={() => setOpen("edit")}>Edit</Button>
      <Button tone="quiet" className="!px-0" aria-label={`Delete ${song.title}`} onClick={() => setOpen("delete")}>Delete</Button>
      <Dialog open={open === "edit"} title={`Edit ${song.title}`} onClose={close}>
        <SongForm
          initial={{ title: song.title, tempoBpm: song.tempoBpm === null ? "" : String(song.tempoBpm), notes: song.notes, copyFrom: "" }}
          submitLabel="Save"
          onCancel={close}
          onSend={async ({ copyFrom: _unused, ...fields }) => {
            await fetchJson(paths.api.song(rigId, song.id), { method: "PATCH", body: fields });
            close();
            router.refresh();
          }}
        />
      </Dialog>
      <ConfirmDialog open={open === "delete"} title={`Delete ${song.title}?`} confirmLabel="Delete the song" danger busy={busy} onConfirm={() => void remove()} onCancel={close}>
        <p>Its patch, all earlier versions of it, and its place in every set list go with it. This cannot be undone.</p>
        {refusal ? <Notice tone="error" live>{refusal}</Notice> : null}
      </ConfirmDialog>
    </>
  );
}
