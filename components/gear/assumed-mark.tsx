/** Dotted, as an unproven lead is: nobody has measured this yet. */
export function AssumedMark() {
  return <span className="border-b-2 border-dotted border-verdict-unproven text-sm text-verdict-unproven">assumed</span>;
}

export function AssumedCount({ count, words = false }: { count: number; words?: boolean }) {
  if (count === 0) return <span>{words ? "nothing assumed" : "none"}</span>;
  return <span className="border-b-2 border-dotted border-verdict-unproven text-verdict-unproven tabular-nums">{count}{words ? " assumed" : ""}</span>;
}
