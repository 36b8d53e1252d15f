/** One field of a refused request, as in RFC 9457 problem details. */
export interface FieldFault {
  field: string;
  pointer: string;
  detail: string;
}

export interface Problem {
  title: string;
  status: number;
  detail: string;
  errors?: FieldFault[];
  [extension: string]: unknown;
}

/** A request the server refused, with its reasons. `status` 0: it never arrived. */
export class ProblemError extends Error {
  constructor(readonly status: number, readonly problem: Problem) {
    super(problem.detail || problem.title);
    this.name = "ProblemError";
  }
}

const unreachable: Problem = {
  title: "No answer from the server",
  status: 0,
  detail: "The server did not answer. What you typed is still here; try again in a moment.",
};

/**
 * Sends JSON and reads JSON.
 * @throws ProblemError for every refusal and for a server that does not answer.
 */
export async function fetchJson<T>(url: string, init: { method?: string; body?: unknown; signal?: AbortSignal; keepalive?: boolean } = {}): Promise<T> {
  let response: Response;
  try {
    response = await fetch(url, {
      method: init.method ?? (init.body === undefined ? "GET" : "POST"),
      headers: init.body === undefined ? { accept: "application/json" } : { accept: "application/json", "content-type": "application/json" },
      body: init.body === undefined ? undefined : JSON.stringify(init.body),
      signal: init.signal,
      keepalive: init.keepalive,
      credentials: "same-origin",
    });
  } catch (cause) {
    if (init.signal?.aborted) throw cause;
    throw new ProblemError(0, unreachable);
  }
  const text = await response.text();
  const data: unknown = text ? safeParse(text) : null;
  if (!response.ok) {
    const problem = isProblem(data) ? data : { title: response.statusText, status: response.status, detail: "The server refused this without saying why." };
    throw new ProblemError(response.status, problem);
  }
  return data as T;
}

function safeParse(text: string): unknown {
  try {
    return JSON.parse(text);
  } catch {
    return null;
  }
}

function isProblem(data: unknown): data is Problem {
  return typeof data === "object" && data !== null && "title" in data && "status" in data;
}
