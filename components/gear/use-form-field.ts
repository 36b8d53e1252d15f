"use client";

import { useController, useFormContext, type FieldPath } from "react-hook-form";
import type { GearFormValues } from "./form-values";
import { fieldId } from "./list-faults";

/** One field of the gear form by its path: what its control needs, and its fault if it has one. */
export function useFormField(path: string) {
  const { control } = useFormContext<GearFormValues>();
  const { field, fieldState } = useController({ control, name: path as FieldPath<GearFormValues> });
  const id = fieldId(path);
  const error = fieldState.error?.message;
  return {
    id,
    error,
    isOn: field.value === true,
    text: typeof field.value === "string" ? field.value : "",
    change: field.onChange as (value: unknown) => void,
    shared: {
      id,
      ref: field.ref,
      name: field.name,
      onBlur: field.onBlur,
      "aria-invalid": error ? true : undefined,
      "aria-describedby": error ? `${id}-error` : undefined,
    },
  };
}
