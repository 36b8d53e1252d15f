import { AppError } from "@/lib/errors";

/** RFC 9457 problem details for a refusal; anything unknown is logged and told as one calm sentence. */
export function problemResponse(thrown: unknown): Response {
  const error = thrown instanceof AppError ? thrown : unexpected(thrown);
  const body = {
    type: "about:blank",
    title: error.title,
    status: error.status,
    detail: error.userMessage,
    ...(error.fields ? { errors: error.fields } : {}),
    ...error.extra,
  };
  return new Response(JSON.stringify(body), {
    status: error.status,
    headers: { "content-type": "application/problem+json", "cache-control": "no-store", ...error.headers },
  });
}

function unexpected(thrown: unknown): AppError {
  console.error("unexpected error", thrown);
  return new AppError("internal", { userMessage: "Something went wrong on the server. What you sent was not kept; try again in a moment.", cause: thrown });
}
