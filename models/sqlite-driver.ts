import sqlite3 from "sqlite3";

/**
 * The sqlite3 driver with every new connection set to wait for a lock and to
 * reach the disk before a write is acknowledged. Sequelize opens a connection
 * for each transaction, so it cannot be set once.
 */
class DurableDatabase extends sqlite3.Database {
  constructor(filename: string, mode: number, callback: (error: Error | null) => void) {
    super(filename, mode, callback);
    this.configure("busyTimeout", 5000);
    this.run("PRAGMA synchronous=FULL");
  }
}

export const durableSqlite = { ...sqlite3, Database: DurableDatabase };
