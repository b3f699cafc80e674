import { stripOf } from "@beadroll/domain/measure/strip";
import type { ScanResult } from "@beadroll/domain/schemas/scan-result";
import { resolveLimits, type SeamModel } from "@beadroll/domain/schemas/seam-model";
import { type Look, plain, styled } from "./look.ts";
import { reasonLines } from "./reason-lines.ts";
import { stripScale, stripText } from "./strip-text.ts";
import { verdictText } from "./verdict-text.ts";

const QUANTITIES = [
  ["lateral_mm", "lateral mm"],
  ["normal_mm", "normal mm"],
  ["gap_mm", "gap mm"],
  ["mismatch_mm", "mismatch mm"],
  ["angle_deg", "angle deg"],
] as const;

const INDENT = "  ";
const COLUMN = 9;

const figure = (value: number, digits: number): string => value.toFixed(digits).padStart(COLUMN);
const vector = (values: readonly number[]): string => values.map((value) => value.toFixed(3)).join(", ");

function summaryLines(result: ScanResult, look: Look): string[] {
  const rows = QUANTITIES.flatMap(([key, name]) => {
    const statistic = result.summary[key];
    if (statistic === undefined) return [];
    const { max_abs, at_mm, rms, p95_abs } = statistic;
    const cells = figure(max_abs, 3) + figure(at_mm, 1) + figure(rms, 3) + figure(p95_abs, 3);
    return [`${INDENT}${name.padEnd(11)}${cells}`];
  });
  if (rows.length === 0) return [];
  const heads = ["largest", "at mm", "rms", "95 %"].map((head) => head.padStart(COLUMN)).join("");
  return ["", styled(`${INDENT}${"".padEnd(11)}${heads}`, look, "bold"), ...rows];
}

function stripLines(result: ScanResult, model: SeamModel, look: Look): string[] {
  const { length_mm } = model.seam;
  const limits = resolveLimits(model.limits).adapt;
  const strip = stripOf(result.stations, { section: model.section, limits, length_mm });
  const legend = "height: share of the limit used; ! beyond the limit; · not measured";
  return [
    "",
    `${INDENT}${stripText(strip, look)}`,
    styled(`${INDENT}${stripScale(strip.length, length_mm)}`, look, "faint"),
    styled(`${INDENT}${legend}`, look, "faint"),
  ];
}

function coverageLine({ coverage, stations }: ScanResult): string {
  const { share, longest_blind_mm, blind_from_mm, blind_to_mm } = coverage;
  const measured = stations.filter((station) => station.measured).length;
  const where =
    blind_from_mm === undefined || blind_to_mm === undefined
      ? ""
      : ` (${blind_from_mm.toFixed(1)} to ${blind_to_mm.toFixed(1)})`;
  const blind =
    longest_blind_mm > 0 ? `, longest blind stretch ${longest_blind_mm.toFixed(1)} mm${where}` : "";
  return `${measured} of ${stations.length} stations measured (${(share * 100).toFixed(1)} %)${blind}`;
}

function endsLine({ ends }: ScanResult): string {
  const end = (name: string, at_mm: number | null, isSeen: boolean): string =>
    at_mm === null
      ? `${name} not seen`
      : `${name} ${at_mm.toFixed(1)} mm${isSeen ? "" : " (the scan ends there)"}`;
  return `${end("start", ends.start_mm, ends.start_seen)}, ${end("end", ends.end_mm, ends.end_seen)}`;
}

const UNOBSERVABLE = {
  along_seam: "movement along the seam cannot be seen",
  turn_about_seam: "a turn about the seam cannot be seen",
  all: "cannot be told",
} as const;

function rigidLine({ rigid }: ScanResult): string {
  const unseen = rigid.unobservable.map((what) => `; ${UNOBSERVABLE[what]}`).join("");
  return `moved ${vector(rigid.translation_mm)} mm, turned ${vector(rigid.rotation_deg)} deg${unseen}`;
}

function remainingLine({ remaining }: ScanResult): string | null {
  if (remaining === undefined) return null;
  const { max_abs_mm, at_mm, rms_mm, bend_lateral_mm, bend_normal_mm, twist_deg } = remaining;
  return `largest ${max_abs_mm.toFixed(3)} mm at ${at_mm.toFixed(1)}, rms ${rms_mm.toFixed(3)}; bend ${bend_lateral_mm.toFixed(3)} lateral, ${bend_normal_mm.toFixed(3)} normal; twist ${twist_deg.toFixed(2)} deg`;
}

function registrationLine({ registration }: ScanResult): string | null {
  if (registration === undefined) return null;
  const { by, rms_mm, condition, u_mm, free } = registration;
  const open = free.length > 0 ? `; left open: ${free.join(", ").replaceAll("_", " ")}` : "";
  return `by ${by === "datums" ? "datum points" : "its plates"}: ${rms_mm.toFixed(3)} mm left, condition ${condition.toFixed(3)}, u ${u_mm.toFixed(3)} mm at the seam${open}`;
}

function factLines(result: ScanResult): string[] {
  const facts: [string, string | null][] = [
    ["placed", registrationLine(result)],
    ["coverage", coverageLine(result)],
    ["ends", endsLine(result)],
    ["rigid part", rigidLine(result)],
    ["remaining", remainingLine(result)],
    ...result.warnings.map((warning): [string, string] => ["note", plain(warning)]),
  ];
  return facts.flatMap(([name, text]) => (text === null ? [] : [`${INDENT}${name.padEnd(11)} ${text}`]));
}

/** An evaluation for people: verdict and reasons, strip, figures. */
export function evaluationText(result: ScanResult, model: SeamModel, look: Look): string {
  const { length_mm } = model.seam;
  const joint = result.joint_type.replaceAll("_", " ");
  return [
    `${verdictText(result.verdict, look)}   ${plain(result.model)}   ${joint}, ${length_mm.toFixed(1)} mm, ${result.points} points`,
    ...reasonLines(result.reasons, look),
    ...stripLines(result, model, look),
    ...summaryLines(result, look),
    "",
    ...factLines(result),
  ].join("\n");
}
