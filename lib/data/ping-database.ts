import "server-only";
import { QueryTypes } from "sequelize";
import { database } from "./database";

/** Reads one value from the file. @throws when it cannot be read */
export async function pingDatabase(): Promise<void> {
  await database().query("SELECT 1", { type: QueryTypes.SELECT });
}
