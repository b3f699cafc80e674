import { type ChildProcess, spawn } from "node:child_process";
import { once } from "node:events";
import { type AddressInfo, createServer } from "node:net";
import { fileURLToPath } from "node:url";

const MAIN = fileURLToPath(new URL("../../apps/api/dist/main.js", import.meta.url));

/** A server as a process of its own, as it runs in a shop, so that it can be killed. */
export interface ServerProcess {
  readonly url: string;
  /** Ends it at once, as a power cut does. */
  kill(): Promise<void>;
}

/** A port that is free now. */
export async function freePort(): Promise<number> {
  const probe = createServer().listen(0, "127.0.0.1");
  await once(probe, "listening");
  // A server that listens on a port has an address with one.
  const { port } = probe.address() as AddressInfo;
  probe.close();
  await once(probe, "close");
  return port;
}

const environment = (dataDir: string, port: number) => ({
  ...process.env,
  BEADROLL_DATA: dataDir,
  BEADROLL_PORT: String(port),
  BEADROLL_HOST: "127.0.0.1",
  BEADROLL_WORKERS: "1",
  BEADROLL_LOG: "error",
});

/** Runs the server's program to its end with these arguments. */
export async function runMain(
  dataDir: string,
  args: readonly string[],
  env: Record<string, string> = {},
): Promise<void> {
  const child = spawn(process.execPath, [MAIN, ...args], {
    env: { ...environment(dataDir, 1), ...env },
    stdio: ["ignore", "ignore", "inherit"],
  });
  const [code] = await once(child, "exit");
  if (code !== 0) throw new Error(`${args.join(" ")} ended with ${code}`);
}

async function answers(url: string, child: ChildProcess, wait_s: number): Promise<void> {
  for (let i = 0; i < wait_s * 10; i += 1) {
    if (child.exitCode !== null) throw new Error(`the server ended with ${child.exitCode}`);
    try {
      if ((await fetch(`${url}/health`)).ok) return;
    } catch (error) {
      // Refused until it listens.
      if (!(error instanceof TypeError)) throw error;
    }
    await new Promise((resolve) => setTimeout(resolve, 100));
  }
  throw new Error(`the server did not answer within ${wait_s} s`);
}

/** Starts the server, with the demo shop if asked, and waits until it answers. */
export async function startProcess(
  dataDir: string,
  port: number,
  options: { readonly demo?: boolean } = {},
): Promise<ServerProcess> {
  const child = spawn(process.execPath, [MAIN, ...(options.demo === true ? ["--demo"] : [])], {
    env: environment(dataDir, port),
    stdio: ["ignore", "ignore", "inherit"],
  });
  const url = `http://127.0.0.1:${port}`;
  await answers(url, child, options.demo === true ? 180 : 30);
  return {
    url,
    kill: async () => {
      const gone = once(child, "exit");
      child.kill("SIGKILL");
      await gone;
    },
  };
}
