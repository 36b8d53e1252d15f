import { expect, it } from "vitest";
import { simulatePiezo, type PiezoSpec } from "@/lib/core/electrics";
import { seededRandom } from "@/lib/core/electrics/tolerance/seeded-random";
import { most, pulsesAt } from "./conditioner-readings";
import { Ngspice } from "./ngspice";

const COUNT = 40;

function randomPiezo(seed: number): PiezoSpec {
  const next = seededRandom(seed * 977 + 5);
  const decades = (low: number, high: number) => low * (high / low) ** next();
  const ringHz = decades(80, 4000);
  return {
    disc: { farad: decades(5e-9, 40e-9), peakV: decades(1, 60), ringHz, decayS: decades(2, 20) / ringHz },
    bleedOhm: decades(30e3, 5e6),
    clamp: next() < 0.75 ? { seriesOhm: decades(1e3, 300e3), highV: 3 + 9 * next() } : null,
    comparator: { thresholdV: decades(0.1, 2), hysteresisV: 0 },
    oneShot: null,
  };
}

function deckOf({ disc, bleedOhm, clamp }: PiezoSpec, stopS: number): string {
  return [
    "piezo",
    `Bopen open 0 V=${disc.peakV}*exp(-time/${disc.decayS})*sin(${2 * Math.PI * disc.ringHz}*time)`,
    `Cdisc open v ${disc.farad}`,
    `Rbleed v 0 ${bleedOhm}`,
    ...(clamp ? [`Rs v s ${clamp.seriesOhm}`, `Vc c 0 ${clamp.highV}`, "Dup s c D4148", "Ddown 0 s D4148"] : ["Rs v s 1m", "Rn s 0 1e12"]),
    ".model D4148 D(Is=2.52n N=1.752 Rs=0.568)",
    ".options reltol=1e-5 temp=27 tnom=27 method=gear",
    `.tran ${stopS / 1000} ${stopS} 0 ${0.01 / disc.ringHz} uic`,
    ".end",
  ].join("\n");
}

it(`${COUNT} random piezo discs agree with ngspice in levels (1 % or 20 mV) and in every pulse (2 % or 20 µs)`, { timeout: 120_000 }, async () => {
  const ngspice = new Ngspice();
  let pulses = 0;
  const worst = { peakV: 0, startS: 0, widthS: 0 };
  for (let seed = 0; seed < COUNT; seed += 1) {
    const spec = randomPiezo(seed);
    const columns = await ngspice.run(deckOf(spec, 5 * spec.disc.decayS));
    expect(columns, `seed ${seed}`).not.toBeNull();
    const [time, input] = [columns!.get("time")!, columns!.get("v(s)")!];
    const ours = simulatePiezo(spec);
    const peakV = most(input);
    worst.peakV = Math.max(worst.peakV, Math.abs(ours.inputPeakV - peakV));
    expect(Math.abs(ours.inputPeakV - peakV), `seed ${seed}`).toBeLessThan(Math.max(0.01 * peakV, 0.02));
    const theirs = pulsesAt(time, input, spec.comparator.thresholdV).slice(0, 6);
    theirs.forEach((pulse, i) => {
      // A crest that grazes the threshold is too near to call (electrics §3).
      if (pulse.widthS < 0.05 / spec.disc.ringHz) return;
      const own = ours.pulses[i];
      expect(own, `seed ${seed}, pulse ${i}`).toBeDefined();
      pulses += 1;
      worst.startS = Math.max(worst.startS, Math.abs(own!.startS - pulse.startS));
      worst.widthS = Math.max(worst.widthS, Math.abs(own!.widthS - pulse.widthS));
      expect(Math.abs(own!.startS - pulse.startS), `seed ${seed}, pulse ${i}`).toBeLessThan(Math.max(0.02 * pulse.startS, 20e-6));
      expect(Math.abs(own!.widthS - pulse.widthS), `seed ${seed}, pulse ${i}`).toBeLessThan(Math.max(0.02 * pulse.widthS, 20e-6));
    });
  }
  console.log(`${pulses} pulses compared; largest differences`, worst);
  expect(pulses).toBeGreaterThan(80);
});
