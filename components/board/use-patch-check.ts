"use client";
import { useMemo } from "react";
import useSWR from "swr";
import { fetchJson } from "@/lib/client/fetch-json";
import type { Verdict } from "@/lib/core/electrics/jacks";
import type { PatchCheck } from "@/lib/core/electrics/patch-types";
import { paths } from "@/lib/paths";
import type { Patch } from "@/lib/schemas/patch";
import { useSettled } from "./use-settled";

interface Candidate {
  jackId: string;
  verdict: Verdict;
  text: string;
}

const OPTIONS = { keepPreviousData: true, revalidateOnFocus: false, revalidateIfStale: false, dedupingInterval: 60_000 } as const;
const QUIET_MS = 120;

/** The server's check of the patch as it is on screen. While a newer one is awaited the last stays, marked as being re-checked. */
export function usePatchCheck(rigId: string, songId: string, patch: Patch, initial: { patch: Patch; check: PatchCheck }) {
  const url = paths.api.check(rigId, songId);
  // The order of cards has no say in any verdict.
  const now = useMemo(() => JSON.stringify({ ...patch, lanes: [[], [], [], []] }), [patch]);
  const body = useSettled(now, QUIET_MS);
  const initialBody = useMemo(() => JSON.stringify({ ...initial.patch, lanes: [[], [], [], []] }), [initial.patch]);
  const isInitial = initialBody === body;
  const { data, isLoading, error } = useSWR(isInitial ? null : [url, body], () => fetchJson<{ check: PatchCheck }>(url, { body: { patch: JSON.parse(body) as Patch } }), OPTIONS);
  return { check: isInitial ? initial.check : (data?.check ?? initial.check), isChecking: now !== body || (!isInitial && isLoading), failed: error !== undefined };
}

/** What every free jack would get if joined to `from`. */
export function useCandidates(rigId: string, songId: string, patch: Patch, from: string | null) {
  const url = paths.api.check(rigId, songId);
  const body = useMemo(() => (from === null ? null : JSON.stringify({ patch, from })), [from, patch]);
  const { data, isLoading } = useSWR(body === null ? null : [url, body], () => fetchJson<{ candidates?: Candidate[] }>(url, { body: JSON.parse(body ?? "null") as unknown }), { ...OPTIONS, keepPreviousData: false });
  const would = useMemo(() => new Map((data?.candidates ?? []).map(({ jackId, verdict, text }) => [jackId, { verdict, text }])), [data]);
  return { would, isLoading };
}
