"use client";
import { useEffect, useState } from "react";

/** A value once it has stood still for a moment: a knob being turned is asked about where it stops. */
export function useSettled<T>(value: T, quietMs: number): T {
  const [settled, setSettled] = useState(value);
  useEffect(() => {
    const timer = setTimeout(() => setSettled(value), quietMs);
    return () => clearTimeout(timer);
  }, [quietMs, value]);
  return settled;
}
