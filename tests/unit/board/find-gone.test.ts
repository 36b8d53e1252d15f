import { describe, expect, it } from "vitest";
import { findGone } from "@/components/board/find-gone";
import { demoPatch } from "@/seeders/demo/demo-patch";
import { demoSongs } from "@/seeders/demo/songs";
import { demoRigGear } from "../../factories/demo-sheet";

const song = demoSongs[0] as (typeof demoSongs)[number];
const gear = demoRigGear();

describe("what a patch names though its gear lost it", () => {
  it("is nothing while every jack and knob is there", () => expect(findGone(demoPatch(song), gear)).toBeNull());
  it("is told by lead number and cleared without touching the rest", () => {
    const fewer = gear.map((item) => (item.id === "voice-low" ? { ...item, jacks: item.jacks.filter((jack) => jack.id !== "voice-low-trig"), knobs: [] } : item));
    const gone = findGone(demoPatch(song), fewer);
    expect(gone?.leadNumbers).toEqual([2]);
    expect(gone?.knobs).toBe(2);
    expect(gone?.patch.leads.map((lead) => lead.number)).toEqual([1, 3, 4, 5, 6]);
    expect(gone && findGone(gone.patch, fewer)).toBeNull();
  });
});
