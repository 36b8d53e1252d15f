"use client";
import { Button } from "@/components/ui/button";

export function NotShown({ onRetry }: { onRetry: () => void }) {
  return (
    <main id="main" className="mx-auto flex w-full max-w-3xl flex-col items-start gap-4 px-4 py-16">
      <h1 className="text-3xl font-bold">This page could not be shown</h1>
      <p className="max-w-prose text-ink-soft">Something went wrong on the server. What you saved is kept. Try again in a moment.</p>
      <Button tone="primary" onClick={onRetry}>Try again</Button>
    </main>
  );
}
