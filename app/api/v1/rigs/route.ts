import { requireApiActor } from "@/lib/auth/require-actor";
import { createRig } from "@/lib/data/create-rig";
import { listRigs } from "@/lib/data/list-rigs";
import { handle, json } from "@/lib/http/handle";
import { readJson } from "@/lib/http/read-json";
import { rigFieldsSchema } from "@/lib/schemas/rig";

export const GET = handle(async () => json({ rigs: await listRigs(await requireApiActor()) }));

export const POST = handle(async (request) => {
  const actor = await requireApiActor();
  const { name } = await readJson(request, rigFieldsSchema);
  return json({ rig: await createRig(actor, name) }, 201);
});
