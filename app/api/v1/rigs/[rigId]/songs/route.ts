import { requireApiActor } from "@/lib/auth/require-actor";
import { createSong } from "@/lib/data/create-song";
import { listSongs } from "@/lib/data/list-songs";
import { requireRight } from "@/lib/data/require-right";
import { handle, json } from "@/lib/http/handle";
import { readJson } from "@/lib/http/read-json";
import { songCreateSchema } from "@/lib/schemas/song";

type Params = { rigId: string };

export const GET = handle<Params>(async (_request, { rigId }) => json({ songs: await listSongs(await requireApiActor(), rigId) }));

export const POST = handle<Params>(async (request, { rigId }) => {
  const actor = await requireApiActor();
  await requireRight(actor, rigId, "editSongs");
  const { copyFrom, ...fields } = await readJson(request, songCreateSchema);
  return json({ song: await createSong(actor, rigId, fields, copyFrom ?? null) }, 201);
});
