import { describe, expect, it } from "vitest";
import { contactStrike, oneShotS, simulateConditioner, simulatePiezo, type PiezoSpec } from "@/lib/core/electrics";
import { DiscMoment } from "@/lib/core/electrics/piezo/disc-moment";

const disc: PiezoSpec = {
  disc: { farad: 20e-9, peakV: 20, ringHz: 400, decayS: 10e-3 }, bleedOhm: 1e6, clamp: { seriesOhm: 100e3, highV: 5 },
  comparator: { thresholdV: 1, hysteresisV: 0.1 }, oneShot: { ohm: 10e3, farad: 1e-7 },
};

describe("a piezo disc on a comparator", () => {
  it("20 nF with 1 MΩ has its corner at 7.96 Hz (arithmetic, sources §8)", () => {
    expect(simulatePiezo(disc).cornerHz).toBeCloseTo(7.96, 2);
  });

  it("40 V through 100 kΩ into a diode to 5 V: 5.535 V and 0.34 mA (run in ngspice, sources §3)", () => {
    const at = new DiscMoment({ ...disc, disc: { ...disc.disc, peakV: 40 } });
    at.look(0, 40);
    expect(at.inputV).toBeCloseTo(5.535, 2);
    expect(at.clampA).toBeCloseTo(0.34e-3, 5);
  });

  it("without a clamp, and a bleed too large to matter, the input is the disc's own sine", () => {
    const free = simulatePiezo({ ...disc, clamp: null, bleedOhm: 1e12, comparator: { thresholdV: 10, hysteresisV: 0 } });
    // The first crest of e^(−t/τ)·sin ωt lies where tan ωt = ωτ.
    const omega = 2 * Math.PI * 400;
    const crestS = Math.atan(omega * 10e-3) / omega;
    expect(free.inputPeakV).toBeCloseTo(20 * Math.exp(-crestS / 10e-3) * Math.sin(omega * crestS), 1);
  });

  it("each swing is a pulse, and a one-shot makes fewer of them, 1.0986 ms each: 10 kΩ·100 nF·ln 3 (TI SLFS022)", () => {
    const found = simulatePiezo(disc);
    expect(found.pulses.length).toBeGreaterThan(3);
    expect(oneShotS(10e3, 1e-7)).toBeCloseTo(1.0986e-3, 7);
    expect(found.oneShotPulses![0]!.widthS).toBeGreaterThanOrEqual(1.0986e-3);
    const long = simulatePiezo({ ...disc, oneShot: { ohm: 1e6, farad: 1e-7 } });
    expect(long.oneShotPulses).toHaveLength(1);
  });

  it("refuses figures that are none, by name", () => {
    for (const farad of [0, -1, NaN, Infinity, 1e300]) expect(() => simulatePiezo({ ...disc, disc: { ...disc.disc, farad } })).toThrow(/disc\.farad/);
    expect(() => oneShotS(0, 1)).toThrow(RangeError);
  });
});

describe("a switch contact", () => {
  const contact = { openOhm: 10e6, closedOhm: 1, bounces: 3, bounceS: 3e-3, holdS: 20e-3 };
  const circuit = {
    supply: { highV: 9, lowV: 0 }, pad: { kind: "resistive" as const, restOhm: 10e6, hitOhm: 1, leg: "upper" as const }, divider: { ohm: 10e3 }, coupling: { farad: 1e-8, ohm: 22e3 },
    threshold: { topOhm: 100e3, potOhm: 10e3, bottomOhm: 1e3, turn: 0.5 }, comparator: { highDropV: 1.5, lowDropV: 0.02, limitA: 0.02 }, output: { seriesOhm: 2200, shuntOhm: null }, envelope: null, load: { ohm: 100e3 },
  };

  it("that bounces three times fires four times, a clean one once", () => {
    expect(simulateConditioner({ ...circuit, strike: contactStrike(contact) }).pulses).toHaveLength(4);
    expect(simulateConditioner({ ...circuit, strike: contactStrike({ ...contact, bounces: 0, bounceS: 0 }) }).pulses).toHaveLength(1);
  });

  it("refuses a contact that is no contact", () => {
    expect(() => contactStrike({ ...contact, openOhm: 0.5 })).toThrow(RangeError);
    expect(() => contactStrike({ ...contact, bounces: 1.5 })).toThrow(RangeError);
    expect(() => contactStrike({ ...contact, holdS: 0 })).toThrow(RangeError);
  });
});
