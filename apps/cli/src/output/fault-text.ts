import { FAULT_KINDS, type FaultCode } from "@beadroll/domain/faults/codes";
import type { Fault } from "@beadroll/domain/faults/fault";
import { EXIT, type ExitCode } from "../exit-codes.ts";
import { plain } from "./look.ts";
import { CommandStop, failure } from "./outcome.ts";

/** A fault as it is shown: of our own readers or named by the server, whose codes may be newer than this command. */
export type ShownFault = Omit<Fault, "code"> & { readonly code: string };

const CODES: ReadonlySet<number> = new Set(Object.values(EXIT));
const isExitCode = (code: number): code is ExitCode => CODES.has(code);

/** The exit code of a fault's code; a code that this version does not know is a refusal. */
export function exitOfCode(code: string): ExitCode {
  const kind = Object.hasOwn(FAULT_KINDS, code) ? FAULT_KINDS[code as FaultCode] : undefined;
  return kind !== undefined && isExitCode(kind.exit) ? kind.exit : EXIT.refused;
}

/** Readers begin a detail with the file's name and place; on a line that begins with them, once is enough. */
function withoutPlace(detail: string, file: string): string {
  if (file === "" || !detail.startsWith(file)) return detail;
  return detail.slice(file.length).replace(/^(, (line|byte) \d+|, \/[^:]*)?: /, "");
}

/** One fault on one line, as compilers print them: `file:line: column: what`. */
export function faultLine(fault: ShownFault, file = ""): string {
  const line = fault.line === undefined ? "" : `:${fault.line}`;
  const byte = fault.byte === undefined ? "" : `byte ${fault.byte}`;
  const parts = [
    `${file}${line}`,
    byte,
    fault.field ?? fault.pointer ?? "",
    withoutPlace(fault.detail, file),
  ];
  return plain(parts.filter((part) => part !== "").join(": "));
}

/** Faults found before anything was done: each on its line on stderr, and in `errors` of the JSON. */
export function stopOnFaults(faults: readonly Fault[], files: readonly string[] = []): never {
  const placed = faults.map((fault) => ({ fault, file: fileOf(fault, files) }));
  const lines = placed.map(({ fault, file }) => faultLine(fault, file));
  const errors = placed.map(({ fault, file }) => (file === "" ? fault : { file, ...fault }));
  const code = faults[0]?.code ?? "internal";
  throw new CommandStop(
    failure(exitOfCode(code), { error: code, detail: lines[0] ?? code, errors }, lines.join("\n")),
  );
}

/** The file that a fault is about: the one its detail begins with, else the first. */
function fileOf(fault: Fault, files: readonly string[]): string {
  return (
    files.find((file) => fault.detail.startsWith(`${file}:`) || fault.detail.startsWith(`${file},`)) ??
    files[0] ??
    ""
  );
}
