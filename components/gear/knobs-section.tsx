"use client";

import { useFieldArray, useFormContext } from "react-hook-form";
import { Button } from "@/components/ui/button";
import { FormSection, GroupError } from "./form-section";
import type { GearFormValues } from "./form-values";
import { TURNS_WORD } from "./gear-words";
import { fieldId } from "./list-faults";
import { makeId } from "./make-id";
import { SelectField, TextField } from "./plain-fields";

const MOST_KNOBS = 32;

/** The knobs a song may set. */
export function KnobsSection({ turnsMatter }: { turnsMatter: boolean }) {
  const { control } = useFormContext<GearFormValues>();
  const { fields, append, remove } = useFieldArray({ control, name: "knobs", keyName: "fieldKey" });
  const takeAway = (index: number) => {
    remove(index);
    document.getElementById(fieldId("knobs"))?.querySelector("button")?.focus();
  };
  return (
    <FormSection title="Knobs" intro="Those whose position a song should remember.">
      <ol className="flex flex-col gap-4">
        {fields.map((field, index) => (
          <li key={field.fieldKey} className="grid grid-cols-1 items-end gap-x-6 gap-y-2 sm:grid-cols-[1fr_auto] lg:grid-cols-3">
            <TextField path={`knobs.${index}.name`} label={`Knob ${index + 1}`} />
            {turnsMatter ? <SelectField path={`knobs.${index}.turns`} label={`What knob ${index + 1} turns`} options={TURNS_WORD} /> : null}
            <Button tone="quiet" className="w-fit" aria-label={`Remove knob ${index + 1}`} onClick={() => takeAway(index)}>Remove</Button>
          </li>
        ))}
      </ol>
      <GroupError path="knobs" />
      <div id={fieldId("knobs")}>
        <Button disabled={fields.length >= MOST_KNOBS} onClick={() => append({ id: makeId(), name: "", turns: "nothing" }, { focusName: `knobs.${fields.length}.name` })}>
          Add a knob
        </Button>
      </div>
    </FormSection>
  );
}
