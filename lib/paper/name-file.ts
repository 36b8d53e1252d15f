/** A file name that every system takes: letters, figures and hyphens of the title, accents taken off. */
export function nameFile(title: string, revision: number, end: string): string {
  const plain = title.normalize("NFKD").replace(/\p{M}/gu, "").replace(/[^A-Za-z0-9]+/g, "-").replace(/^-+|-+$/g, "").toLowerCase();
  return `${plain === "" ? "patch-sheet" : `${plain}-patch-sheet`}-r${revision}.${end}`;
}
