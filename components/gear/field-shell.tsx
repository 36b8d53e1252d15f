import type { ReactNode } from "react";
import { Checkbox } from "@/components/ui/inputs";

interface FieldShellProps {
  id: string;
  label: string;
  unit?: string;
  error?: string;
  help?: string;
  /** Where an assumed figure was taken from. */
  source?: string;
  readBack?: string;
  /** Null: the box is empty, there is nothing to assume. */
  mark?: { on: boolean; set: (on: boolean) => void } | null;
  children: ReactNode;
}

/** A label over its control; beneath, what was read, whether it is assumed, what is wrong, and how to measure it. */
export function FieldShell({ id, label, unit, error, help, source, readBack, mark, children }: FieldShellProps) {
  return (
    <div className="flex min-w-0 flex-col gap-1">
      <label htmlFor={id} className="flex items-baseline justify-between gap-2 font-semibold">
        <span>{label}</span>
        {unit ? <span className="font-mono text-sm font-normal text-ink-soft">{unit}</span> : null}
      </label>
      {children}
      {readBack || mark ? (
        <div className="flex min-h-8 items-center justify-between gap-3 text-sm">
          <span id={`${id}-back`} className="font-mono text-ink-soft tabular-nums">{readBack}</span>
          {mark ? (
            <Checkbox
              label={<span className={mark.on ? "border-b-2 border-dotted border-verdict-unproven font-semibold" : "text-ink-soft"}>assumed</span>}
              aria-label={`${label}: assumed`}
              checked={mark.on}
              onChange={(event) => mark.set(event.target.checked)}
            />
          ) : null}
        </div>
      ) : null}
      {error ? <p id={`${id}-error`} className="text-sm font-semibold text-verdict-hot">{error}</p> : null}
      {help ? (
        <details className="text-sm">
          <summary className="w-fit py-1 text-ink-soft underline decoration-dotted underline-offset-4" aria-label={`How to measure: ${label}`}>How to measure</summary>
          <p id={`${id}-help`} className="pt-1">{help}</p>
          {source ? <p className="pt-1 text-ink-soft">The starting figure: {source}.</p> : null}
        </details>
      ) : null}
    </div>
  );
}
