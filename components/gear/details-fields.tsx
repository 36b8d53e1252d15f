"use client";

import { useRef } from "react";
import { Checkbox } from "@/components/ui/inputs";
import { useFormContext, useWatch } from "react-hook-form";
import { startingGear } from "@/lib/core/electrics/starting-figures";
import { gearInputSchema } from "@/lib/schemas/gear";
import { FigureGrid } from "./figure-field";
import { SelectField, TextField } from "./plain-fields";
import { emptyOutput, toFormValues, type CircuitValues, type GearFormValues, type JackValues } from "./form-values";
import { BUILD_WORD, LEG_WORD, SENSOR_WORD, SOURCE_WORD } from "./gear-words";
import { figuresOfPad } from "./jack-figures";
import { makeId } from "./make-id";
import { FoldedFigures, Group, HalfWidth } from "./form-section";

/** The figures of the box itself, by its kind. */
export function DetailsFields() {
  const { control } = useFormContext<GearFormValues>();
  const kind = useWatch({ control, name: "details.kind" });
  switch (kind) {
    case "pad": return <PadFields />;
    case "conditioner": return <ConditionerFields />;
    case "desk-channel": return <TextField path="details.channel" label="Channel number on the desk" inputMode="numeric" narrow />;
    case "supply": return <SupplyFields />;
    default: return null;
  }
}

function PadFields() {
  const { control } = useFormContext<GearFormValues>();
  const sensor = useWatch({ control, name: "details.sensor" });
  const { main, more } = figuresOfPad(sensor);
  return (
    <>
      <HalfWidth><SelectField path="details.sensor" label="What senses the hit" options={SENSOR_WORD} /></HalfWidth>
      <FigureGrid paths={main.map((key) => `details.${key}`)} />
      <FoldedFigures paths={more.map((key) => `details.${key}`)} />
    </>
  );
}

function SupplyFields() {
  return (
    <>
      <HalfWidth><SelectField path="details.source" label="Where the power comes from" options={SOURCE_WORD} /></HalfWidth>
      <FigureGrid paths={["details.highV", "details.lowV", "details.ratingA"]} />
    </>
  );
}

const PARTS = "details.circuit";

function ConditionerFields() {
  const { control, getValues, setValue } = useFormContext<GearFormValues>();
  const build = useWatch({ control, name: "details.build" });
  const circuit = useWatch({ control, name: "details.circuit" });
  const putAside = useRef<CircuitValues | null>(null);

  const changeBuild = (next: string) => {
    if (next === "black-box") {
      putAside.current = getValues("details.circuit");
      setValue("details.circuit", null, { shouldDirty: true });
      return;
    }
    if (putAside.current) setValue("details.circuit", putAside.current, { shouldDirty: true });
    else fillIn("single-9v", (start) => setValue("details.circuit", start, { shouldDirty: true }));
  };
  const fillIn = (variant: string, put: (circuit: CircuitValues) => void, only = PARTS) => {
    const start = toFormValues(gearInputSchema.parse(startingGear("conditioner", variant, makeId)));
    if (start.details.kind !== "conditioner" || !start.details.circuit) return;
    put(start.details.circuit);
    const added = start.assumed.filter((path) => path.startsWith(`${only}.`));
    setValue("assumed", [...new Set([...getValues("assumed"), ...added])], { shouldDirty: true });
  };

  return (
    <>
      <HalfWidth><SelectField path="details.build" label="How well it is known" options={BUILD_WORD} onPicked={changeBuild} /></HalfWidth>
      {build === "circuit" && circuit ? <CircuitFields hasEnvelope={circuit.envelope !== null} fillIn={fillIn} /> : (
        <p className="text-ink-soft">Its outputs count as read: give the figures at each output jack below.</p>
      )}
    </>
  );
}

type FillIn = (variant: string, put: (circuit: CircuitValues) => void, only?: string) => void;

function CircuitFields({ hasEnvelope, fillIn }: { hasEnvelope: boolean; fillIn: FillIn }) {
  const { control, getValues, setValue } = useFormContext<GearFormValues>();
  const hasJack = useWatch({ control, name: "jacks", compute: (jacks) => jacks.some((jack) => jack.role === "envelope-out") });
  const paths = (group: string, ...keys: string[]) => keys.map((key) => `${PARTS}.${group}.${key}`);

  const switchEnvelope = (on: boolean) => {
    if (!on) return setValue("details.circuit.envelope", null, { shouldDirty: true });
    fillIn("single-9v-envelope", (start) => setValue("details.circuit.envelope", start.envelope, { shouldDirty: true }), `${PARTS}.envelope`);
    if (hasJack) return;
    const jack: JackValues = { id: makeId(), direction: "output", name: "Envelope out", connector: "6.35 mm TS", role: "envelope-out", output: emptyOutput("envelope") };
    setValue("jacks", [...getValues("jacks"), jack], { shouldDirty: true });
  };

  return (
    <>
      <Group title="Pad and its divider">
        <HalfWidth><SelectField path={`${PARTS}.padLeg`} label="Where the pad sits" options={LEG_WORD} /></HalfWidth>
        <FigureGrid paths={paths("divider", "ohm")} />
      </Group>
      <Group title="Coupling" path={`${PARTS}.coupling`}>
        <FigureGrid paths={paths("coupling", "farad", "ohm")} />
      </Group>
      <Group title="Threshold" path={`${PARTS}.threshold`}>
        <FigureGrid paths={paths("threshold", "topOhm", "potOhm", "bottomOhm")} />
      </Group>
      <Group title="Comparator">
        <FigureGrid paths={paths("comparator", "highDropV", "lowDropV", "limitA")} />
      </Group>
      <Group title="Trigger output">
        <FigureGrid paths={paths("output", "seriesOhm", "shuntOhm")} />
      </Group>
      <Group title="Envelope">
        <Checkbox checked={hasEnvelope} onChange={(event) => switchEnvelope(event.target.checked)} label="It makes an envelope beside the pulse" id="gear-has-envelope" />
        {hasEnvelope ? <FigureGrid paths={paths("envelope", "seriesOhm", "farad", "ohm", "emitterOhm")} /> : null}
        {!hasEnvelope && hasJack ? <p className="text-ink-soft">An envelope output is still among the jacks: tick this, or remove that jack.</p> : null}
      </Group>
    </>
  );
}
