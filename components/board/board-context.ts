"use client";
import { createContext, useContext } from "react";
import type { Verdict } from "@/lib/core/electrics/jacks";

/** What every jack on the board needs to know; changes only when plugging begins or ends. */
export interface Plugging {
  /** The jack a lead is being plugged from. */
  from: { jackId: string; side: "in" | "out" } | null;
  /** Verdict each free jack would get. */
  would: ReadonlyMap<string, { verdict: Verdict; text: string }>;
  canEdit: boolean;
  tap: (jackId: string) => void;
  openList: (jackId: string) => void;
  unplugJack: (jackId: string) => void;
}

export const PluggingContext = createContext<Plugging>({ from: null, would: new Map(), canEdit: false, tap: () => undefined, openList: () => undefined, unplugJack: () => undefined });

export function usePlugging(): Plugging {
  return useContext(PluggingContext);
}
