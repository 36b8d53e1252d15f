import type { Can } from "@/lib/rights/can";
import type { Gear, GearKind } from "@/lib/schemas/gear";
import { paths } from "@/lib/paths";
import { ButtonLink } from "../ui/button";
import { EmptyState } from "../ui/empty-state";

const QUESTIONS: readonly { kind: GearKind; question: string; text: string; action: string }[] = [
  { kind: "pad", question: "What do you hit?", text: "A foam pad, a piezo disc, a foot switch: it comes with figures to start from.", action: "Add a pad" },
  { kind: "conditioner", question: "What turns it into a pulse?", text: "A circuit known by its parts, or a box known by its readings.", action: "Add a conditioner" },
  { kind: "voice", question: "What should sound?", text: "A drum voice with an input that waits for a pulse.", action: "Add a voice" },
];

/** One question at a time until a first run can be plugged; then how to plug it. */
export function FirstRun({ rigId, gear, can }: { rigId: string; gear: readonly Gear[]; can: Can }) {
  const missing = QUESTIONS.findIndex(({ kind }) => !gear.some((item) => item.kind === kind));
  const next = QUESTIONS[missing];
  if (next) {
    if (!can.editGear) return <EmptyState title="No gear to plug yet">The performer or a collaborator adds it.</EmptyState>;
    return (
      <div className="mb-5">
        <EmptyState title={`${missing + 1} of ${QUESTIONS.length}: ${next.question}`} action={<ButtonLink tone="primary" href={paths.newGear(rigId, next.kind)}>{next.action}</ButtonLink>}>{next.text}</EmptyState>
      </div>
    );
  }
  return (
    <div className="mb-5">
      <EmptyState title="Plug the first lead">
        Drag a pad’s jack onto a conditioner’s <em>Pad in</em>. Or tap one, then the other. Or move to a jack with Tab and press Enter for the list of what it could go to, each with the verdict it would get.
      </EmptyState>
    </div>
  );
}
