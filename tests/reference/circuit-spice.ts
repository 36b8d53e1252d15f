import { Simulation } from "eecircuit-engine";
import type { Circuit } from "@/lib/core/electrics/circuit/conditioner-types";
import { strikeConductance } from "@/lib/core/electrics/circuit/strike-conductance";

/** What the reference simulator says of one conditioner. */
export interface SpiceAnswer {
  timeS: number[];
  padV: number[];
  shapedV: number[];
  outV: number[];
  emitterV: number[] | null;
  stopS: number;
}

/** Settings a simulator needs to get over the comparator's jump; the first is the sharpest, the next are for decks it gives up on. */
interface Ease {
  steep: number;
  farad: string;
  method: "trap" | "gear";
}
const EASES: readonly Ease[] = [
  { steep: 2e4, farad: "300p", method: "trap" },
  { steep: 2e4, farad: "1n", method: "gear" },
  { steep: 5e3, farad: "2n", method: "gear" },
];

/** The circuit of electrics §3 as an ngspice deck: devices by their models, the comparator as a steep limited source. */
export function deckOf(circuit: Circuit, stopS: number, ease: Ease = EASES[0] as Ease): string {
  const { times, siemens } = strikeConductance(circuit);
  const padEnds = circuit.leg === "upper" ? ["vcc", "pad"] : ["pad", "0"];
  const fixedEnds = circuit.leg === "upper" ? ["pad", "0"] : ["vcc", "pad"];
  const target = `(${circuit.outLowV} + ${circuit.outHighV - circuit.outLowV} * 0.5 * (1 + tanh(${ease.steep} * (v(s) - ${circuit.tripV}))))`;
  const shortest = Math.min(...times.slice(1).map((t, i) => t - (times[i] as number)).filter((d) => d > 1e-6), circuit.couplingF * circuit.couplingOhm);
  const fixed = 1 / circuit.dividerOhm;
  const padRestV = (circuit.highV * (circuit.leg === "upper" ? (siemens[0] as number) : fixed)) / ((siemens[0] as number) + fixed);
  const envelope = circuit.envelope
    ? [`Re1 out e1 ${circuit.envelope.seriesOhm + 1e-3}`, "De1 e1 e D4148", `Ce e 0 ${circuit.envelope.farad}`, `Re2 e 0 ${circuit.envelope.ohm}`, "Q1 vcc e em NPN1", `Re3 em 0 ${circuit.envelope.emitterOhm}`]
    : [];
  return [
    "conditioner",
    `Vcc vcc 0 ${circuit.highV}`,
    `Vg g 0 PWL(${times.map((t, i) => `${t - (times[0] as number)} ${siemens[i]}`).join(" ")})`,
    `Bpad ${padEnds[0]} ${padEnds[1]} I=v(g)*(v(${padEnds[0]})-v(${padEnds[1]}))`.replaceAll("v(0)", "0"),
    `Rfix ${fixedEnds[0]} ${fixedEnds[1]} ${circuit.dividerOhm}`,
    `Cc pad s ${circuit.couplingF}`,
    `Rc s 0 ${circuit.couplingOhm}`,
    "Dc 0 s D4148",
    `Bcmp 0 out I=max(${-circuit.sinkA}, min(${circuit.limitA}, (${target} - v(out)) * 20))`,
    `Cout out 0 ${ease.farad}`,
    ...(circuit.loadOhm === Infinity ? [`Rs out trig ${circuit.seriesOhm + 1e-3}`, "Rl trig 0 1e12"] : [`Rs out trig ${circuit.seriesOhm + 1e-3}`, `Rl trig 0 ${circuit.loadOhm}`]),
    ...envelope,
    ".model D4148 D(Is=2.52n N=1.752 Rs=0.568)",
    ".model NPN1 NPN(Is=6.734f Bf=416.4 Ise=6.734f Ne=1.259 Vaf=74 Ikf=66.78m)",
    `.options reltol=1e-5 vntol=1e-8 abstol=1e-12 temp=27 method=${ease.method}`,
    // The comparator's jump misleads the search for the settled state: begin near it.
    `.nodeset v(s)=0 v(pad)=${padRestV} v(out)=${circuit.outLowV}`,
    `.tran ${stopS / 1000} ${stopS} 0 ${Math.min(stopS / 500, shortest / 12)}`,
    ".end",
  ].join("\n");
}

/** Null where the simulator gives up on the deck with every ease. */
export async function runDeck(getSim: (fresh: boolean) => Promise<Simulation>, circuit: Circuit, stopS: number): Promise<SpiceAnswer | null> {
  for (const [attempt, ease] of EASES.entries()) {
    // After a deck it gave up on the simulator is not to be trusted with the next one.
    const sim = await getSim(attempt > 0);
    sim.setNetList(deckOf(circuit, stopS, ease));
    try {
      const result = await sim.runSim();
      const errors = sim.getError().filter((line) => /abort|too small|error|singular/i.test(line));
      if (errors.length === 0 && result.dataType === "real") return answerOf(result.data, circuit, stopS);
    } catch {
      // A deck it gave up on; the next ease.
    }
  }
  return null;
}

function answerOf(data: readonly { name: string; values: number[] }[], circuit: Circuit, stopS: number): SpiceAnswer {
  const column = (name: string) => data.find((item) => item.name.toLowerCase() === name)?.values;
  return {
    timeS: column("time") ?? [],
    padV: column("v(pad)") ?? [],
    shapedV: column("v(s)") ?? [],
    outV: column("v(trig)") ?? [],
    emitterV: circuit.envelope ? (column("v(em)") ?? []) : null,
    stopS,
  };
}

/** Pulses of the trigger output at a level, from sampled values, straight between samples. */
export function pulsesAt(answer: SpiceAnswer, level: number): { startS: number; widthS: number }[] {
  const pulses: { startS: number; widthS: number }[] = [];
  let startS: number | null = null;
  for (let i = 1; i < answer.timeS.length; i += 1) {
    const [t0, t1, v0, v1] = [answer.timeS[i - 1]!, answer.timeS[i]!, answer.outV[i - 1]!, answer.outV[i]!];
    const at = t0 + ((level - v0) / (v1 - v0)) * (t1 - t0);
    if (v0 < level && v1 >= level) startS = at;
    if (v0 >= level && v1 < level && startS !== null) {
      pulses.push({ startS, widthS: at - startS });
      startS = null;
    }
  }
  return pulses;
}
