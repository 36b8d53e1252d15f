"use client";
import { useCallback, useState } from "react";

/** The width of an element, kept current; 0 until it is on the page. */
export function useFrameWidth(): [ref: (node: HTMLElement | null) => void, width: number] {
  const [width, setWidth] = useState(0);
  const ref = useCallback((node: HTMLElement | null) => {
    if (!node) return;
    const observer = new ResizeObserver(([entry]) => setWidth(entry?.contentRect.width ?? 0));
    observer.observe(node);
    return () => observer.disconnect();
  }, []);
  return [ref, width];
}
