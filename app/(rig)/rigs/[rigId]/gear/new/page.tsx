import { randomUUID } from "node:crypto";
import { notFound } from "next/navigation";
import { GearForm } from "@/components/gear/gear-form";
import { StartFrom, StartingChooser } from "@/components/gear/starting-chooser";
import { startForRig } from "@/components/gear/start-for-rig";
import { toSupplyChoices } from "@/components/gear/supply-choices";
import { requireActor } from "@/lib/auth/require-actor";
import { startingSourcesOf, startingVariants } from "@/lib/core/electrics/starting-figures";
import { listGear } from "@/lib/data/list-gear";
import { loadRig } from "@/lib/data/load-rig";
import { paths } from "@/lib/paths";
import { rightToEditGear } from "@/lib/rights/can";
import { GEAR_KINDS } from "@/lib/schemas/gear";
import { orNotFound } from "@/lib/http/or-not-found";

export const metadata = { title: "New gear" };

interface NewGearProps {
  params: Promise<{ rigId: string }>;
  searchParams: Promise<{ kind?: string | string[]; variant?: string | string[] }>;
}

export default async function NewGearPage({ params, searchParams }: NewGearProps) {
  const { rigId } = await params;
  const asked = await searchParams;
  const actor = await requireActor(paths.newGear(rigId));
  const { can } = await orNotFound(loadRig(actor, rigId));
  const kinds = GEAR_KINDS.filter((kind) => can[rightToEditGear(kind)]);
  const kind = kinds.find((known) => known === asked.kind);
  if (!kind) {
    if (asked.kind !== undefined) notFound();
    return <StartingChooser rigId={rigId} kinds={kinds} />;
  }
  const variants = startingVariants(kind);
  const variant = variants.find((known) => known.variant === asked.variant) ?? variants[0];
  if (!variant) notFound();
  const gear = await listGear(actor, rigId, { retired: "without" });
  const start = startForRig(variant, gear, randomUUID);
  return (
    <div className="mx-auto max-w-5xl">
      <StartFrom rigId={rigId} kind={kind} chosen={variant.variant} />
      <GearForm
        key={`${kind}/${variant.variant}`}
        rigId={rigId}
        gear={null}
        start={start}
        sources={startingSourcesOf(kind, variant.variant, start.jacks.map((jack) => jack.id))}
        draftId={`new:${kind}:${variant.variant}`}
        supplies={toSupplyChoices(gear)}
        pads={gear.filter((item) => item.kind === "pad")}
      />
    </div>
  );
}
