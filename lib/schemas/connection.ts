import { z } from "zod";
import { findConnectionIssues } from "@/lib/core/electrics/find-connection-issues";
import { inputSchema, outputSchema } from "./jack";

/** The open connection calculator: one or more outputs joined to one or more inputs by passive leads. */
export const connectionRequestSchema = z
  .strictObject({
    outputs: z.array(outputSchema).min(1, "Give at least one output.").max(32, "At most 32 outputs."),
    inputs: z.array(inputSchema).min(1, "Give at least one input.").max(256, "At most 256 inputs."),
  })
  .superRefine((request, ctx) => {
    const seen = new Set<string>();
    request.inputs.forEach((input, index) => {
      if (seen.has(input.id)) ctx.addIssue({ code: "custom", path: ["inputs", index, "id"], message: "This id is used twice." });
      seen.add(input.id);
    });
    for (const { path, message } of findConnectionIssues(request)) ctx.addIssue({ code: "custom", path, message });
  })
  .meta({ id: "ConnectionRequest" });
export type ConnectionRequest = z.infer<typeof connectionRequestSchema>;
