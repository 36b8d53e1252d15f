import { box, conditioner, deskChannel, input, output, pad, supply, type SeedGear } from "./build-gear";

/** Marrow Lane's two tea trolleys: everything here is invented. */

const audioOut = (id: string, peak: string) => output(`${id}-out`, "Audio out", { signal: "audio", restV: "0", activeV: peak, sourceOhm: "1k", limitA: "10m" });
const trigIn = (id: string, figures: Partial<Parameters<typeof input>[2]> = {}) =>
  input(`${id}-trig`, "Trig", { accepts: ["trigger", "gate"], onV: "1–2", offV: "0.8–1.5", safeLowV: "-0.5", safeHighV: "12", loadOhm: "100k", ...figures });

export const demoSupplies: SeedGear[] = [
  supply("batt-a", "Battery, top trolley", { source: "battery", highV: "6–9.6", lowV: 0, ratingA: "50m" }),
  supply("batt-b", "Battery, low trolley", { source: "battery", highV: "6–9.6", lowV: 0, ratingA: "50m" }),
  supply("rail-12", "±12 V adapter box", { source: "mains-adapter", highV: "11.8–12.2", lowV: "-12", ratingA: "400m" }),
  supply("rail-5", "5 V adapter", { source: "mains-adapter", highV: "4.9–5.1", lowV: 0, ratingA: "500m" }),
];

export const demoPads: SeedGear[] = [
  pad("pad-kick", "Kick slab", "Bath-mat foam under ply, 30 cm square.", { restOhm: "45k–50k", hitOhm: "9k–11k" }),
  pad("pad-snare", "Snare tile", "Black foam from a chip tray, 12 cm.", { restOhm: "38k–42k", hitOhm: "9k–10k" }),
  pad("pad-tom-l", "Low tom tile", "Same foam, 15 cm.", { restOhm: "40k–46k", hitOhm: "9k5–11k" }),
  pad("pad-tom-h", "High tom tile", "Same foam, 10 cm.", { restOhm: "30k–36k", hitOhm: "8k5–10k" }),
  pad("pad-plate", "Plate strip", "Thin foam on a baking tray; nobody has measured it.", { restOhm: "20k–50k", hitOhm: "10k" }, ["details.restOhm", "details.hitOhm"]),
  pad("pad-rim-l", "Left rim disc", "27 mm piezo disc under the rim.", { sensor: "piezo", farad: "16n ±30%", peakV: "5–40", riseS: null, holdS: null, fallS: null }, ["details.peakV"]),
  pad("pad-rim-r", "Right rim disc", "27 mm piezo disc under the rim.", { sensor: "piezo", farad: "16n ±30%", peakV: "5–40", riseS: null, holdS: null, fallS: null }, ["details.peakV"]),
  pad("pad-foot", "Foot switch", "Doorbell push in a tin.", { sensor: "switch", restOhm: null, hitOhm: "1", riseS: null, holdS: null, fallS: null }),
];

export const demoConditioning: SeedGear[] = [
  conditioner("cond-kick", "Kick trigger", "Half of the first dual op-amp.", "batt-a", {}),
  conditioner("cond-snare", "Snare trigger", "Other half; no shunt at its output, so nearly all of the battery comes out.", "batt-a", { output: { seriesOhm: "1k", shuntOhm: null } }),
  conditioner("cond-tom", "Tom trigger", "With a short envelope beside the trigger.", "batt-b", {
    envelope: { seriesOhm: "100", farad: "1u", ohm: "100k", emitterOhm: "10k" },
  }),
  conditioner("cond-plate", "Plate trigger", "Built late at night with 22 nF and 12 kΩ.", "batt-b", { coupling: { farad: "22n", ohm: "12k" } }),
  conditioner("cond-rim", "Rim trigger", "On the ±12 V box; no diode at its output.", "rail-12", { output: { seriesOhm: "1k", shuntOhm: null } }),
  {
    id: "cond-grey",
    gear: {
      name: "Grey box",
      notes: "Swapped for a bag of cable ties. No diagram; known by its readings alone.",
      supplyId: null,
      details: { kind: "conditioner", build: "black-box", circuit: null },
      jacks: [
        input("cond-grey-pad", "Pad in", { accepts: ["sensor"] }, "pad-in"),
        output("cond-grey-trig", "Out", { signal: "trigger", restV: "0.9–1.1", activeV: "6.8–7.4", sourceOhm: "2k2 ±10%" }, "plain"),
      ],
      knobs: [{ id: "sens", name: "Sens", turns: "nothing" }],
      assumed: [],
    },
  },
];

export const demoShapers: SeedGear[] = [
  box("shape-env", "shaper", "Swell maker", "Turns a trigger into a long envelope.", "rail-12", [
    input("shape-env-in", "Trig", { accepts: ["trigger", "gate"], onV: "1–2", offV: "0.8–1.5", safeLowV: "-12", safeHighV: "12", loadOhm: "100k" }),
    output("shape-env-out", "Env", { signal: "envelope", restV: "0–0.05", activeV: "7.5–8.5", sourceOhm: "1k", decayS: "300m–500m", limitA: "10m" }),
  ], ["Decay"]),
  box("shape-gate", "shaper", "Gate holder", "Holds a 5 V gate for as long as the knob says; its logic chip gives little current.", "rail-5", [
    input("shape-gate-in", "Trig", { accepts: ["trigger", "gate"], onV: "1–2", offV: "0.8–1.5", safeLowV: "-0.5", safeHighV: "12", loadOhm: "100k" }),
    output("shape-gate-out", "Gate", { signal: "gate", restV: "0–0.05", activeV: "4.8–5.1", sourceOhm: "220", pulseS: "20m–80m", limitA: "1m" }),
  ], ["Hold"]),
];

export const demoVoices: SeedGear[] = [
  box("voice-low", "voice", "Low drum", "Bridged-T oscillator, rings when pinged.", "rail-12", [trigIn("voice-low"), audioOut("voice-low", "2.5–3.5")], ["Pitch", "Decay"]),
  box("voice-snare", "voice", "Snare", "Noise and a ringing filter.", "rail-12", [trigIn("voice-snare", { pulseMinS: "1.5m" }), audioOut("voice-snare", "2–3")], ["Snap", "Decay"]),
  box("voice-tin", "voice", "Tin plate", "A bare 5 V logic input behind the jack: 5.5 V is all it stands.", "rail-5", [
    input("voice-tin-trig", "Trig", { accepts: ["trigger", "gate"], onV: "0.8–2", offV: "0.8–2", safeLowV: "-0.5", safeHighV: "5.5", loadOhm: "100k" }),
    audioOut("voice-tin", "1–1.5"),
  ], ["Ring"]),
  box("voice-hiss", "voice", "Hiss", "Wants a shape, not a pulse: the envelope opens the noise.", "rail-12", [
    input("voice-hiss-env", "Env in", { accepts: ["envelope", "control"], safeLowV: "-0.5", safeHighV: "12", loadOhm: "47k", decayMinS: "50m" }),
    audioOut("voice-hiss", "1.5–2"),
  ], ["Colour"]),
  box("voice-clap", "voice", "Clap", "Fires when its input is pulled to 0 V.", "rail-5", [
    input("voice-clap-trig", "Pull", { accepts: ["trigger", "gate"], polarity: "falling", onV: "0.8–2", offV: "2–3", safeLowV: "-0.5", safeHighV: "12", loadOhm: "10k", biasV: "5" }),
    audioOut("voice-clap", "1.5–2"),
  ], ["Spread"]),
  box("voice-tom-l", "voice", "Low tom", "", "rail-12", [trigIn("voice-tom-l"), audioOut("voice-tom-l", "2–3")], ["Pitch", "Bend"]),
  box("voice-tom-h", "voice", "High tom", "Answers only to short pulses.", "rail-12", [trigIn("voice-tom-h", { pulseMaxS: "5m" }), audioOut("voice-tom-h", "2–3")], ["Pitch", "Bend"]),
  box("voice-wood", "voice", "Wood", "Needs a firm push: a diode and a transistor in series.", "rail-12", [
    trigIn("voice-wood", { onV: "2–4.5", offV: "1.5–2", loadOhm: "4k7" }), audioOut("voice-wood", "1–2"),
  ], ["Length"]),
  box("voice-bell", "voice", "Bell", "Built for a bigger system: wants most of 12 V.", "rail-12", [
    trigIn("voice-bell", { onV: "9–10", offV: "6–8", safeHighV: "15", loadOhm: "3k3" }), audioOut("voice-bell", "2–3"),
  ], ["Partials"]),
];

export const demoDesk: SeedGear[] = [
  deskChannel(1, "Ch 1 low drum"), deskChannel(2, "Ch 2 snare"), deskChannel(3, "Ch 3 tin"), deskChannel(4, "Ch 4 hiss"),
  deskChannel(5, "Ch 5 toms"), deskChannel(6, "Ch 6 wood"), deskChannel(7, "Ch 7 bell"), deskChannel(8, "Ch 8 mic", { loadOhm: "1k5", maxDbu: 0, phantom: true }),
];

export const demoGear: SeedGear[] = [...demoSupplies, ...demoPads, ...demoConditioning, ...demoShapers, ...demoVoices, ...demoDesk];
