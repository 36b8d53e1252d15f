/** Moves to the first field that is at fault, unfolding whatever hides it. */
export function focusFirstFault(form: HTMLElement | null): void {
  const first = form?.querySelector<HTMLElement>("[aria-invalid='true']") ?? form?.querySelector<HTMLElement>("[data-fault]");
  if (first) reveal(first);
}

/** Moves to one field. False where the page has none of that id. */
export function focusField(id: string): boolean {
  const field = document.getElementById(id);
  if (!field) return false;
  reveal(field.matches("input, select, textarea") ? field : field.querySelector<HTMLElement>("input, select, textarea, button") ?? field);
  return true;
}

function reveal(field: HTMLElement): void {
  for (let fold = field.closest("details"); fold; fold = fold.parentElement?.closest("details") ?? null) fold.open = true;
  field.focus();
  field.scrollIntoView({ block: "center" });
}
