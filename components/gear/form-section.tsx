"use client";

import { useId, type ReactNode } from "react";
import { get, useFormContext, useFormState, useWatch, type FieldPath } from "react-hook-form";
import { FigureGrid } from "./figure-field";
import type { GearFormValues } from "./form-values";

export function FormSection({ title, intro, children }: { title: string; intro?: string; children: ReactNode }) {
  const id = useId();
  return (
    <section aria-labelledby={id} className="flex flex-col gap-4 border-t-2 border-ink pt-3">
      <div>
        <h2 id={id} className="text-xl font-bold">{title}</h2>
        {intro ? <p className="text-ink-soft">{intro}</p> : null}
      </div>
      {children}
    </section>
  );
}

/** Figures that belong together, with the fault of the group as a whole. */
export function Group({ title, path, children }: { title: string; path?: string; children: ReactNode }) {
  return (
    <fieldset className="border-t border-line-soft pt-2">
      <legend className="pr-3 font-bold text-ink-soft">{title}</legend>
      <div className="flex flex-col gap-3">
        {children}
        {path ? <GroupError path={path} /> : null}
      </div>
    </fieldset>
  );
}

/** A choice of a few words needs no more than half the form. */
export function HalfWidth({ children }: { children: ReactNode }) {
  return <div className="grid grid-cols-1 gap-x-6 sm:grid-cols-2">{children}</div>;
}

/** A fault of several fields together, such as a divider without any resistance. */
export function GroupError({ path }: { path: string }) {
  const { control } = useFormContext<GearFormValues>();
  const { errors } = useFormState({ control });
  const found: unknown = get(errors, path);
  const message = messageOf(found) ?? messageOf(typeof found === "object" && found !== null && "root" in found ? found.root : null);
  return message ? <p data-fault tabIndex={-1} className="text-sm font-semibold text-verdict-hot">{message}</p> : null;
}

const messageOf = (node: unknown): string | null =>
  typeof node === "object" && node !== null && "message" in node && typeof node.message === "string" ? node.message : null;

/** Figures that seldom matter here; the fold says how many of them are filled in. */
export function FoldedFigures({ paths }: { paths: readonly string[] }) {
  const { control } = useFormContext<GearFormValues>();
  const values: unknown[] = useWatch({ control, name: paths as FieldPath<GearFormValues>[] });
  const filled = values.filter((value) => typeof value === "string" && value.trim() !== "").length;
  if (paths.length === 0) return null;
  return (
    <details>
      <summary className="w-fit py-1 font-semibold">More figures{filled > 0 ? ` (${filled} filled in)` : ""}</summary>
      <div className="pt-3"><FigureGrid paths={paths} /></div>
    </details>
  );
}
