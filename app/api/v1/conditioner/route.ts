import { simulateConditioner } from "@/lib/core/electrics";
import { handleOpen, json } from "@/lib/http/handle";
import { readJson } from "@/lib/http/read-json";
import { takeCalculatorTurn } from "@/lib/http/take-calculator-turn";
import { conditionerRequestSchema } from "@/lib/schemas/conditioner";

/** Open calculator: a pad and its trigger conditioner into a load. */
export const POST = handleOpen(async (request) => {
  takeCalculatorTurn(request);
  return json(simulateConditioner(await readJson(request, conditionerRequestSchema)));
});
