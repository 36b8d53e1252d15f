import clsx from "clsx";
import type { ReactNode } from "react";

const SIZES = { small: "text-lg px-2 py-0.5", medium: "text-2xl px-3 py-0.5", large: "text-4xl px-4 py-1 md:text-5xl" } as const;

interface TapeProps {
  children: ReactNode;
  size?: keyof typeof SIZES;
  as?: "span" | "div" | "h1" | "h2" | "h3";
  className?: string;
}

/** A name a person gave, lettered on a strip of tape. */
export function Tape({ children, size = "medium", as: Tag = "span", className }: TapeProps) {
  return <Tag className={clsx("tape inline-block max-w-full leading-tight break-words", SIZES[size], className)}>{children}</Tag>;
}
