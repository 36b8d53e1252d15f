import type { Metadata } from "next";
import { GearForm } from "@/components/gear/gear-form";
import { GearView } from "@/components/gear/gear-view";
import { toSupplyChoices } from "@/components/gear/supply-choices";
import { PageHeader } from "@/components/ui/page-header";
import { Tape } from "@/components/ui/tape";
import { requireActor } from "@/lib/auth/require-actor";
import { listGear } from "@/lib/data/list-gear";
import { loadGear } from "@/lib/data/load-gear";
import { loadRig } from "@/lib/data/load-rig";
import { paths } from "@/lib/paths";
import { rightToEditGear } from "@/lib/rights/can";
import { orNotFound } from "@/lib/http/or-not-found";

interface GearPageProps {
  params: Promise<{ rigId: string; gearId: string }>;
  searchParams: Promise<{ edit?: string | string[]; saved?: string | string[] }>;
}

export async function generateMetadata({ params, searchParams }: GearPageProps): Promise<Metadata> {
  const { rigId, gearId } = await params;
  const { edit } = await searchParams;
  const { name } = await orNotFound(loadGear(await requireActor(paths.gear(rigId, gearId)), rigId, gearId));
  return { title: edit === "1" ? `Edit ${name}` : name };
}

export default async function GearPage({ params, searchParams }: GearPageProps) {
  const { rigId, gearId } = await params;
  const { edit, saved } = await searchParams;
  const actor = await requireActor(paths.gear(rigId, gearId));
  const { can } = await orNotFound(loadRig(actor, rigId));
  const gear = await orNotFound(loadGear(actor, rigId, gearId));
  const others = await listGear(actor, rigId, { retired: "with" });
  const mayEdit = can[rightToEditGear(gear.kind)];
  if (edit !== "1" || !mayEdit) {
    return <GearView rigId={rigId} gear={gear} others={others} mayEdit={mayEdit} justSaved={saved === String(gear.revision)} />;
  }
  return (
    <div className="mx-auto max-w-5xl">
      <PageHeader title={<Tape size="large">{gear.name}</Tape>}>Typing a figure says you know it; untick “assumed” where you measured the same.</PageHeader>
      <GearForm
        key={gear.id}
        rigId={rigId}
        gear={gear}
        start={gear}
        draftId={gear.id}
        supplies={toSupplyChoices(others.filter((item) => !item.retired || item.id === gear.supplyId))}
        pads={others.filter((item) => item.kind === "pad" && !item.retired)}
      />
    </div>
  );
}
