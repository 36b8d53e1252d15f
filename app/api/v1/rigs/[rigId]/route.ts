import { requireApiActor } from "@/lib/auth/require-actor";
import { loadRig } from "@/lib/data/load-rig";
import { renameRig } from "@/lib/data/rename-rig";
import { requireRight } from "@/lib/data/require-right";
import { handle, json } from "@/lib/http/handle";
import { readJson } from "@/lib/http/read-json";
import { rigFieldsSchema } from "@/lib/schemas/rig";

type Params = { rigId: string };

export const GET = handle<Params>(async (_request, { rigId }) => json(await loadRig(await requireApiActor(), rigId)));

export const PATCH = handle<Params>(async (request, { rigId }) => {
  const actor = await requireApiActor();
  await requireRight(actor, rigId, "manageRig");
  const { name } = await readJson(request, rigFieldsSchema);
  return json({ rig: await renameRig(actor, rigId, name) });
});
