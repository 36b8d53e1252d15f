"use client";

import { memo } from "react";
import { Checkbox } from "@/components/ui/inputs";
import { useFormContext, useWatch } from "react-hook-form";
import { CONNECTORS, type JackRole } from "@/lib/schemas/jack";
import { SIGNALS, type Signal } from "@/lib/core/electrics/jacks";
import { FigureGrid } from "./figure-field";
import { FormCheck, SelectField, TextField } from "./plain-fields";
import { FoldedFigures, GroupError, HalfWidth } from "./form-section";
import { emptyClamp, emptyInput, emptyOutput, type GearFormValues, type JackValues } from "./form-values";
import { POLARITY_WORD, ROLE_WORD, SIGNAL_WORD } from "./gear-words";
import { CLAMP_FIGURES, figuresOfJack } from "./jack-figures";
import { fieldId } from "./list-faults";

const CONNECTOR_WORD = Object.fromEntries(CONNECTORS.map((name) => [name, name]));
const DIRECTION_WORD = { output: "Output", input: "Input" };

/** One jack: what it is called, which way it goes, what travels on it, and its figures. Typing in one does not draw the others again. */
export const JackFields = memo(function JackFields({ index }: { index: number }) {
  const { control, setValue } = useFormContext<GearFormValues>();
  const jack = useWatch({ control, name: `jacks.${index}` });
  const details = useWatch({ control, name: "details" });
  const base = `jacks.${index}`;
  const side = `${base}.${jack.direction}`;
  const { main, more, note } = figuresOfJack(jack, details);
  const signals: readonly Signal[] = jack.direction === "output" ? [jack.output.signal] : jack.input.accepts;
  // A bare contact and a sound have no edge: polarity and diodes say nothing about them.
  const hasEdge = signals.some((signal) => signal !== "sensor" && signal !== "audio");
  const at = (keys: readonly string[]) => keys.map((key) => `${side}.${key}`);

  const turnAround = (direction: string) => {
    const { id, name, connector } = jack;
    const turned: JackValues = direction === "output"
      ? { id, name, connector, role: "plain", direction, output: emptyOutput("trigger") }
      : { id, name, connector, role: "plain", direction: "input", input: emptyInput(["trigger", "gate"]) };
    setValue(`jacks.${index}`, turned, { shouldDirty: true });
  };

  return (
    <div className="flex flex-col gap-4">
      <div className="grid grid-cols-1 gap-x-5 gap-y-4 sm:grid-cols-2 xl:grid-cols-4">
        <TextField path={`${base}.name`} label="Name" />
        <SelectField path={`${base}.direction`} label="Direction" options={DIRECTION_WORD} onPicked={turnAround} />
        <SelectField path={`${base}.connector`} label="Connector" options={CONNECTOR_WORD} />
        <RoleField base={base} jack={jack} kind={details.kind} />
      </div>
      {jack.direction === "output" ? (
        <>
          <div className="grid grid-cols-1 gap-x-5 gap-y-4 sm:grid-cols-2">
            <SelectField path={`${side}.signal`} label="What comes out" options={SIGNAL_WORD} />
            {hasEdge ? <SelectField path={`${side}.polarity`} label="Polarity" options={POLARITY_WORD} /> : null}
          </div>
          {hasEdge ? <FormCheck path={`${side}.or`} label="It leaves through a diode, so that several may share an input" /> : null}
        </>
      ) : (
        <>
          <AcceptsField path={`${side}.accepts`} index={index} accepts={jack.input.accepts} />
          {hasEdge ? <HalfWidth><SelectField path={`${side}.polarity`} label="Polarity it waits for" options={POLARITY_WORD} /></HalfWidth> : null}
        </>
      )}
      {note ? <p className="text-ink-soft">{note}</p> : null}
      {main.length > 0 ? <FigureGrid paths={at(main)} /> : null}
      {jack.direction === "input" && jack.input.accepts.includes("audio") ? (
        <FormCheck path={`${side}.phantom`} label="Phantom power is switched on for this channel" />
      ) : null}
      {jack.direction === "input" && (hasEdge || jack.input.clamp) ? (
        <>
          <Checkbox
            id={fieldId(`${side}.clamp`)}
            label="Protection diodes at the input"
            checked={jack.input.clamp !== null}
            onChange={(event) => setValue(`jacks.${index}.input.clamp`, event.target.checked ? emptyClamp() : null, { shouldDirty: true })}
          />
          {jack.input.clamp ? <FigureGrid paths={at(CLAMP_FIGURES)} /> : null}
        </>
      ) : null}
      <FoldedFigures paths={at(more)} />
    </div>
  );
});

/** Only a conditioner's jacks need telling apart: its own outputs are computed. */
function RoleField({ base, jack, kind }: { base: string; jack: JackValues; kind: string }) {
  if (kind !== "conditioner") return null;
  const usual: JackRole[] = jack.direction === "input" ? ["plain", "pad-in"] : ["plain", "trigger-out", "envelope-out"];
  const roles = usual.includes(jack.role) ? usual : [...usual, jack.role];
  return <SelectField path={`${base}.role`} label="What it is on the box" options={Object.fromEntries(roles.map((role) => [role, ROLE_WORD[role]]))} />;
}

function AcceptsField({ path, index, accepts }: { path: string; index: number; accepts: Signal[] }) {
  const { setValue } = useFormContext<GearFormValues>();
  const toggle = (signal: Signal, on: boolean) =>
    setValue(
      `jacks.${index}.input.accepts`,
      SIGNALS.filter((known) => (known === signal ? on : accepts.includes(known))),
      { shouldDirty: true, shouldValidate: accepts.length === 0 || !on },
    );
  return (
    <fieldset id={fieldId(path)}>
      <legend className="mb-1 font-semibold">Listens to</legend>
      <div className="flex flex-wrap gap-x-5 gap-y-1">
        {SIGNALS.map((signal) => (
          <Checkbox key={signal} id={`${fieldId(path)}-${signal}`} label={SIGNAL_WORD[signal]} checked={accepts.includes(signal)} onChange={(event) => toggle(signal, event.target.checked)} />
        ))}
      </div>
      <GroupError path={path} />
    </fieldset>
  );
}
