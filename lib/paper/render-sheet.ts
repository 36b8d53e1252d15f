import { layOutSheet } from "./lay-out-sheet";
import type { PaperSize } from "./page";
import { paintPages } from "./paint-pages";
import type { SheetView } from "./sheet-view";

/** A patch sheet as a PDF. The same view on the same paper gives the same bytes; the date is the view's. */
export async function renderSheet(view: SheetView, size: PaperSize): Promise<Uint8Array> {
  return paintPages(layOutSheet(view, size), { title: `${view.title}: patch sheet, revision ${view.revision}`, author: view.rigName, language: "en-GB", createdAt: view.printedAt });
}
