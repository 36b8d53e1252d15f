import type { TestProject } from "vitest/node";
import { serve } from "../factories/serve.mjs";

declare module "vitest" {
  interface ProvidedContext {
    url: string;
  }
}

/** One built server with the demo rig for the whole project. */
export default async function setup(project: TestProject): Promise<() => Promise<void>> {
  const { url, stop } = await serve();
  project.provide("url", url);
  return stop;
}
