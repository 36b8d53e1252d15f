import type { Verdict } from "@/lib/core/electrics/jacks";

/** Text tone of each verdict; it only repeats what the word and the line style say. */
export const VERDICT_TONE: Record<Verdict, string> = {
  good: "text-verdict-good",
  tight: "text-verdict-tight",
  unproven: "text-verdict-unproven",
  brief: "text-verdict-brief",
  long: "text-verdict-long",
  weak: "text-verdict-weak",
  dead: "text-verdict-dead",
  stuck: "text-verdict-stuck",
  "wrong-kind": "text-verdict-wrong-kind",
  reversed: "text-verdict-reversed",
  overload: "text-verdict-overload",
  clash: "text-verdict-clash",
  hot: "text-verdict-hot",
};
