import clsx from "clsx";
import { ButtonLink } from "@/components/ui/button";
import { EmptyState } from "@/components/ui/empty-state";
import type { Overview } from "@/lib/data/load-overview";
import { paths } from "@/lib/paths";

/** What to do until a first lead is plugged in some song; what is done stays in sight, marked so. */
export function FirstSteps({ overview: { rig, can, gearCounts, songs } }: { overview: Overview }) {
  if (!can.editGear) return <EmptyState title="No lead to check yet">The rig’s performer or a collaborator adds gear and plugs the first song.</EmptyState>;
  const first = songs[0];
  const steps = [
    { question: "What do you hit?", text: "A foam pad, a piezo disc or a foot switch, with figures to start from.", label: "Add a pad", href: paths.newGear(rig.id, "pad"), isDone: gearCounts.pad > 0 },
    { question: "What turns it into a pulse?", text: "A conditioner known by its parts, or a black box known by its readings.", label: "Add a conditioner", href: paths.newGear(rig.id, "conditioner"), isDone: gearCounts.conditioner > 0 },
    { question: "What should sound?", text: "A drum voice and the input that waits for a pulse.", label: "Add a voice", href: paths.newGear(rig.id, "voice"), isDone: gearCounts.voice > 0 },
    { question: "Where do they meet?", text: "A song’s board, where you plug them and see each lead’s verdict.", label: first ? `Open ${first.title}` : "Go to songs", href: first ? paths.board(rig.id, first.id) : paths.songs(rig.id), isDone: false },
  ];
  const next = steps.findIndex((step) => !step.isDone);
  return (
    <section aria-labelledby="first" className="flex flex-col gap-4">
      <h2 id="first" className="text-xl font-bold">The first run, in four steps</h2>
      <ol className="grid gap-4 sm:grid-cols-2">
        {steps.map(({ question, text, label, href, isDone }, index) => (
          <li key={question} aria-current={index === next ? "step" : undefined} className={clsx("flex flex-col items-start gap-2 border-l-8 bg-bench p-4", index === next ? "border-mark" : "border-transparent")}>
            <h3 className="text-lg font-bold">{index + 1}. {question}{isDone ? <span className="text-verdict-good"> Done</span> : null}</h3>
            <p className="text-ink-soft">{text}</p>
            <ButtonLink className="mt-auto max-w-full break-words" tone={index === next ? "primary" : "plain"} href={href}>{isDone ? label.replace("Add a ", "Add another ") : label}</ButtonLink>
          </li>
        ))}
      </ol>
    </section>
  );
}
