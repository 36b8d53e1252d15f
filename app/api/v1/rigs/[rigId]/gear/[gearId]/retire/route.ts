import { requireApiActor } from "@/lib/auth/require-actor";
import { requireRight } from "@/lib/data/require-right";
import { retireGear } from "@/lib/data/retire-gear";
import { handle, json } from "@/lib/http/handle";
import { readJson } from "@/lib/http/read-json";
import { gearRetireSchema } from "@/lib/schemas/gear";

export const POST = handle<{ rigId: string; gearId: string }>(async (request, { rigId, gearId }) => {
  const actor = await requireApiActor();
  await requireRight(actor, rigId, "editDesk");
  const { retired } = await readJson(request, gearRetireSchema);
  return json({ gear: await retireGear(actor, rigId, gearId, retired) });
});
