import { requireApiActor } from "@/lib/auth/require-actor";
import { copyGear } from "@/lib/data/copy-gear";
import { handle, json } from "@/lib/http/handle";

export const POST = handle<{ rigId: string; gearId: string }>(async (_request, { rigId, gearId }) =>
  json({ gear: await copyGear(await requireApiActor(), rigId, gearId) }, 201),
);
