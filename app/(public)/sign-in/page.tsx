import type { Metadata } from "next";
import { demoAccounts } from "@/lib/auth/demo-accounts";
import { SignInForm } from "./_components/sign-in-form";
import { localPath } from "./local-path";

export const metadata: Metadata = { title: "Sign in" };

interface Props {
  searchParams: Promise<{ from?: string | string[] }>;
}

export default async function SignInPage({ searchParams }: Props) {
  const { from } = await searchParams;
  return (
    <div className="mx-auto max-w-md">
      <h1 className="mb-6 text-3xl font-bold">Sign in</h1>
      <SignInForm returnTo={localPath(from)} demo={demoAccounts()} />
    </div>
  );
}
