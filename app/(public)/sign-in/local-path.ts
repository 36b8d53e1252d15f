const HERE = "http://here.invalid";

/** A path of this site to return to after signing in, as a browser would read it; null for anything that leads elsewhere. */
export function localPath(from: unknown): string | null {
  if (typeof from !== "string" || !from.startsWith("/") || !URL.canParse(from, HERE)) return null;
  const { origin, pathname, search, hash } = new URL(from, HERE);
  // Two slashes in front would be read as another site's name.
  return origin === HERE && !pathname.startsWith("//") ? `${pathname}${search}${hash}` : null;
}
