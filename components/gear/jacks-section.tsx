"use client";

import { useFieldArray, useFormContext, useWatch } from "react-hook-form";
import { Button } from "@/components/ui/button";
import { useAnnounce } from "@/components/ui/announcer";
import type { GearKind } from "@/lib/schemas/gear";
import { FormSection, GroupError } from "./form-section";
import { newJack, type GearFormValues } from "./form-values";
import { JackFields } from "./jack-fields";
import { fieldId } from "./list-faults";
import { makeId } from "./make-id";

const MOST_JACKS = 24;

/** The jacks of the box: add, describe, remove. */
export function JacksSection({ kind }: { kind: GearKind }) {
  const { control } = useFormContext<GearFormValues>();
  const { fields, append, remove } = useFieldArray({ control, name: "jacks", keyName: "fieldKey" });
  const titles = useWatch({ control, name: "jacks", compute: (jacks) => jacks.map(({ name, direction }) => ({ name, direction })) });
  const announce = useAnnounce();
  const full = fields.length >= MOST_JACKS;
  const add = (direction: "input" | "output") => append(newJack(kind, direction, makeId()), { focusName: `jacks.${fields.length}.name` });
  const takeAway = (index: number, title: string) => {
    remove(index);
    announce(`${title} removed. It is gone for good once you save.`);
    document.getElementById(fieldId("jacks"))?.querySelector("button")?.focus();
  };

  return (
    <FormSection title="Jacks" intro="Every socket a lead can go into, and what travels on it.">
      <ol className="flex flex-col gap-5">
        {fields.map((field, index) => {
          const { name, direction } = titles[index] ?? field;
          const title = `Jack ${index + 1}${name ? `: ${name}` : ""}`;
          return (
            <li key={field.fieldKey}>
              <fieldset className="border-2 border-line-soft bg-bench px-4 pb-4">
                <legend className="px-2 font-bold">{title}</legend>
                <JackFields index={index} />
                <div className="mt-3 flex justify-end">
                  <Button tone="quiet" aria-label={`Remove ${title}`} onClick={() => takeAway(index, title)}>Remove this {direction}</Button>
                </div>
              </fieldset>
            </li>
          );
        })}
      </ol>
      {fields.length === 0 ? <p className="text-ink-soft">No jack yet. Without one, nothing can be patched into it.</p> : null}
      <GroupError path="jacks" />
      <div id={fieldId("jacks")} className="flex flex-wrap gap-3">
        <Button disabled={full} onClick={() => add("input")}>Add an input</Button>
        <Button disabled={full} onClick={() => add("output")}>Add an output</Button>
      </div>
    </FormSection>
  );
}
