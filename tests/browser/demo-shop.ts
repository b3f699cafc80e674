import { mkdtemp, rm } from "node:fs/promises";
import { tmpdir } from "node:os";
import { join } from "node:path";
import type { TestProject } from "vitest/node";
import { freePort, startProcess } from "../processes/server-process.ts";

declare module "vitest" {
  interface ProvidedContext {
    /** Address of the running product with the demo shop. */
    demo_url: string;
  }
}

/** Starts the whole product, as built, with the demo shop in a folder of its own; one for all browser tests. */
export async function setup(project: TestProject): Promise<() => Promise<void>> {
  const folder = await mkdtemp(join(tmpdir(), "beadroll-demo-"));
  const server = await startProcess(folder, await freePort(), { demo: true });
  project.provide("demo_url", server.url);
  return async () => {
    await server.kill();
    await rm(folder, { recursive: true, force: true });
  };
}
