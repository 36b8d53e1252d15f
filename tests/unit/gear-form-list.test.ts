import { describe, expect, it } from "vitest";
import { arrangeGearRows, buildGearRows, readGearQuery, writeGearQuery, type GearQuery } from "@/components/gear/gear-rows";
import { summariseGear } from "@/components/gear/summarise-gear";
import { startForRig } from "@/components/gear/start-for-rig";
import { startingGear, startingVariants } from "@/lib/core/electrics/starting-figures";
import { gearInputSchema, type Gear, type GearKind } from "@/lib/schemas/gear";

let n = 0;
const makeId = () => `id${(n += 1)}`;
function make(kind: GearKind, variant: string, over: Partial<Gear> = {}): Gear {
  return { ...gearInputSchema.parse(startingGear(kind, variant, makeId)), id: makeId(), kind, retired: false, revision: 1, position: 0, ...over };
}

const battery = make("supply", "battery-9v", { id: "battery", name: "Left battery" });
const gear = [
  make("pad", "foam", { name: "Pad 10" }),
  make("pad", "foam", { name: "Pad 2", assumed: [] }),
  make("conditioner", "single-9v", { name: "Green box", supplyId: "battery" }),
  make("voice", "logic-5v", { name: "Clap", notes: "The pin is bare." }),
  make("pad", "piezo", { name: "Old rim", retired: true }),
  battery,
];
const plain: GearQuery = { sort: null, descending: false, kind: null, text: "", assumedOnly: false, retired: false };
const names = (over: Partial<GearQuery>) => arrangeGearRows(buildGearRows(gear), { ...plain, ...over }).map((row) => row.gear.name);

describe("the gear list", () => {
  it("keeps the rig's order and hides retired gear until asked", () => {
    expect(names({})).toEqual(["Pad 10", "Pad 2", "Green box", "Clap", "Left battery"]);
    expect(names({ retired: true })).toContain("Old rim");
  });

  it("sorts by every column, both ways, numbers in names as numbers", () => {
    expect(names({ sort: "name" })).toEqual(["Clap", "Green box", "Left battery", "Pad 2", "Pad 10"]);
    expect(names({ sort: "name", descending: true })[0]).toBe("Pad 10");
    expect(names({ sort: "kind", descending: true })[0]).toBe("Left battery");
    expect(names({ sort: "assumed" })[0]).toBe("Pad 2");
    expect(names({ sort: "supply", descending: true })[0]).toBe("Green box");
    expect(names({ sort: "state", descending: true, retired: true })[0]).toBe("Old rim");
    expect(names({ sort: "figures" })).toHaveLength(5);
  });

  it("filters by kind, by every word, and by assumed figures", () => {
    expect(names({ kind: "pad" })).toEqual(["Pad 10", "Pad 2"]);
    expect(names({ text: "bare PIN" })).toEqual(["Clap"]);
    expect(names({ text: "left" })).toEqual(["Green box", "Left battery"]);
    expect(names({ text: "bare box" })).toEqual([]);
    expect(names({ assumedOnly: true })).not.toContain("Pad 2");
  });

  it("lives in the address and comes back from it", () => {
    const query: GearQuery = { sort: "assumed", descending: true, kind: "voice", text: "5 V & up", assumedOnly: true, retired: true };
    expect(readGearQuery(new URLSearchParams(writeGearQuery(query)))).toEqual(query);
    expect(writeGearQuery(plain)).toBe("");
    expect(readGearQuery(new URLSearchParams("sort=price&kind=lamp&dir=up"))).toEqual(plain);
  });
});

describe("the one-line summary", () => {
  it("gives what a person would ask for first", () => {
    expect(summariseGear(make("pad", "foam"))).toBe("rest 20–50 kΩ, hit 10 kΩ ±20 %");
    expect(summariseGear(make("conditioner", "single-9v-envelope"))).toBe("RC 2.2 ms, threshold pot 10 kΩ, with envelope");
    expect(summariseGear(make("supply", "split-12v"))).toBe("12 V ±5 % and −12 V");
    expect(summariseGear(make("desk-channel", "mic"))).toBe("channel 1, audio in up to 0 dBu phantom on");
    expect(summariseGear(make("voice", "trigger"))).toBe("trigger/gate in fires at 1–2 V → audio out 5 V");
  });
});

describe("starting figures fitted to a rig", () => {
  const rig = [battery, make("supply", "split-12v", { id: "split", retired: true }), make("supply", "split-12v", { id: "split2" }), make("desk-channel", "line"), make("desk-channel", "line", { retired: true })];
  const startOf = (kind: GearKind, variant: string) => {
    const found = startingVariants(kind).find((known) => known.variant === variant);
    if (!found) throw new Error("no such variant");
    return startForRig(found, rig, makeId);
  };

  it("runs on a supply of the rig that suits it, never on a retired one", () => {
    expect(startOf("conditioner", "single-9v").supplyId).toBe("battery");
    expect(startOf("voice", "trigger").supplyId).toBe("split2");
    expect(startOf("voice", "logic-5v").supplyId).toBeNull();
    expect(startOf("pad", "foam").supplyId).toBeNull();
  });

  it("takes the next free channel of the desk", () => {
    expect(startOf("desk-channel", "line").details).toMatchObject({ channel: 2 });
  });
});
