import "server-only";
import { Transaction, type Sequelize } from "sequelize";
import { env } from "@/lib/env";
import { openDatabase } from "@/models";

interface Held {
  sequelize: Sequelize;
  queue: Promise<unknown>;
}

/* Next evaluates this module once a bundle; the file must be opened once a process. */
const holder = globalThis as typeof globalThis & { __knockwireDatabase?: Held };

function held(): Held {
  holder.__knockwireDatabase ??= { sequelize: openDatabase(env().DATABASE_FILE), queue: Promise.resolve() };
  return holder.__knockwireDatabase;
}

/** The open database with its models ready; call before the first query of a verb. */
export function database(): Sequelize {
  return held().sequelize;
}

/**
 * The one way to write: callers in this process take turns, and each turn is one
 * IMMEDIATE transaction, so SQLite never sees two writers of ours at once.
 */
export function writeTx<T>(work: (transaction: Transaction) => Promise<T>): Promise<T> {
  const current = held();
  const turn = current.queue.then(() => current.sequelize.transaction({ type: Transaction.TYPES.IMMEDIATE }, work));
  current.queue = turn.catch(() => undefined);
  return turn;
}

/** Closes the file; for tests and scripts. */
export async function closeDatabase(): Promise<void> {
  await held().queue;
  await held().sequelize.close();
  delete holder.__knockwireDatabase;
}
