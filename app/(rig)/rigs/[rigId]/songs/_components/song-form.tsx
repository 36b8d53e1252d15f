"use client";
import { zodResolver } from "@hookform/resolvers/zod";
import { useId, useState } from "react";
import { useForm } from "react-hook-form";
import { Button } from "@/components/ui/button";
import { describedBy, Field } from "@/components/ui/field";
import { Select, TextArea, TextInput } from "@/components/ui/inputs";
import { Notice } from "@/components/ui/notice";
import { ProblemError } from "@/lib/client/fetch-json";
import { songCreateSchema } from "@/lib/schemas/song";

export interface SongValues {
  title: string;
  tempoBpm: string;
  notes: string;
  copyFrom: string;
}

interface SongFormProps {
  initial: SongValues;
  /** Songs whose patch a new one may begin with; absent: no such choice. */
  copies?: readonly { id: string; title: string }[];
  submitLabel: string;
  /** Sends it; a refusal is shown beside its field and nothing typed is lost. */
  onSend: (values: SongValues) => Promise<void>;
  onCancel: () => void;
}

const schema = songCreateSchema.extend({ copyFrom: songCreateSchema.shape.copyFrom.or(songCreateSchema.shape.notes) });

export function SongForm({ initial, copies, submitLabel, onSend, onCancel }: SongFormProps) {
  const id = useId();
  const [refusal, setRefusal] = useState<string | null>(null);
  const { register, handleSubmit, setError, formState: { errors, isSubmitting } } = useForm<SongValues>({ resolver: zodResolver(schema, undefined, { raw: true }) as never, defaultValues: initial });

  async function send(values: SongValues) {
    setRefusal(null);
    try {
      await onSend(values);
    } catch (error) {
      if (!(error instanceof ProblemError)) throw error;
      for (const fault of error.problem.errors ?? []) {
        if (fault.field in initial) setError(fault.field as keyof SongValues, { message: fault.detail }, { shouldFocus: true });
      }
      setRefusal(error.problem.detail);
    }
  }

  return (
    <form noValidate onSubmit={(event) => void handleSubmit(send)(event)} className="flex flex-col gap-4">
      {refusal ? <Notice tone="error" title="Not saved" live>{refusal}</Notice> : null}
      <Field id={`${id}-title`} label="Title" error={errors.title?.message}>
        <TextInput id={`${id}-title`} autoComplete="off" aria-invalid={!!errors.title} aria-describedby={describedBy(`${id}-title`, { error: errors.title })} {...register("title")} />
      </Field>
      <Field id={`${id}-tempo`} label="Tempo, beats a minute" hint="Leave empty where it drifts." error={errors.tempoBpm?.message}>
        <TextInput id={`${id}-tempo`} inputMode="decimal" className="max-w-32" aria-invalid={!!errors.tempoBpm} aria-describedby={describedBy(`${id}-tempo`, { hint: true, error: errors.tempoBpm })} {...register("tempoBpm")} />
      </Field>
      <Field id={`${id}-notes`} label="Notes" hint="Feel, cues, what to watch." error={errors.notes?.message}>
        <TextArea id={`${id}-notes`} aria-invalid={!!errors.notes} aria-describedby={describedBy(`${id}-notes`, { hint: true, error: errors.notes })} {...register("notes")} />
      </Field>
      {copies && copies.length > 0 ? (
        <Field id={`${id}-copy`} label="Begin with the patch of" error={errors.copyFrom?.message}>
          <Select id={`${id}-copy`} {...register("copyFrom")}>
            <option value="">no other song: an empty board</option>
            {copies.map((song) => <option key={song.id} value={song.id}>{song.title}</option>)}
          </Select>
        </Field>
      ) : null}
      <div className="flex gap-3">
        <Button type="submit" tone="primary" disabled={isSubmitting}>{isSubmitting ? "Saving…" : submitLabel}</Button>
        <Button onClick={onCancel}>Cancel</Button>
      </div>
    </form>
  );
}
