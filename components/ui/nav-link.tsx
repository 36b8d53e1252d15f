"use client";
import clsx from "clsx";
import Link from "next/link";
import { usePathname } from "next/navigation";

interface NavLinkProps {
  href: string;
  /** True: only this very page counts as being here. */
  exact?: boolean;
  children: React.ReactNode;
}

/** A link that carries the mark while you are on it. */
export function NavLink({ href, exact = false, children }: NavLinkProps) {
  const path = usePathname();
  const isHere = exact ? path === href : path === href || path.startsWith(`${href}/`);
  return (
    <Link
      href={href}
      aria-current={isHere ? "page" : undefined}
      className={clsx("inline-flex min-h-11 items-center border-b-4 px-2 font-semibold no-underline md:min-h-9", isHere ? "border-ink bg-mark text-mark-ink" : "border-transparent hover:border-line")}
    >
      {children}
    </Link>
  );
}
