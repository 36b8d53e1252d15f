import { env } from "@/lib/env";
import { AppError } from "@/lib/errors";
import { takeTurn } from "./rate-limit";

/** Counts a call to an open calculator. @throws AppError too-many with Retry-After */
export function takeCalculatorTurn(request: Request): void {
  const address = request.headers.get("x-forwarded-for")?.split(",").at(-1)?.trim() ?? "unknown";
  const turn = takeTurn(`calculator:${address}`, env().CALCULATOR_CALLS_PER_MINUTE, 60);
  if (turn.allowed) return;
  throw new AppError("too-many", {
    userMessage: `This calculator answers a limited number of calls a minute. Try again in ${turn.retryAfterS} s.`,
    headers: { "retry-after": String(turn.retryAfterS) },
  });
}
