import { IMPERFECTIONS, type Imperfection, type WeldSizes } from "./imperfections.ts";
import { ISO_5817_CURRENT, type Iso5817Edition, type QualityLevel, type SourcedLimit } from "./limit.ts";

/** The table begins here, mm (ISO 5817, clause 1). */
export const THINNEST_MM = 0.5;

/** What a limit is asked for: sizes that the imperfection does not depend on may be left out. */
export interface LimitQuestion extends Partial<Omit<WeldSizes, "edition">> {
  readonly code: string;
  readonly level: QualityLevel;
  /** 2023 where left out. */
  readonly edition?: Iso5817Edition;
}

const BY_CODE: ReadonlyMap<string, Imperfection> = new Map(IMPERFECTIONS.map((one) => [one.code, one]));

/** The imperfection of a number of ISO 6520-1. @throws RangeError for a number that Table 1 does not hold */
export function imperfection(code: string): Imperfection {
  const found = BY_CODE.get(code);
  if (!found) throw new RangeError(`imperfection ${code}: not in ISO 5817 Table 1`);
  return found;
}

/**
 * What a quality level allows of an imperfection, ISO 5817 Table 1. Not rounded: compare unrounded.
 * @throws RangeError for an unknown number, a size that is missing or not positive, or a plate under 0.5 mm
 */
export function limitOf(question: LimitQuestion): SourcedLimit {
  const { code, level, edition = ISO_5817_CURRENT } = question;
  const { needs, limit, row, from_memory = false } = imperfection(code);
  const missing = needs.find((size) => question[size] === undefined);
  // A pore is held against the throat or the butt weld's thickness, whichever weld it is in.
  const eitherSize = code === "2017" && (missing === "a_mm" || missing === "s_mm");
  if (missing && !(eitherSize && (question.a_mm ?? question.s_mm) !== undefined))
    throw new RangeError(`${missing}: needed for imperfection ${code}`);
  for (const size of ["t_mm", "a_mm", "s_mm", "b_mm"] as const) {
    const value = question[size];
    if (value !== undefined && !(value > 0)) throw new RangeError(`${size}: expected > 0, got ${value}`);
  }
  if (question.t_mm !== undefined && question.t_mm < THINNEST_MM)
    throw new RangeError(`t_mm: ISO 5817 begins at ${THINNEST_MM} mm, got ${question.t_mm}`);
  const is_fillet = question.is_fillet ?? question.a_mm !== undefined;
  const { t_mm = Number.NaN, a_mm = Number.NaN, s_mm = Number.NaN, b_mm = Number.NaN } = question;
  return {
    limit: limit(level, { t_mm, a_mm, s_mm, b_mm, is_fillet, edition }),
    source: `ISO 5817:${edition} Table 1, ${row}`,
    from_memory,
  };
}
