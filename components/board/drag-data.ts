/** What is being dragged or dropped on, as @dnd-kit carries it. */
export type DragData =
  | { type: "card"; cardId: string; lane: number }
  | { type: "jack"; jackId: string; side: "in" | "out" }
  | { type: "lead"; leadId: string };

export function dragDataOf(data: unknown): DragData | null {
  return typeof data === "object" && data !== null && "type" in data ? (data as DragData) : null;
}
