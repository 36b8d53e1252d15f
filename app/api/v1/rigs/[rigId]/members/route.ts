import { requireApiActor } from "@/lib/auth/require-actor";
import { listMembers } from "@/lib/data/list-members";
import { handle, json } from "@/lib/http/handle";

export const GET = handle<{ rigId: string }>(async (_request, { rigId }) => json({ members: await listMembers(await requireApiActor(), rigId) }));
