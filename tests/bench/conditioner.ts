import { spawnSync } from "node:child_process";
import { mkdtempSync, rmSync, writeFileSync } from "node:fs";
import { tmpdir } from "node:os";
import { join } from "node:path";
import { simulateConditioner, simulateForPatch, type ConditionerSpec } from "@/lib/core/electrics";
import { settleCircuit } from "@/lib/core/electrics/conditioner/settle-circuit";
import { solveCircuit } from "@/lib/core/electrics/conditioner/solve-circuit";
import { conditionerDeck, EASES, type Ease } from "../reference/conditioner-deck";
import { Ngspice } from "../reference/ngspice";
import { row, type BenchRow } from "./bench-row";

/** The contract's own example (electrics §3), with its envelope and without. */
const PLAIN: ConditionerSpec = {
  supply: { highV: 9, lowV: 0 }, pad: { kind: "resistive", restOhm: 47e3, hitOhm: 9100, leg: "upper" }, strike: { riseS: 1e-3, holdS: 5e-3, fallS: 30e-3 },
  divider: { ohm: 10e3 }, coupling: { farad: 1e-7, ohm: 22e3 }, threshold: { topOhm: 100e3, potOhm: 10e3, bottomOhm: 1e3, turn: 0.5 },
  comparator: { highDropV: 1.5, lowDropV: 0.02, limitA: 0.02 }, output: { seriesOhm: 2200, shuntOhm: 4700 }, envelope: null, load: { ohm: 100e3 },
};
const WITH_ENVELOPE: ConditionerSpec = { ...PLAIN, envelope: { seriesOhm: 100, farad: 1e-6, ohm: 100e3, emitterOhm: 10e3 } };

/** The least of several times, for both sides alike: what else the machine does only ever adds. */
const least = (times: number[]) => Math.min(...times);

/** Milliseconds for one call, least over batches. */
function each(work: (i: number) => void, calls: number, batches = 9): number {
  const times: number[] = [];
  for (let batch = 0; batch <= batches; batch += 1) {
    const startedMs = performance.now();
    for (let i = 0; i < calls; i += 1) work(i);
    if (batch > 0) times.push((performance.now() - startedMs) / calls);
  }
  return least(times);
}

/** One conditioner beside the same circuit in ngspice: in Node (start-up excluded, its own choice of steps), and native (the process less an empty deck's). */
export async function bench(): Promise<BenchRow[]> {
  const rows: BenchRow[] = [];
  for (const [name, spec, stopS] of [["without envelope", PLAIN, 0.04], ["with envelope", WITH_ENVELOPE, 0.1]] as const) {
    // A value that changes each time, so that nothing can be kept.
    const ours = each((i) => solveCircuit(settleCircuit({ ...spec, coupling: { farad: 1e-7 + i * 1e-13, ohm: 22e3 } })), 2000);
    rows.push(row(`one conditioner ${name}`, ours * 1000, "µs", "for comparison", true));
    const circuit = settleCircuit(spec);
    const { ms: inNode, ease } = await timeInNode(circuit, stopS);
    rows.push(row(`  the same in ngspice in Node ÷ ours`, inNode / ours, "×", "≥ 1000", inNode / ours >= 1000));
    const native = timeNative(conditionerDeck(circuit, stopS, ease, true));
    if (native !== null) rows.push(row(`  the same in native ngspice ÷ ours`, native / ours, "×", "≥ 200", native / ours >= 200));
  }
  const whole = each((i) => void simulateConditioner({ ...WITH_ENVELOPE, coupling: { farad: 1e-7 + i * 1e-12, ohm: 22e3 } }), 5, 5);
  rows.push(row("whole answer: trace, findings, corners, yield, weakest hit", whole, "ms", "< 100", whole < 100));
  const { padLeg, ...circuit } = { padLeg: "upper" as const, ...WITH_ENVELOPE };
  let asked = 0;
  const forPatch = each((i) => void simulateForPatch({
    circuit: { ...circuit, padLeg, coupling: { farad: 1e-7 + (asked += 1) * 1e-13 + i * 1e-12, ohm: 22e3 } },
    pad: { sensor: "resistive", restOhm: { min: 20e3, max: 50e3 }, hitOhm: { nominal: 10e3, tol: 0.2 }, riseS: 1e-3, holdS: 5e-3, fallS: 30e-3 }, turn: 0.5, loadOhm: 100e3,
  }), 20, 5);
  rows.push(row("a box and pad at their corners, for a patch, new each time", forPatch, "ms", "< 4", forPatch < 4));
  return rows;
}

async function timeInNode(circuit: ReturnType<typeof settleCircuit>, stopS: number): Promise<{ ms: number; ease: Ease }> {
  const ngspice = new Ngspice();
  for (const ease of EASES) {
    const deck = conditionerDeck(circuit, stopS, ease, true);
    if (!(await ngspice.run(deck))) continue;
    const times: number[] = [];
    for (let i = 0; i < 9; i += 1) {
      const startedMs = performance.now();
      await ngspice.run(deck);
      times.push(performance.now() - startedMs);
    }
    return { ms: least(times), ease };
  }
  throw new Error("ngspice gave up on the bench's own deck");
}

/** Milliseconds of native ngspice on a deck, less those on an empty one; null where it is not installed. */
function timeNative(deck: string): number | null {
  const folder = mkdtempSync(join(tmpdir(), "bench-"));
  try {
    const time = (text: string) => {
      const file = join(folder, "deck.cir");
      writeFileSync(file, text);
      const startedMs = performance.now();
      const { error } = spawnSync("ngspice", ["-b", "-r", join(folder, "out.raw"), file], { stdio: "ignore" });
      return error ? null : performance.now() - startedMs;
    };
    const [empties, fulls]: [number[], number[]] = [[], []];
    for (let i = 0; i < 12; i += 1) {
      const [empty, full] = [time("empty\nV1 a 0 1\nR1 a 0 1\n.op\n.end\n"), time(deck)];
      if (empty === null || full === null) return null;
      empties.push(empty);
      fulls.push(full);
    }
    return least(fulls) - least(empties);
  } finally {
    rmSync(folder, { recursive: true });
  }
}
