import { GearList } from "@/components/gear/gear-list";
import { requireActor } from "@/lib/auth/require-actor";
import { listGear } from "@/lib/data/list-gear";
import { loadRig } from "@/lib/data/load-rig";
import { paths } from "@/lib/paths";
import { orNotFound } from "@/lib/http/or-not-found";

export const metadata = { title: "Gear" };

export default async function GearPage({ params }: { params: Promise<{ rigId: string }> }) {
  const { rigId } = await params;
  const actor = await requireActor(paths.gearList(rigId));
  const { can } = await orNotFound(loadRig(actor, rigId));
  const gear = await listGear(actor, rigId, { retired: "with" });
  return <GearList rigId={rigId} gear={gear} can={can} />;
}
