// The environment of a run: a local demo run unless a public address is configured.
import { randomBytes } from "node:crypto";
import { existsSync, mkdirSync, readFileSync, writeFileSync } from "node:fs";
import { dirname, join } from "node:path";
import { fileURLToPath } from "node:url";

export const root = dirname(dirname(fileURLToPath(import.meta.url)));

function localSecret(folder) {
  const file = join(folder, "session-secret");
  if (!existsSync(file)) {
    mkdirSync(folder, { recursive: true });
    writeFileSync(file, randomBytes(32).toString("hex"), { mode: 0o600 });
  }
  return readFileSync(file, "utf8").trim();
}

function isThisMachine(address) {
  return ["localhost", "127.0.0.1", "[::1]"].includes(new URL(address).hostname);
}

/** Settles port, address, secret and whether this is the demo; throws one sentence per mistake. */
export function settleEnv(source = process.env) {
  const port = source.PORT ?? "3000";
  const address = source.NEXTAUTH_URL ?? `http://localhost:${port}`;
  const isLocal = isThisMachine(address);
  const databaseFile = source.DATABASE_FILE ?? join(root, "data", "knockwire.sqlite");
  if (!isLocal && !source.NEXTAUTH_SECRET) throw new Error("Set NEXTAUTH_SECRET to at least 32 random characters: this run has a public address.");
  if (!isLocal && source.KNOCKWIRE_DEMO === "yes") throw new Error("The demo accounts have a published password, so a run with a public address cannot offer them. Unset KNOCKWIRE_DEMO.");
  return {
    ...source,
    PORT: port,
    HOST: source.HOST ?? (isLocal ? "127.0.0.1" : "0.0.0.0"),
    NEXTAUTH_URL: address,
    NEXTAUTH_SECRET: source.NEXTAUTH_SECRET ?? localSecret(dirname(databaseFile)),
    DATABASE_FILE: databaseFile,
    KNOCKWIRE_DEMO: source.KNOCKWIRE_DEMO ?? (isLocal ? "yes" : "no"),
    NEXT_TELEMETRY_DISABLED: "1",
  };
}
