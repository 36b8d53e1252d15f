import { z } from "zod";

/** Row ids: random UUIDs, or readable ids in seeds. */
export const idSchema = z.string().min(1).max(64).regex(/^[A-Za-z0-9_-]+$/, "An id holds letters, figures, - and _ only.");

/** A name a person gave: 1 to 60 characters, spaces trimmed, no control characters. */
export const nameSchema = z.string().trim()
  .min(1, "Give it a name.")
  .max(60, "At most 60 characters.")
  .regex(/^[^\p{Cc}]*$/u, "A name cannot hold control characters.");

/** Free text under a card or a song, at most 2,000 characters. */
export const notesSchema = z.string().trim().max(2000, "At most 2,000 characters.")
  .regex(/^[^\p{Cc}]*(?:[\n\t\r][^\p{Cc}]*)*$/u, "Notes cannot hold control characters.");

export const revisionSchema = z.number().int().min(0).max(1_000_000_000);
