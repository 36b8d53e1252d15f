// Migrates, seeds the demo where this is a local demo run, and serves.
import { spawn } from "node:child_process";
import { join } from "node:path";
import { root, settleEnv } from "./demo-env.mjs";
import { run } from "./run.mjs";

const isDev = process.argv.includes("--dev");
const env = settleEnv();
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
