"use client";
import { useRouter } from "next/navigation";
import { useEffect, useRef, useState } from "react";
import { fetchJson, ProblemError } from "@/lib/client/fetch-json";
import { startingGear, startingVariants } from "@/lib/core/electrics/starting-figures";
import { paths } from "@/lib/paths";
import type { Can } from "@/lib/rights/can";
import type { Gear } from "@/lib/schemas/gear";
import { Button } from "../ui/button";
import { EmptyState } from "../ui/empty-state";
import { Notice } from "../ui/notice";
import { firstLeads } from "./first-leads";

const QUESTIONS = [
  { kind: "pad", question: "What do you hit?" },
  { kind: "conditioner", question: "What turns it into a pulse?" },
  { kind: "voice", question: "What should sound?" },
] as const;

interface FirstRunProps {
  rigId: string;
  gear: readonly Gear[];
  can: Can;
  onPlug: (outputId: string, inputId: string) => void;
}

/** One question at a time, each answered by gear with starting figures; after the last the run is plugged. Where the gear was there before: how to plug it. */
export function FirstRun({ rigId, gear, can, onPlug }: FirstRunProps) {
  const router = useRouter();
  const [busy, setBusy] = useState(false);
  const [refusal, setRefusal] = useState<string | null>(null);
  const missing = QUESTIONS.findIndex(({ kind }) => !gear.some((item) => item.kind === kind));
  const next = QUESTIONS[missing];
  const answeredHere = useRef(false);

  useEffect(() => {
    if (missing >= 0 || !answeredHere.current) return;
    answeredHere.current = false;
    for (const [outputId, inputId] of firstLeads(gear)) onPlug(outputId, inputId);
  }, [gear, missing, onPlug]);

  if (!next) {
    return (
      <div className="mb-5">
        <EmptyState title="Plug the first lead">
          Drag a pad’s jack onto a conditioner’s <em>Pad in</em>. Or tap one, then the other. Or move to a jack with Tab and press Enter for the list of what it could go to, each with the verdict it would get.
        </EmptyState>
      </div>
    );
  }
  if (!can.editGear) return <EmptyState title="No gear to plug yet">The performer or a collaborator adds it.</EmptyState>;

  async function add(kind: (typeof QUESTIONS)[number]["kind"], variant: string) {
    setBusy(true);
    setRefusal(null);
    try {
      await fetchJson(paths.api.gearList(rigId), { body: startingGear(kind, variant, () => crypto.randomUUID()) });
      answeredHere.current = true;
      router.refresh();
    } catch (error) {
      if (!(error instanceof ProblemError)) throw error;
      setRefusal(error.problem.detail);
    } finally {
      setBusy(false);
    }
  }

  return (
    <div className="mb-5">
      <EmptyState
        title={`${missing + 1} of ${QUESTIONS.length}: ${next.question}`}
        action={
          <ul className="flex flex-wrap gap-3">
            {startingVariants(next.kind).map((item) => (
              <li key={item.variant}><Button disabled={busy} title={item.hint} onClick={() => void add(next.kind, item.variant)}>{item.label}</Button></li>
            ))}
          </ul>
        }
      >
        After the third the run is plugged, and its verdicts say what to measure first. Each comes with figures to start from, marked as assumed until you measure your own. Name and figures can be changed under Gear.
      </EmptyState>
      {refusal ? <Notice tone="error" live>{refusal}</Notice> : null}
    </div>
  );
}
