import { PassCreate } from "@beadroll/domain/schemas/pass";
import { readPassLog } from "@beadroll/domain/weld/read-pass-log";
import { loadProfile } from "../home/profile.ts";
import { checkFields } from "../input/fields.ts";
import { instantOption } from "../input/instant-option.ts";
import { type InputFile, readInput } from "../input/read-input.ts";
import { tagOption, tagOptionIfGiven } from "../input/tag-option.ts";
import type { Look } from "../output/look.ts";
import type { CommandOutcome } from "../output/outcome.ts";
import { pushResult } from "./push-result.ts";

/** Options of `push pass`, as parsed. */
export interface PushPassOptions {
  readonly seam: string;
  readonly log: string;
  readonly pass?: string;
  readonly operator?: string;
  readonly startedAt?: string;
  readonly program?: string;
  readonly part?: string;
}

const OPTIONS = {
  pass_number: "--pass",
  started_at: "--started-at",
  operator_tag: "--operator",
  program: "--program",
  part_tag: "--part",
};

/**
 * When the log began if it ends now; absent for a log that cannot be read, about which the server says what is wrong.
 * The server would reckon the same from when it arrives, which after a night in the queue names the wrong wire.
 */
function startedAt(log: InputFile, now: Date): string | undefined {
  const read = readPassLog({ name: log.name, bytes: log.bytes });
  if (!read.ok) return undefined;
  const { times_s } = read.value;
  const duration_s = (times_s.at(-1) ?? 0) - (times_s[0] ?? 0);
  return new Date(now.getTime() - duration_s * 1000).toISOString();
}

/** Records a weld run of a seam with its log. */
export async function pushPass(options: PushPassOptions, look: Look): Promise<CommandOutcome> {
  const now = new Date();
  const seam = tagOption("--seam", options.seam, "S");
  const tags = {
    operator_tag: tagOptionIfGiven("--operator", options.operator, "W"),
    part_tag: tagOptionIfGiven("--part", options.part, "P"),
  };
  const asked = options.startedAt && instantOption("--started-at", options.startedAt);
  const given = { ...tags, pass_number: options.pass, program: options.program, started_at: asked };
  const checked = checkFields(PassCreate, given, OPTIONS);
  loadProfile();
  const log = await readInput(options.log);
  const started_at = asked ?? startedAt(log, now);
  const fields = started_at === undefined ? checked : { ...checked, started_at };
  const files = [{ part: "log", name: log.name, bytes: log.bytes }];
  return pushResult({ kind: "pass", seam, fields, files, queued_at: now.toISOString() }, look);
}
