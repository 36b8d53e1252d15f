import { z } from "zod";
import { SIGNALS } from "@/lib/core/electrics/jacks";
import { figure, level, limits, orUnknown, spread } from "./figures";
import { idSchema, nameSchema } from "./identity";

export const signalSchema = z.enum(SIGNALS as unknown as ["sensor", "trigger", "gate", "envelope", "control", "audio"]);
export const polaritySchema = z.enum(["rising", "falling"]);

/** A volt range with both ends; whether they are the right way round is asked once, for the whole connection. */
const voltRange = z.strictObject({ min: figure("V"), max: figure("V") });

/** An output as the open calculator takes it (every driving figure stated). */
export const outputSchema = z
  .strictObject({
    signal: signalSchema,
    polarity: polaritySchema.optional(),
    restV: spread("V"),
    activeV: spread("V"),
    sourceOhm: spread("Ohm"),
    pulseS: spread("s").optional(),
    decayS: spread("s").optional(),
    limitA: spread("A").optional(),
    or: z.boolean().optional(),
  })
  .meta({ id: "Output", description: "What an output jack puts out; open-circuit volts, SI units." });

export const clampSchema = z
  .strictObject({
    lowV: spread("V"),
    highV: spread("V"),
    seriesOhm: spread("Ohm"),
    maxA: figure("A", { openMin: true }),
  })
  .meta({ id: "Clamp", description: "Protection diodes to lowV and highV behind seriesOhm, good for maxA." });

const inputFields = {
  accepts: z.array(signalSchema).min(1, "Say what this input listens to.").max(6),
  polarity: polaritySchema.optional(),
  onV: spread("V").optional(),
  offV: spread("V").optional(),
  safeV: voltRange.optional(),
  loadOhm: spread("Ohm", { openMin: true }).nullable(),
  biasV: spread("V").optional(),
  pulseS: limits("s").optional(),
  decayS: z.strictObject({ min: figure("s").optional() }).optional(),
  clamp: clampSchema.optional(),
  maxDbu: z.number().min(-60).max(60).optional(),
  phantom: z.boolean().optional(),
};

/** An input as the open calculator takes it. */
export const inputSchema = z
  .strictObject({ id: z.string().min(1).max(64), ...inputFields })
  .meta({ id: "Input", description: "What an input jack takes in; absent figures are unknown." });

export const CONNECTORS = ["6.35 mm TS", "6.35 mm TRS", "3.5 mm TS", "3.5 mm TRS", "XLR", "RCA", "4 mm", "wire"] as const;
export const connectorSchema = z.enum(CONNECTORS);

/** What a jack is on its box; a conditioner's own outputs are computed from its parts. */
export const jackRoleSchema = z.enum(["plain", "pad-in", "trigger-out", "envelope-out", "through"]);

/** A gear's output jack as stored: any figure may still be unknown (absent). */
export const gearOutputSchema = z.strictObject({
  id: idSchema,
  direction: z.literal("output"),
  name: nameSchema,
  connector: connectorSchema,
  role: jackRoleSchema,
  output: z
    .strictObject({
      signal: signalSchema,
      polarity: polaritySchema,
      restV: orUnknown(spread("V")),
      activeV: orUnknown(spread("V")),
      sourceOhm: orUnknown(spread("Ohm")),
      pulseS: orUnknown(spread("s")),
      decayS: orUnknown(spread("s")),
      limitA: orUnknown(spread("A")),
      or: z.boolean(),
    }),
});

/** A gear's input jack as stored: null where a figure is unknown. */
export const gearInputSchema = z.strictObject({
  id: idSchema,
  direction: z.literal("input"),
  name: nameSchema,
  connector: connectorSchema,
  role: jackRoleSchema,
  input: z
    .strictObject({
      accepts: z.array(signalSchema).min(1, "Say what this input listens to.").max(6),
      polarity: polaritySchema,
      onV: orUnknown(spread("V")),
      offV: orUnknown(spread("V")),
      safeLowV: orUnknown(figure("V")),
      safeHighV: orUnknown(figure("V")),
      /** Null: open (draws nothing that matters). */
      loadOhm: orUnknown(spread("Ohm", { openMin: true })),
      biasV: orUnknown(spread("V")),
      pulseMinS: orUnknown(figure("s")),
      pulseMaxS: orUnknown(figure("s")),
      decayMinS: orUnknown(figure("s")),
      clamp: clampSchema.nullable(),
      maxDbu: orUnknown(level()),
      phantom: z.boolean(),
    })
    .superRefine((input, ctx) => {
      if (input.safeLowV !== null && input.safeHighV !== null && input.safeLowV > input.safeHighV) {
        ctx.addIssue({ code: "custom", path: ["safeHighV"], message: "The highest safe level lies below the lowest." });
      }
      if ((input.safeLowV === null) !== (input.safeHighV === null)) {
        ctx.addIssue({ code: "custom", path: [input.safeLowV === null ? "safeLowV" : "safeHighV"], message: "Give both ends of what the jack stands, or neither." });
      }
      if (input.pulseMinS !== null && input.pulseMaxS !== null && input.pulseMinS > input.pulseMaxS) {
        ctx.addIssue({ code: "custom", path: ["pulseMaxS"], message: "The longest pulse lies below the shortest." });
      }
    }),
});

export const jackSchema = z.discriminatedUnion("direction", [gearOutputSchema, gearInputSchema]);

export type Jack = z.infer<typeof jackSchema>;
export type OutputJack = z.infer<typeof gearOutputSchema>;
export type InputJack = z.infer<typeof gearInputSchema>;
export type JackRole = z.infer<typeof jackRoleSchema>;
