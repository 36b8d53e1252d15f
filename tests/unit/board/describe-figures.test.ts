import { describe, expect, it } from "vitest";
import { describeFigures } from "@/components/board/describe-figures";
import { checkGearPatch } from "@/lib/data/check-gear-patch";
import { demoPatch } from "@/seeders/demo/demo-patch";
import { demoSongs } from "@/seeders/demo/songs";
import { demoRigGear } from "../../factories/demo-sheet";

const gear = demoRigGear();

describe("figures that a verdict leans on", () => {
  it("are said box by box, each once, jacks by their name", () => {
    expect(describeFigures(["pad-kick:pad.restOhm", "pad-kick:pad.hitOhm", "voice-low:jacks.voice-low-trig.onV", "voice-low:jacks.voice-low-trig.safeV", "nobody:pad.restOhm"], gear)).toEqual([
      { gearId: "pad-kick", gearName: "Kick slab", figures: ["resistance at rest", "resistance when hit"] },
      { gearId: "voice-low", gearName: "Low drum", figures: ["Trig: fires at", "Trig: what it stands"] },
    ]);
  });
  it("have words for every one the demo's checks name", () => {
    const keys = demoSongs.flatMap((song) => Object.values(checkGearPatch(gear, demoPatch(song)).leads).flatMap((lead) => lead.assumed));
    expect(keys.length).toBeGreaterThan(0);
    for (const box of describeFigures(keys, gear)) for (const words of box.figures) expect(words).not.toMatch(/[a-z](V|Ohm|S|A)$|\./);
  });
});
