// Makes a checkout runnable: dependencies from the lockfile when it changed, a build when the sources changed.
// Node built-ins only, since nothing is installed yet when this runs.
import { createHash } from "node:crypto";
import { existsSync, mkdirSync, readdirSync, readFileSync, writeFileSync } from "node:fs";
import { dirname, join } from "node:path";
import { fileURLToPath } from "node:url";
import { run, runAsRoot } from "./run.mjs";

const root = dirname(dirname(fileURLToPath(import.meta.url)));
const wantsBuild = !process.argv.includes("--no-build");
const SOURCES = ["app", "components", "lib", "models", "public"];
const SOURCE_FILES = ["next.config.mjs", "tailwind.config.ts", "postcss.config.mjs", "tsconfig.json", "package-lock.json", "proxy.ts"];

function* filesBelow(folder) {
  for (const entry of readdirSync(folder, { withFileTypes: true }).sort((a, b) => (a.name < b.name ? -1 : 1))) {
    const path = join(folder, entry.name);
    if (entry.isDirectory()) yield* filesBelow(path);
    else yield path;
  }
}

function hashOf(paths) {
  const hash = createHash("sha256").update(process.version);
  for (const path of paths) hash.update(path.slice(root.length)).update(readFileSync(path));
  return hash.digest("hex");
}

function isCurrent(stamp, hash) {
  return existsSync(stamp) && readFileSync(stamp, "utf8") === hash;
}

function write(stamp, hash) {
  mkdirSync(dirname(stamp), { recursive: true });
  writeFileSync(stamp, hash);
}

async function install() {
  const stamp = join(root, "node_modules", ".knockwire-lock");
  const hash = hashOf([join(root, "package-lock.json")]);
  if (isCurrent(stamp, hash)) return;
  console.log("Installing what the lockfile names (sqlite3 is compiled; this takes a minute or two)…");
  await ensureCompiler();
  const nodePrefix = dirname(dirname(process.execPath));
  const hasHeaders = existsSync(join(nodePrefix, "include", "node", "node.h"));
  const env = { ...process.env, NODE_ENV: "development", ...(hasHeaders ? { npm_config_nodedir: nodePrefix } : {}) };
  await run("npm", ["ci", "--include=dev", "--no-audit", "--no-fund", "--loglevel=error"], { cwd: root, env });
  write(stamp, hash);
}

/** sqlite3 is compiled where no ready-made build can be had: that wants g++, make and python3. */
async function ensureCompiler() {
  const missing = [["g++", "g++"], ["make", "make"], ["python3", "python3"]].filter(([command]) => !onPath(command)).map(([, name]) => name);
  if (missing.length === 0) return;
  await runAsRoot(missing, "sqlite3 is compiled at install and needs them");
}

function onPath(command) {
  return (process.env.PATH ?? "").split(":").some((folder) => existsSync(join(folder, command)));
}

async function build() {
  const stamp = join(root, ".next", "knockwire-sources");
  const paths = [
    ...SOURCES.filter((name) => existsSync(join(root, name))).flatMap((name) => [...filesBelow(join(root, name))]),
    ...SOURCE_FILES.map((name) => join(root, name)).filter(existsSync),
  ];
  const hash = hashOf(paths);
  if (isCurrent(stamp, hash) && existsSync(join(root, ".next", "BUILD_ID"))) return;
  console.log("Building…");
  await run("npx", ["next", "build"], { cwd: root, env: { ...process.env, NODE_ENV: "production", NEXT_TELEMETRY_DISABLED: "1" } });
  write(stamp, hash);
}

await install();
if (wantsBuild) await build();
