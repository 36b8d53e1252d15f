import { z } from "zod";
import { idSchema, nameSchema, notesSchema } from "./identity";

const tempoSchema = z.preprocess(
  (value) => (value === "" || value === undefined ? null : typeof value === "string" ? Number(value) : value),
  z.number({ error: "Give the tempo in beats a minute." }).min(20, "At least 20 beats a minute.").max(400, "At most 400 beats a minute.").nullable(),
);

export const songFieldsSchema = z.strictObject({ title: nameSchema, tempoBpm: tempoSchema, notes: notesSchema }).meta({ id: "SongFields" });
export type SongFields = z.infer<typeof songFieldsSchema>;
export type SongDraft = z.input<typeof songFieldsSchema>;

/** A new song, empty or with another song's patch. */
export const songCreateSchema = songFieldsSchema.extend({ copyFrom: idSchema.nullable().optional() }).meta({ id: "SongCreate" });

export interface Song extends SongFields {
  id: string;
  /** Revision of its patch; 0 before the first save. */
  revision: number;
  position: number;
}
