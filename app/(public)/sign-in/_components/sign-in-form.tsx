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
import { paths } from "@/lib/paths";
import { signInSchema } from "@/lib/schemas/account";

interface SignInFormProps {
  returnTo: string | null;
  demo: { email: string; password: string; role: string }[];
}

interface Draft {
  email: string;
  password: string;
}

export function SignInForm({ returnTo, demo }: SignInFormProps) {
  const [refusal, setRefusal] = useState<string | null>(null);
  const { register, handleSubmit, formState: { errors, isSubmitting } } = useForm<Draft>({
    resolver: zodResolver(signInSchema),
    defaultValues: { email: "", password: "" },
  });

  async function enter({ email, password }: Draft) {
    setRefusal(null);
    const answer = await signIn("credentials", { email, password, redirect: false }).catch(() => null);
    if (answer?.ok) {
      // A whole page load, so that nothing of a visitor's pages is kept.
      window.location.assign(returnTo ?? paths.rigs());
      return;
    }
    setRefusal(answer ? "That address and password do not belong together, or there were too many tries. What you typed is still here." : "The server did not answer. Try again in a moment.");
  }

  return (
    <div className="flex flex-col gap-6">
      <form noValidate onSubmit={(event) => void handleSubmit(enter)(event)} className="flex flex-col gap-4">
        {refusal ? <Notice tone="error" title="Not signed in" live>{refusal}</Notice> : null}
        <Field id="email" label="E-mail" error={errors.email?.message}>
          <TextInput id="email" type="email" autoComplete="username" aria-invalid={!!errors.email} aria-describedby={describedBy("email", { error: errors.email })} {...register("email")} />
        </Field>
        <Field id="password" label="Password" error={errors.password?.message}>
          <TextInput id="password" type="password" autoComplete="current-password" aria-invalid={!!errors.password} aria-describedby={describedBy("password", { error: errors.password })} {...register("password")} />
        </Field>
        <Button type="submit" tone="primary" disabled={isSubmitting}>{isSubmitting ? "Signing in…" : "Sign in"}</Button>
      </form>
      <p>No account yet? <Link className="underline" href={paths.signUp()}>Sign up</Link>.</p>
      {demo.length > 0 ? (
        <section aria-labelledby="demo" className="flex flex-col gap-3 border-2 border-dashed border-line p-4">
          <h2 id="demo" className="text-lg font-bold">This is the demo</h2>
          <p className="text-ink-soft">It runs on this machine alone. Step into the demo rig as</p>
          {demo.map(({ email, password, role }) => (
            <Button key={email} disabled={isSubmitting} onClick={() => void enter({ email, password })}>{role}</Button>
          ))}
        </section>
      ) : null}
    </div>
  );
}
