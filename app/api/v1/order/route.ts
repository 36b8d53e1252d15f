import { orderSet } from "@/lib/core/planning";
import { AppError, fieldFault } from "@/lib/errors";
import { handleOpen, json } from "@/lib/http/handle";
import { readJson } from "@/lib/http/read-json";
import { takeCalculatorTurn } from "@/lib/http/take-calculator-turn";
import { orderRequestSchema } from "@/lib/schemas/order";

/** Longest search beyond what is solved exactly, ms. */
const BUDGET_MS = 4000;

/** Open calculator: the order of songs with the least total changeover. */
export const POST = handleOpen(async (request) => {
  takeCalculatorTurn(request);
  const outcome = orderSet(await readJson(request, orderRequestSchema), { now: () => performance.now(), budgetMs: BUDGET_MS });
  if (!outcome.ok) {
    throw new AppError("unprocessable", { userMessage: outcome.conflicts.join(" "), fields: outcome.conflicts.map((text) => fieldFault([], text)), extra: { conflicts: outcome.conflicts } });
  }
  const { order, totalS, lowerBoundS, provenOptimal } = outcome;
  return json({ order, totalS, lowerBoundS, provenOptimal });
});
