import { spawn } from "node:child_process";
import { mkdtemp, rm } from "node:fs/promises";
import { tmpdir } from "node:os";
import { join } from "node:path";
import { text } from "node:stream/consumers";
import { buildCli } from "../../build.mjs";

/** What a run of the command left behind. */
export interface Ran {
  readonly exit: number | null;
  readonly stdout: string;
  readonly stderr: string;
}

/** The built command with a folder of its own: what is tested is the file that people run. */
export interface BuiltCommand {
  /** Scratch folder, deleted at the end. */
  readonly folder: string;
  /** BEADROLL_HOME of every run. */
  readonly home: string;
  run(args: readonly string[], options?: RunOptions): Promise<Ran>;
  /** Starts a run that a test wants to end itself. */
  start(args: readonly string[], options?: RunOptions): ReturnType<typeof spawn>;
  remove(): Promise<void>;
}

interface RunOptions {
  readonly env?: Readonly<Record<string, string>>;
  readonly stdin?: string;
}

/** Builds the command into a scratch folder. */
export async function builtCommand(): Promise<BuiltCommand> {
  const folder = await mkdtemp(join(tmpdir(), "beadroll-cli-"));
  const home = join(folder, "home");
  await buildCli(join(folder, "dist"));
  const start = (args: readonly string[], { env = {} }: RunOptions = {}) =>
    spawn(process.execPath, [join(folder, "dist/beadroll.mjs"), ...args], {
      cwd: folder,
      env: { PATH: process.env["PATH"], BEADROLL_HOME: home, ...env },
      stdio: ["pipe", "pipe", "pipe"],
    });
  return {
    folder,
    home,
    start,
    run: async (args, options = {}) => {
      const child = start(args, options);
      child.stdin.end(options.stdin ?? "");
      const exited = new Promise<number | null>((resolve) => child.on("close", resolve));
      const [stdout, stderr] = await Promise.all([text(child.stdout), text(child.stderr)]);
      return { exit: await exited, stdout, stderr };
    },
    remove: () => rm(folder, { recursive: true, force: true }),
  };
}
