import { z } from "zod";
import { idSchema, revisionSchema } from "./identity";

/** Colours of lead a person can tell apart by name; the name is printed, colour only repeats it. */
export const LEAD_COLOURS = ["black", "white", "red", "orange", "yellow", "green", "blue", "violet", "grey", "brown"] as const;
export const leadColourSchema = z.enum(LEAD_COLOURS);

const resistance = () => z.number().min(1).max(1e9);

/** Parts soldered into a lead at its input end: how a fix becomes part of the patch. */
const tolerance = () => z.number().min(0).max(0.5);
export const inlineSchema = z.discriminatedUnion("kind", [
  z.strictObject({ kind: z.enum(["divider", "diode-divider"]), seriesOhm: resistance(), shuntOhm: resistance(), tol: tolerance() }),
  z.strictObject({ kind: z.literal("series-resistor"), seriesOhm: resistance(), tol: tolerance() }),
  z.strictObject({ kind: z.literal("series-diode"), pullDownOhm: resistance().nullable() }),
]);
export type Inline = z.infer<typeof inlineSchema>;

export const leadSchema = z.strictObject({
  id: idSchema,
  number: z.number().int().min(1).max(999),
  colour: leadColourSchema,
  /** Jack ids: the output end and the input end. */
  outputId: idSchema,
  inputId: idSchema,
  inline: inlineSchema.optional(),
});
export type Lead = z.infer<typeof leadSchema>;

export const knobPositionSchema = z.strictObject({
  gearId: idSchema,
  knobId: idSchema,
  /** 0 = fully anticlockwise (7 o'clock) … 1 = fully clockwise (5 o'clock). */
  position: z.number().min(0).max(1),
});
export type KnobPosition = z.infer<typeof knobPositionSchema>;

/** All leads and knob positions of one song, and the order of its cards in the four lanes. */
export const patchSchema = z
  .strictObject({
    leads: z.array(leadSchema).max(200, "At most 200 leads in one song."),
    knobs: z.array(knobPositionSchema).max(400),
    /** Gear ids in card order: pads, conditioning, voices, desk. Gear not named follows in the rig's order. */
    lanes: z.tuple([z.array(idSchema).max(200), z.array(idSchema).max(200), z.array(idSchema).max(200), z.array(idSchema).max(200)]),
  })
  .superRefine((patch, ctx) => {
    const numbers = new Set<number>();
    const ids = new Set<string>();
    const pairs = new Set<string>();
    patch.leads.forEach((lead, index) => {
      const pair = `${lead.outputId}>${lead.inputId}`;
      if (ids.has(lead.id)) ctx.addIssue({ code: "custom", path: ["leads", index, "id"], message: "This lead id is used twice." });
      if (numbers.has(lead.number)) ctx.addIssue({ code: "custom", path: ["leads", index, "number"], message: `Lead number ${lead.number} is used twice.` });
      if (pairs.has(pair)) ctx.addIssue({ code: "custom", path: ["leads", index, "inputId"], message: "Those two jacks are already joined." });
      ids.add(lead.id);
      numbers.add(lead.number);
      pairs.add(pair);
    });
    const knobs = new Set<string>();
    patch.knobs.forEach((knob, index) => {
      const key = `${knob.gearId}/${knob.knobId}`;
      if (knobs.has(key)) ctx.addIssue({ code: "custom", path: ["knobs", index], message: "This knob is set twice." });
      knobs.add(key);
    });
  })
  .meta({ id: "Patch" });
export type Patch = z.infer<typeof patchSchema>;

export const emptyPatch: Patch = { leads: [], knobs: [], lanes: [[], [], [], []] };

export const patchSaveSchema = z.strictObject({ baseRevision: revisionSchema, patch: patchSchema });
/** A draft to check without saving; `from` asks for the verdict every free jack would get with that jack. */
export const patchCheckSchema = z.strictObject({ patch: patchSchema, from: idSchema.optional() });
