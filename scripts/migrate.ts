import { mkdirSync } from "node:fs";
import { dirname } from "node:path";
import { env } from "../lib/env";
import { migrator } from "../migrations/migrator";
import { openDatabase } from "../models";

async function main(): Promise<void> {
  const file = env().DATABASE_FILE;
  mkdirSync(dirname(file), { recursive: true });
  const sequelize = openDatabase(file);
  await sequelize.query("PRAGMA journal_mode=WAL");
  const done = await migrator(sequelize).up();
  await sequelize.close();
  console.log(done.length > 0 ? `Database brought up to date: ${done.map((step) => step.name).join(", ")}.` : "Database is up to date.");
}

main().catch((error: unknown) => {
  console.error(error instanceof Error ? error.message : error);
  process.exitCode = 1;
});
