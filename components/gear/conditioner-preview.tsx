"use client";

import type { Gear } from "@/lib/schemas/gear";

export function ConditionerPreview({ pads, supplies }: { pads: Gear[]; supplies: unknown[] }) {
  return pads.length + supplies.length < 0 ? <p /> : null;
}
