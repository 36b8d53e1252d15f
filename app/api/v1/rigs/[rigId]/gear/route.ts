import { requireApiActor } from "@/lib/auth/require-actor";
import { createGear } from "@/lib/data/create-gear";
import { listGear } from "@/lib/data/list-gear";
import { requireRight } from "@/lib/data/require-right";
import { handle, json } from "@/lib/http/handle";
import { readJson } from "@/lib/http/read-json";
import { gearInputSchema } from "@/lib/schemas/gear";

type Params = { rigId: string };

export const GET = handle<Params>(async (_request, { rigId }) => json({ gear: await listGear(await requireApiActor(), rigId) }));

export const POST = handle<Params>(async (request, { rigId }) => {
  const actor = await requireApiActor();
  await requireRight(actor, rigId, "editDesk");
  const input = await readJson(request, gearInputSchema);
  return json({ gear: await createGear(actor, rigId, input) }, 201);
});
