"use client";

import { useRouter } from "next/navigation";
import { useState } from "react";
import { Button } from "@/components/ui/button";
import { Notice } from "@/components/ui/notice";
import { paths } from "@/lib/paths";
import type { Gear } from "@/lib/schemas/gear";
import { RetireDialog } from "./retire-dialog";
import { useGearActions } from "./use-gear-actions";

/** Copy and retire, on the page of one piece of gear. */
export function GearPageActions({ rigId, gear }: { rigId: string; gear: Gear }) {
  const router = useRouter();
  const { busyId, copy, retire } = useGearActions(rigId);
  const [asking, setAsking] = useState(false);
  const [refusal, setRefusal] = useState<string | null>(null);
  const busy = busyId !== null;

  const copyGear = async () => {
    const outcome = await copy(gear.id);
    if (outcome.ok) router.push(paths.editGear(rigId, outcome.gear.id));
    else setRefusal(outcome.message);
  };
  const setRetired = async (retired: boolean) => {
    const outcome = await retire(gear.id, retired);
    setAsking(false);
    setRefusal(outcome.ok ? null : outcome.message);
  };

  return (
    <>
      <Button disabled={busy} onClick={() => void copyGear()}>Copy</Button>
      {gear.retired
        ? <Button disabled={busy} onClick={() => void setRetired(false)}>Bring back</Button>
        : <Button disabled={busy} onClick={() => setAsking(true)}>Retire</Button>}
      {refusal ? <Notice tone="error" live className="basis-full">{refusal}</Notice> : null}
      <RetireDialog gear={asking ? gear : null} busy={busy} onRetire={() => void setRetired(true)} onCancel={() => setAsking(false)} />
    </>
  );
}
