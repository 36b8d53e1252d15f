import type { ReactNode } from "react";

interface FieldProps {
  id: string;
  label: ReactNode;
  hint?: ReactNode;
  error?: string;
  children: ReactNode;
}

/** Ids for `aria-describedby` of the control inside a field. */
export function describedBy(id: string, has: { hint?: unknown; error?: unknown }): string | undefined {
  const ids = [has.hint ? `${id}-hint` : "", has.error ? `${id}-error` : ""].filter(Boolean);
  return ids.length > 0 ? ids.join(" ") : undefined;
}

/** A label over its control, with what it wants and what is wrong with it beside it. */
export function Field({ id, label, hint, error, children }: FieldProps) {
  return (
    <div className="flex flex-col gap-1">
      <label htmlFor={id} className="font-semibold">{label}</label>
      {hint ? <p id={`${id}-hint`} className="text-sm text-ink-soft">{hint}</p> : null}
      {children}
      {error ? <p id={`${id}-error`} className="text-sm font-semibold text-verdict-hot">{error}</p> : null}
    </div>
  );
}
