import { z } from "zod";
import { findOrderIssues, MOST_SONGS } from "@/lib/core/planning/order/find-order-issues";

/** A song in the open calculator: any short text that names it. */
const songRef = z.string().min(1, "A song's id cannot be empty.").max(120, "At most 120 characters.");
const seconds = z.number({ error: "Give a number of seconds." });
const pair = z.tuple([songRef, songRef], { error: "Give two song ids." });

const MOST_PAIRS = 2000;

/** The open order calculator: the time between every two songs, and what the performer insists on. */
export const orderRequestSchema = z
  .strictObject({
    songs: z.array(songRef).min(1, "Give at least one song.").max(MOST_SONGS, `At most ${MOST_SONGS} songs.`),
    setupS: z.record(z.string(), seconds),
    /** Row = from, column = to; the diagonal is not read and may be null. */
    changeoverS: z.array(z.array(seconds.nullable()).max(MOST_SONGS)).max(MOST_SONGS),
    pinned: z.record(z.string(), z.number({ error: "Give a position, counted from 0." })).optional(),
    together: z.array(pair).max(MOST_PAIRS, `At most ${MOST_PAIRS} pairs.`).optional(),
    apart: z.array(pair).max(MOST_PAIRS, `At most ${MOST_PAIRS} pairs.`).optional(),
  })
  .transform(({ changeoverS, ...rest }, ctx) => {
    const request = { ...rest, changeoverS: changeoverS.map((row, from) => row.map((time, to) => time ?? (from === to ? 0 : Number.NaN))) };
    for (const { path, message } of findOrderIssues(request)) ctx.issues.push({ code: "custom", path, message, input: request });
    return request;
  })
  .meta({ id: "OrderRequest", description: "Seconds between every two songs (row = from, column = to) and the rules an order must keep." });
export type OrderRequest = z.infer<typeof orderRequestSchema>;

export const orderResultSchema = z
  .strictObject({
    order: z.array(z.string()),
    totalS: z.number(),
    lowerBoundS: z.number(),
    provenOptimal: z.boolean(),
  })
  .meta({ id: "OrderResult", description: "totalS = set-up of the first song + changeovers between neighbours; no order takes less than lowerBoundS." });
export type OrderResult = z.infer<typeof orderResultSchema>;
