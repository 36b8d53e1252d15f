import { requireApiActor } from "@/lib/auth/require-actor";
import { loadPatch } from "@/lib/data/load-patch";
import { requireRight } from "@/lib/data/require-right";
import { savePatch } from "@/lib/data/save-patch";
import { handle, json } from "@/lib/http/handle";
import { readJson } from "@/lib/http/read-json";
import { patchSaveSchema } from "@/lib/schemas/patch";

type Params = { rigId: string; songId: string };

export const GET = handle<Params>(async (_request, { rigId, songId }) => json(await loadPatch(await requireApiActor(), rigId, songId)));

export const PUT = handle<Params>(async (request, { rigId, songId }) => {
  const actor = await requireApiActor();
  await requireRight(actor, rigId, "editPatch");
  const { baseRevision, patch } = await readJson(request, patchSaveSchema);
  return json(await savePatch(actor, rigId, songId, baseRevision, patch));
});
