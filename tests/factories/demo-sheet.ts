import { checkGearPatch } from "@/lib/data/check-gear-patch";
import type { SheetSource } from "@/lib/paper/build-sheet-view";
import { gearInputSchema, type Gear } from "@/lib/schemas/gear";
import { demoGear } from "@/seeders/demo/gear";
import { demoPatch } from "@/seeders/demo/demo-patch";
import { demoSongs } from "@/seeders/demo/songs";

/** The demo rig's gear as the database would give it. */
export function demoRigGear(): Gear[] {
  return demoGear.map(({ id, gear: draft }, position) => {
    const gear = gearInputSchema.parse(draft);
    return { ...gear, id, kind: gear.details.kind, retired: false, revision: 1, position };
  });
}

/** What the sheet of one demo song is made from. */
export function demoSheet(songId: string): SheetSource {
  const index = demoSongs.findIndex((song) => song.id === songId);
  const song = demoSongs[index];
  if (!song) throw new Error(`no demo song ${songId}`);
  const before = demoSongs[index - 1];
  const gear = demoRigGear();
  const patch = demoPatch(song);
  return {
    rigName: "Marrow Lane",
    song,
    place: { set: "Pump House, Thursday", position: index + 1, of: demoSongs.length },
    gear,
    patch,
    revision: 1,
    check: checkGearPatch(gear, patch),
    before: before ? { title: before.title, patch: demoPatch(before) } : null,
    printedAt: new Date("2026-12-01T13:05:00Z"),
  };
}
