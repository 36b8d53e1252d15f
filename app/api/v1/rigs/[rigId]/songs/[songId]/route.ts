import { requireApiActor } from "@/lib/auth/require-actor";
import { deleteSong } from "@/lib/data/delete-song";
import { editSong } from "@/lib/data/edit-song";
import { loadSong } from "@/lib/data/load-song";
import { requireRight } from "@/lib/data/require-right";
import { handle, json } from "@/lib/http/handle";
import { readJson } from "@/lib/http/read-json";
import { songFieldsSchema } from "@/lib/schemas/song";

type Params = { rigId: string; songId: string };

export const GET = handle<Params>(async (_request, { rigId, songId }) => json({ song: await loadSong(await requireApiActor(), rigId, songId) }));

export const PATCH = handle<Params>(async (request, { rigId, songId }) => {
  const actor = await requireApiActor();
  await requireRight(actor, rigId, "editSongs");
  const fields = await readJson(request, songFieldsSchema);
  return json({ song: await editSong(actor, rigId, songId, fields) });
});

export const DELETE = handle<Params>(async (_request, { rigId, songId }) => {
  await deleteSong(await requireApiActor(), rigId, songId);
  return new Response(null, { status: 204 });
});
