import type { Metadata } from "next";
import { PageHeader } from "@/components/ui/page-header";
import { requireActor } from "@/lib/auth/require-actor";
import { paths } from "@/lib/paths";
import { SignOutButton } from "./_components/sign-out-button";

export const metadata: Metadata = { title: "Your account" };

export default async function AccountPage() {
  const { name, email } = await requireActor(paths.account());
  return (
    <main id="main" className="mx-auto w-full max-w-3xl px-4 py-8 md:px-6">
      <PageHeader title="Your account" />
      <dl className="mb-6 grid grid-cols-[auto_1fr] gap-x-6 gap-y-2">
        <dt className="font-semibold">Name</dt>
        <dd>{name}</dd>
        <dt className="font-semibold">E-mail</dt>
        <dd>{email}</dd>
      </dl>
      <SignOutButton />
    </main>
  );
}
