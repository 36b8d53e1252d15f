import { z } from "zod";
import { idSchema, nameSchema, revisionSchema } from "./identity";

export const setCreateSchema = z.strictObject({ name: nameSchema }).meta({ id: "SetCreate" });
/** The whole order at once: every song at most once. */
export const setOrderSchema = z
  .strictObject({ baseRevision: revisionSchema, name: nameSchema, songIds: z.array(idSchema).max(200) })
  .refine((set) => new Set(set.songIds).size === set.songIds.length, { path: ["songIds"], error: "A song stands in a set once." })
  .meta({ id: "SetOrder" });

export interface SetList {
  id: string;
  name: string;
  revision: number;
  songIds: string[];
}
