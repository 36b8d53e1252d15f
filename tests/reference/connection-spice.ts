import { Simulation } from "eecircuit-engine";

/** One element between a node and ground, seen from the node. */
export type Element =
  | { kind: "source" | "load"; volt: number; ohm: number }
  | { kind: "or" | "clamp-high" | "clamp-low"; volt: number; ohm: number };

/** A node as the reference simulator gets it. */
export type Circuit = Element[];

/**
 * Levels of many independent nodes from ngspice (npm eecircuit-engine), a few hundred to a deck.
 * Diodes are behavioural and ideal, as the check takes them: current only one way, behind their resistance.
 */
export async function spiceLevels(circuits: readonly Circuit[], perDeck = 400): Promise<number[]> {
  const sim = new Simulation();
  await sim.start();
  const levels: number[] = [];
  for (let from = 0; from < circuits.length; from += perDeck) {
    const batch = circuits.slice(from, from + perDeck);
    const lines = batch.flatMap((circuit, i) => circuit.flatMap((element, j) => elementLines(element, `${i}_${j}`, `n${i}`)));
    sim.setNetList(["nodes", ...lines, ".options reltol=1e-6 vntol=1e-9 abstol=1e-13 gmin=1e-15", ".op", ".end"].join("\n"));
    const result = await sim.runSim();
    failOnError(sim);
    if (result.dataType !== "real") throw new Error("expected real values");
    const byName = new Map(result.data.map((column) => [column.name.toLowerCase(), column.values[0] ?? NaN]));
    batch.forEach((_, i) => levels.push(byName.get(`v(n${i})`) ?? byName.get(`n${i}`) ?? NaN));
  }
  return levels;
}

/** The time at which each envelope's node falls through its threshold, s; ngspice transient. */
export async function spiceCrossings(nodes: readonly { active: number; rest: number; decayS: number; sourceOhm: number; loadOhm: number; on: number }[], stopS: number, steps: number): Promise<number[]> {
  const sim = new Simulation();
  await sim.start();
  const lines = nodes.flatMap((n, i) => [
    `B${i} s${i} 0 V=${n.rest}+(${n.active - n.rest})*exp(-time/${n.decayS})`,
    `R${i}a s${i} n${i} ${n.sourceOhm}`,
    `R${i}b n${i} 0 ${n.loadOhm}`,
  ]);
  sim.setNetList(["envelopes", ...lines, `.tran ${stopS / steps} ${stopS} 0 ${stopS / steps}`, ".end"].join("\n"));
  const result = await sim.runSim();
  failOnError(sim);
  if (result.dataType !== "real") throw new Error("expected real values");
  const time = result.data[0]?.values ?? [];
  return nodes.map((n, i) => {
    const column = result.data.find(({ name }) => name.toLowerCase() === `v(n${i})`)?.values ?? [];
    const after = column.findIndex((v) => v < n.on);
    if (after < 1) return NaN;
    const [v0, v1, t0, t1] = [column[after - 1]!, column[after]!, time[after - 1]!, time[after]!];
    return t0 + ((v0 - n.on) / (v0 - v1)) * (t1 - t0);
  });
}

function failOnError(sim: Simulation): void {
  const errors = sim.getError().filter((line) => !/^\s*$|warning|note/i.test(line));
  if (errors.length > 0) throw new Error(`the simulator refused the deck: ${errors.slice(0, 3).join(" | ")}`);
}

function elementLines(element: Element, id: string, node: string): string[] {
  const { volt, ohm } = element;
  if (element.kind === "source" || element.kind === "load") return [`V${id} s${id} 0 ${volt}`, `R${id} s${id} ${node} ${ohm}`];
  const drains = element.kind === "clamp-high";
  const drop = drains ? `v(${node})-(${volt})` : `(${volt})-v(${node})`;
  return [drains ? `B${id} ${node} 0 I=max(0,(${drop})/${ohm})` : `B${id} 0 ${node} I=max(0,(${drop})/${ohm})`];
}
