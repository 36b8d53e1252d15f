import { describeApi } from "@/lib/http/describe-api";
import { handleOpen, json } from "@/lib/http/handle";

/** The API's own description, OpenAPI 3.1. */
export const GET = handleOpen(async (request) => json(describeApi(new URL(request.url).origin)));
