/** One line of a bench: what was measured, in which unit, against which goal. */
export interface BenchRow {
  name: string;
  value: number;
  unit: string;
  goal: string;
  pass: boolean;
}

/** A row with its value in three figures. */
export const row = (name: string, value: number, unit: string, goal: string, pass: boolean): BenchRow => ({ name, value: Number(value.toPrecision(3)), unit, goal, pass });
