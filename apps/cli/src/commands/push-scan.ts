import { ScanCreate } from "@beadroll/domain/schemas/scan";
import { loadProfile } from "../home/profile.ts";
import { checkFields } from "../input/fields.ts";
import { instantOption } from "../input/instant-option.ts";
import { readScanFiles, type ScanOptions } from "../input/scan-files.ts";
import { tagOption, tagOptionIfGiven } from "../input/tag-option.ts";
import type { Look } from "../output/look.ts";
import type { CommandOutcome } from "../output/outcome.ts";
import { pushResult } from "./push-result.ts";

/** Options of `push scan`, as parsed. */
export interface PushScanOptions extends ScanOptions {
  readonly seam: string;
  readonly stage: string;
  readonly takenAt?: string;
  readonly part?: string;
}

const OPTIONS = { stage: "--stage", units: "--units", taken_at: "--taken-at", part_tag: "--part" };

/** Records a scan of a seam. Without a time it was taken now: it may reach the server much later. */
export async function pushScan(options: PushScanOptions, look: Look): Promise<CommandOutcome> {
  const queued_at = new Date().toISOString();
  const seam = tagOption("--seam", options.seam, "S");
  const given = {
    stage: options.stage,
    units: options.units,
    taken_at: options.takenAt === undefined ? queued_at : instantOption("--taken-at", options.takenAt),
    part_tag: tagOptionIfGiven("--part", options.part, "P"),
  };
  const fields = checkFields(ScanCreate, given, OPTIONS);
  loadProfile();
  const { scan, poses, talk } = await readScanFiles(options);
  const files = [
    { part: "scan", name: scan.name, bytes: scan.bytes },
    ...(poses === null ? [] : [{ part: "poses", name: poses.name, bytes: poses.bytes }]),
  ];
  return pushResult({ kind: "scan", seam, fields, files, queued_at }, look, talk);
}
