import { requireApiActor } from "@/lib/auth/require-actor";
import { createSet } from "@/lib/data/create-set";
import { listSets } from "@/lib/data/list-sets";
import { requireRight } from "@/lib/data/require-right";
import { handle, json } from "@/lib/http/handle";
import { readJson } from "@/lib/http/read-json";
import { setCreateSchema } from "@/lib/schemas/set";

type Params = { rigId: string };

export const GET = handle<Params>(async (_request, { rigId }) => json({ sets: await listSets(await requireApiActor(), rigId) }));

export const POST = handle<Params>(async (request, { rigId }) => {
  const actor = await requireApiActor();
  await requireRight(actor, rigId, "editSets");
  const { name } = await readJson(request, setCreateSchema);
  return json({ set: await createSet(actor, rigId, name) }, 201);
});
