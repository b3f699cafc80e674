import { EXIT } from "./exit-codes.ts";
import { lookOf } from "./output/look.ts";
import { type CommandOutcome, CommandStop, failure } from "./output/outcome.ts";

/** How stdout may look; decided once. */
export const look = lookOf(process.stdout, process.env);

/** A reader that has seen enough (`| head`) closes the pipe; that is no failure of ours. */
process.stdout.on("error", (error: NodeJS.ErrnoException) => {
  if (error.code !== "EPIPE") throw error;
});

/** Prints an outcome: with --json nothing but JSON on stdout, talk always on stderr. */
export function print(outcome: CommandOutcome, asJson: boolean): void {
  if (outcome.talk) process.stderr.write(`${outcome.talk}\n`);
  if (asJson) process.stdout.write(`${JSON.stringify(outcome.json)}\n`);
  else if (outcome.text) process.stdout.write(`${outcome.text}\n`);
  process.exitCode = outcome.exit;
}

function unexpected(error: unknown): CommandOutcome {
  // The computer's own no: a full disk, a folder that is a file, a right that lacks.
  if (error instanceof Error && "syscall" in error && "path" in error) {
    const words = error.message.replace(/^[A-Z0-9]+: |, \w+ '.*$/g, "");
    return failure(EXIT.failure, { error: "system", detail: `${error.path}: ${words}` });
  }
  const detail = error instanceof Error ? error.message : String(error);
  const trace = error instanceof Error ? (error.stack ?? detail) : detail;
  return failure(
    EXIT.failure,
    { error: "internal", detail },
    `This is a fault of beadroll itself; please report it with these lines.\n${trace}`,
  );
}

/** Runs a verb and prints what came of it: the one place that prints and sets the exit code. */
export async function runVerb(work: () => Promise<CommandOutcome>, asJson: boolean): Promise<void> {
  try {
    print(await work(), asJson);
  } catch (error) {
    print(error instanceof CommandStop ? error.outcome : unexpected(error), asJson);
  }
}
