"use client";
import { useEffect } from "react";

interface BoardKeys {
  onUndo: () => void;
  onRedo: () => void;
  onRuns: () => void;
  onEscape: () => void;
}

/** Control (or Command) Z and Shift Z, R for the list of runs, Escape to let go; not while typing or in a dialog. */
export function useBoardKeys({ onUndo, onRedo, onRuns, onEscape }: BoardKeys): void {
  useEffect(() => {
    const onKeyDown = (event: KeyboardEvent) => {
      const target = event.target instanceof Element ? event.target : null;
      const isTyping = target?.closest("input, textarea, select, dialog") !== null && target !== null;
      if (isTyping) return;
      const key = event.key.toLowerCase();
      if ((event.ctrlKey || event.metaKey) && key === "z") {
        event.preventDefault();
        (event.shiftKey ? onRedo : onUndo)();
      } else if ((event.ctrlKey || event.metaKey) && key === "y") {
        event.preventDefault();
        onRedo();
      } else if (key === "r" && !event.ctrlKey && !event.metaKey && !event.altKey) onRuns();
      else if (event.key === "Escape") onEscape();
    };
    window.addEventListener("keydown", onKeyDown);
    return () => window.removeEventListener("keydown", onKeyDown);
  }, [onEscape, onRedo, onRuns, onUndo]);
}
