import { describe, expect, it } from "vitest";
import { canOf, rightToEditGear, RIGHTS } from "@/lib/rights/can";

describe("the rights table", () => {
  it("gives the performer everything", () => {
    const can = canOf("performer");
    expect(RIGHTS.filter((right) => !can[right])).toEqual([]);
  });
  it("lets a collaborator edit gear and patches, but neither songs, sets nor people", () => {
    const can = canOf("collaborator");
    expect(RIGHTS.filter((right) => can[right]).sort()).toEqual(["editDesk", "editGear", "editPatch", "print", "seeRig"]);
  });
  it("lets a sound helper see, print and edit desk channels alone", () => {
    const can = canOf("sound-helper");
    expect(RIGHTS.filter((right) => can[right]).sort()).toEqual(["editDesk", "print", "seeRig"]);
  });
  it("asks less for a desk channel than for any other gear", () => {
    expect(rightToEditGear("desk-channel")).toBe("editDesk");
    expect(rightToEditGear("pad")).toBe("editGear");
  });
});
