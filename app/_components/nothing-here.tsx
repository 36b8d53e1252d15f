import { ButtonLink } from "@/components/ui/button";
import { paths } from "@/lib/paths";

export function NothingHere() {
  return (
    <main id="main" className="mx-auto flex w-full max-w-3xl flex-col items-start gap-4 px-4 py-16">
      <h1 className="text-3xl font-bold">There is nothing here</h1>
      <p className="max-w-prose text-ink-soft">The page was moved or deleted, or it belongs to a rig you are not in.</p>
      <ButtonLink tone="primary" href={paths.rigs()}>Your rigs</ButtonLink>
    </main>
  );
}
