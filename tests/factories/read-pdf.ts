import { getDocument } from "pdfjs-dist/legacy/build/pdf.mjs";

export interface ReadPdf {
  pages: number;
  /** The text of each page, pieces parted by a space. */
  texts: string[];
  info: Record<string, unknown>;
  /** Width and height of each page, pt. */
  sizes: [number, number][];
}

/** A PDF as another program reads it. */
export async function readPdf(bytes: Uint8Array): Promise<ReadPdf> {
  const document = await getDocument({ data: bytes.slice(), verbosity: 0 }).promise;
  const texts: string[] = [];
  const sizes: [number, number][] = [];
  for (let number = 1; number <= document.numPages; number += 1) {
    const page = await document.getPage(number);
    const content = await page.getTextContent({ disableNormalization: true });
    texts.push(content.items.map((item) => ("str" in item ? item.str : "")).join(" ").replace(/\s+/g, " "));
    const { width, height } = page.getViewport({ scale: 1 });
    sizes.push([width, height]);
  }
  const { info } = await document.getMetadata();
  const result = { pages: document.numPages, texts, info: info as Record<string, unknown>, sizes };
  await document.destroy();
  return result;
}
