import { z } from "zod";
import { figure, orUnknown, spread } from "./figures";
import { idSchema, nameSchema, notesSchema, revisionSchema } from "./identity";
import { jackSchema } from "./jack";

export const GEAR_KINDS = ["pad", "conditioner", "shaper", "voice", "desk-channel", "supply"] as const;
export const gearKindSchema = z.enum(GEAR_KINDS);
export type GearKind = (typeof GEAR_KINDS)[number];

export const padDetailsSchema = z.strictObject({
  kind: z.literal("pad"),
  sensor: z.enum(["resistive", "piezo", "switch"]),
  restOhm: orUnknown(spread("Ohm", { openMin: true })),
  hitOhm: orUnknown(spread("Ohm", { openMin: true })),
  riseS: orUnknown(figure("s", { openMin: true })),
  holdS: orUnknown(figure("s")),
  fallS: orUnknown(figure("s", { openMin: true })),
  /** Piezo discs: capacitance and the peak of a firm hit, open circuit. */
  farad: orUnknown(spread("F")),
  peakV: orUnknown(spread("V")),
});

export const circuitSchema = z.strictObject({
  /** Where the pad sits in its divider: upper (to the supply) or lower (to 0 V). */
  padLeg: z.enum(["upper", "lower"]),
  divider: z.strictObject({ ohm: figure("Ohm", { openMin: true }) }),
  coupling: z.strictObject({ farad: figure("F"), ohm: figure("Ohm", { openMin: true }) }),
  threshold: z.strictObject({ topOhm: figure("Ohm"), potOhm: figure("Ohm"), bottomOhm: figure("Ohm") })
    .refine((t) => t.topOhm + t.potOhm + t.bottomOhm > 0, { error: "The threshold divider needs some resistance." }),
  comparator: z.strictObject({
    highDropV: figure("V", { min: 0 }),
    lowDropV: figure("V", { min: 0 }),
    limitA: figure("A", { openMin: true }),
  }),
  output: z.strictObject({ seriesOhm: figure("Ohm"), shuntOhm: orUnknown(figure("Ohm", { openMin: true })) }),
  envelope: z.strictObject({
    seriesOhm: figure("Ohm"),
    farad: figure("F"),
    ohm: figure("Ohm", { openMin: true }),
    emitterOhm: figure("Ohm", { openMin: true }),
  }).nullable(),
});
export type CircuitFigures = z.infer<typeof circuitSchema>;

export const conditionerDetailsSchema = z.strictObject({
  kind: z.literal("conditioner"),
  /** Known by its parts, or a black box known only by readings at its jacks. */
  build: z.enum(["circuit", "black-box"]),
  circuit: circuitSchema.nullable(),
});

export const deskDetailsSchema = z.strictObject({
  kind: z.literal("desk-channel"),
  channel: z.coerce.number({ error: "Write the channel's number, for example 3." }).int("A whole number.").min(1, "Channels count from 1.").max(96, "At most 96."),
});

export const supplyDetailsSchema = z.strictObject({
  kind: z.literal("supply"),
  source: z.enum(["battery", "mains-adapter"]),
  highV: spread("V", { min: 0, openMin: true, max: 60 }),
  lowV: figure("V", { min: -60, max: 0 }),
  ratingA: orUnknown(figure("A", { openMin: true })),
});

export const detailsSchema = z.discriminatedUnion("kind", [
  padDetailsSchema,
  conditionerDetailsSchema,
  z.strictObject({ kind: z.literal("shaper") }),
  z.strictObject({ kind: z.literal("voice") }),
  deskDetailsSchema,
  supplyDetailsSchema,
]);
export type GearDetails = z.infer<typeof detailsSchema>;

export const knobSchema = z.strictObject({
  id: idSchema,
  name: nameSchema,
  /** The circuit figure this knob turns, if the check should follow it. */
  turns: z.enum(["threshold", "nothing"]),
});
export type Knob = z.infer<typeof knobSchema>;

/** What a form or a client sends to create or replace a piece of gear. */
export const gearInputSchema = z
  .strictObject({
    name: nameSchema,
    notes: notesSchema,
    supplyId: z.preprocess((v) => (v === "" ? null : v), idSchema.nullable()),
    details: detailsSchema,
    jacks: z.array(jackSchema).max(24, "At most 24 jacks on one box."),
    knobs: z.array(knobSchema).max(32, "At most 32 knobs on one box."),
    /** Paths of figures nobody has measured yet, such as `details.restOhm` or `jacks.<jackId>.onV`. */
    assumed: z.array(z.string().max(160)).max(400),
  })
  .superRefine((gear, ctx) => {
    for (const [list, key] of [[gear.jacks, "jacks"], [gear.knobs, "knobs"]] as const) {
      const seen = new Set<string>();
      list.forEach((item, index) => {
        if (seen.has(item.id)) ctx.addIssue({ code: "custom", path: [key, index, "id"], message: "This id is used twice." });
        seen.add(item.id);
      });
    }
    const { details } = gear;
    if (details.kind === "conditioner" && details.build === "circuit" && !details.circuit) {
      ctx.addIssue({ code: "custom", path: ["details", "circuit"], message: "Give the circuit's parts, or call it a black box." });
    }
    if (details.kind === "supply" && gear.jacks.length > 0) {
      ctx.addIssue({ code: "custom", path: ["jacks"], message: "A supply has no patch jacks." });
    }
  })
  .meta({ id: "GearInput" });
export type GearInput = z.infer<typeof gearInputSchema>;
/** The same before parsing: figures as text, as the form holds them. */
export type GearDraft = z.input<typeof gearInputSchema>;

/** A stored piece of gear as the API presents it. */
export interface Gear extends GearInput {
  id: string;
  kind: GearKind;
  retired: boolean;
  revision: number;
  position: number;
}

/** A replacement carries the revision it was made from; a stale one is refused with 409. */
export const gearReplaceSchema = z.strictObject({ baseRevision: revisionSchema, gear: gearInputSchema });
export const gearRetireSchema = z.strictObject({ retired: z.boolean() });
