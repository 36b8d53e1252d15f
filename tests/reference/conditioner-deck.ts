import type { Circuit } from "@/lib/core/electrics/conditioner/conditioner-types";
import { strikeConductance } from "@/lib/core/electrics/conditioner/strike-conductance";

/** What helps the simulator over the comparator's jump: the first is the sharpest, the others are for decks it gives up on. */
export interface Ease {
  /** Of the decision, per volt; half of it is made within a fraction of a millivolt. */
  steep: number;
  /** At the comparator's output, F: with the output's conductance a few nanoseconds. */
  outFarad: number;
  method: "trap" | "gear";
  /** How much shorter than usual the longest step is. */
  finer: number;
}

export const EASES: readonly Ease[] = [
  { steep: 2e4, outFarad: 1e-9, method: "gear", finer: 1 },
  { steep: 2e4, outFarad: 300e-12, method: "trap", finer: 1 },
  { steep: 5e3, outFarad: 5e-9, method: "gear", finer: 1 },
];

/** For a circuit on which solver and simulator differ: the simulator again, an order finer, decides. */
export const FINE: Ease = { steep: 2e5, outFarad: 1e-10, method: "gear", finer: 20 };

/** Time constant of the decision where it must remember itself (hysteresis), s. */
const MEMORY_S = 2e-7;
/** An edge of no length, which a deck cannot hold, s. */
const EDGE_S = 1e-9;

/**
 * The circuit of electrics §3 as a deck. The pad is a conductance over time; the comparator a steep decision, a ramp where
 * its slew is known, and one source of current that follows the wanted level until its limit: min and max on its current.
 * @param ownSteps true: the simulator chooses its steps freely, as for the race.
 */
export function conditionerDeck(circuit: Circuit, stopS: number, ease: Ease, ownSteps = false): string {
  const { leg, highV, outHighV, outLowV, tripV, releaseV, slewVperS, envelope, limitA, sinkA } = circuit;
  const { corners, shortestS } = padCorners(circuit);
  const [top, bottom] = [leg === "upper" ? "Bpad vcc pad I=v(g)*(v(vcc)-v(pad))" : `Rfix vcc pad ${circuit.dividerOhm}`, leg === "upper" ? `Rfix pad 0 ${circuit.dividerOhm}` : "Bpad pad 0 I=v(g)*v(pad)"];
  const middle = (tripV + releaseV) / 2;
  const half = (tripV - releaseV) / 2;
  const decision = half > 0
    ? [`Bdec 0 dec I=(0.5*(1+tanh(${ease.steep}*(v(s)-(${middle})-(${half})*(1-2*v(dec)))))-v(dec))*1m`, `Cdec dec 0 ${MEMORY_S * 1e-3}`]
    : [`Bdec dec 0 V=0.5*(1+tanh(${ease.steep}*(v(s)-(${tripV}))))`];
  const restV = tripV <= 0 ? outHighV : outLowV;
  const swing = outHighV - outLowV;
  const wanted = slewVperS < Infinity
    ? [`Bwant 0 want I=max(${-slewVperS},min(${slewVperS},((${outLowV})+(${swing})*v(dec)-v(want))*${slewVperS * 1e3}))*1n`, "Cwant want 0 1n"]
    : [`Bwant want 0 V=(${outLowV})+(${swing})*v(dec)`];
  const follower = envelope
    ? [`Re1 out e1 ${Math.max(envelope.seriesOhm, 1e-3)}`, "De1 e1 e D4148", `Ce e 0 ${envelope.farad}`, `Re2 e 0 ${envelope.ohm}`, "Q1 vcc e em NPN1", `Re3 em 0 ${envelope.emitterOhm}`]
    : [];
  const tauS = circuit.couplingF * circuit.couplingOhm;
  const longest = ownSteps ? "" : ` 0 ${Math.min(stopS / 300, shortestS / 25, tauS / 25) / ease.finer}`;
  return [
    "conditioner",
    `Vcc vcc 0 ${highV}`,
    `Vg g 0 PWL(${corners.map(([t, g]) => `${t} ${g}`).join(" ")})`,
    top,
    bottom,
    `Cc pad s ${circuit.couplingF}`,
    `Rc s 0 ${circuit.couplingOhm}`,
    "Dc 0 s D4148",
    ...decision,
    ...wanted,
    `Bcmp 0 out I=max(${-sinkA},min(${limitA},(v(want)-v(out))*20))`,
    `Cout out 0 ${ease.outFarad}`,
    `Rs out trig ${Math.max(circuit.seriesOhm, 1e-3)}`,
    `Rl trig 0 ${circuit.loadOhm === Infinity ? 1e12 : circuit.loadOhm}`,
    ...follower,
    `.nodeset v(want)=${restV} v(out)=${restV}`,
    ".model D4148 D(Is=2.52n N=1.752 Rs=0.568)",
    ".model NPN1 NPN(Is=6.734f Bf=416.4 Ise=6.734f Ne=1.259 Vaf=74 Ikf=66.78m)",
    `.options reltol=${ownSteps ? 1e-3 : 1e-5 / ease.finer} temp=27 tnom=27 method=${ease.method}`,
    `.tran ${stopS / 1000} ${stopS}${longest}`,
    ".end",
  ].join("\n");
}

function padCorners(circuit: Circuit): { corners: [number, number][]; shortestS: number } {
  const { times, siemens } = strikeConductance(circuit);
  const corners: [number, number][] = [];
  let shortestS = Infinity;
  times.forEach((time, i) => {
    const earlier = corners.at(-1)?.[0] ?? -Infinity;
    if (time - earlier > 10 * EDGE_S && Number.isFinite(earlier)) shortestS = Math.min(shortestS, time - earlier);
    corners.push([Math.max(time, earlier + EDGE_S), siemens[i] as number]);
  });
  return { corners, shortestS };
}
