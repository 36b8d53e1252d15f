import type { ReactNode } from "react";

export function SiteFooter({ children }: { children: ReactNode }) {
  return <footer data-print="hide" className="mt-auto border-t border-line px-4 py-4 text-sm text-ink-soft md:px-6">{children}</footer>;
}
