"use client";

import { useState } from "react";
import { fetchJson, ProblemError, type FieldFault } from "@/lib/client/fetch-json";
import { paths } from "@/lib/paths";
import type { Gear, GearInput } from "@/lib/schemas/gear";

export type SaveOutcome =
  | { kind: "saved"; gear: Gear }
  | { kind: "stale"; stored: Gear }
  | { kind: "refused"; message: string; faults: FieldFault[] };

/** Sends new gear, or a replacement made from a revision, and says plainly what came of it. */
export function useSaveGear(rigId: string, gearId: string | null): { busy: boolean; save: (gear: GearInput, baseRevision: number) => Promise<SaveOutcome> } {
  const [busy, setBusy] = useState(false);
  const save = async (gear: GearInput, baseRevision: number): Promise<SaveOutcome> => {
    setBusy(true);
    try {
      const answer = gearId === null
        ? await fetchJson<{ gear: Gear }>(paths.api.gearList(rigId), { method: "POST", body: gear })
        : await fetchJson<{ gear: Gear }>(paths.api.gear(rigId, gearId), { method: "PUT", body: { baseRevision, gear } });
      return { kind: "saved", gear: answer.gear };
    } catch (error) {
      return outcomeOf(error);
    } finally {
      setBusy(false);
    }
  };
  return { busy, save };
}

function outcomeOf(error: unknown): SaveOutcome {
  if (!(error instanceof ProblemError)) throw error;
  const { problem, status } = error;
  if (status === 409 && problem.current) return { kind: "stale", stored: problem.current as Gear };
  if (status === 401) return { kind: "refused", message: "You are signed out. Sign in again in another tab, then save here; what you typed stays.", faults: [] };
  return { kind: "refused", message: problem.detail || problem.title, faults: problem.errors ?? [] };
}
