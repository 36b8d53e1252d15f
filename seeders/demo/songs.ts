/** The demo's songs: titles and notes are invented. A lead is written `output jack > input jack`. */
export interface SeedSong {
  id: string;
  title: string;
  tempoBpm: number;
  notes: string;
  leads: string[];
  /** `gear/knob` → 0…1. */
  knobs: Record<string, number>;
}

export const demoSongs: SeedSong[] = [
  {
    id: "wet-chalk",
    title: "Wet Chalk",
    tempoBpm: 92,
    notes: "Everything safe. Starts with the kick alone for four bars.",
    leads: [
      "pad-kick-out>cond-kick-pad", "cond-kick-trig>voice-low-trig", "voice-low-out>desk-1-in",
      "pad-tom-l-out>cond-tom-pad", "cond-tom-trig>voice-tom-l-trig", "voice-tom-l-out>desk-5-in",
    ],
    knobs: { "cond-kick/threshold": 0.6, "voice-low/pitch": 0.3, "voice-low/decay": 0.7 },
  },
  {
    id: "ladder-month",
    title: "Ladder Month",
    tempoBpm: 118,
    notes: "Draft: the snare trigger is far too much for the tin plate.",
    leads: [
      "pad-snare-out>cond-snare-pad", "cond-snare-trig>voice-tin-trig", "voice-tin-out>desk-3-in",
      "pad-kick-out>cond-kick-pad", "cond-kick-trig>voice-low-trig", "voice-low-out>desk-1-in",
    ],
    knobs: { "voice-tin/ring": 0.8 },
  },
  {
    id: "tin-parade",
    title: "Tin Parade",
    tempoBpm: 132,
    notes: "Draft: plate strip fires too short a pulse; the held gate is too long for the high tom.",
    leads: [
      "pad-plate-out>cond-plate-pad", "cond-plate-trig>voice-snare-trig", "voice-snare-out>desk-2-in",
      "pad-tom-h-out>cond-tom-pad", "cond-tom-trig>shape-gate-in", "shape-gate-out>voice-tom-h-trig", "voice-tom-h-out>desk-5-in",
    ],
    knobs: { "cond-plate/threshold": 0.05, "shape-gate/hold": 0.2, "voice-snare/snap": 0.5 },
  },
  {
    id: "slow-kettle",
    title: "Slow Kettle",
    tempoBpm: 64,
    notes: "Swells under the first verse. The clap wants pulling down, which the tom trigger does not do.",
    leads: [
      "pad-kick-out>cond-kick-pad", "cond-kick-trig>shape-env-in", "shape-env-out>voice-hiss-env", "voice-hiss-out>desk-4-in",
      "pad-tom-l-out>cond-tom-pad", "cond-tom-trig>voice-clap-trig", "voice-clap-out>desk-6-in",
      "pad-snare-out>cond-snare-pad", "cond-snare-trig>voice-low-trig", "voice-low-out>desk-1-in",
    ],
    knobs: { "shape-env/decay": 0.75, "voice-hiss/colour": 0.4 },
  },
  {
    id: "copper-rain",
    title: "Copper Rain",
    tempoBpm: 104,
    notes: "Draft: the bell wants more than a battery gives, and the grey box never lets go.",
    leads: [
      "pad-kick-out>cond-kick-pad", "cond-kick-trig>voice-bell-trig", "voice-bell-out>desk-7-in",
      "pad-snare-out>cond-snare-pad", "cond-snare-trig>voice-wood-trig", "voice-wood-out>desk-6-in",
      "pad-foot-out>cond-grey-pad", "cond-grey-trig>voice-snare-trig", "voice-snare-out>desk-2-in",
      "pad-tom-l-out>cond-plate-pad", "cond-plate-trig>voice-hiss-env", "voice-hiss-out>desk-4-in",
    ],
    knobs: { "cond-grey/sens": 0.5, "voice-bell/partials": 0.9, "voice-wood/length": 0.1 },
  },
  {
    id: "back-stairs",
    title: "Back Stairs",
    tempoBpm: 148,
    notes: "Draft: two triggers meet in the low drum, and the gate holder is asked for more than it gives.",
    leads: [
      "pad-kick-out>cond-kick-pad", "cond-kick-trig>voice-low-trig",
      "pad-tom-l-out>cond-tom-pad", "cond-tom-trig>voice-low-trig", "voice-low-out>desk-1-in",
      "pad-snare-out>cond-snare-pad", "cond-snare-trig>shape-gate-in", "shape-gate-out>voice-wood-trig", "voice-wood-out>desk-6-in",
    ],
    knobs: { "shape-gate/hold": 0.6 },
  },
  {
    id: "last-bus-north",
    title: "Last Bus North",
    tempoBpm: 76,
    notes: "Rim discs into the split-supply box. Nobody has measured the discs.",
    leads: [
      "pad-rim-l-out>cond-rim-pad", "cond-rim-trig>voice-tom-h-trig", "voice-tom-h-out>desk-5-in",
      "pad-kick-out>cond-kick-pad", "cond-kick-trig>voice-low-trig", "voice-low-out>desk-1-in",
      "pad-snare-out>cond-tom-pad", "cond-tom-env>voice-hiss-env", "voice-hiss-out>desk-8-in",
    ],
    knobs: { "cond-rim/threshold": 0.8, "voice-tom-h/bend": 0.5 },
  },
];
