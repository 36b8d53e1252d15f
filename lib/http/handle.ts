import { AppError } from "@/lib/errors";
import { problemResponse } from "./problem";

type Params = Record<string, string>;
interface Context<P extends Params> {
  params: Promise<P>;
}

/** A route handler that turns every refusal into problem details and refuses cross-site writes. */
export function handle<P extends Params = Params>(work: (request: Request, params: P) => Promise<Response>) {
  return async (request: Request, context: Context<P>): Promise<Response> => {
    try {
      if (request.method !== "GET" && request.method !== "HEAD") requireSameOrigin(request);
      return await work(request, await context.params);
    } catch (error) {
      return problemResponse(error);
    }
  };
}

/** An open calculator: no account, no cookie used, so any page may ask. */
export function handleOpen(work: (request: Request) => Promise<Response>) {
  return async (request: Request): Promise<Response> => {
    try {
      return await work(request);
    } catch (error) {
      return problemResponse(error);
    }
  };
}

function requireSameOrigin(request: Request): void {
  const site = request.headers.get("sec-fetch-site");
  const origin = request.headers.get("origin");
  const foreignSite = site !== null && site !== "same-origin" && site !== "none";
  const foreignOrigin = origin !== null && hostOf(origin) !== request.headers.get("host");
  if (foreignSite || foreignOrigin) throw new AppError("forbidden", { userMessage: "This request came from another site and was refused." });
}

function hostOf(origin: string): string | null {
  try {
    return new URL(origin).host;
  } catch {
    return null;
  }
}

export function json(body: unknown, status = 200): Response {
  return new Response(JSON.stringify(body), { status, headers: { "content-type": "application/json", "cache-control": "no-store" } });
}
