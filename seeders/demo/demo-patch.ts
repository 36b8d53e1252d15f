import { LEAD_COLOURS, patchSchema, type Patch } from "@/lib/schemas/patch";
import type { SeedSong } from "./songs";

/** A demo song's leads, numbered as they are written down, and its knobs. */
export function demoPatch(song: SeedSong): Patch {
  return patchSchema.parse({
    leads: song.leads.map((pair, index) => {
      const [outputId, inputId] = pair.split(">");
      return { id: `${song.id}-${index + 1}`, number: index + 1, colour: LEAD_COLOURS[index % LEAD_COLOURS.length], outputId, inputId };
    }),
    knobs: Object.entries(song.knobs).map(([knob, position]) => {
      const [gearId, knobId] = knob.split("/");
      return { gearId, knobId, position };
    }),
    lanes: [[], [], [], []],
  });
}
