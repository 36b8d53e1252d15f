import type { Metadata } from "next";
import { Board } from "@/components/board/board";
import { ButtonLink } from "@/components/ui/button";
import { PageHeader } from "@/components/ui/page-header";
import { Tape } from "@/components/ui/tape";
import { requireActor } from "@/lib/auth/require-actor";
import { loadBoard } from "@/lib/data/load-board";
import { orNotFound } from "@/lib/http/or-not-found";
import { paths } from "@/lib/paths";

export const metadata: Metadata = { title: "Board" };

export default async function BoardPage({ params }: { params: Promise<{ rigId: string; songId: string }> }) {
  const { rigId, songId } = await params;
  const actor = await requireActor(paths.board(rigId, songId));
  const { song, gear, patch, revision, check, can } = await orNotFound(loadBoard(actor, rigId, songId));
  return (
    <>
      <PageHeader
        title={<Tape size="large">{song.title}</Tape>}
        actions={
          <>
            <ButtonLink href={paths.sheet(rigId, songId)}>Patch sheet</ButtonLink>
            <a className="inline-flex min-h-11 items-center underline md:min-h-9" href={paths.api.sheetPdf(rigId, songId)}>PDF</a>
          </>
        }
      >
        {[song.tempoBpm === null ? null : `${song.tempoBpm} beats a minute`, song.notes || null].filter(Boolean).join(" · ")}
      </PageHeader>
      <Board key={song.id} rigId={rigId} songId={songId} gear={gear} patch={patch} revision={revision} check={check} can={can} />
    </>
  );
}
