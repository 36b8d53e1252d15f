import { patchSchema, type Patch } from "@/lib/schemas/patch";

/** An unsaved patch kept on this device, with the version it began from, so that it can still be merged later. */
export interface PatchDraft {
  baseRevision: number;
  base: Patch;
  patch: Patch;
}

const keyOf = (songId: string) => `patch-draft-1:${songId}`;

export function readPatchDraft(songId: string): PatchDraft | null {
  try {
    const text = localStorage.getItem(keyOf(songId));
    const kept: unknown = text === null ? null : JSON.parse(text);
    if (typeof kept !== "object" || kept === null || !("patch" in kept) || !("base" in kept) || !("baseRevision" in kept)) return null;
    const [patch, base] = [patchSchema.safeParse(kept.patch), patchSchema.safeParse(kept.base)];
    return patch.success && base.success && typeof kept.baseRevision === "number" ? { baseRevision: kept.baseRevision, base: base.data, patch: patch.data } : null;
  } catch {
    return null;
  }
}

export function writePatchDraft(songId: string, draft: PatchDraft): void {
  try {
    localStorage.setItem(keyOf(songId), JSON.stringify(draft));
  } catch {
    // A full or forbidden store must not keep anybody from editing; autosave still runs.
  }
}

export function dropPatchDraft(songId: string): void {
  try {
    localStorage.removeItem(keyOf(songId));
  } catch {
    // Nothing to drop where nothing could be kept.
  }
}
