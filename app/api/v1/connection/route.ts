import { checkConnection } from "@/lib/core/electrics";
import { handleOpen, json } from "@/lib/http/handle";
import { readJson } from "@/lib/http/read-json";
import { takeCalculatorTurn } from "@/lib/http/take-calculator-turn";
import { connectionRequestSchema } from "@/lib/schemas/connection";

/** Open calculator: one or more outputs into one or more inputs. */
export const POST = handleOpen(async (request) => {
  takeCalculatorTurn(request);
  return json(checkConnection(await readJson(request, connectionRequestSchema)));
});
