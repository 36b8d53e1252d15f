import { describe, expect, it } from "vitest";
import { firstLeads } from "@/components/board/first-leads";
import { startingGear, startingVariants, type StartingKind } from "@/lib/core/electrics/starting-figures";
import { gearInputSchema, type Gear } from "@/lib/schemas/gear";

let last = 0;
function make(kind: StartingKind, variant: string): Gear {
  const gear = gearInputSchema.parse(startingGear(kind, variant, () => `id-${(last += 1)}`));
  return { ...gear, id: `gear-${(last += 1)}`, kind: gear.details.kind, retired: false, revision: 1, position: 0 };
}

describe("the leads of a first run", () => {
  const variants = (kind: StartingKind) => startingVariants(kind).map(({ variant }) => variant);
  for (const conditioner of variants("conditioner")) {
    for (const voice of variants("voice")) {
      it(`go from a pad through "${conditioner}" into "${voice}"`, () => {
        const gear = [make("pad", variants("pad")[0] ?? ""), make("conditioner", conditioner), make("voice", voice)];
        const jacks = new Map(gear.flatMap((item) => item.jacks.map((jack) => [jack.id, { jack, kind: item.kind }] as const)));
        const leads = firstLeads(gear);
        expect(leads.map((pair) => pair.map((id) => [jacks.get(id)?.kind, jacks.get(id)?.jack.direction]))).toEqual([
          [["pad", "output"], ["conditioner", "input"]],
          [["conditioner", "output"], ["voice", "input"]],
        ]);
      });
    }
  }
  it("take an envelope output to a voice that wants an envelope, where the box has one", () => {
    const gear = [make("pad", "foam"), make("conditioner", "single-9v-envelope"), make("voice", "envelope")];
    const [, second] = firstLeads(gear);
    const jack = (id?: string) => gear.flatMap((item) => item.jacks).find((item) => item.id === id);
    const [output, input] = [jack(second?.[0]), jack(second?.[1])];
    if (output?.direction !== "output" || input?.direction !== "input") throw new Error("not a lead");
    expect(input.input.accepts).toContain(output.output.signal);
  });
  it("are none where there is nothing to plug", () => expect(firstLeads([])).toEqual([]));
});
