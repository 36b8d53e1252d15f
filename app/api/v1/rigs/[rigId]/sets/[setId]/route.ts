import { requireApiActor } from "@/lib/auth/require-actor";
import { loadSet } from "@/lib/data/load-set";
import { orderSet } from "@/lib/data/order-set";
import { requireRight } from "@/lib/data/require-right";
import { handle, json } from "@/lib/http/handle";
import { readJson } from "@/lib/http/read-json";
import { setOrderSchema } from "@/lib/schemas/set";

type Params = { rigId: string; setId: string };

export const GET = handle<Params>(async (_request, { rigId, setId }) => json({ set: await loadSet(await requireApiActor(), rigId, setId) }));

export const PUT = handle<Params>(async (request, { rigId, setId }) => {
  const actor = await requireApiActor();
  await requireRight(actor, rigId, "editSets");
  return json({ set: await orderSet(actor, rigId, setId, await readJson(request, setOrderSchema)) });
});
