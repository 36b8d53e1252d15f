import { describe, expect, it } from "vitest";
import { gearInputSchema } from "@/lib/schemas/gear";
import { demoGear } from "@/seeders/demo/gear";
import { signUpSchema } from "@/lib/schemas/account";
import { figure, spread } from "@/lib/schemas/figures";

const kick = demoGear.find((item) => item.id === "pad-kick")?.gear;

function firstFault(draft: unknown): string | undefined {
  const parsed = gearInputSchema.safeParse(draft);
  return parsed.success ? undefined : parsed.error.issues[0]?.path.join(".");
}

describe("figures as people write them", () => {
  it.each([
    ["4k7", "Ohm", 4700],
    ["R47", "Ohm", 0.47],
    ["27k", "Ohm", 27_000],
  ] as const)("%s reads as %s", (text, unit, value) => expect(figure(unit).parse(text)).toBeCloseTo(value, 9));
  it("0.01 µF is ten nanofarads", () => expect(figure("F").parse("0.01 µF")).toBeCloseTo(10e-9, 15));
  it("a range and a tolerance keep their shape", () => {
    expect(spread("Ohm").parse("20k–50k")).toEqual({ min: 20_000, max: 50_000 });
    expect(spread("Ohm").parse("10k ±5%")).toEqual({ nominal: 10_000, tol: 0.05 });
  });
  it.each(["", "ten", "1e999", "--5"])("%j is refused with a sentence", (text) => {
    const parsed = figure("Ohm").safeParse(text);
    expect(parsed.success).toBe(false);
    expect(parsed.error?.issues[0]?.message).toMatch(/[.!?]$/);
  });
  it.each([Number.NaN, Infinity, -1, 1e300])("%d ohms is refused", (value) => expect(figure("Ohm").safeParse(value).success).toBe(false));
});

describe("a piece of gear", () => {
  it("of the demo parses, and parses again to the same", () => {
    for (const { gear } of demoGear) {
      const once = gearInputSchema.parse(gear);
      expect(gearInputSchema.parse(once)).toEqual(once);
    }
  });
  it("names the field at fault", () => {
    expect(firstFault({ ...kick, name: "" })).toBe("name");
    expect(firstFault({ ...kick, name: "x".repeat(61) })).toBe("name");
    expect(firstFault({ ...kick, details: { ...kick?.details, restOhm: "0" } })).toBe("details.restOhm");
    expect(firstFault({ ...kick, jacks: [kick?.jacks[0], kick?.jacks[0]] })).toBe("jacks.1.id");
  });
});

describe("a new account", () => {
  const draft = { name: "A", email: "a@b.example", password: "two-tea-trolleys" };
  it("keeps the address in lower case", () => expect(signUpSchema.parse({ ...draft, email: " A@B.Example " }).email).toBe("a@b.example"));
  it.each(["short", "passwordpassword", "aaaaaaaaaaaaaaaa"])("refuses %s as a password", (password) => expect(signUpSchema.safeParse({ ...draft, password }).success).toBe(false));
});
