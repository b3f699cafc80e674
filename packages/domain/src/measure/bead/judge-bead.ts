import type { Limit, SourcedLimit } from "../../quality/iso-5817/limit.ts";
import { imperfection, limitOf } from "../../quality/iso-5817/limit-of.ts";
import type { BeadRequirement } from "../../schemas/bead-requirement.ts";
import type { BeadFinding } from "../../schemas/bead-result.ts";
import { medianOf } from "../fit/median.ts";
import { COVERAGE_FACTOR } from "../judge/decide.ts";
import { type BeadCheck, beadChecks } from "./bead-checks.ts";
import type { Figure } from "./bead-geometry.ts";
import type { MeasuredBead } from "./measure-bead.ts";

/** Short imperfections: at most this much of any window of this length (ISO 5817:2014, 3.3), mm. */
const SHORT_MM = 25;
const WINDOW_MM = 100;

/** Sections nearer together than this are judged by a running median: one alone is a stray return, mm. */
const STRAY_PITCH_MM = { mm: 2, deg: 6 } as const;

/** Undercut over a longer unbroken stretch than this is continuous, 5011; else intermittent, 5012, mm. */
const CONTINUOUS_MM = 25;

const ROUNDING = 1e-9;

type State = BeadFinding["state"];

/** One section held against its limit. */
interface Held {
  readonly at_mm: number;
  readonly value: number;
  readonly u: number;
  readonly sourced: SourcedLimit;
  readonly state: State;
  /** Beyond the limit by this, in its unit; negative inside. */
  readonly over: number;
  /** Proved to be there at all. */
  readonly isThere: boolean;
}

/** What a limit allows as a number: nothing at all is 0. */
function bound(limit: Limit): { value: number; way: 1 | -1 } | null {
  switch (limit.kind) {
    case "at_most":
      return { value: limit.value_mm, way: 1 };
    case "at_least":
      return { value: limit.value_deg, way: -1 };
    case "not_permitted":
      return { value: 0, way: 1 };
    default:
      return null;
  }
}

/** The decision rule of ISO 14253-1 for a limit on one side, guard bands of the expanded uncertainty. */
function decided(over: number, u: { readonly down: number; readonly up: number }, isNothing: boolean): State {
  if (isNothing) return "met";
  if (over - COVERAGE_FACTOR * u.down > ROUNDING) return "not_met";
  return over + COVERAGE_FACTOR * u.up <= ROUNDING ? "met" : "not_proven";
}

/** Sections to either side whose median is judged: a toe's angle in one section alone is mostly noise. */
const BESIDE = { mm: 1, deg: 3 } as const;

/** What a median keeps of the uncertainty: of three sections nothing is gained, they may share their error. */
const KEPT_U = { mm: 1, deg: 0.6 } as const;

/** Values of a check along the weld, stray sections evened out. */
function seriesOf({ outcomes, slices }: MeasuredBead, check: BeadCheck, requirement: BeadRequirement) {
  const figures = outcomes.map((one) => (one.found ? check.measure(one.section.figures, requirement) : null));
  const by = BESIDE[check.unit];
  return figures.map((figure, i): Figure | null => {
    if (!figure || !(slices.pitch_mm <= STRAY_PITCH_MM[check.unit])) return figure;
    const about = figures.slice(Math.max(0, i - by), i + by + 1).flatMap((one) => one ?? []);
    if (about.length < 3) return figure;
    return {
      value: medianOf(about.map(({ value }) => value)),
      u: KEPT_U[check.unit] * medianOf(about.map(({ u }) => u)),
      u_down: KEPT_U[check.unit] * medianOf(about.map(({ u, u_down }) => u_down ?? u)),
    };
  });
}

function heldSections(
  measured: MeasuredBead,
  check: BeadCheck,
  requirement: BeadRequirement,
  common_mm: number,
): Held[] {
  const { weld_size_mm, quality_level, edition } = requirement;
  const isFillet = measured.bead.kind === "fillet";
  return seriesOf(measured, check, requirement).flatMap((figure, i): Held[] => {
    const outcome = measured.outcomes[i];
    if (!figure || !outcome?.found) return [];
    const b_mm = Math.max(0.1, outcome.section.figures.width_mm?.value ?? 0.1);
    const sourced = limitOf({
      code: check.code,
      level: quality_level,
      edition,
      t_mm: check.t_mm,
      a_mm: weld_size_mm,
      s_mm: weld_size_mm,
      b_mm,
      is_fillet: isFillet,
    });
    const limit = bound(sourced.limit);
    if (!limit) return [];
    const wholly = (u: number) => (check.unit === "mm" ? Math.hypot(u, common_mm) : u);
    const u = wholly(figure.u);
    const down = wholly(figure.u_down ?? figure.u);
    const over = limit.way * (figure.value - limit.value);
    const state = decided(over, { down, up: u }, check.shows && figure.value === 0);
    const isThere = figure.value > COVERAGE_FACTOR * down;
    return [{ at_mm: measured.slices.at_mm[i]!, value: figure.value, u, sourced, state, over, isThere }];
  });
}

/** The most of an imperfection that lies in any window, mm. */
function mostInWindow(there: readonly Held[], pitch_mm: number, window_mm: number): number {
  let [from, most] = [0, 0];
  there.forEach((held, to) => {
    while (there[from]!.at_mm < held.at_mm - window_mm) from += 1;
    most = Math.max(most, (to - from + 1) * pitch_mm);
  });
  return most;
}

const RANK: Record<State, number> = { not_met: 2, not_proven: 1, met: 0 };

/** The section that is told: the worst state, and of those the one furthest over its limit. */
function worstOf(held: readonly Held[]): Held | null {
  return held.reduce<Held | null>((worst, one) => {
    if (!worst || RANK[one.state] > RANK[worst.state]) return one;
    return RANK[one.state] === RANK[worst.state] && one.over > worst.over ? one : worst;
  }, null);
}

/** The longest unbroken stretch on which an imperfection is there, mm. */
function longestStretch(held: readonly Held[], pitch_mm: number): number {
  let [run, longest] = [0, 0];
  for (const one of held) {
    run = one.isThere ? run + pitch_mm : 0;
    longest = Math.max(longest, run);
  }
  return longest;
}

const rounded = (value: number) => Math.round(value * 1e4) / 1e4 + 0;

interface Told {
  readonly check: BeadCheck;
  readonly code: string;
  readonly worst: Held;
  readonly state: State;
  /** Length of a short imperfection that is too long, mm; null where its length is no matter. */
  readonly too_long_mm: number | null;
}

function sentence({ check, code, worst, state, too_long_mm }: Told): string {
  const unit = check.unit === "mm" ? " mm" : "°";
  const figure = (value: number) => `${value.toFixed(check.unit === "mm" ? 2 : 0)}${unit}`;
  const name = `${code} ${imperfection(code).name}${check.plate ? `, plate ${check.plate.toUpperCase()}` : ""}`;
  const place = `${Number(worst.at_mm.toFixed(1))} mm`;
  const { limit } = worst.sourced;
  const allowed =
    limit.kind === "not_permitted"
      ? "not permitted"
      : limit.kind === "at_least"
        ? `at least ${figure(limit.value_deg)} asked`
        : limit.kind === "at_most"
          ? `${figure(limit.value_mm)} allowed`
          : "";
  const doubt = state === "not_proven" ? `, too near to say (± ${figure(COVERAGE_FACTOR * worst.u)})` : "";
  const length =
    too_long_mm === null
      ? ""
      : `; ${Math.round(too_long_mm)} mm of it in ${WINDOW_MM} mm, ${SHORT_MM} mm allowed`;
  return `${name}: ${figure(worst.value)} at ${place}, ${allowed}${doubt}${length}`;
}

function findingOf(
  measured: MeasuredBead,
  check: BeadCheck,
  requirement: BeadRequirement,
  common_mm: number,
): BeadFinding | null {
  const held = heldSections(measured, check, requirement, common_mm);
  const worst = worstOf(held);
  if (!worst) return null;
  const pitch_mm = measured.slices.pitch_mm || 1;
  const length_mm = held.filter((one) => one.state !== "met").length * pitch_mm;
  const { limit } = worst.sourced;
  const whole_mm = held.length * pitch_mm;
  const window_mm = Math.min(WINDOW_MM, whole_mm);
  const most_mm = mostInWindow(
    held.filter((one) => one.isThere),
    pitch_mm,
    window_mm,
  );
  const isTooLong =
    limit.kind === "at_most" && limit.short_only && most_mm > SHORT_MM * (window_mm / WINDOW_MM) + pitch_mm;
  const state: State = isTooLong ? "not_met" : worst.state;
  const code = check.code === "5011" && longestStretch(held, pitch_mm) <= CONTINUOUS_MM ? "5012" : check.code;
  const told = { check, code, worst, state, too_long_mm: isTooLong ? most_mm : null };
  return {
    code,
    name: imperfection(code).name,
    ...(check.plate && { plate: check.plate }),
    state,
    station_mm: rounded(worst.at_mm),
    value: rounded(worst.value),
    expanded_u: rounded(COVERAGE_FACTOR * worst.u),
    limit: limit.kind === "not_permitted" ? null : rounded(bound(limit)?.value ?? 0),
    unit: check.unit,
    length_mm: rounded(length_mm),
    source: worst.sourced.source,
    text: sentence(told),
  };
}

/**
 * Holds a measured weld against a quality level of ISO 5817: every imperfection that its face shows, the worst first.
 * Sections are compared unrounded with unrounded limits by the decision rule of ISO 14253-1.
 * @param common_mm standard uncertainty that all sizes share (the scanner's accuracy), mm
 */
export function judgeBead(
  measured: MeasuredBead,
  requirement: BeadRequirement,
  common_mm: number,
): BeadFinding[] {
  return beadChecks(measured.bead)
    .flatMap((check) => findingOf(measured, check, requirement, common_mm) ?? [])
    .sort((a, b) => RANK[b.state] - RANK[a.state]);
}
