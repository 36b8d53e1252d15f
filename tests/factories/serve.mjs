// Serves the built product on a port of its own with a new database holding the demo rig.
// Used by the API tests and by the browser tests; prints nothing but the server's own errors.
import { spawn } from "node:child_process";
import { mkdtempSync, rmSync } from "node:fs";
import { createServer } from "node:net";
import { tmpdir } from "node:os";
import { dirname, join } from "node:path";
import { fileURLToPath } from "node:url";
import { run } from "../../scripts/run.mjs";

const root = dirname(dirname(dirname(fileURLToPath(import.meta.url))));

function freePort() {
  return new Promise((resolve, reject) => {
    const probe = createServer();
    probe.on("error", reject);
    probe.listen(0, "127.0.0.1", () => {
      const { port } = probe.address();
      probe.close(() => resolve(port));
    });
  });
}

/** Starts a server; returns its address and how to stop it. */
export async function serve(wantedPort) {
  const port = wantedPort ?? (await freePort());
  const folder = mkdtempSync(join(tmpdir(), "knockwire-test-"));
  const url = `http://localhost:${port}`;
  const env = {
    ...process.env,
    NODE_ENV: "production",
    NEXTAUTH_URL: url,
    NEXTAUTH_SECRET: "a secret for tests that never leaves this machine",
    DATABASE_FILE: join(folder, "test.sqlite"),
    KNOCKWIRE_DEMO: "yes",
    NEXT_TELEMETRY_DISABLED: "1",
  };
  const tsx = join(root, "node_modules", ".bin", "tsx");
  const quiet = { cwd: root, env, stdio: ["ignore", "ignore", "inherit"] };
  await run(tsx, ["scripts/migrate.ts"], quiet);
  await run(tsx, ["scripts/seed.ts"], quiet);
  const server = spawn(process.execPath, [join(root, "node_modules/next/dist/bin/next"), "start", "-p", String(port), "-H", "127.0.0.1"], quiet);
  const ended = new Promise((resolve) => server.on("exit", resolve));
  const stop = async () => {
    server.kill("SIGTERM");
    await ended;
    rmSync(folder, { recursive: true, force: true });
  };
  for (let tries = 0; tries < 240; tries += 1) {
    try {
      if ((await fetch(`${url}/api/v1/health`)).ok) return { url, stop };
    } catch {
      // Not listening yet.
    }
    if (server.exitCode !== null) break;
    await new Promise((resolve) => setTimeout(resolve, 250));
  }
  await stop();
  throw new Error("The server under test did not answer.");
}

if (process.argv[1] === fileURLToPath(import.meta.url)) {
  const { stop } = await serve(Number(process.argv[2]));
  for (const signal of ["SIGINT", "SIGTERM"]) process.on(signal, () => void stop().then(() => process.exit(0)));
}
