/** What is being dragged or dropped on, as @dnd-kit carries it. */
export type DragData =
  | { type: "card"; cardId: string; lane: number }
  /** A lead's end or a new lead; what exactly is in the canvas's own hands. */
  | { type: "plug" };

/** What a hand has taken hold of to plug: a jack, or the tag at a lead's input end. */
export type Grabbed = { type: "jack"; jackId: string; side: "in" | "out" } | { type: "lead"; leadId: string };

/** The jack or lead tag that an element belongs to. */
export function grabbedAt(element: Element | null): Grabbed | null {
  const jack = element?.closest<HTMLElement>("[data-jack]");
  if (jack?.dataset.jack) return { type: "jack", jackId: jack.dataset.jack, side: jack.dataset.side === "in" ? "in" : "out" };
  const tag = element?.closest<HTMLElement>("[data-lead-tag]");
  return tag?.dataset.leadTag ? { type: "lead", leadId: tag.dataset.leadTag } : null;
}

/** The jack under a point of the window that this grip could be put on. */
export function jackUnder(x: number, y: number, grabbed: Grabbed): HTMLElement | null {
  const wanted = grabbed.type === "lead" ? "in" : grabbed.side === "in" ? "out" : "in";
  for (const element of document.elementsFromPoint(x, y)) {
    const jack = element.closest<HTMLElement>("[data-jack]");
    if (jack) return jack.dataset.side === wanted ? jack : null;
  }
  return null;
}

export function dragDataOf(data: unknown): DragData | null {
  return typeof data === "object" && data !== null && "type" in data ? (data as DragData) : null;
}
