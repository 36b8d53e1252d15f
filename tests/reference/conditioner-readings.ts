import type { Circuit, Pulse } from "@/lib/core/electrics/conditioner/conditioner-types";
import type { Columns } from "./ngspice";

/** The figures of the contract (electrics §3) read off the simulator's columns. */
export interface Readings {
  padRestV: number;
  padHitV: number;
  shapedPeakV: number;
  restV: number;
  highestV: number;
  pulses: Pulse[];
  envelope: null | { peakV: number; decayS: number | null };
}

export function readingsOf(columns: Columns, circuit: Circuit): Readings {
  const column = (name: string) => columns.get(name) ?? [];
  const time = column("time");
  const pad = column("v(pad)");
  const trigger = column("v(trig)");
  const half = ((circuit.outHighV + circuit.outLowV) / 2) * circuit.triggerShare;
  const up = (circuit.leg === "upper") === circuit.hitOhm <= circuit.restOhm;
  return {
    padRestV: pad[0] ?? NaN,
    padHitV: up ? most(pad) : -most(pad.map((v) => -v)),
    shapedPeakV: most(column("v(s)")),
    restV: trigger[0] ?? NaN,
    highestV: most(trigger),
    pulses: pulsesAt(time, trigger, half),
    envelope: circuit.envelope ? envelopeOf(time, column("v(em)"), column("v(dec)")) : null,
  };
}

function envelopeOf(time: readonly number[], emitter: readonly number[], decision: readonly number[]): Readings["envelope"] {
  const peakV = most(emitter);
  const lastHighS = pulsesAt(time, decision, 0.5).at(-1);
  if (!lastHighS) return { peakV, decayS: null };
  const fromS = lastHighS.startS + lastHighS.widthS;
  const goal = peakV / Math.E;
  for (let i = 1; i < time.length; i += 1) {
    const [t0, t1, v0, v1] = [time[i - 1]!, time[i]!, emitter[i - 1]!, emitter[i]!];
    if (t1 > fromS && v0 > goal && v1 <= goal) return { peakV, decayS: t0 + ((v0 - goal) / (v0 - v1)) * (t1 - t0) - fromS };
  }
  return { peakV, decayS: null };
}

/** Rises and falls through a level, straight between samples. */
export function pulsesAt(time: readonly number[], values: readonly number[], level: number): Pulse[] {
  const pulses: Pulse[] = [];
  let startS: number | null = null;
  for (let i = 1; i < time.length; i += 1) {
    const [t0, t1, v0, v1] = [time[i - 1]!, time[i]!, values[i - 1]!, values[i]!];
    const at = t0 + ((level - v0) / (v1 - v0)) * (t1 - t0);
    if (v0 < level && v1 >= level) startS = at;
    if (v0 >= level && v1 < level && startS !== null) {
      pulses.push({ startS, widthS: at - startS });
      startS = null;
    }
  }
  return pulses;
}

export function most(values: readonly number[]): number {
  return values.reduce((a, b) => Math.max(a, b), -Infinity);
}
