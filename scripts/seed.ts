import { env } from "../lib/env";
import { openDatabase } from "../models";
import { up } from "../seeders/001-demo-rig";

async function main(): Promise<void> {
  const sequelize = openDatabase(env().DATABASE_FILE);
  const isNew = await up(sequelize);
  await sequelize.close();
  console.log(isNew ? "The demo rig is in the database." : "The demo rig was there already.");
}

main().catch((error: unknown) => {
  console.error(error instanceof Error ? error.message : error);
  process.exitCode = 1;
});
