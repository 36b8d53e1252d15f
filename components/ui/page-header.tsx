import type { ReactNode } from "react";

interface PageHeaderProps {
  title: ReactNode;
  children?: ReactNode;
  actions?: ReactNode;
}

/** A page's name, a line about it, and what can be done on it. */
export function PageHeader({ title, children, actions }: PageHeaderProps) {
  return (
    <div className="mb-5 flex flex-wrap items-end justify-between gap-x-6 gap-y-3">
      <div className="flex min-w-0 flex-col gap-1">
        <h1 className="text-3xl font-bold leading-tight">{title}</h1>
        {children ? <div className="max-w-prose text-ink-soft">{children}</div> : null}
      </div>
      {actions ? <div className="flex flex-wrap gap-3" data-print="hide">{actions}</div> : null}
    </div>
  );
}
