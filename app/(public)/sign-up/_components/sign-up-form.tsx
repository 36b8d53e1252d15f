"use client";
import { zodResolver } from "@hookform/resolvers/zod";
import { signIn } from "next-auth/react";
import Link from "next/link";
import { useState } from "react";
import { useForm } from "react-hook-form";
import { Button } from "@/components/ui/button";
import { describedBy, Field } from "@/components/ui/field";
import { TextInput } from "@/components/ui/inputs";
import { Notice } from "@/components/ui/notice";
import { fetchJson, ProblemError } from "@/lib/client/fetch-json";
import { paths } from "@/lib/paths";
import { signUpSchema, type SignUpDraft } from "@/lib/schemas/account";

const FIELDS = ["name", "email", "password"] as const;

export function SignUpForm() {
  const [refusal, setRefusal] = useState<string | null>(null);
  const { register, handleSubmit, setError, formState: { errors, isSubmitting } } = useForm<SignUpDraft>({
    resolver: zodResolver(signUpSchema),
    defaultValues: { name: "", email: "", password: "" },
  });

  async function join(draft: SignUpDraft) {
    setRefusal(null);
    try {
      await fetchJson(paths.api.accounts(), { body: draft });
    } catch (error) {
      if (!(error instanceof ProblemError)) throw error;
      const faults = error.problem.errors ?? [];
      for (const field of FIELDS) {
        const fault = faults.find((item) => item.field === field);
        if (fault) setError(field, { message: fault.detail }, { shouldFocus: true });
      }
      setRefusal(error.problem.detail);
      return;
    }
    const answer = await signIn("credentials", { email: draft.email, password: draft.password, redirect: false }).catch(() => null);
    window.location.assign(answer?.ok ? paths.rigs() : paths.signIn());
  }

  return (
    <form noValidate onSubmit={(event) => void handleSubmit(join)(event)} className="flex flex-col gap-4">
      {refusal ? <Notice tone="error" title="No account made" live>{refusal}</Notice> : null}
      <Field id="name" label="Your name" hint="As the others in your rig will see it." error={errors.name?.message}>
        <TextInput id="name" autoComplete="name" aria-invalid={!!errors.name} aria-describedby={describedBy("name", { hint: true, error: errors.name })} {...register("name")} />
      </Field>
      <Field id="email" label="E-mail" error={errors.email?.message}>
        <TextInput id="email" type="email" autoComplete="username" aria-invalid={!!errors.email} aria-describedby={describedBy("email", { error: errors.email })} {...register("email")} />
      </Field>
      <Field id="password" label="Password" hint="12 characters or more. A few words in a row are easy to keep in mind." error={errors.password?.message}>
        <TextInput id="password" type="password" autoComplete="new-password" aria-invalid={!!errors.password} aria-describedby={describedBy("password", { hint: true, error: errors.password })} {...register("password")} />
      </Field>
      <Button type="submit" tone="primary" disabled={isSubmitting}>{isSubmitting ? "Making your account…" : "Sign up"}</Button>
      <p>Have an account? <Link className="underline" href={paths.signIn()}>Sign in</Link>.</p>
    </form>
  );
}
