"use client";
import { zodResolver } from "@hookform/resolvers/zod";
import { useRouter } from "next/navigation";
import { useForm } from "react-hook-form";
import { Button } from "@/components/ui/button";
import { describedBy, Field } from "@/components/ui/field";
import { TextInput } from "@/components/ui/inputs";
import { fetchJson, ProblemError } from "@/lib/client/fetch-json";
import { paths } from "@/lib/paths";
import { rigFieldsSchema } from "@/lib/schemas/rig";

export function NewRigForm() {
  const router = useRouter();
  const { register, handleSubmit, setError, formState: { errors, isSubmitting } } = useForm<{ name: string }>({
    resolver: zodResolver(rigFieldsSchema),
    defaultValues: { name: "" },
  });

  async function create(draft: { name: string }) {
    try {
      const { rig } = await fetchJson<{ rig: { id: string } }>(paths.api.rigs(), { body: draft });
      router.push(paths.rig(rig.id));
    } catch (error) {
      if (!(error instanceof ProblemError)) throw error;
      setError("name", { message: error.problem.errors?.[0]?.detail ?? error.problem.detail });
    }
  }

  return (
    <form noValidate onSubmit={(event) => void handleSubmit(create)(event)} className="flex max-w-md flex-col gap-3">
      <h2 className="text-xl font-bold">A new rig</h2>
      <Field id="rig-name" label="Its name" error={errors.name?.message}>
        <TextInput id="rig-name" autoComplete="off" aria-invalid={!!errors.name} aria-describedby={describedBy("rig-name", { error: errors.name })} {...register("name")} />
      </Field>
      <Button type="submit" tone="primary" className="self-start" disabled={isSubmitting}>Make this rig</Button>
    </form>
  );
}
