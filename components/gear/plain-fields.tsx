"use client";

import { Checkbox, Select, TextArea, TextInput } from "@/components/ui/inputs";
import { FieldShell } from "./field-shell";
import { useFormField } from "./use-form-field";

interface PathProps {
  path: string;
  label: string;
}

interface TextFieldProps extends PathProps {
  inputMode?: "numeric";
  /** For a number of a digit or two. */
  narrow?: boolean;
  lines?: number;
}

export function TextField({ path, label, inputMode, narrow, lines }: TextFieldProps) {
  const { shared, id, error, text, change } = useFormField(path);
  return (
    <FieldShell id={id} label={label} error={error}>
      {lines ? <TextArea {...shared} value={text} onChange={(event) => change(event.target.value)} rows={lines} maxLength={2000} />
        : <TextInput {...shared} value={text} onChange={(event) => change(event.target.value)} inputMode={inputMode} autoComplete="off" maxLength={120} className={narrow ? "max-w-32" : undefined} />}
    </FieldShell>
  );
}

interface SelectFieldProps extends PathProps {
  options: Readonly<Record<string, string>>;
  onPicked?: (value: string) => void;
}

export function SelectField({ path, label, options, onPicked }: SelectFieldProps) {
  const { shared, id, error, text, change } = useFormField(path);
  return (
    <FieldShell id={id} label={label} error={error}>
      <Select
        {...shared}
        value={text}
        onChange={(event) => {
          change(event.target.value);
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
  const { id, isOn, change } = useFormField(path);
  return <Checkbox id={id} label={label} checked={isOn} onChange={(event) => change(event.target.checked)} />;
}
