"use client";

import { zodResolver } from "@hookform/resolvers/zod";
import { useRef, useState } from "react";
import { useForm, type FieldPath, type Resolver, type UseFormReturn } from "react-hook-form";
import { gearInputSchema, type Gear, type GearInput } from "@/lib/schemas/gear";
import { pruneAssumed } from "./assumed-paths";
import { toFormValues, type GearFormValues } from "./form-values";
import { formFieldOf } from "./server-faults";
import { useSaveGear } from "./use-save-gear";

export type GearFormApi = UseFormReturn<GearFormValues, unknown, GearInput>;

interface GearFormState {
  form: GearFormApi;
  busy: boolean;
  baseRevision: number;
  /** Why the last save was refused, beyond single fields. */
  refusal: string | null;
  conflict: { mine: GearInput; stored: Gear } | null;
  /** What was in the form before the stored version was taken. */
  putAside: GearFormValues | null;
  /** Rises with every attempt that found faults, so that focus can follow. */
  faultyTries: number;
  submit: (baseRevision?: number) => Promise<void>;
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
      setConflict({ mine, stored: outcome.stored });
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

  const takeStored = () => {
    if (!conflict) return;
    setPutAside(structuredClone(form.getValues()));
    form.reset(toFormValues(conflict.stored));
    setBaseRevision(conflict.stored.revision);
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

  return { form, busy, baseRevision, refusal, conflict, putAside, faultyTries, submit, takeStored, bringBack, restore };
}

/** Puts the server's word beside its field. False where the form has no such field. */
function showFault(form: GearFormApi, field: string, message: string): boolean {
  const root = field.split(".")[0] ?? "";
  if (!["name", "notes", "supplyId", "details", "jacks", "knobs"].includes(root)) return false;
  form.setError(field as FieldPath<GearFormValues>, { type: "server", message });
  return true;
}
