import { pingDatabase } from "@/lib/data/ping-database";
import { handleOpen, json } from "@/lib/http/handle";

export const dynamic = "force-dynamic";

/** Whether the server answers and its database can be read. */
export const GET = handleOpen(async () => {
  await pingDatabase();
  return json({ status: "ok" });
});
