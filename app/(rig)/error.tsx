"use client";
import { NotShown } from "../_components/not-shown";

export default function PageError({ reset }: { error: Error; reset: () => void }) {
  return <NotShown onRetry={reset} />;
}
