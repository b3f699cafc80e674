import type { ScanResult, StationResult, Verdict, VerdictReason } from "../../schemas/scan-result.ts";
import { resolveLimits, type SeamModel } from "../../schemas/seam-model.ts";
import { coverageReasons } from "./coverage-reasons.ts";
import { JUDGED } from "./judged-quantities.ts";
import { reasonFor } from "./reason.ts";

/** What a scan's deviations mean, with every reason. */
export interface Judgement {
  readonly verdict: Verdict;
  readonly reasons: VerdictReason[];
}

/** A quantity's reason at the outer limits if it has one there, else at the inner ones. */
function reasonsOf(model: SeamModel, stations: readonly StationResult[]): VerdictReason[] {
  const limits = resolveLimits(model.limits);
  return JUDGED.flatMap((quantity) => {
    const nominal = quantity.nominalOf(model.section);
    for (const level of ["adapt", "within"] as const) {
      const limit = quantity.limitOf(limits[level]);
      const reason = reasonFor(stations, quantity, { level, limit, nominal });
      if (reason) return reason;
    }
    return [];
  });
}

/**
 * The verdict: `within` where every deviation is proved inside the inner limits, `adapt` where every one is proved
 * inside the outer limits, else `hold`. Nothing that was not measured counts as good.
 * Source of the rule: ISO 14253-1, guard bands of the expanded uncertainty.
 */
export function judgeScan(
  model: SeamModel,
  stations: readonly StationResult[],
  coverage: ScanResult["coverage"],
): Judgement {
  const reasons = [
    ...coverageReasons(stations, coverage, resolveLimits(model.limits)),
    ...reasonsOf(model, stations),
  ].sort((a, b) => (a.level === b.level ? 0 : a.level === "adapt" ? -1 : 1));
  const verdict = reasons.some((reason) => reason.level === "adapt")
    ? "hold"
    : reasons.length > 0
      ? "adapt"
      : "within";
  return { verdict, reasons };
}
