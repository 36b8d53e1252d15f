import clsx from "clsx";
import Link from "next/link";
import type { ButtonHTMLAttributes, ComponentProps } from "react";

type Tone = "primary" | "plain" | "quiet" | "danger";

const SHAPE = "inline-flex min-h-11 items-center justify-center gap-2 rounded-sm px-4 py-2 text-base font-semibold leading-tight md:min-h-9 md:px-3 md:py-1.5 disabled:opacity-60 disabled:cursor-not-allowed";
const TONES: Record<Tone, string> = {
  primary: "bg-ink text-bench border-2 border-ink hover:bg-ink-soft",
  plain: "bg-raised text-ink border-2 border-line hover:border-ink",
  quiet: "text-ink underline hover:no-underline",
  danger: "bg-raised text-verdict-hot border-2 border-verdict-hot hover:underline",
};

/** The look of a button, for links and other things that act as one. */
export function buttonClass(tone: Tone = "plain", more?: string): string {
  return clsx(SHAPE, TONES[tone], more);
}

export function Button({ tone = "plain", className, type = "button", ...rest }: ButtonHTMLAttributes<HTMLButtonElement> & { tone?: Tone }) {
  return <button type={type} className={buttonClass(tone, className)} {...rest} />;
}

export function ButtonLink({ tone = "plain", className, ...rest }: ComponentProps<typeof Link> & { tone?: Tone }) {
  return <Link className={buttonClass(tone, className)} {...rest} />;
}
