"use client";

import { useRouter } from "next/navigation";
import { useEffect, useRef, useState } from "react";
import { FormProvider } from "react-hook-form";
import { paths } from "@/lib/paths";
import type { Gear, GearInput } from "@/lib/schemas/gear";
import { ConditionerPreview } from "./conditioner-preview";
import { ConflictPanel } from "./conflict-panel";
import { DetailsFields } from "./details-fields";
import { DraftOffer } from "./draft-offer";
import { draftKey } from "./draft-store";
import { FaultSummary } from "./fault-summary";
import { focusFirstFault } from "./focus-fault";
import { StartSources } from "./figure-field";
import { FormSection } from "./form-section";
import { isPowered, KIND_HINT, KIND_WORD } from "./gear-words";
import { JacksSection } from "./jacks-section";
import { KnobsSection } from "./knobs-section";
import { LeaveDialog } from "./leave-dialog";
import { SelectField, TextField } from "./plain-fields";
import { SaveBar } from "./save-bar";
import { type SupplyChoice } from "./supply-choices";
import { useGearDraft } from "./use-gear-draft";
import { useGearForm } from "./use-gear-form";
import { useLeaveWarning } from "./use-leave-warning";

interface GearFormProps {
  rigId: string;
  /** Null: a new piece of gear. */
  gear: Gear | null;
  /** What the form begins with. */
  start: GearInput;
  /** Names this form among the drafts kept on the device. */
  draftId: string;
  supplies: SupplyChoice[];
  /** Pads of the rig, to try a conditioner with. */
  pads: Gear[];
  /** Where the starting figures are from, by assumed path. */
  sources?: Readonly<Record<string, string>>;
}

const NO_SOURCES = {};

/** Creates or edits one piece of gear. */
export function GearForm({ rigId, gear, start, draftId, supplies, pads, sources = NO_SOURCES }: GearFormProps) {
  const router = useRouter();
  // A refresh makes new starting gear with new ids on the server; the form keeps what it began with.
  const [startSources] = useState(sources);
  const element = useRef<HTMLFormElement>(null);
  const key = draftKey(rigId, draftId);
  const done = useRef<(saved: Gear) => void>(() => undefined);
  const state = useGearForm(rigId, gear, start, (saved) => done.current(saved));
  const { form, baseRevision, faultyTries } = state;
  const { isDirty } = form.formState;
  const { forget } = useGearDraft(form, key, baseRevision, isDirty);
  const { leavingTo, stay } = useLeaveWarning(isDirty);
  const kind = start.details.kind;
  const backTo = gear ? paths.gear(rigId, gear.id) : paths.gearList(rigId);

  useEffect(() => {
    done.current = (saved) => {
      forget();
      form.reset(form.getValues());
      router.push(paths.savedGear(rigId, saved.id, saved.revision));
      router.refresh();
    };
  });

  useEffect(() => {
    if (faultyTries > 0) focusFirstFault(element.current);
  }, [faultyTries]);

  const supplyName = (id: string | null) => supplies.find((supply) => supply.id === id)?.name ?? "none";
  const supplyOptions = Object.fromEntries([["", "None, or not recorded"], ...supplies.map(({ id, name }) => [id, name])]);

  return (
    <FormProvider {...form}>
      <StartSources value={startSources}>
        <form
          ref={element}
          noValidate
          className="flex flex-col gap-8"
          aria-label={gear ? `Edit ${gear.name}` : `New ${KIND_WORD[kind].toLowerCase()}`}
          onSubmit={(event) => {
            event.preventDefault();
            void state.submit();
          }}
        >
          <DraftOffer draftKey={key} revision={gear?.revision ?? 0} onRestore={(draft) => state.restore(draft.values, draft.baseRevision)} />
          <FaultSummary tries={faultyTries} refusal={state.refusal} />
          {state.conflict ? (
            <ConflictPanel
              mine={state.conflict.mine}
              stored={state.conflict.stored}
              base={state.conflict.base}
              merged={state.conflict.merged}
              onMerge={() => void state.saveMerged()}
              supplyName={supplyName}
              busy={state.busy}
              onKeepMine={() => void state.submit(state.conflict?.stored.revision)}
              onTakeStored={state.takeStored}
            />
          ) : null}
          <FormSection title={KIND_WORD[kind]} intro={KIND_HINT[kind]}>
            <div className="grid grid-cols-1 gap-x-6 gap-y-4 sm:grid-cols-2">
              <TextField path="name" label="Name, as it stands on its tape" />
              {isPowered(kind) ? <SelectField path="supplyId" label="Runs on" options={supplyOptions} /> : null}
            </div>
            <DetailsFields />
            {kind === "conditioner" ? <ConditionerPreview pads={pads} supplies={supplies} /> : null}
          </FormSection>
          {kind === "supply" ? null : <JacksSection kind={kind} />}
          {kind === "supply" || kind === "pad" ? null : <KnobsSection turnsMatter={kind === "conditioner"} />}
          <FormSection title="Notes">
            <TextField path="notes" label="Anything worth remembering" lines={4} />
          </FormSection>
          <SaveBar busy={state.busy} dirty={isDirty} isNew={gear === null} backTo={backTo} putAside={state.putAside !== null} onBringBack={state.bringBack} />
        </form>
        <LeaveDialog to={leavingTo} onStay={stay} onLeave={(href) => router.push(href)} />
      </StartSources>
    </FormProvider>
  );
}
