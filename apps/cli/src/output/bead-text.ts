import { BEAD_QUANTITIES, type BeadFinding, type BeadResult } from "@beadroll/domain/schemas/bead-result";
import type { SeamModel } from "@beadroll/domain/schemas/seam-model";
import { type Look, plain, styled } from "./look.ts";
import { reasonMark, verdictText } from "./verdict-text.ts";

const COLUMN = 9;
const NAME = 20;

const cell = (text: string): string => text.padStart(COLUMN);
const figure = (value: number): string => cell(value.toFixed(2));

/** `leg_a_mm` as `leg A mm`. */
const nameOf = (quantity: string): string =>
  quantity.replaceAll("_", " ").replace(/ ([ab]) /, (_, plate: string) => ` ${plate.toUpperCase()} `);

function figureLines({ summary }: BeadResult, look: Look): string[] {
  const rows = BEAD_QUANTITIES.flatMap((quantity) => {
    const found = summary[quantity];
    if (!found) return [];
    return [
      `  ${nameOf(quantity).padEnd(NAME)}${figure(found.mean)}${figure(found.min)}${figure(found.max)}`,
    ];
  });
  if (rows.length === 0) return [];
  const heads = ["mean", "least", "largest"].map(cell).join("");
  return ["", styled(`  ${"".padEnd(NAME)}${heads}`, look, "bold"), ...rows];
}

const STATES: Readonly<Record<BeadFinding["state"], string>> = {
  met: "keeps",
  not_met: "fails",
  not_proven: "not proved",
};

function findingLines({ findings }: BeadResult, look: Look): string[] {
  return findings.map(({ state, text }) => {
    const line = `  ${STATES[state].padEnd(11)} ${plain(text)}`;
    return state === "met" ? styled(line, look, "faint") : line;
  });
}

/** Reasons that no finding says: how much of the weld was measured. */
function otherReasons({ reasons, findings }: BeadResult, look: Look): string[] {
  const told = new Set(findings.map(({ text }) => text));
  return reasons
    .filter((reason) => !told.has(reason))
    .map((reason) => `  ${reasonMark("adapt", look)} ${plain(reason)}`);
}

/** A finished weld for people: verdict, findings, figures. */
export function beadText(result: BeadResult, model: SeamModel, look: Look): string {
  const { requirement, coverage } = result;
  const joint = result.joint_type.replaceAll("_", " ");
  const { length_mm } = model.seam;
  return [
    `${verdictText(result.verdict, look)}   ${plain(result.model)}   finished ${joint}, ${length_mm.toFixed(1)} mm, ${result.points} points`,
    `  held against ISO 5817:${requirement.edition} level ${requirement.quality_level}, size ${requirement.weld_size_mm} mm`,
    ...otherReasons(result, look),
    ...findingLines(result, look),
    ...figureLines(result, look),
    "",
    `  coverage    ${(coverage.share * 100).toFixed(1)} % of the stations measured, longest blind stretch ${coverage.longest_blind_mm.toFixed(1)} mm`,
    ...result.warnings.map((warning) => `  note        ${plain(warning)}`),
  ].join("\n");
}
