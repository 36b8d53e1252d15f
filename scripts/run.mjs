import { spawn } from "node:child_process";

/** Runs a command to its end with our output; throws when it fails. */
export function run(command, args, options = {}) {
  return new Promise((resolve, reject) => {
    const child = spawn(command, args, { stdio: "inherit", ...options });
    child.on("error", reject);
    child.on("exit", (code, signal) => {
      if (code === 0) resolve();
      else reject(new Error(`${command} ${args.join(" ")} ended with ${signal ?? code}`));
    });
  });
}

/** Installs Debian packages where we may; otherwise says which are missing. */
export async function runAsRoot(packages, why) {
  const isRoot = typeof process.getuid === "function" && process.getuid() === 0;
  const prefix = isRoot ? [] : ["sudo", "-n"];
  const env = { ...process.env, DEBIAN_FRONTEND: "noninteractive" };
  const [first, ...rest] = [...prefix, "apt-get"];
  try {
    await run(first, [...rest, "update", "-qq"], { env });
    await run(first, [...rest, "install", "-y", "-qq", "--no-install-recommends", ...packages], { env });
  } catch (cause) {
    throw new Error(`Install these Debian packages first: ${packages.join(" ")} (${why}).`, { cause });
  }
}
