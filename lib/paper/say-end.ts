import type { EndView } from "./sheet-view";

/** One end of a lead in a sentence. */
export function sayEnd({ gear, jack }: EndView): string {
  return jack === "" ? gear : `${gear}, ${jack}`;
}
