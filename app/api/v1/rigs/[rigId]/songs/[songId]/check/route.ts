import { requireApiActor } from "@/lib/auth/require-actor";
import { checkDraft } from "@/lib/data/check-draft";
import { requireRight } from "@/lib/data/require-right";
import { handle, json } from "@/lib/http/handle";
import { readJson } from "@/lib/http/read-json";
import { patchCheckSchema } from "@/lib/schemas/patch";

export const POST = handle<{ rigId: string; songId: string }>(async (request, { rigId, songId }) => {
  const actor = await requireApiActor();
  await requireRight(actor, rigId, "seeRig");
  const { patch, from } = await readJson(request, patchCheckSchema);
  return json(await checkDraft(actor, rigId, songId, patch, from ?? null));
});
