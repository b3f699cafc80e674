/** Editions of ISO 5817 that differ in a number; a shop chooses its own. */
export const ISO_5817_EDITIONS = ["2014", "2023"] as const;

/** The edition that serves where none is chosen. */
export const ISO_5817_CURRENT = "2023" as const;
export type Iso5817Edition = (typeof ISO_5817_EDITIONS)[number];

/** Quality levels, the strictest first. */
export const QUALITY_LEVELS = ["B", "C", "D"] as const;
export type QualityLevel = (typeof QUALITY_LEVELS)[number];

/**
 * What a level allows of an imperfection.
 * - `at_most`: its size in mm; `short_only`: only as a short imperfection (3.3: at most 25 mm in any 100 mm of weld)
 * - `at_least`: an angle in degrees
 */
export type Limit =
  | { readonly kind: "at_most"; readonly value_mm: number; readonly short_only: boolean }
  | { readonly kind: "at_least"; readonly value_deg: number }
  | { readonly kind: "not_permitted" }
  | { readonly kind: "permitted" }
  | { readonly kind: "by_application" };

/** A limit with where it stands. */
export interface SourcedLimit {
  readonly limit: Limit;
  /** Standard, edition and row: `ISO 5817:2023 Table 1, 1.10`. */
  readonly source: string;
  /** True where the figure was remembered, not read in the standard or two copies of it. */
  readonly from_memory: boolean;
}

export const NOT_PERMITTED: Limit = { kind: "not_permitted" };
export const PERMITTED: Limit = { kind: "permitted" };

/** A size allowed, capped. */
export function atMost(value_mm: number, cap_mm = Number.POSITIVE_INFINITY): Limit {
  return { kind: "at_most", value_mm: Math.min(value_mm, cap_mm), short_only: false };
}

/** A size allowed for short imperfections only, capped. */
export function short(value_mm: number, cap_mm = Number.POSITIVE_INFINITY): Limit {
  return { kind: "at_most", value_mm: Math.min(value_mm, cap_mm), short_only: true };
}

export const atLeast = (value_deg: number): Limit => ({ kind: "at_least", value_deg });
