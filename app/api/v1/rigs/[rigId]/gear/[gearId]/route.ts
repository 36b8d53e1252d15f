import { requireApiActor } from "@/lib/auth/require-actor";
import { loadGear } from "@/lib/data/load-gear";
import { replaceGear } from "@/lib/data/replace-gear";
import { requireRight } from "@/lib/data/require-right";
import { handle, json } from "@/lib/http/handle";
import { readJson } from "@/lib/http/read-json";
import { gearReplaceSchema } from "@/lib/schemas/gear";

type Params = { rigId: string; gearId: string };

export const GET = handle<Params>(async (_request, { rigId, gearId }) => json({ gear: await loadGear(await requireApiActor(), rigId, gearId) }));

export const PUT = handle<Params>(async (request, { rigId, gearId }) => {
  const actor = await requireApiActor();
  await requireRight(actor, rigId, "editDesk");
  const { baseRevision, gear } = await readJson(request, gearReplaceSchema);
  return json({ gear: await replaceGear(actor, rigId, gearId, baseRevision, gear) });
});
