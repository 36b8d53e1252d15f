import { formatQuantity } from "@/lib/core/units/format-quantity";
import { toRange } from "@/lib/core/units/spread";
import type { Reason } from "../jacks";
import { isAbove, isBelow } from "./compare";
import type { Scene } from "./scene";

/** 0 dBu is the voltage that gives 1 mW in 600 Ω. Source: √0.6 V; see also the table at Sowter. */
const ZERO_DBU_V = Math.sqrt(0.6);
/** Load over source that costs less than 1 dB. Source: bridging practice (IEC 61938, secondary). */
const LEAST_BRIDGING = 10;

/**
 * Level of a sine, dBu.
 * @param peakV its peak, V, above 0; 0 gives −Infinity.
 */
export function dbuOfPeak(peakV: number): number {
  return 20 * Math.log10(peakV / Math.SQRT2 / ZERO_DBU_V);
}

/** Peak of a sine of a level, V: the inverse of {@link dbuOfPeak}. @param dbu any finite level. */
export function peakOfDbu(dbu: number): number {
  return 10 ** (dbu / 20) * ZERO_DBU_V * Math.SQRT2;
}

/** Level, bridging and phantom power of an audio lead. */
export function judgeAudio(scene: Scene): Reason[] {
  const audio = scene.driving.filter((i) => scene.outputs[i]?.signal === "audio");
  if (audio.length === 0) return [];
  return [...judgeLevel(scene), ...judgeBridging(scene, audio), ...judgePhantom(scene)];
}

function judgeLevel({ input, highV }: Scene): Reason[] {
  if (input.maxDbu === undefined || !highV) return [];
  const peak = Math.max(Math.abs(highV.min), Math.abs(highV.max));
  if (peak === 0) return [];
  const dbu = dbuOfPeak(peak);
  if (!isAbove(dbu, input.maxDbu)) return [];
  const text = `${signed(dbu)} dBu arrives (${formatQuantity(peak, "V")} peak); the channel takes ${signed(input.maxDbu)} dBu.`;
  return [{ verdict: "hot", text, measured: dbu, limit: input.maxDbu, unit: "dBu" }];
}

function judgeBridging(scene: Scene, audio: number[]): Reason[] {
  return audio.flatMap((index): Reason[] => {
    const sourceOhm = scene.outputs[index]?.sourceOhm;
    if (sourceOhm === undefined || scene.leastLoadOhm === Infinity) return [];
    const source = toRange(sourceOhm).max;
    if (source === 0) return [];
    const ratio = scene.leastLoadOhm / source;
    if (!isBelow(ratio, LEAST_BRIDGING)) return [];
    const text = `The load is only ${three(ratio)} × the output's ${formatQuantity(source, "Ohm")}: level is lost; ${LEAST_BRIDGING} × or more is wanted.`;
    return [{ verdict: "tight", text, measured: ratio, limit: LEAST_BRIDGING, unit: "ratio" }];
  });
}

function judgePhantom({ input }: Scene): Reason[] {
  if (!input.phantom) return [];
  return [{ verdict: "tight", text: "Phantom power is on for this channel: switch it off before a home-made output is plugged in, or put a DI box between." }];
}

function signed(dbu: number): string {
  const text = three(Math.abs(dbu));
  return dbu < 0 ? `\u2212${text}` : `+${text}`;
}

function three(value: number): string {
  return String(Number(value.toPrecision(3)));
}
