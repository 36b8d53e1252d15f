"use client";

import { zodResolver } from "@hookform/resolvers/zod";
import { useRef, useState } from "react";
import { useForm, type FieldPath, type Resolver, type UseFormReturn } from "react-hook-form";
import { gearInputSchema, type Gear, type GearInput } from "@/lib/schemas/gear";
import { pruneAssumed } from "./assumed-paths";
import { toFormValues, type GearFormValues } from "./form-values";
import { formFieldOf } from "./server-faults";
import { mergeGear, type MergedGear } from "./merge-gear";
import { useSaveGear } from "./use-save-gear";

export type GearFormApi = UseFormReturn<GearFormValues, unknown, GearInput>;

interface Conflict {
  mine: GearInput;
  stored: Gear;
  /** What both began from; null where the typing began from an older revision than this page knows. */
  base: GearInput | null;
  merged: MergedGear | null;
}

interface GearFormState {
  form: GearFormApi;
  busy: boolean;
  baseRevision: number;
  /** Why the last save was refused, beyond single fields. */
  refusal: string | null;
  conflict: Conflict | null;
  /** What was in the form before the stored version was taken. */
  putAside: GearFormValues | null;
  /** Rises with every attempt that found faults, so that focus can follow. */
  faultyTries: number;
  submit: (baseRevision?: number) => Promise<void>;
  /** Saves the stored version with what was typed put onto it. */
  saveMerged: () => Promise<void>;
  takeStored: () => void;
  bringBack: () => void;
  restore: (values: GearFormValues, baseRevision: number) => void;
}

// The form holds the schema's input with figures as text; its declared input type is wider (`unknown` figures).
const resolver = zodResolver(gearInputSchema) as unknown as Resolver<GearFormValues, unknown, GearInput>;

/** The form's state: what is typed, what is saved, and what to do when the two part. */
export function useGearForm(rigId: string, gear: Gear | null, start: GearInput, onSaved: (gear: Gear) => void): GearFormState {
  const [initial] = useState(() => toFormValues(start));
  const form = useForm<GearFormValues, unknown, GearInput>({ defaultValues: initial, resolver, mode: "onTouched", shouldFocusError: false });
  const { busy, save } = useSaveGear(rigId, gear?.id ?? null);
  const [baseRevision, setBaseRevision] = useState(gear?.revision ?? 0);
  const [base, setBase] = useState<{ revision: number; gear: GearInput }>({ revision: gear?.revision ?? 0, gear: start });
  const [refusal, setRefusal] = useState<string | null>(null);
  const [conflict, setConflict] = useState<GearFormState["conflict"]>(null);
  const [putAside, setPutAside] = useState<GearFormValues | null>(null);
  const [faultyTries, setFaultyTries] = useState(0);
  const sending = useRef(false);

  const send = async (parsed: GearInput, revision: number): Promise<void> => {
    if (sending.current) return;
    sending.current = true;
    const mine: GearInput = { ...parsed, assumed: pruneAssumed(form.getValues()) };
    const outcome = await save(mine, revision).finally(() => { sending.current = false; });
    if (outcome.kind === "saved") {
      setConflict(null);
      onSaved(outcome.gear);
    } else if (outcome.kind === "stale") {
      const { stored } = outcome;
      const began = base.revision === revision ? base.gear : null;
      setConflict({ mine, stored, base: began, merged: began ? mergeGear(began, mine, stored) : null });
    } else {
      const known = outcome.faults.filter((fault) => showFault(form, formFieldOf(fault), fault.detail));
      setRefusal(known.length === 0 ? outcome.message : null);
      if (known.length > 0) setFaultyTries((tries) => tries + 1);
    }
  };

  const submit = (revision = baseRevision): Promise<void> => {
    setRefusal(null);
    return form.handleSubmit((parsed) => send(parsed, revision), () => setFaultyTries((tries) => tries + 1))();
  };

  const saveMerged = async (): Promise<void> => {
    if (!conflict?.merged) return;
    form.reset(toFormValues(conflict.merged.gear), { keepDefaultValues: true });
    await submit(conflict.stored.revision);
  };
  const takeStored = () => {
    if (!conflict) return;
    setPutAside(structuredClone(form.getValues()));
    form.reset(toFormValues(conflict.stored));
    setBaseRevision(conflict.stored.revision);
    setBase({ revision: conflict.stored.revision, gear: conflict.stored });
    setConflict(null);
  };
  const bringBack = () => {
    if (!putAside) return;
    form.reset(putAside, { keepDefaultValues: true });
    setPutAside(null);
  };
  const restore = (values: GearFormValues, revision: number) => {
    form.reset(values, { keepDefaultValues: true });
    if (gear) setBaseRevision(revision);
  };

  return { form, busy, baseRevision, refusal, conflict, putAside, faultyTries, submit, saveMerged, takeStored, bringBack, restore };
}

/** Puts the server's word beside its field. False where the form has no such field. */
function showFault(form: GearFormApi, field: string, message: string): boolean {
  const root = field.split(".")[0] ?? "";
  if (!["name", "notes", "supplyId", "details", "jacks", "knobs"].includes(root)) return false;
  form.setError(field as FieldPath<GearFormValues>, { type: "server", message });
  return true;
}
