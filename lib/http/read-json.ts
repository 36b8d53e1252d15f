import type { z } from "zod";
import { AppError, fieldFault, type FieldFault } from "@/lib/errors";

const MOST_BYTES = 1_048_576;

/**
 * A request's JSON body, read through a schema.
 * @throws AppError too-large over 1 MiB, wrong-type when it is not JSON, bad-request naming each field.
 */
export async function readJson<S extends z.ZodType>(request: Request, schema: S): Promise<z.output<S>> {
  const type = request.headers.get("content-type") ?? "";
  if (!/^application\/([a-z0-9.+-]+\+)?json\b/i.test(type)) throw new AppError("wrong-type");
  const text = await readText(request);
  let data: unknown;
  try {
    data = JSON.parse(text);
  } catch (cause) {
    throw new AppError("bad-request", { userMessage: "The body is not valid JSON.", cause, fields: [fieldFault([], "Not valid JSON.")] });
  }
  return parseOrThrow(schema, data);
}

/** The same check for data that is already at hand. */
export function parseOrThrow<S extends z.ZodType>(schema: S, data: unknown): z.output<S> {
  const parsed = schema.safeParse(data);
  if (parsed.success) return parsed.data;
  const fields = parsed.error.issues.flatMap(faultsOf).slice(0, 50);
  const named = fields[0]?.field ? ` (${fields[0].field})` : "";
  throw new AppError("bad-request", { userMessage: `${fields[0]?.detail ?? "Some of this cannot be read."}${named}`, fields });
}

function faultsOf(issue: z.core.$ZodIssue): FieldFault[] {
  if (issue.code === "unrecognized_keys") return issue.keys.map((key) => fieldFault([...issue.path, key], "There is no such field."));
  // The schema library speaks of types; a person wants to know that something is missing.
  const isMissing = issue.code === "invalid_type" && issue.message.endsWith("received undefined");
  return [fieldFault(issue.path, isMissing ? "This is missing." : issue.message)];
}

async function readText(request: Request): Promise<string> {
  if (Number(request.headers.get("content-length") ?? 0) > MOST_BYTES) throw tooLarge();
  if (!request.body) return "";
  const chunks: Uint8Array[] = [];
  let size = 0;
  const reader = request.body.getReader();
  for (;;) {
    const { done, value } = await reader.read();
    if (done) break;
    size += value.byteLength;
    if (size > MOST_BYTES) {
      await reader.cancel();
      throw tooLarge();
    }
    chunks.push(value);
  }
  return new TextDecoder().decode(Buffer.concat(chunks));
}

function tooLarge(): AppError {
  return new AppError("too-large", { userMessage: "A request may hold at most 1 MB." });
}
