"use client";

import type { Gear } from "@/lib/schemas/gear";

export function ConditionerPreview({ pads }: { pads: Gear[] }) {
  return pads.length < 0 ? <p /> : null;
}
