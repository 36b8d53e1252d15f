"use client";

import clsx from "clsx";
import { createContext, useContext } from "react";
import { useFormContext, useWatch } from "react-hook-form";
import { TextInput } from "@/components/ui/inputs";
import { assumedPath } from "./assumed-paths";
import { FieldShell } from "./field-shell";
import { figureInfo } from "./figure-catalogue";
import { readBack } from "./figure-text";
import type { GearFormValues } from "./form-values";
import { useFormField } from "./use-form-field";

const UNIT_SIGN = { V: "V", Ohm: "Ω", F: "F", s: "s", A: "A", dBu: "dBu" } as const;

/** Where starting figures are from, by assumed path; empty for gear that is already stored. */
export const StartSources = createContext<Readonly<Record<string, string>>>({});

/** One electrical figure: what was typed, what it is taken for, whether it is assumed, and how to measure it. */
export function FigureField({ path }: { path: string }) {
  const info = figureInfo(path);
  if (!info) throw new RangeError(`not a figure: ${path}`);
  const { control, getValues, setValue } = useFormContext<GearFormValues>();
  const { shared, id, error, text, change } = useFormField(path);
  const assumed = useWatch({ control, name: "assumed" });
  const key = assumedPath(path, getValues("jacks"));
  const isAssumed = assumed.includes(key);
  const source = useContext(StartSources)[key];
  const back = readBack(text, info);
  const markAssumed = (on: boolean) =>
    setValue("assumed", on ? [...assumed, key] : assumed.filter((known) => known !== key), { shouldDirty: true });

  return (
    <FieldShell
      id={id}
      label={info.label}
      unit={UNIT_SIGN[info.unit]}
      error={error}
      help={info.help}
      source={isAssumed ? source : undefined}
      readBack={back}
      mark={text.trim() === "" ? null : { on: isAssumed, set: markAssumed }}
    >
      <TextInput
        {...shared}
        value={text}
        autoComplete="off"
        autoCapitalize="off"
        spellCheck={false}
        maxLength={60}
        placeholder={info.optional ? "not known" : undefined}
        className={clsx("font-mono tabular-nums", isAssumed && text.trim() !== "" && "border-dotted")}
        aria-describedby={[back ? `${id}-back` : "", error ? `${id}-error` : "", `${id}-help`].filter(Boolean).join(" ")}
        onChange={(event) => {
          change(event.target.value);
          if (isAssumed) markAssumed(false);
        }}
      />
    </FieldShell>
  );
}

/** Several figures side by side, as many as fit. */
export function FigureGrid({ paths }: { paths: readonly string[] }) {
  return (
    <div className="grid grid-cols-1 gap-x-6 gap-y-4 sm:grid-cols-2 lg:grid-cols-3">
      {paths.map((path) => <FigureField key={path} path={path} />)}
    </div>
  );
}
