import { planChangeover } from "@/lib/core/planning";
import { handleOpen, json } from "@/lib/http/handle";
import { readJson } from "@/lib/http/read-json";
import { takeCalculatorTurn } from "@/lib/http/take-calculator-turn";
import { changeoverRequestSchema } from "@/lib/schemas/changeover";

/** Open calculator: the fewest jacks to touch from one patch to another. */
export const POST = handleOpen(async (request) => {
  takeCalculatorTurn(request);
  return json(planChangeover(await readJson(request, changeoverRequestSchema)));
});
