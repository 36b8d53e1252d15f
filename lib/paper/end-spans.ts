import type { EndView } from "./sheet-view";
import type { Span } from "./wrap-text";

/** One end of a lead: the box as it is lettered on its tape, the jack as it is read. */
export function endSpans({ gear, jack }: EndView): Span[] {
  return [{ style: "label", size: 13, text: gear }, ...(jack === "" ? [] : [{ style: "text" as const, size: 10, text: jack }])];
}
