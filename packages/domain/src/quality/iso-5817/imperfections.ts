import {
  atLeast,
  atMost,
  type Iso5817Edition,
  type Limit,
  NOT_PERMITTED,
  PERMITTED,
  type QualityLevel,
  short,
} from "./limit.ts";

/** Sizes that limits depend on, mm. */
export interface WeldSizes {
  /** Thickness of the parent plate, ≥ 0.5. */
  readonly t_mm: number;
  /** Nominal throat of a fillet weld. */
  readonly a_mm: number;
  /** Nominal thickness of a butt weld. */
  readonly s_mm: number;
  /** Width of the reinforcement or the root bead. */
  readonly b_mm: number;
  readonly is_fillet: boolean;
  readonly edition: Iso5817Edition;
}

/** An imperfection of ISO 6520-1 and its limits in ISO 5817 Table 1. */
export interface Imperfection {
  readonly code: string;
  readonly name: string;
  /** Row of Table 1. */
  readonly row: string;
  /** Sizes that the limit is worked out from. */
  readonly needs: readonly ("t_mm" | "a_mm" | "s_mm" | "b_mm")[];
  /** True where figures were remembered. */
  readonly from_memory?: boolean;
  readonly limit: (level: QualityLevel, sizes: WeldSizes) => Limit;
}

/** Rows of plates up to 3 mm and above differ; the table has no row below 0.5 mm. */
const isThin = ({ t_mm }: WeldSizes) => t_mm <= 3;

type ByLevel = Readonly<Record<QualityLevel, Limit>>;
const never: ByLevel = { B: NOT_PERMITTED, C: NOT_PERMITTED, D: NOT_PERMITTED };
const notBelow = (D: Limit): ByLevel => ({ B: NOT_PERMITTED, C: NOT_PERMITTED, D });
const always: ByLevel = {
  B: { kind: "by_application" },
  C: { kind: "by_application" },
  D: { kind: "by_application" },
};

const row = (
  code: string,
  name: string,
  number: string,
  needs: Imperfection["needs"],
  limits: (sizes: WeldSizes) => ByLevel,
  from_memory = false,
): Imperfection => ({
  code,
  name,
  row: number,
  needs,
  from_memory,
  limit: (level, sizes) => limits(sizes)[level],
});

/**
 * Imperfections of fusion welds in steel, nickel and titanium from 0.5 mm, ISO 5817 Table 1. Numbers by ISO 6520-1.
 * Sizes in mm. Micro lack of fusion and what can be seen only in a micro section is left out.
 */
export const IMPERFECTIONS: readonly Imperfection[] = [
  row("100", "crack", "1.1", [], () => never),
  row("104", "crater crack", "1.2", [], () => never),
  row("2017", "surface pore", "1.3", ["t_mm", "a_mm", "s_mm"], (sizes) => {
    const size = sizes.is_fillet ? sizes.a_mm : sizes.s_mm;
    return isThin(sizes)
      ? notBelow(atMost(0.3 * size))
      : { B: NOT_PERMITTED, C: atMost(0.2 * size, 2), D: atMost(0.3 * size, 3) };
  }),
  row("2025", "end crater pipe", "1.4", ["t_mm"], (sizes) =>
    isThin(sizes)
      ? notBelow(atMost(0.2 * sizes.t_mm))
      : { B: NOT_PERMITTED, C: atMost(0.1 * sizes.t_mm, 1), D: atMost(0.2 * sizes.t_mm, 2) },
  ),
  row("401", "lack of fusion", "1.5", [], () => never),
  row("4021", "incomplete root penetration", "1.6", ["t_mm"], ({ t_mm }) => notBelow(short(0.2 * t_mm, 2))),
  row("5011", "continuous undercut", "1.7", ["t_mm"], undercut),
  row("5012", "intermittent undercut", "1.7", ["t_mm"], undercut),
  row("5013", "shrinkage groove", "1.8", ["t_mm"], (sizes) =>
    isThin(sizes)
      ? { B: NOT_PERMITTED, C: short(0.1 * sizes.t_mm), D: short(0.2 + 0.1 * sizes.t_mm) }
      : {
          B: short(0.05 * sizes.t_mm, 0.5),
          C: short(0.1 * sizes.t_mm, 1),
          D: short(0.2 * sizes.t_mm, 2),
        },
  ),
  row("502", "excess weld metal", "1.9", ["b_mm"], ({ b_mm }) => ({
    B: atMost(1 + 0.1 * b_mm, 5),
    C: atMost(1 + 0.15 * b_mm, 7),
    D: atMost(1 + 0.25 * b_mm, 10),
  })),
  row("503", "excessive convexity", "1.10", ["b_mm"], ({ b_mm }) => ({
    B: atMost(1 + 0.1 * b_mm, 3),
    C: atMost(1 + 0.15 * b_mm, 4),
    D: atMost(1 + 0.25 * b_mm, 5),
  })),
  row("504", "excess penetration", "1.11", ["t_mm", "b_mm"], (sizes) => {
    const { b_mm } = sizes;
    if (isThin(sizes))
      return { B: atMost(1 + 0.1 * b_mm), C: atMost(1 + 0.3 * b_mm), D: atMost(1 + 0.6 * b_mm) };
    const level_c = sizes.edition === "2014" ? 0.6 : 0.45;
    return { B: atMost(1 + 0.2 * b_mm, 3), C: atMost(1 + level_c * b_mm, 4), D: atMost(1 + b_mm, 5) };
  }),
  row("505", "incorrect weld toe", "1.12", [], ({ is_fillet }) =>
    is_fillet
      ? { B: atLeast(110), C: atLeast(100), D: atLeast(90) }
      : { B: atLeast(150), C: atLeast(110), D: atLeast(90) },
  ),
  row("506", "overlap", "1.13", ["b_mm"], ({ b_mm }) => notBelow(atMost(0.2 * b_mm))),
  row("509", "sagging", "1.14", ["t_mm"], underfill),
  row("511", "incompletely filled groove", "1.14", ["t_mm"], underfill),
  row("510", "burn-through", "1.15", [], () => never),
  row("512", "excessive asymmetry", "1.16", ["a_mm"], ({ a_mm }) => ({
    B: atMost(1.5 + 0.15 * a_mm),
    C: atMost(2 + 0.15 * a_mm),
    D: atMost(2 + 0.2 * a_mm),
  })),
  row("515", "root concavity", "1.17", ["t_mm"], (sizes) =>
    isThin(sizes)
      ? { B: NOT_PERMITTED, C: short(0.1 * sizes.t_mm), D: atMost(0.2 + 0.1 * sizes.t_mm) }
      : {
          B: short(0.05 * sizes.t_mm, 0.5),
          C: short(0.1 * sizes.t_mm, 1),
          D: short(0.2 * sizes.t_mm, 2),
        },
  ),
  row("516", "root porosity", "1.18", [], () => notBelow(PERMITTED)),
  row("517", "poor restart", "1.19", [], () => notBelow(PERMITTED)),
  row("5213", "insufficient throat", "1.20", ["t_mm", "a_mm"], (sizes) => {
    const { a_mm } = sizes;
    return isThin(sizes)
      ? { B: NOT_PERMITTED, C: short(0.2), D: short(0.2 + 0.1 * a_mm) }
      : { B: NOT_PERMITTED, C: short(0.3 + 0.1 * a_mm, 1), D: short(0.3 + 0.1 * a_mm, 2) };
  }),
  row("5214", "excessive throat", "1.21", ["a_mm"], ({ a_mm }) => ({
    B: atMost(1 + 0.15 * a_mm, 3),
    C: atMost(1 + 0.2 * a_mm, 4),
    D: PERMITTED,
  })),
  row("601", "stray arc", "1.22", [], () => notBelow(PERMITTED)),
  row("602", "spatter", "1.23", [], () => always),
  row("610", "temper colour", "1.24", [], () => always),
  row(
    "5071",
    "linear misalignment of plates",
    "3.1",
    ["t_mm"],
    (sizes) => {
      const { t_mm } = sizes;
      return isThin(sizes)
        ? { B: atMost(0.2 + 0.1 * t_mm), C: atMost(0.2 + 0.15 * t_mm), D: atMost(0.2 + 0.25 * t_mm) }
        : { B: atMost(0.1 * t_mm, 3), C: atMost(0.15 * t_mm, 4), D: atMost(0.25 * t_mm, 5) };
    },
    true,
  ),
  row(
    "5072",
    "linear misalignment of circumferential welds",
    "3.1",
    ["t_mm"],
    ({ t_mm }) => ({ B: atMost(0.5 * t_mm, 2), C: atMost(0.5 * t_mm, 3), D: atMost(0.5 * t_mm, 4) }),
    true,
  ),
  row("617", "incorrect root gap", "3.2", ["t_mm", "a_mm"], (sizes) => {
    const { a_mm } = sizes;
    return isThin(sizes)
      ? { B: atMost(0.2 + 0.1 * a_mm), C: atMost(0.3 + 0.1 * a_mm), D: atMost(0.5 + 0.1 * a_mm) }
      : {
          B: atMost(0.5 + 0.1 * a_mm, 2),
          C: atMost(0.5 + 0.2 * a_mm, 3),
          D: atMost(1 + 0.3 * a_mm, 4),
        };
  }),
];

function undercut(sizes: WeldSizes): ByLevel {
  const { t_mm } = sizes;
  return isThin(sizes)
    ? { B: NOT_PERMITTED, C: short(0.1 * t_mm), D: short(0.2 * t_mm) }
    : { B: atMost(0.05 * t_mm, 0.5), C: atMost(0.1 * t_mm, 0.5), D: atMost(0.2 * t_mm, 1) };
}

function underfill(sizes: WeldSizes): ByLevel {
  const { t_mm } = sizes;
  return isThin(sizes)
    ? { B: NOT_PERMITTED, C: short(0.1 * t_mm), D: short(0.25 * t_mm) }
    : { B: short(0.05 * t_mm, 0.5), C: short(0.1 * t_mm, 1), D: short(0.25 * t_mm, 2) };
}
