// Migrates, seeds the demo where this is a local demo run, and serves.
import { spawn } from "node:child_process";
import { createServer } from "node:net";
import { join } from "node:path";
import { root, settleEnv } from "./demo-env.mjs";
import { run } from "./run.mjs";

// A mistake in the configuration is one sentence, not a stack.
process.on("uncaughtException", (error) => {
  console.error(error.message);
  process.exit(1);
});

const isDev = process.argv.includes("--dev");
const env = settleEnv();
await refuseTakenPort(Number(env.PORT), env.HOST);
const tsx = join(root, "node_modules", ".bin", "tsx");

await run(tsx, ["scripts/migrate.ts"], { cwd: root, env });
if (env.KNOCKWIRE_DEMO === "yes") await run(tsx, ["scripts/seed.ts"], { cwd: root, env });

const next = join(root, "node_modules", "next", "dist", "bin", "next");
const server = spawn(process.execPath, [next, isDev ? "dev" : "start", "-p", env.PORT, "-H", env.HOST], {
  cwd: root,
  env: { ...env, NODE_ENV: isDev ? "development" : "production" },
  stdio: "inherit",
});
for (const signal of ["SIGINT", "SIGTERM"]) process.on(signal, () => server.kill(signal));
server.on("exit", (code) => process.exit(code ?? 0));

await answers(`http://${env.HOST === "0.0.0.0" ? "127.0.0.1" : env.HOST}:${env.PORT}/api/v1/health`);
console.log(`\nKnockwire is at ${env.NEXTAUTH_URL}`);
if (env.KNOCKWIRE_DEMO === "yes") {
  console.log("This is the demo: it listens on this machine alone. Sign in as");
  for (const name of ["performer", "collaborator", "sound"]) console.log(`  ${name}@marrowlane.example   password two-tea-trolleys`);
}

/** Says so at once when another program listens there already. */
function refuseTakenPort(port, host) {
  return new Promise((resolve, reject) => {
    const probe = createServer();
    probe.once("error", (error) => reject(error.code === "EADDRINUSE" ? new Error(`Something listens on port ${port} already. Stop it, or choose another with PORT=3001 npm start.`) : error));
    probe.listen(port, host, () => probe.close(() => resolve()));
  });
}

async function answers(address) {
  for (let tries = 0; tries < 240; tries += 1) {
    try {
      if ((await fetch(address)).ok) return;
    } catch {
      // Not listening yet.
    }
    await new Promise((resolve) => setTimeout(resolve, 500));
  }
  throw new Error("The server did not answer within two minutes.");
}
