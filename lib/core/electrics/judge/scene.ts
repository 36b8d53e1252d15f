import type { Range } from "@/lib/core/units/spread";
import type { Branch } from "../node/branch";
import type { Input, Output } from "../jacks";

/** Everything a judge may look at: one listener and the node it listens to. */
export interface Scene {
  input: Input;
  outputs: readonly Partial<Output>[];
  /** Indexes of the outputs that drive: all but sensors. */
  driving: readonly number[];
  /** Level while active and at rest; null where a figure is missing. */
  highV: Range | null;
  lowV: Range | null;
  /** Levels with each output in its own worst state. */
  extremeV: Range | null;
  /** Level while active, each output of a diode OR also taken alone. */
  weakestV: Range | null;
  /** Greatest current through the listener's own diodes. */
  clampA: number | null;
  /** Current each driving output gives, by its index; null where a figure is missing. */
  currentsA: ReadonlyMap<number, Range | null>;
  /** Every branch of the node but the driving outputs'. */
  passive: readonly Branch[];
  /** Least resistance of all loads together; Infinity where all are open. */
  leastLoadOhm: number;
}

/** “the output”, or “output 2” where there are several. */
export function nameOutput(scene: Pick<Scene, "outputs">, index: number): string {
  return scene.outputs.length > 1 ? `output ${index + 1}` : "the output";
}

export function capital(text: string): string {
  return text.charAt(0).toUpperCase() + text.slice(1);
}

export function isFalling(input: Pick<Input, "polarity">): boolean {
  return input.polarity === "falling";
}

/** The range seen upside down, so that a falling input is judged by the rising rules. */
export function mirror(range: Range, falling: boolean): Range {
  return falling ? { min: -range.max, max: -range.min } : range;
}
