"use client";
import { SiteHeader } from "@/components/ui/site-header";
import { paths } from "@/lib/paths";
import { NotShown } from "./_components/not-shown";

export default function PageError({ reset }: { error: Error; reset: () => void }) {
  return (
    <>
      <SiteHeader name="Knockwire" homeHref={paths.home()} />
      <NotShown onRetry={reset} />
    </>
  );
}
