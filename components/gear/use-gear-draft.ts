"use client";

import { useCallback, useEffect, useRef } from "react";
import { dropDraft, writeDraft } from "./draft-store";
import type { GearFormApi } from "./use-gear-form";

const PAUSE_MS = 400;

/**
 * Keeps what is typed on this device: within half a second of the last key, and at once when the page goes away.
 * A closed tab takes its sessionStorage with it, so the draft lies in localStorage.
 * @param dirty false while there is nothing unsaved: what was kept from this visit is then dropped.
 * @returns `forget`, which drops the draft for good once the server has it.
 */
export function useGearDraft(form: GearFormApi, key: string, baseRevision: number, dirty: boolean): { forget: () => void } {
  const latest = useRef({ key, baseRevision, dirty });
  const kept = useRef(false);
  const forgotten = useRef(false);
  useEffect(() => {
    latest.current = { key, baseRevision, dirty };
  });

  const settle = useCallback(() => {
    const now = latest.current;
    if (forgotten.current) return;
    if (now.dirty) {
      kept.current = true;
      writeDraft(localStorage, now.key, { values: form.getValues(), baseRevision: now.baseRevision, savedAt: Date.now() });
    } else if (kept.current) {
      kept.current = false;
      dropDraft(localStorage, now.key);
    }
  }, [form]);

  useEffect(() => {
    let timer = setTimeout(settle, PAUSE_MS);
    const later = () => {
      clearTimeout(timer);
      timer = setTimeout(settle, PAUSE_MS);
    };
    const stop = form.subscribe({ formState: { values: true }, callback: later });
    return () => {
      clearTimeout(timer);
      stop();
    };
  }, [form, settle, dirty, baseRevision]);

  useEffect(() => {
    const onHide = () => {
      if (document.visibilityState === "hidden") settle();
    };
    window.addEventListener("pagehide", settle);
    document.addEventListener("visibilitychange", onHide);
    return () => {
      window.removeEventListener("pagehide", settle);
      document.removeEventListener("visibilitychange", onHide);
      settle();
    };
  }, [settle]);

  const forget = useCallback(() => {
    forgotten.current = true;
    dropDraft(localStorage, latest.current.key);
  }, []);
  return { forget };
}
