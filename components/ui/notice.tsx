import clsx from "clsx";
import type { ReactNode } from "react";

const TONES = {
  plain: { edge: "border-line", word: null },
  caution: { edge: "border-verdict-tight", word: "Caution" },
  error: { edge: "border-verdict-hot", word: "Not done" },
  done: { edge: "border-verdict-good", word: null },
} as const;

interface NoticeProps {
  tone?: keyof typeof TONES;
  title?: string;
  children: ReactNode;
  /** Say it at once to a screen reader. */
  live?: boolean;
  className?: string;
}

/** Something to read before going on; its tone is also a word. */
export function Notice({ tone = "plain", title, children, live = false, className }: NoticeProps) {
  const { edge, word } = TONES[tone];
  const heading = title ?? word;
  return (
    <div role={live ? (tone === "error" ? "alert" : "status") : undefined} className={clsx("border-l-8 bg-bench px-4 py-3", edge, className)}>
      {heading ? <p className="font-bold">{heading}</p> : null}
      <div>{children}</div>
    </div>
  );
}
