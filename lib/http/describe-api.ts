import { z } from "zod";
import { signUpSchema } from "@/lib/schemas/account";
import { changeoverRequestSchema } from "@/lib/schemas/changeover";
import { conditionerRequestSchema } from "@/lib/schemas/conditioner";
import { connectionRequestSchema } from "@/lib/schemas/connection";
import { gearInputSchema, gearReplaceSchema, gearRetireSchema } from "@/lib/schemas/gear";
import { orderRequestSchema } from "@/lib/schemas/order";
import { patchCheckSchema, patchSaveSchema } from "@/lib/schemas/patch";
import { rigFieldsSchema } from "@/lib/schemas/rig";
import { setCreateSchema, setOrderSchema } from "@/lib/schemas/set";
import { songCreateSchema, songFieldsSchema } from "@/lib/schemas/song";
import type { Right } from "@/lib/rights/can";

type Method = "get" | "post" | "put" | "patch" | "delete";

/** One operation of the API: what it takes, what it answers with, and who may. */
export interface Operation {
  method: Method;
  path: string;
  summary: string;
  /** `open`: anyone; `account`: anyone signed in; else the right it asks for in the rig. */
  right: "open" | "account" | Right;
  body?: z.ZodType;
  ok: 200 | 201 | 204;
  /** Media type of a good answer; JSON unless stated. */
  type?: string;
  /** Optional query parameters and what they may be. */
  query?: Record<string, readonly string[]>;
  /** Refusals beyond 400, 401 and 404. */
  refusals?: number[];
}

const rig = "/api/v1/rigs/{rigId}";
const gear = `${rig}/gear/{gearId}`;
const song = `${rig}/songs/{songId}`;

/** Every route of the API. The document, and the test of every route × every role, are made from this table. */
export const OPERATIONS: readonly Operation[] = [
  { method: "get", path: "/api/v1/health", summary: "Whether the server answers", right: "open", ok: 200 },
  { method: "get", path: "/api/v1/openapi.json", summary: "This document", right: "open", ok: 200 },
  { method: "post", path: "/api/v1/connection", summary: "One or more outputs into one or more inputs: volts and verdicts, worst case", right: "open", body: connectionRequestSchema, ok: 200, refusals: [413, 415, 429] },
  { method: "post", path: "/api/v1/conditioner", summary: "A pad and its trigger conditioner: levels, pulses, envelope, findings", right: "open", body: conditionerRequestSchema, ok: 200, refusals: [413, 415, 429] },
  { method: "post", path: "/api/v1/changeover", summary: "The fewest jacks to touch from one patch to another, step by step", right: "open", body: changeoverRequestSchema, ok: 200, refusals: [413, 415, 429] },
  { method: "post", path: "/api/v1/order", summary: "The order of songs with the least total changeover", right: "open", body: orderRequestSchema, ok: 200, refusals: [413, 415, 422, 429] },
  { method: "post", path: "/api/v1/accounts", summary: "Make an account", right: "open", body: signUpSchema, ok: 201, refusals: [409] },
  { method: "get", path: "/api/v1/rigs", summary: "The rigs you are in", right: "account", ok: 200 },
  { method: "post", path: "/api/v1/rigs", summary: "Make a rig of your own", right: "account", body: rigFieldsSchema, ok: 201 },
  { method: "get", path: rig, summary: "A rig and what you may do in it", right: "seeRig", ok: 200 },
  { method: "patch", path: rig, summary: "Rename a rig", right: "manageRig", body: rigFieldsSchema, ok: 200 },
  { method: "get", path: `${rig}/members`, summary: "The people of a rig", right: "seeRig", ok: 200 },
  { method: "get", path: `${rig}/gear`, summary: "All gear of a rig, retired gear too", right: "seeRig", ok: 200 },
  { method: "post", path: `${rig}/gear`, summary: "Add gear (desk channels: any role)", right: "editGear", body: gearInputSchema, ok: 201, refusals: [422] },
  { method: "get", path: gear, summary: "One piece of gear", right: "seeRig", ok: 200 },
  { method: "put", path: gear, summary: "Replace a piece of gear's figures", right: "editGear", body: gearReplaceSchema, ok: 200, refusals: [409, 422] },
  { method: "post", path: `${gear}/copy`, summary: "Copy a piece of gear", right: "editGear", ok: 201 },
  { method: "post", path: `${gear}/retire`, summary: "Take gear out of use, or back into it", right: "editGear", body: gearRetireSchema, ok: 200 },
  { method: "get", path: `${rig}/songs`, summary: "The songs of a rig", right: "seeRig", ok: 200 },
  { method: "post", path: `${rig}/songs`, summary: "Add a song, empty or with another song's patch", right: "editSongs", body: songCreateSchema, ok: 201, refusals: [422] },
  { method: "get", path: song, summary: "One song", right: "seeRig", ok: 200 },
  { method: "patch", path: song, summary: "Change a song's title, tempo and notes", right: "editSongs", body: songFieldsSchema, ok: 200 },
  { method: "delete", path: song, summary: "Delete a song with its patch", right: "editSongs", ok: 204 },
  { method: "get", path: `${song}/patch`, summary: "A song's patch with the check of every lead", right: "seeRig", ok: 200 },
  { method: "put", path: `${song}/patch`, summary: "Save a song's patch", right: "editPatch", body: patchSaveSchema, ok: 200, refusals: [409, 422] },
  { method: "post", path: `${song}/check`, summary: "Check a draft patch without saving it", right: "seeRig", body: patchCheckSchema, ok: 200 },
  { method: "get", path: `${song}/sheet.pdf`, summary: "The patch sheet of a song", right: "print", ok: 200, type: "application/pdf", query: { paper: ["a4", "letter"] }, refusals: [400] },
  { method: "get", path: `${rig}/sets`, summary: "The set lists of a rig", right: "seeRig", ok: 200 },
  { method: "post", path: `${rig}/sets`, summary: "Add a set list", right: "editSets", body: setCreateSchema, ok: 201 },
  { method: "get", path: `${rig}/sets/{setId}`, summary: "One set list", right: "seeRig", ok: 200 },
  { method: "put", path: `${rig}/sets/{setId}`, summary: "Replace a set list's order", right: "editSets", body: setOrderSchema, ok: 200, refusals: [409, 422] },
];

const REFUSED: Record<number, string> = {
  400: "Something in the request cannot be read; each field is named",
  401: "Sign in first",
  403: "Your role does not allow it",
  404: "There is nothing here, or not for you",
  409: "It changed meanwhile, or is there already",
  413: "Over 1 MB",
  415: "Not JSON",
  422: "It can be read but not done; each field is named",
  429: "Too many calls; see Retry-After",
};

const problemSchema = z
  .object({
    type: z.string(),
    title: z.string(),
    status: z.int(),
    detail: z.string(),
    errors: z.array(z.object({ field: z.string(), pointer: z.string(), detail: z.string() })).optional(),
  })
  .meta({ id: "Problem", description: "RFC 9457 problem details." });

/** The OpenAPI 3.1 document of this API, made from the same schemas the handlers parse with. */
export function describeApi(serverUrl: string): Record<string, unknown> {
  const components: Record<string, unknown> = {};
  const schemaOf = (schema: z.ZodType): unknown => {
    const { $schema: _dialect, $defs, ...rest } = z.toJSONSchema(schema, { io: "input", target: "draft-2020-12", unrepresentable: "any" }) as Record<string, unknown> & { $defs?: Record<string, unknown> };
    for (const [name, definition] of Object.entries($defs ?? {})) components[name] = withComponentRefs(definition);
    const { id } = (schema.meta() ?? {}) as { id?: string };
    if (!id) return withComponentRefs(rest);
    components[id] = withComponentRefs(rest);
    return { $ref: `#/components/schemas/${id}` };
  };
  const problem = schemaOf(problemSchema);
  const paths: Record<string, Record<string, unknown>> = {};
  for (const operation of OPERATIONS) {
    paths[operation.path] = { ...paths[operation.path], [operation.method]: describe(operation, schemaOf, problem) };
  }
  return {
    openapi: "3.1.0",
    info: { title: "Knockwire", version: "1", description: "Plans and checks the patches, songs and sets of home-made drum rigs. SI units; the unit stands in the field's name." },
    servers: [{ url: serverUrl }],
    paths,
    components: {
      schemas: components,
      securitySchemes: { session: { type: "apiKey", in: "cookie", name: "next-auth.session-token" } },
    },
  };
}

function describe(operation: Operation, schemaOf: (schema: z.ZodType) => unknown, problem: unknown): Record<string, unknown> {
  const { method, path, summary, right, body, ok, type = "application/json", query = {}, refusals = [] } = operation;
  const names = [...path.matchAll(/\{(\w+)\}/g)].map((match) => match[1] ?? "");
  const isOpen = right === "open";
  const codes = new Set([...(body ? [400] : []), ...(isOpen ? [] : [401]), ...(names.length > 0 ? [403, 404] : []), ...refusals]);
  const refused = [...codes].sort((a, b) => a - b).map((code) => [String(code), { description: REFUSED[code] ?? "Refused", content: { "application/problem+json": { schema: problem } } }]);
  return {
    operationId: `${method}${path.replace("/api/v1", "").replace(/[^A-Za-z0-9]+(\w?)/g, (_all, next: string) => next.toUpperCase())}`,
    summary,
    description: isOpen ? "Open to anyone." : right === "account" ? "For anyone signed in." : `Asks for the right “${right}” in the rig.`,
    ...(names.length > 0
      ? {
          parameters: [
            ...names.map((name) => ({ name, in: "path", required: true, schema: { type: "string", maxLength: 64 } })),
            ...Object.entries(query).map(([name, values]) => ({ name, in: "query", required: false, schema: { type: "string", enum: values } })),
          ],
        }
      : {}),
    ...(body ? { requestBody: { required: true, content: { "application/json": { schema: schemaOf(body) } } } } : {}),
    responses: {
      [String(ok)]: ok === 204 ? { description: "Done" } : { description: "Done", content: { [type]: { schema: type === "application/json" ? { type: "object" } : { type: "string", format: "binary" } } } },
      ...Object.fromEntries(refused),
    },
    security: isOpen ? [] : [{ session: [] }],
  };
}

function withComponentRefs(node: unknown): unknown {
  if (Array.isArray(node)) return node.map(withComponentRefs);
  if (typeof node !== "object" || node === null) return node;
  return Object.fromEntries(
    Object.entries(node).map(([key, value]) => [key, key === "$ref" && typeof value === "string" ? value.replace("#/$defs/", "#/components/schemas/") : withComponentRefs(value)]),
  );
}
