import { requireApiActor } from "@/lib/auth/require-actor";
import { loadSheet } from "@/lib/data/load-sheet";
import { AppError, fieldFault } from "@/lib/errors";
import { handle } from "@/lib/http/handle";
import { buildSheetView } from "@/lib/paper/build-sheet-view";
import { nameFile } from "@/lib/paper/name-file";
import { PAPER_SIZES, type PaperSize } from "@/lib/paper/page";
import { renderSheet } from "@/lib/paper/render-sheet";

type Params = { rigId: string; songId: string };

export const GET = handle<Params>(async (request, { rigId, songId }) => {
  const actor = await requireApiActor();
  const source = await loadSheet(actor, rigId, songId);
  const paper = readPaper(request);
  const view = buildSheetView({ ...source, printedAt: new Date() });
  const bytes = await renderSheet(view, paper);
  return new Response(new Uint8Array(bytes), {
    headers: {
      "content-type": "application/pdf",
      "content-disposition": `inline; filename="${nameFile(view.title, view.revision, "pdf")}"`,
      "cache-control": "no-store",
    },
  });
});

function readPaper(request: Request): PaperSize {
  const asked = new URL(request.url).searchParams.get("paper") ?? "a4";
  const paper = PAPER_SIZES.find((size) => size === asked);
  if (!paper) throw new AppError("bad-request", { userMessage: "Paper is a4 or letter.", fields: [fieldFault(["paper"], "Paper is a4 or letter.")] });
  return paper;
}
