"use client";

import { useRouter } from "next/navigation";
import { useState } from "react";
import { fetchJson, ProblemError } from "@/lib/client/fetch-json";
import { paths } from "@/lib/paths";
import type { Gear } from "@/lib/schemas/gear";

export type ActionOutcome = { ok: true; gear: Gear } | { ok: false; message: string };

/** Copying, retiring and bringing back; the page's data is read again after each. */
export function useGearActions(rigId: string) {
  const router = useRouter();
  const [busyId, setBusyId] = useState<string | null>(null);
  const send = async (gearId: string, url: string, body: unknown): Promise<ActionOutcome> => {
    setBusyId(gearId);
    try {
      const { gear } = await fetchJson<{ gear: Gear }>(url, { method: "POST", body });
      router.refresh();
      return { ok: true, gear };
    } catch (error) {
      if (!(error instanceof ProblemError)) throw error;
      return { ok: false, message: error.problem.detail || error.problem.title };
    } finally {
      setBusyId(null);
    }
  };
  return {
    busyId,
    copy: (gearId: string) => send(gearId, paths.api.copyGear(rigId, gearId), {}),
    retire: (gearId: string, retired: boolean) => send(gearId, paths.api.retireGear(rigId, gearId), { retired }),
  };
}
