import "server-only";
import { Transaction, type Sequelize } from "sequelize";
import { env } from "@/lib/env";
import { openDatabase } from "@/models";

/*
 * Next evaluates this module, and the models, once a bundle: pages and route handlers each have their own.
 * Models belong to the connection that readied them, so each bundle opens the file; the turns to write are one a process.
 */
let opened: Sequelize | undefined;
const holder = globalThis as typeof globalThis & { __knockwireWrites?: Promise<unknown> };

/** The open database with its models ready; call before the first query of a verb. */
export function database(): Sequelize {
  opened ??= openDatabase(env().DATABASE_FILE);
  return opened;
}

/**
 * The one way to write: callers in this process take turns, and each turn is one
 * IMMEDIATE transaction, so SQLite never sees two writers of ours at once.
 */
export function writeTx<T>(work: (transaction: Transaction) => Promise<T>): Promise<T> {
  const sequelize = database();
  const before = holder.__knockwireWrites ?? Promise.resolve();
  const turn = before.then(() => sequelize.transaction({ type: Transaction.TYPES.IMMEDIATE }, work));
  holder.__knockwireWrites = turn.catch(() => undefined);
  return turn;
}

/** Closes the file; for tests and scripts. */
export async function closeDatabase(): Promise<void> {
  await holder.__knockwireWrites;
  await opened?.close();
  opened = undefined;
}
