"use client";

import { useFormContext, useFormState } from "react-hook-form";
import { Notice } from "@/components/ui/notice";
import { focusField } from "./focus-fault";
import type { GearFormValues } from "./form-values";
import { fieldId, listFaults } from "./list-faults";

const MOST_SHOWN = 12;

/** What stopped the last save, each fault a link to its field. */
export function FaultSummary({ tries, refusal }: { tries: number; refusal: string | null }) {
  const { control, getValues } = useFormContext<GearFormValues>();
  const { errors } = useFormState({ control });
  const faults = tries > 0 ? listFaults(errors, getValues()) : [];
  if (faults.length === 0 && refusal === null) return null;
  return (
    <Notice tone="error" title="Not saved; what you typed is kept" live>
      <p>{refusal ?? (faults.length === 1 ? "One field needs another look:" : `${faults.length} fields need another look:`)}</p>
      {faults.length > 0 ? (
        <ul className="list-disc pl-5">
          {faults.slice(0, MOST_SHOWN).map((fault) => (
            <li key={`${fault.path} ${fault.message}`}>
              <a
                href={`#${fieldId(fault.path)}`}
                className="font-semibold underline"
                onClick={(event) => {
                  if (focusField(fieldId(fault.path))) event.preventDefault();
                }}
              >
                {fault.label || "This form"}
              </a>
              : {fault.message}
            </li>
          ))}
        </ul>
      ) : null}
      {faults.length > MOST_SHOWN ? <p>and {faults.length - MOST_SHOWN} more.</p> : null}
    </Notice>
  );
}
