import Link from "next/link";
import { Notice } from "@/components/ui/notice";
import { PageHeader } from "@/components/ui/page-header";
import { startingVariants } from "@/lib/core/electrics/starting-figures";
import { paths } from "@/lib/paths";
import type { GearKind } from "@/lib/schemas/gear";
import { KIND_HINT, KIND_WORD } from "./gear-words";

interface ChooserProps {
  rigId: string;
  /** Those this person may add. */
  kinds: readonly GearKind[];
}

/** What is it? Every kind with the figures it can start from. */
export function StartingChooser({ rigId, kinds }: ChooserProps) {
  return (
    <div className="mx-auto max-w-5xl">
      <PageHeader title="Add gear">Pick what comes nearest. It is filled with starting figures, marked as assumed until somebody measures them.</PageHeader>
      {kinds.length === 0 ? <Notice tone="error">Your role in this rig does not allow adding gear.</Notice> : null}
      <div className="grid gap-x-8 gap-y-6 md:grid-cols-2 lg:grid-cols-3">
        {kinds.map((kind) => (
          <section key={kind} aria-labelledby={`kind-${kind}`}>
            <h2 id={`kind-${kind}`} className="text-xl font-bold">{KIND_WORD[kind]}</h2>
            <p className="mb-2 text-ink-soft">{KIND_HINT[kind]}</p>
            <ul className="flex flex-col gap-2">
              {startingVariants(kind).map(({ variant, label, hint }) => (
                <li key={variant}>
                  <Link href={paths.newGear(rigId, kind, variant)} className="block border-2 border-line bg-raised px-3 py-2 hover:border-ink">
                    <span className="block font-semibold underline">{label}</span>
                    <span className="text-sm text-ink-soft">{hint}</span>
                  </Link>
                </li>
              ))}
            </ul>
          </section>
        ))}
      </div>
    </div>
  );
}

/** Above a new form: which starting figures fill it, and the others it could start from. */
export function StartFrom({ rigId, kind, chosen }: { rigId: string; kind: GearKind; chosen: string }) {
  const variants = startingVariants(kind);
  return (
    <>
      <PageHeader title={`New ${KIND_WORD[kind].toLowerCase()}`}>
        Its figures are starting figures: each is marked assumed until you type your own, or untick the mark because you measured the same.
      </PageHeader>
      {variants.length > 1 ? (
        <nav aria-label="Starting figures" className="mb-6 flex flex-wrap items-center gap-2">
          <span className="font-semibold">Start from</span>
          {variants.map(({ variant, label }) => (
            <Link
              key={variant}
              href={paths.newGear(rigId, kind, variant)}
              aria-current={variant === chosen ? "true" : undefined}
              className={variant === chosen ? "border-2 border-ink bg-mark px-3 py-1.5 font-semibold text-mark-ink" : "border-2 border-line bg-raised px-3 py-1.5 hover:border-ink"}
            >
              {label}
            </Link>
          ))}
        </nav>
      ) : null}
    </>
  );
}
