import type { Simulation } from "eecircuit-engine";

/** One run's columns by lower-case name: `time`, `v(pad)`. */
export type Columns = ReadonlyMap<string, readonly number[]>;

const REFUSED = /abort|too small|singular|no convergence|error/i;
/** A simulator that has run many decks slows down; a fresh one starts in half a second. */
const FRESH_AFTER = 60;

/** ngspice in Node (npm eecircuit-engine), one deck at a time. */
export class Ngspice {
  private simulation: Simulation | null = null;
  private runs = 0;

  /** The deck's columns, or null where the simulator gives up on it (it prints, and does not throw). */
  async run(deck: string): Promise<Columns | null> {
    if (!this.simulation || this.runs >= FRESH_AFTER) {
      // The package is a module only; loaded here it also comes along where tests are run as scripts.
      const engine = await import("eecircuit-engine");
      this.simulation = new engine.Simulation();
      await this.simulation.start();
      this.runs = 0;
    }
    this.runs += 1;
    this.simulation.setNetList(deck);
    try {
      const result = await this.simulation.runSim();
      if (this.simulation.getError().some((line) => REFUSED.test(line)) || result.dataType !== "real") {
        this.simulation = null;
        return null;
      }
      return new Map(result.data.map(({ name, values }) => [name.toLowerCase(), values]));
    } catch {
      this.simulation = null;
      return null;
    }
  }
}
