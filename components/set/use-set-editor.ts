"use client";
import { useCallback, useRef, useState } from "react";
import { fetchJson, ProblemError } from "@/lib/client/fetch-json";
import { paths } from "@/lib/paths";
import type { SetList } from "@/lib/schemas/set";

type SetState = { status: "saved" | "saving" } | { status: "stale"; theirs: SetList } | { status: "refused"; detail: string };

/** A set's order on screen, saved at each change; changes made while one is being saved follow it. */
export function useSetEditor(rigId: string, initial: SetList, canEdit: boolean) {
  const [songIds, setSongIds] = useState(initial.songIds);
  const [past, setPast] = useState<string[][]>([]);
  const [state, setState] = useState<SetState>({ status: "saved" });
  const [revision, setRevision] = useState(initial.revision);
  const saved = useRef(initial.revision);
  const waiting = useRef<string[] | null>(null);
  const busy = useRef(false);

  const send = useCallback(async (order: string[]) => {
    waiting.current = order;
    if (busy.current) return;
    busy.current = true;
    setState({ status: "saving" });
    try {
      while (waiting.current) {
        const next: string[] = waiting.current;
        waiting.current = null;
        const { set } = await fetchJson<{ set: SetList }>(paths.api.set(rigId, initial.id), { method: "PUT", body: { baseRevision: saved.current, name: initial.name, songIds: next }, keepalive: true });
        saved.current = set.revision;
        setRevision(set.revision);
      }
      setState({ status: "saved" });
    } catch (error) {
      if (!(error instanceof ProblemError)) throw error;
      const theirs = error.status === 409 ? (error.problem.current as SetList | undefined) : undefined;
      setState(theirs ? { status: "stale", theirs } : { status: "refused", detail: error.problem.detail });
    } finally {
      busy.current = false;
    }
  }, [initial.id, initial.name, rigId]);

  const change = useCallback((order: string[]) => {
    if (!canEdit) return;
    setPast((before) => [...before, songIds].slice(-100));
    setSongIds(order);
    void send(order);
  }, [canEdit, send, songIds]);

  const undo = useCallback(() => {
    const before = past.at(-1);
    if (!before) return;
    setPast(past.slice(0, -1));
    setSongIds(before);
    void send(before);
  }, [past, send]);

  const theirs = state.status === "stale" ? state.theirs : null;
  return {
    songIds, revision, state, change, undo,
    canUndo: past.length > 0,
    takeTheirs: useCallback(() => {
      if (!theirs) return;
      saved.current = theirs.revision;
      setRevision(theirs.revision);
      setPast((before) => [...before, songIds]);
      setSongIds(theirs.songIds);
      setState({ status: "saved" });
    }, [songIds, theirs]),
    keepMine: useCallback(() => {
      if (!theirs) return;
      saved.current = theirs.revision;
      void send(songIds);
    }, [send, songIds, theirs]),
  };
}
