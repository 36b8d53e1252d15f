import Link from "next/link";
import type { ReactNode } from "react";

interface SiteHeaderProps {
  name: string;
  homeHref: string;
  children?: ReactNode;
}

/** The strip along the top of every page. */
export function SiteHeader({ name, homeHref, children }: SiteHeaderProps) {
  return (
    <header data-print="hide" className="flex flex-wrap items-center justify-between gap-x-6 gap-y-2 border-b-2 border-line bg-bench px-4 py-2 md:px-6">
      <Link href={homeHref} className="tape px-3 text-3xl leading-snug no-underline">{name}</Link>
      <div className="flex flex-wrap items-center gap-x-4 gap-y-1">{children}</div>
    </header>
  );
}
