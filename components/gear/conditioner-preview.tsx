"use client";

import { useEffect, useId, useState } from "react";
import { useFormContext, useWatch } from "react-hook-form";
import { Select } from "@/components/ui/inputs";
import { Field } from "@/components/ui/field";
import { startingGear } from "@/lib/core/electrics/starting-figures";
import { simulateForPatch } from "@/lib/core/electrics/conditioner/simulate-for-patch";
import type { ConditionerOutcome, ConditionerQuestion } from "@/lib/core/electrics/patch-types";
import { gearInputSchema, type Gear } from "@/lib/schemas/gear";
import type { GearFormValues } from "./form-values";
import { ASSUMED_RAILS, previewQuestion } from "./preview-question";
import { PreviewOutcome } from "./preview-outcome";
import type { SupplyChoice } from "./supply-choices";

const PAUSE_MS = 500;
const TURNS = [[0, "fully anticlockwise"], [0.25, "a quarter up"], [0.5, "midway"], [0.75, "three quarters up"], [1, "fully clockwise"]] as const;

const FOAM = { id: "foam", name: "Any foam pad, assumed figures", details: gearInputSchema.parse(startingGear("pad", "foam", () => "foam")).details };

/** What the circuit as typed does with one of the rig's pads, worked out again after every pause in the typing. */
export function ConditionerPreview({ pads, supplies }: { pads: Gear[]; supplies: SupplyChoice[] }) {
  const { control } = useFormContext<GearFormValues>();
  const circuit = useWatch({ control, name: "details.circuit" });
  const supplyId = useWatch({ control, name: "supplyId" });
  const [padId, setPadId] = useState("");
  const [turn, setTurn] = useState(0.5);
  const usable = [...pads.filter((pad) => pad.details.kind === "pad" && pad.details.sensor === "resistive"), FOAM];
  const pad = usable.find((item) => item.id === padId) ?? usable[0] ?? FOAM;
  const supply = supplies.find((item) => item.id === supplyId);
  const question = circuit ? previewQuestion(circuit, supply ?? ASSUMED_RAILS, pad, turn) : null;
  const outcome = useOutcome(question);
  const headingId = useId();

  if (!circuit) return null;
  return (
    <section aria-labelledby={headingId} className="flex flex-col gap-3 border-2 border-line-soft bg-bench p-4">
      <h3 id={headingId} className="text-lg font-bold">What comes out</h3>
      <div className="grid grid-cols-1 gap-x-6 gap-y-3 sm:grid-cols-2">
        <Field id="gear-preview-pad" label="With this pad">
          <Select id="gear-preview-pad" value={pad.id} onChange={(event) => setPadId(event.target.value)}>
            {usable.map((item) => <option key={item.id} value={item.id}>{item.name}</option>)}
          </Select>
        </Field>
        <Field id="gear-preview-turn" label="Threshold pot">
          <Select id="gear-preview-turn" value={turn} onChange={(event) => setTurn(Number(event.target.value))}>
            {TURNS.map(([value, word]) => <option key={value} value={value}>{word}</option>)}
          </Select>
        </Field>
      </div>
      <PreviewOutcome outcome={question ? outcome : null} unreadable={question === null} onSupply={supply?.name ?? "a 9 V battery from 9.6 down to 6 V"} />
    </section>
  );
}

/** The answer to the latest question that stood still for a moment. */
function useOutcome(question: ConditionerQuestion | null): ConditionerOutcome | null {
  const [answered, setAnswered] = useState<ConditionerOutcome | null>(null);
  const asked = question === null ? "" : JSON.stringify(question);
  useEffect(() => {
    if (asked === "") return;
    const timer = setTimeout(() => setAnswered(simulateForPatch(JSON.parse(asked) as ConditionerQuestion)), PAUSE_MS);
    return () => clearTimeout(timer);
  }, [asked]);
  return answered;
}
