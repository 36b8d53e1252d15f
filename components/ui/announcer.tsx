"use client";
import { createContext, useCallback, useContext, useState, type ReactNode } from "react";

const AnnounceContext = createContext<(text: string) => void>(() => undefined);

/** Says things to screen readers without moving anything on screen. */
export function Announcer({ children }: { children: ReactNode }) {
  const [said, setSaid] = useState({ text: "", turn: 0 });
  const announce = useCallback((text: string) => setSaid((before) => ({ text, turn: before.turn + 1 })), []);
  return (
    <AnnounceContext.Provider value={announce}>
      {children}
      <div aria-live="polite" role="status" className="sr-only">
        {/* A new key makes the same sentence be read again. */}
        <span key={said.turn}>{said.text}</span>
      </div>
    </AnnounceContext.Provider>
  );
}

export function useAnnounce(): (text: string) => void {
  return useContext(AnnounceContext);
}
