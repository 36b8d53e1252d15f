import type { ReactNode } from "react";

interface EmptyStateProps {
  title: string;
  children?: ReactNode;
  action?: ReactNode;
}

/** What a list says while it has nothing: what it is for, and what to do first. */
export function EmptyState({ title, children, action }: EmptyStateProps) {
  return (
    <div className="flex flex-col items-start gap-3 border-2 border-dashed border-line bg-bench px-5 py-6">
      <p className="text-xl font-bold">{title}</p>
      {children ? <div className="max-w-prose text-ink-soft">{children}</div> : null}
      {action}
    </div>
  );
}
