"use client";
import { useCallback, useEffect, useMemo, useReducer, useRef, useState } from "react";
import { fetchJson, ProblemError } from "@/lib/client/fetch-json";
import { paths } from "@/lib/paths";
import type { Patch } from "@/lib/schemas/patch";
import { mergePatches, settleConflicts, type Merge } from "./merge-patches";
import { dropPatchDraft, readPatchDraft, writePatchDraft } from "./patch-draft";
import { reduceHistory, startHistory, type HistoryAction, type PatchEdit } from "./patch-reducer";

export type SaveState =
  | { status: "saved" | "waiting" | "saving" | "asking" }
  | { status: "offline"; detail: string }
  | { status: "refused"; detail: string };

interface Saved {
  revision: number;
  patch: Patch;
}

export interface OpenConflict {
  merge: Merge;
  /** What both began from, what stands on this screen, and what they saved. */
  base: Patch;
  mine: Patch;
  theirs: Saved;
}

const QUIET_MS = 500;
const RETRY_MS = 4000;
const same = (a: Patch, b: Patch) => a === b || JSON.stringify(a) === JSON.stringify(b);

/** The patch being edited: history, autosave with revisions, a draft on this device, and a way out of two people's saves. */
export function usePatchEditor(rigId: string, songId: string, initial: Saved, canEdit: boolean) {
  const [history, dispatch] = useReducer(reduceHistory, initial.patch, startHistory);
  const [saved, setSaved] = useState<Saved>(initial);
  const [state, setState] = useState<SaveState>({ status: "saved" });
  const [clash, setClash] = useState<{ base: Patch; theirs: Saved } | null>(null);
  const [news, setNews] = useState<string | null>(null);
  const [retry, setRetry] = useState(0);
  const savedRef = useRef(saved);
  const presentRef = useRef(history.present);
  const busy = useRef(false);
  /** Whether this visit wrote the draft on this device. */
  const hasDraft = useRef(false);
  const url = paths.api.patch(rigId, songId);
  const { present } = history;
  // Merged anew at every edit, since the question can be put off and edited on.
  const conflict = useMemo((): OpenConflict | null => clash && { ...clash, mine: present, merge: mergePatches(clash.base, present, clash.theirs.patch) }, [clash, present]);

  useEffect(() => {
    savedRef.current = saved;
    presentRef.current = present;
  });

  const noteSaved = useCallback((next: Saved) => {
    savedRef.current = next;
    setSaved(next);
  }, []);

  /** Takes another's save in: by itself where nothing conflicts, else by asking. */
  const takeIn = useCallback((base: Saved, mine: Patch, theirs: Saved) => {
    const merge = mergePatches(base.patch, mine, theirs.patch);
    if (merge.conflicts.length > 0) {
      // Until it is settled the draft keeps what it began from, so that a closed tab asks again.
      noteSaved(base);
      setClash({ base: base.patch, theirs });
      if (presentRef.current !== mine) dispatch({ type: "replace", patch: mine });
      return;
    }
    noteSaved(theirs);
    dispatch({ type: "rebase", base: base.patch, theirs: theirs.patch, present: merge.patch });
    setNews("Somebody else saved this song too. Both their changes and yours are here.");
  }, [noteSaved]);

  const save = useCallback(async () => {
    if (busy.current) return;
    busy.current = true;
    const [base, patch] = [savedRef.current, presentRef.current];
    setState((before) => (before.status === "offline" ? before : { status: "saving" }));
    try {
      const { revision } = await fetchJson<{ revision: number }>(url, { method: "PUT", body: { baseRevision: base.revision, patch } });
      noteSaved({ revision, patch });
      if (same(presentRef.current, patch)) dropPatchDraft(songId);
      setState({ status: same(presentRef.current, patch) ? "saved" : "waiting" });
    } catch (error) {
      if (!(error instanceof ProblemError)) throw error;
      const current = error.status === 409 ? (error.problem.current as Saved | undefined) : undefined;
      if (current) {
        setState({ status: "waiting" });
        takeIn(base, presentRef.current, current);
      } else if (error.status === 0 || error.status >= 500) {
        setState({ status: "offline", detail: error.problem.detail });
        setTimeout(() => setRetry((count) => count + 1), RETRY_MS);
      } else {
        setState({ status: "refused", detail: error.status === 401 ? "You are signed out. What you changed is kept on this device; sign in and open the song again." : error.problem.detail });
      }
    } finally {
      busy.current = false;
    }
  }, [noteSaved, songId, takeIn, url]);

  // What an earlier visit could not save.
  useEffect(() => {
    const draft = canEdit ? readPatchDraft(songId) : null;
    if (!draft) return;
    const restoring = setTimeout(() => {
      if (same(draft.patch, initial.patch)) dropPatchDraft(songId);
      else if (draft.baseRevision === initial.revision) {
        dispatch({ type: "replace", patch: draft.patch });
        setNews("Changes from your last visit had not been saved. They are back.");
      } else takeIn({ revision: draft.baseRevision, patch: draft.base }, draft.patch, initial);
    }, 0);
    return () => clearTimeout(restoring);
    // Only once, with what the page was opened with.
    // eslint-disable-next-line react-hooks/exhaustive-deps
  }, []);

  useEffect(() => {
    if (!canEdit) return;
    if (same(present, saved.patch)) {
      // Taken back before it was saved: a draft left behind would bring it back. An earlier visit's draft is not ours to drop here.
      if (hasDraft.current) dropPatchDraft(songId);
      hasDraft.current = false;
      return;
    }
    hasDraft.current = true;
    writePatchDraft(songId, { baseRevision: saved.revision, base: saved.patch, patch: present });
    if (clash) return;
    const timer = setTimeout(() => void save(), QUIET_MS);
    return () => clearTimeout(timer);
  }, [canEdit, clash, present, retry, save, saved, songId]);

  // A closing tab sends what the quiet half second still held back.
  useEffect(() => {
    const flush = () => {
      const [base, patch] = [savedRef.current, presentRef.current];
      if (!canEdit || busy.current || same(base.patch, patch)) return;
      void fetchJson(url, { method: "PUT", body: { baseRevision: base.revision, patch }, keepalive: true }).catch(() => undefined);
    };
    window.addEventListener("pagehide", flush);
    return () => window.removeEventListener("pagehide", flush);
  }, [canEdit, url]);

  const act = useCallback((action: HistoryAction) => {
    if (canEdit) dispatch(action);
  }, [canEdit]);

  const settle = useCallback((takeMine: ReadonlySet<string>) => {
    if (!conflict) return;
    const patch = settleConflicts(conflict.merge, takeMine);
    noteSaved(conflict.theirs);
    setClash(null);
    if (same(patch, conflict.theirs.patch)) {
      dropPatchDraft(songId);
      setState({ status: "saved" });
    }
    dispatch({ type: "rebase", base: conflict.base, theirs: conflict.theirs.patch, present: patch });
  }, [conflict, noteSaved, songId]);

  // Undoing one's own side of it leaves nothing to ask.
  const isSettled = conflict !== null && conflict.merge.conflicts.length === 0;
  useEffect(() => {
    if (!isSettled) return;
    const settling = setTimeout(() => settle(new Set()), 0);
    return () => clearTimeout(settling);
  }, [isSettled, settle]);

  const isDirty = !same(present, saved.patch);
  return {
    patch: present,
    revision: saved.revision,
    state: clash ? { status: "asking" as const } : isDirty && state.status === "saved" ? { status: "waiting" as const } : !isDirty && state.status === "waiting" ? { status: "saved" as const } : state,
    edit: act as (edit: PatchEdit) => void,
    undo: useCallback(() => act({ type: "undo" }), [act]),
    redo: useCallback(() => act({ type: "redo" }), [act]),
    canUndo: history.past.length > 0,
    canRedo: history.future.length > 0,
    saveNow: save,
    conflict,
    settle,
    news,
    dismissNews: useCallback(() => setNews(null), []),
  };
}

export type PatchEditor = ReturnType<typeof usePatchEditor>;
