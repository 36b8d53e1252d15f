import { mkdirSync, writeFileSync } from "node:fs";
import { dirname, join } from "node:path";
import type { BenchRow } from "./bench-row";

/** Every bench by its name; each gives rows. */
const BENCHES: Record<string, () => Promise<{ bench: () => Promise<BenchRow[]> | BenchRow[] }>> = {
  conditioner: () => import("./conditioner"),
  planning: () => import("./planning"),
};

/** `npm run bench [name]`: prints a table and writes tests/bench/latest.json. */
async function main(): Promise<void> {
  const wanted = process.argv.slice(2);
  const unknown = wanted.filter((name) => !(name in BENCHES));
  if (unknown.length > 0) throw new Error(`There is no bench called ${unknown.join(", ")}; there are ${Object.keys(BENCHES).join(", ")}.`);
  const rows: BenchRow[] = [];
  for (const name of wanted.length > 0 ? wanted : Object.keys(BENCHES)) {
    const { bench } = await (BENCHES[name] as NonNullable<(typeof BENCHES)[string]>)();
    rows.push(...(await bench()));
  }
  console.table(rows);
  const file = join(__dirname, "latest.json");
  mkdirSync(dirname(file), { recursive: true });
  writeFileSync(file, `${JSON.stringify(rows, null, 2)}\n`);
  if (rows.some((row) => !row.pass)) process.exitCode = 1;
}

main().catch((error: unknown) => {
  console.error(error instanceof Error ? error.message : error);
  process.exitCode = 1;
});
