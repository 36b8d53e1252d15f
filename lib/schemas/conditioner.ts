import { z } from "zod";
import { findConditionerIssues } from "@/lib/core/electrics/conditioner/find-conditioner-issues";
import { figure, spread } from "./figures";

const positiveOhm = () => spread("Ohm", { openMin: true });

const strikeShape = z.strictObject({
  riseS: figure("s", { max: 60 }),
  holdS: figure("s", { max: 60 }),
  fallS: figure("s", { max: 60 }),
});

/** A measured strike: `[seconds, ohms]`, time rising. */
const strikeCapture = z
  .strictObject({
    samples: z
      .array(z.tuple([z.number().min(-3600).max(3600), z.number().positive().max(1e15)]))
      .min(2, "A capture needs at least two samples.")
      .max(10_000, "At most 10,000 samples."),
  })
  .superRefine(({ samples }, ctx) => {
    const at = samples.findIndex(([time], index) => index > 0 && time <= (samples[index - 1]?.[0] ?? -Infinity));
    if (at > 0) ctx.addIssue({ code: "custom", path: ["samples", at, 0], message: "Sample times must rise from one to the next." });
  });

/** The open conditioner calculator: a pad, its circuit and a load. */
export const conditionerRequestSchema = z
  .strictObject({
    supply: z.strictObject({
      highV: spread("V", { min: 0, openMin: true, max: 1000 }),
      lowV: spread("V", { min: -1000, max: 0 }).default(0),
    }),
    pad: z.strictObject({
      kind: z.literal("resistive", { error: "This calculator covers resistive pads." }).default("resistive"),
      restOhm: positiveOhm(),
      hitOhm: positiveOhm(),
      leg: z.enum(["upper", "lower"]).default("upper"),
    }),
    strike: z.union([strikeShape, strikeCapture], { error: "Give riseS, holdS and fallS, or samples." }),
    divider: z.strictObject({ ohm: positiveOhm() }),
    coupling: z.strictObject({ farad: spread("F"), ohm: positiveOhm() }),
    threshold: z.strictObject({
      topOhm: spread("Ohm"),
      potOhm: spread("Ohm"),
      bottomOhm: spread("Ohm"),
      turn: z.number().min(0).max(1),
    }),
    comparator: z.strictObject({
      highDropV: spread("V", { min: 0 }),
      lowDropV: spread("V", { min: 0 }),
      limitA: figure("A", { openMin: true }),
      sinkA: figure("A", { openMin: true }).optional(),
      slewVperS: z.number().positive().max(1e12).optional(),
      offsetV: figure("V", { min: -10, max: 10 }).optional(),
      hysteresisV: figure("V", { min: 0, max: 100 }).optional(),
      noiseV: figure("V", { min: 0, max: 100 }).optional(),
      commonMode: z.strictObject({ lowV: figure("V"), highV: figure("V") }).optional(),
    }),
    output: z.strictObject({ seriesOhm: spread("Ohm"), shuntOhm: positiveOhm().nullable().default(null) }),
    envelope: z
      .strictObject({ seriesOhm: spread("Ohm"), farad: spread("F"), ohm: positiveOhm(), emitterOhm: positiveOhm() })
      .nullable()
      .default(null),
    load: z.strictObject({ ohm: positiveOhm().nullable() }).default({ ohm: null }),
  })
  .superRefine((request, ctx) => {
    for (const { path, message } of findConditionerIssues(request)) ctx.addIssue({ code: "custom", path, message });
  })
  .meta({ id: "ConditionerRequest", description: "A pad, a trigger conditioner and its load." });
export type ConditionerRequest = z.infer<typeof conditionerRequestSchema>;
