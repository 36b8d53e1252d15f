import type { Metadata } from "next";
import { ButtonLink, buttonClass } from "@/components/ui/button";
import { PageHeader } from "@/components/ui/page-header";
import { requireActor } from "@/lib/auth/require-actor";
import { loadSheet } from "@/lib/data/load-sheet";
import { orNotFound } from "@/lib/http/or-not-found";
import { buildSheetView } from "@/lib/paper/build-sheet-view";
import { PAPER, PAPER_SIZES, type PaperSize } from "@/lib/paper/page";
import { paths } from "@/lib/paths";
import { PrintButton } from "./_components/print-button";
import { SheetBody } from "./_components/sheet-body";

export const metadata: Metadata = { title: "Patch sheet" };

interface Props {
  params: Promise<{ rigId: string; songId: string }>;
  searchParams: Promise<{ paper?: string | string[] }>;
}

export default async function SheetPage({ params, searchParams }: Props) {
  const { rigId, songId } = await params;
  const { paper: asked } = await searchParams;
  const paper: PaperSize = asked === "letter" ? "letter" : "a4";
  const actor = await requireActor(paths.sheet(rigId, songId));
  const source = await orNotFound(loadSheet(actor, rigId, songId));
  const view = buildSheetView({ ...source, printedAt: new Date() });
  const pdf = paths.api.sheetPdf(rigId, songId, paper);
  return (
    <>
      <style>{`@page { size: ${paper === "letter" ? "letter" : "A4"}; margin: 10mm; }`}</style>
      <div data-print="hide">
        <PageHeader
          title={`Patch sheet: ${view.title}`}
          actions={
            <>
              <a className={buttonClass("primary")} href={pdf} download>Download the PDF</a>
              <PrintButton />
              <ButtonLink href={paths.board(rigId, songId)}>Board</ButtonLink>
            </>
          }
        >
          Revision {view.revision}. Drawn from the same patch as the board.
        </PageHeader>
        <nav aria-label="Paper size" className="mb-4 flex flex-wrap items-center gap-3">
          <span className="font-semibold">Paper</span>
          {PAPER_SIZES.map((size) => (
            <ButtonLink key={size} href={paths.sheet(rigId, songId, size)} aria-current={size === paper ? "true" : undefined} className={size === paper ? "border-ink! bg-mark! text-mark-ink!" : undefined}>
              {PAPER[size].name}
            </ButtonLink>
          ))}
        </nav>
      </div>
      <div className="grid items-start gap-6 xl:grid-cols-[minmax(0,2fr)_minmax(0,3fr)] print:block">
        <section aria-labelledby="preview-heading" data-print="hide" className="hidden w-full max-w-[46rem] md:block">
          <h2 id="preview-heading" className="mb-2 text-lg font-bold">What the printer gets</h2>
          <object key={paper} data={pdf} type="application/pdf" aria-label={`The patch sheet of ${view.title} as a PDF`} className="h-[min(64rem,120vh)] w-full border border-line bg-raised">
            <p className="p-4">This browser shows no PDF inside a page. <a className="underline" href={pdf}>Open the PDF</a>, or read the same sheet on this page.</p>
          </object>
        </section>
        <section aria-labelledby="screen-heading" className="w-full min-w-0">
          <h2 id="screen-heading" data-print="hide" className="mb-2 text-lg font-bold">The same on this screen</h2>
          <SheetBody view={view} />
        </section>
      </div>
    </>
  );
}
