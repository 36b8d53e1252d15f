import type { GearFormValues } from "./form-values";

/** What was typed and not yet saved, kept on this device. */
export interface GearDraftKept {
  values: GearFormValues;
  /** The revision the typing began from; 0 for gear that does not exist yet. */
  baseRevision: number;
  /** Milliseconds since 1970. */
  savedAt: number;
}

const VERSION = "1";
const LONGEST_AGE_MS = 14 * 24 * 3600 * 1000;

export const draftKey = (rigId: string, what: string): string => `gear-draft-${VERSION}:${rigId}:${what}`;

type Store = Pick<Storage, "getItem" | "setItem" | "removeItem">;

/** A draft younger than a fortnight that still has the shape of one; anything else is dropped. */
export function readDraft(store: Store, key: string, now: number): GearDraftKept | null {
  try {
    const text = store.getItem(key);
    if (text === null) return null;
    const kept: unknown = JSON.parse(text);
    if (isDraft(kept) && now - kept.savedAt < LONGEST_AGE_MS) return kept;
    store.removeItem(key);
  } catch {
    // A full or forbidden store must not keep anybody from the form.
  }
  return null;
}

/** False where the device refuses (private window, full store). */
export function writeDraft(store: Store, key: string, draft: GearDraftKept): boolean {
  try {
    store.setItem(key, JSON.stringify(draft));
    return true;
  } catch {
    return false;
  }
}

export function dropDraft(store: Store, key: string): void {
  try {
    store.removeItem(key);
  } catch {
    // Nothing to drop where nothing could be kept.
  }
}

function isDraft(kept: unknown): kept is GearDraftKept {
  if (typeof kept !== "object" || kept === null || !("values" in kept) || !("savedAt" in kept) || !("baseRevision" in kept)) return false;
  const { values, savedAt, baseRevision } = kept as Record<string, unknown>;
  return typeof savedAt === "number" && typeof baseRevision === "number" && typeof values === "object" && values !== null
    && "details" in values && "jacks" in values && Array.isArray((values as { jacks: unknown }).jacks);
}
