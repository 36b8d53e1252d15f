import { describe, expect, it } from "vitest";
import { forgetTurns, takeTurn } from "@/lib/http/rate-limit";

describe("turns in a window", () => {
  it("lets the stated number through, says how long to wait, then begins anew", () => {
    const start = 1_000_000;
    const turns = Array.from({ length: 601 }, () => takeTurn("someone", 600, 60, start));
    expect(turns.filter((turn) => turn.allowed)).toHaveLength(600);
    expect(turns.at(-1)).toEqual({ allowed: false, retryAfterS: 60 });
    expect(takeTurn("someone", 600, 60, start + 59_000)).toEqual({ allowed: false, retryAfterS: 1 });
    expect(takeTurn("someone", 600, 60, start + 60_000).allowed).toBe(true);
  });
  it("begins anew when told to", () => {
    takeTurn("honest", 1, 60, 0);
    forgetTurns("honest");
    expect(takeTurn("honest", 1, 60, 1).allowed).toBe(true);
  });
  it("counts each key by itself", () => {
    takeTurn("a", 1, 60, 0);
    expect(takeTurn("a", 1, 60, 1).allowed).toBe(false);
    expect(takeTurn("b", 1, 60, 1).allowed).toBe(true);
  });
});
