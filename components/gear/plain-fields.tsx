"use client";

import { useController, useFormContext, type FieldPath } from "react-hook-form";
import { Checkbox, Select, TextArea, TextInput } from "@/components/ui/inputs";
import { FieldShell } from "./field-shell";
import type { GearFormValues } from "./form-values";
import { fieldId } from "./list-faults";

interface PathProps {
  path: string;
  label: string;
}

function useField(path: string) {
  const { control } = useFormContext<GearFormValues>();
  const { field, fieldState } = useController({ control, name: path as FieldPath<GearFormValues> });
  const id = fieldId(path);
  const error = fieldState.error?.message;
  return {
    field,
    error,
    shared: {
      id,
      ref: field.ref,
      name: field.name,
      value: typeof field.value === "string" ? field.value : "",
      onBlur: field.onBlur,
      onChange: field.onChange,
      "aria-invalid": error ? true : undefined,
      "aria-describedby": error ? `${id}-error` : undefined,
    },
  };
}

interface TextFieldProps extends PathProps {
  inputMode?: "numeric";
  /** For a number of a digit or two. */
  narrow?: boolean;
  lines?: number;
}

export function TextField({ path, label, inputMode, narrow, lines }: TextFieldProps) {
  const { shared, error } = useField(path);
  return (
    <FieldShell id={shared.id} label={label} error={error}>
      {lines ? <TextArea {...shared} rows={lines} maxLength={2000} />
        : <TextInput {...shared} inputMode={inputMode} autoComplete="off" maxLength={120} className={narrow ? "max-w-32" : undefined} />}
    </FieldShell>
  );
}

interface SelectFieldProps extends PathProps {
  options: Readonly<Record<string, string>>;
  onPicked?: (value: string) => void;
}

export function SelectField({ path, label, options, onPicked }: SelectFieldProps) {
  const { shared, error } = useField(path);
  return (
    <FieldShell id={shared.id} label={label} error={error}>
      <Select
        {...shared}
        onChange={(event) => {
          shared.onChange(event.target.value);
          onPicked?.(event.target.value);
        }}
      >
        {Object.entries(options).map(([value, word]) => <option key={value} value={value}>{word}</option>)}
      </Select>
    </FieldShell>
  );
}

/** A yes-or-no that the form holds. */
export function FormCheck({ path, label }: PathProps) {
  const { field } = useField(path);
  return <Checkbox id={fieldId(path)} label={label} checked={field.value === true} onChange={(event) => field.onChange(event.target.checked)} />;
}
