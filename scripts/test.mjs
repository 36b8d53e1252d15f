// The whole check: lint, types, unit, reference, API and browser tests, on a machine with nothing but Node and git.
// Runs everything even when something fails, then prints one closing line.
import { existsSync, mkdirSync, readFileSync, rmSync } from "node:fs";
import { join } from "node:path";
import { root } from "./demo-env.mjs";
import { run, runAsRoot } from "./run.mjs";

const results = join(root, "test-results");
let passed = 0;
let failed = 0;
let skipped = 0;
const troubles = [];

async function step(name, work) {
  const startedMs = Date.now();
  console.log(`\n== ${name}`);
  try {
    await work();
    return true;
  } catch (error) {
    troubles.push(`${name}: ${error instanceof Error ? error.message : error}`);
    return false;
  } finally {
    console.log(`== ${name}: ${((Date.now() - startedMs) / 1000).toFixed(1)} s`);
  }
}

/** A step that is one check in itself. */
async function check(name, work) {
  if (await step(name, work)) passed += 1;
  else failed += 1;
}

/** A step whose runner counts its own tests into a JSON file. */
async function suite(name, file, work, count) {
  rmSync(file, { force: true });
  const ok = await step(name, work);
  const counts = existsSync(file) ? count(JSON.parse(readFileSync(file, "utf8"))) : { passed: 0, failed: 0, skipped: 0 };
  passed += counts.passed;
  failed += counts.failed;
  skipped += counts.skipped;
  if (!ok && counts.failed === 0) failed += 1;
  if (ok && counts.passed === 0) {
    failed += 1;
    troubles.push(`${name}: ran no test`);
  }
}

const bin = (name) => join(root, "node_modules", ".bin", name);
const here = { cwd: root, env: { ...process.env, NEXT_TELEMETRY_DISABLED: "1" } };
const vitest = (project) => {
  const file = join(results, `${project}.json`);
  return suite(
    `${project} tests`,
    file,
    () => run(bin("vitest"), ["run", "--project", project, "--reporter=default", "--reporter=json", `--outputFile.json=${file}`], here),
    (report) => ({ passed: report.numPassedTests, failed: report.numFailedTests, skipped: report.numPendingTests }),
  );
};

async function ensureChromium() {
  if (["/usr/bin/chromium", "/usr/bin/chromium-browser"].some(existsSync)) return;
  await runAsRoot(["chromium"], "the browser tests drive it");
}

mkdirSync(results, { recursive: true });
if (await step("install", () => run(process.execPath, ["scripts/prepare.mjs", "--no-build"], here))) {
  await check("build", () => run(process.execPath, ["scripts/prepare.mjs"], here));
  await check("lint", () => run(bin("eslint"), [".", "--max-warnings=0"], here));
  await check("types", () => run(bin("tsc"), ["--noEmit"], here));
  await vitest("unit");
  await vitest("reference");
  await vitest("api");
  await step("browser", ensureChromium);
  const e2eFile = join(results, "e2e.json");
  await suite("browser tests", e2eFile, () => run(bin("playwright"), ["test"], here), (report) => ({
    passed: report.stats.expected,
    failed: report.stats.unexpected + report.stats.flaky,
    skipped: report.stats.skipped,
  }));
} else failed += 1;

if (troubles.length > 0) console.log(`\nNot as it should be:\n${troubles.map((line) => `- ${line}`).join("\n")}`);
console.log(`\n${passed} passed, ${failed} failed${skipped > 0 ? `, ${skipped} skipped` : ""}`);
process.exitCode = failed > 0 ? 1 : 0;
