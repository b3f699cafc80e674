import type { PassRecord } from "@beadroll/domain/schemas/pass";
import type { ScanPage } from "@beadroll/domain/schemas/scan";
import { EXIT, type ExitCode } from "../exit-codes.ts";
import type { Receipt } from "../queue/send-entry.ts";
import { type Look, plain, styled } from "./look.ts";
import { reasonLines } from "./reason-lines.ts";
import { reasonMark, verdictText } from "./verdict-text.ts";

const recorded = ({ record, is_repeat }: Receipt): string =>
  is_repeat
    ? `already recorded ${record.received_at}, ledger entry ${record.ledger_seq}`
    : `recorded, ledger entry ${record.ledger_seq}`;

function scanText(scan: ScanPage, note: string, look: Look): string {
  const { share } = scan.result.coverage;
  return [
    `${verdictText(scan.verdict, look)}   scan of ${scan.stage === "bead" ? "the finished bead of " : ""}seam ${scan.seam_tag}: ${scan.points} points, ${(share * 100).toFixed(1)} % of the stations measured`,
    ...(scan.stage === "bead"
      ? scan.result.reasons.map((reason) => `  ${reasonMark("adapt", look)} ${plain(reason)}`)
      : reasonLines(scan.result.reasons, look)),
    styled(note, look, "faint"),
  ].join("\n");
}

const heatText = (heat_input_kj_mm: number | null): string =>
  heat_input_kj_mm === null ? "heat input not known" : `${heat_input_kj_mm.toFixed(2)} kJ/mm`;

function againstText({ result, procedure_name }: PassRecord): string {
  if (result.judgement === null) return "no procedure to judge it by";
  const { verdict } = result.judgement;
  const name = procedure_name ?? "its procedure";
  return verdict === "doubtful" ? `doubtful against ${name}` : `${verdict} ${name}`;
}

function passText(pass: PassRecord, note: string, look: Look): string {
  const { result } = pass;
  const reasons = result.judgement?.reasons ?? [];
  return [
    `Pass ${pass.pass_number} of seam ${pass.seam_tag}: ${result.arc_on_s.toFixed(1)} s of arc, ${heatText(result.heat_input_kj_mm)}, ${againstText(pass)}`,
    ...reasons.map((reason) => `  ${reason.detail}`),
    styled(note, look, "faint"),
  ].join("\n");
}

/** A receipt for people. */
export function receiptText(receipt: Receipt, look: Look): string {
  const note = recorded(receipt);
  return receipt.kind === "scan"
    ? scanText(receipt.record, note, look)
    : passText(receipt.record, note, look);
}

/** The exit code of a receipt: a scan's verdict decides; a pass is recorded whatever it says. */
export function receiptExit(receipt: Receipt): ExitCode {
  return receipt.kind === "scan" && receipt.record.verdict === "hold" ? EXIT.hold : EXIT.done;
}
