/** A random id in the browser; `crypto.randomUUID` is missing on a plain-http address, so it is not used. */
export function makeId(): string {
  const bytes = crypto.getRandomValues(new Uint8Array(16));
  return Array.from(bytes, (byte) => byte.toString(16).padStart(2, "0")).join("");
}
