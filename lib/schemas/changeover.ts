import { z } from "zod";
import { MOST_CONNECTIONS } from "@/lib/core/planning/changeover/assign-leads";

/** A jack, knob or channel in the open calculator: any short text that names it. */
const ref = z.string().min(1, "This cannot be empty.").max(120, "At most 120 characters.");
const leadRef = z.union([ref, z.number().int().min(0).max(1_000_000)], { error: "Name the lead by a whole number or a short text." });
const position = z.union([z.string().max(60), z.number(), z.boolean()], { error: "Give a position: text, a number, or true or false." });
const seconds = z.number({ error: "Give a number of seconds." }).min(0, "This must be zero or more (seconds).").max(3600, "This must be at most an hour.");
const metres = z.number().min(-1000).max(1000);
const ohms = z.number().min(0).max(1e15);

/** `lead` is read in `from`; which lead serves a connection of `to` is the answer. */
const connection = z.strictObject({ output: ref, input: ref, lead: leadRef.optional() }).meta({ id: "PluggedLead" });
const connections = () => z.array(connection).max(MOST_CONNECTIONS, `At most ${MOST_CONNECTIONS} connections.`);
const knobs = () => z.record(ref, position).refine((all) => Object.keys(all).length <= 1000, { error: "At most 1,000 knobs." });

const jackFacts = { name: ref.optional(), connector: ref.optional(), xM: metres.optional(), yM: metres.optional() };

export const paceSchema = z
  .strictObject({ endS: seconds.optional(), knobS: seconds.optional(), fetchS: seconds.optional() })
  .meta({ id: "Pace", description: "Seconds for one end, one knob, one lead fetched; absent: 4, 2, 3 (typical — time your own)." });

export const stockLeadSchema = z
  .strictObject({
    lead: leadRef,
    colour: ref.optional(),
    lengthM: z.number().positive("A length is more than zero (metres).").max(100).optional(),
    connectors: z.strictObject({ output: ref, input: ref }).optional(),
  })
  .meta({ id: "StockLead" });

/** The open changeover calculator: two patches, and what is known of leads and jacks. */
export const changeoverRequestSchema = z
  .strictObject({
    from: connections(),
    to: connections(),
    knobsFrom: knobs().optional(),
    knobsTo: knobs().optional(),
    pace: paceSchema.optional(),
    leads: z.array(stockLeadSchema).max(MOST_CONNECTIONS, `At most ${MOST_CONNECTIONS} leads.`).optional(),
    outputs: z.record(ref, z.strictObject({ ...jackFacts, sourceOhm: ohms.optional(), limitA: z.number().min(0).max(1000).optional() })).optional(),
    inputs: z.record(ref, z.strictObject(jackFacts)).optional(),
    adapters: z.array(z.strictObject({ plug: ref, jack: ref })).max(100).optional(),
    desk: z.array(z.strictObject({ channel: ref, inputs: z.array(ref).max(1000) })).max(96).optional(),
  })
  .superRefine((request, ctx) => {
    for (const field of ["from", "leads"] as const) {
      const seen = new Set<string>();
      request[field]?.forEach(({ lead }, index) => {
        if (lead === undefined) return;
        if (seen.has(String(lead))) ctx.addIssue({ code: "custom", path: [field, index, "lead"], message: `Lead ${lead} is named twice.` });
        seen.add(String(lead));
      });
    }
    for (const field of ["from", "to"] as const) {
      const seen = new Set<string>();
      request[field].forEach(({ output, input }, index) => {
        const pair = JSON.stringify([output, input]);
        if (seen.has(pair)) ctx.addIssue({ code: "custom", path: [field, index, "input"], message: "Those two jacks are already joined." });
        seen.add(pair);
      });
    }
  })
  .meta({ id: "ChangeoverRequest", description: "The patch that is plugged, the patch that is wanted, and the pace." });
export type ChangeoverRequest = z.infer<typeof changeoverRequestSchema>;

const plainConnection = z.strictObject({ output: z.string(), input: z.string() });
const leadOrNull = z.union([z.string(), z.number()]).nullable();
const adapterList = z.array(z.strictObject({ plug: z.string(), jack: z.string() })).optional();
const pullFirst = z
  .array(z.strictObject({ fromRow: z.number().int(), lead: leadOrNull, end: z.enum(["output", "input"]), jack: z.string() }))
  .optional();
const common = { lead: leadOrNull, ends: z.number().int(), text: z.string(), pullFirst, adapters: adapterList, cautions: z.array(z.string()).optional() };
const row = z.number().int().min(0);

export const stepSchema = z
  .discriminatedUnion("kind", [
    z.strictObject({ kind: z.enum(["move-input", "move-output", "move-both"]), fromRow: row, toRow: row, from: plainConnection, to: plainConnection, ...common }),
    z.strictObject({ kind: z.literal("put-away"), fromRow: row, from: plainConnection, ...common }),
    z.strictObject({ kind: z.literal("fetch"), toRow: row, to: plainConnection, ...common }),
    z.strictObject({ kind: z.literal("turn"), knob: z.string(), from: position.nullable(), to: position, text: z.string() }),
  ])
  .meta({ id: "ChangeoverStep", description: "One thing to do. fromRow and toRow are rows of the request's from and to; pullFirst names ends to pull and let hang before it." });

export const changeoverResultSchema = z
  .strictObject({
    endMoves: z.number().int(),
    knobTurns: z.number().int(),
    seconds: z.number(),
    steps: z.array(stepSchema),
    shortages: z.array(z.strictObject({ toRow: row, text: z.string() })).optional(),
    before: z.array(z.string()).optional(),
    after: z.array(z.string()).optional(),
  })
  .meta({ id: "ChangeoverResult" });
export type ChangeoverResult = z.infer<typeof changeoverResultSchema>;
