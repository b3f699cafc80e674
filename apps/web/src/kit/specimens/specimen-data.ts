import type { SectionView } from "@beadroll/domain/schemas/section-view";
import type { PlotSpec } from "../plots/plot-spec.ts";
import type { StateName } from "../states/state-words.ts";
import type { StripStation } from "../strip/strip-groups.ts";

/** A seam as the kit's page shows it; invented. */
export interface SpecimenSeam {
  readonly seam: string;
  readonly joint: string;
  readonly stations: readonly StripStation[];
  readonly largest_mm: number;
  readonly heat_input_kj_mm: number;
  readonly verdict: StateName;
}

const LIMIT_MM = 3;

/** A wave that repeats exactly, so that pictures of the page can be compared. */
const rough = (index: number) => Math.sin(index * 12.9898) * 0.5 + Math.sin(index * 4.1414) * 0.5;

function stations(
  share: (along: number) => number | null,
  count = 65,
  pitch_mm = 5,
  noise = 0.04,
): StripStation[] {
  return Array.from({ length: count }, (_, index) => {
    const station_mm = index * pitch_mm;
    const value = share(index / (count - 1));
    if (value === null) return { station_mm, measured: false };
    const signed = value + rough(index) * noise;
    return { station_mm, measured: true, share: Math.abs(signed), deviation: signed * LIMIT_MM };
  });
}

function seam(
  name: string,
  verdict: StateName,
  heat_input_kj_mm: number,
  share: (along: number) => number | null,
): SpecimenSeam {
  const along = stations(share);
  const largest_mm = Math.max(...along.map((station) => Math.abs(station.deviation ?? 0)));
  return { seam: name, joint: "T, a5", stations: along, largest_mm, heat_input_kj_mm, verdict };
}

/** Six seams of one part. */
export const SPECIMEN_SEAMS: readonly SpecimenSeam[] = [
  seam("S1", "within", 1.2, (t) => 0.1 * Math.sin(t * 3)),
  seam("S2", "adapt", 1, (t) => -0.22 + 0.86 * t),
  seam("S3", "adapt", 1, (t) => (t > 0.46 && t < 0.52 ? null : 0.68 - Math.abs(t - 0.5) * 1.5)),
  seam("S4", "hold", 1.19, (t) => 0.3 + 0.92 * t * t),
  seam("S5", "within", 0.97, (t) => 0.15 * Math.cos(t * 4)),
  seam("S6", "accepted", 1.09, (t) => 0.34 * Math.cos(t * 5)),
];

/** A long seam with more stations than there are pixels, two blind stretches, one place beyond the limit. */
export const LONG_STRIP: readonly StripStation[] = stations(
  (t) => {
    if ((t > 0.18 && t < 0.2) || t > 0.96) return null;
    return Math.abs(t - 0.7) < 0.002 ? 1.3 : 0.5 * Math.sin(t * 9);
  },
  2400,
  1,
);

const S4 = SPECIMEN_SEAMS[3]?.stations ?? [];

/** Length of the seam whose plots are shown. */
export const SPECIMEN_LENGTH_MM = 320;

function deviation(
  id: string,
  title: string,
  unit: string,
  value: (index: number) => number | null,
): PlotSpec {
  const values = S4.map((_, index) => value(index));
  return {
    id,
    title,
    unit,
    stations_mm: S4.map((station) => station.station_mm),
    values,
    expanded_u: values.map((known) => (known === null ? null : 0.06)),
    signed: true,
    bands: [
      { kind: "within", low: -0.5, high: 0.5, word: "within" },
      { kind: "adapt", low: -LIMIT_MM, high: LIMIT_MM, word: "adapt" },
    ],
  };
}

const blind = (index: number) => index > 20 && index < 25;

/** Two deviations and a log, on one axis. */
export const SPECIMEN_PLOTS: readonly PlotSpec[] = [
  deviation("lateral_mm", "Lateral", "mm", (index) => (blind(index) ? null : (S4[index]?.deviation ?? null))),
  deviation("normal_mm", "Normal", "mm", (index) => (blind(index) ? null : -0.3 + rough(index) * 0.08)),
  {
    id: "current_a",
    title: "Current",
    unit: "A",
    decimals: 0,
    stations_mm: Array.from({ length: 160 }, (_, index) => index * 2),
    values: Array.from({ length: 160 }, (_, index) => 251 + rough(index) * 3),
    envelope: {
      min: Array.from({ length: 160 }, (_, index) => 238 + rough(index * 3) * 4),
      max: Array.from({ length: 160 }, (_, index) => 264 + rough(index * 7) * 5),
    },
    bands: [{ kind: "within", low: 220, high: 280, word: "procedure" }],
  },
];

function face(
  from: readonly [number, number],
  to: readonly [number, number],
  count: number,
): [number, number][] {
  return Array.from({ length: count }, (_, index) => {
    const part = index / (count - 1);
    const off = rough(index + from[0]) * 0.12;
    const upright = from[0] === to[0];
    return [
      from[0] + (to[0] - from[0]) * part + (upright ? off : 0),
      from[1] + (to[1] - from[1]) * part + (upright ? 0 : off),
    ];
  });
}

/** A T joint seen at one station. */
export const SPECIMEN_SECTION: SectionView = {
  station_mm: 310,
  measured: true,
  why: null,
  kept: [...face([-28, -0.2], [3, -0.2], 130), ...face([3.4, 0.4], [3.4, 19], 70)],
  rejected: [
    { point: [-1.2, 2.1], why: "ghost" },
    { point: [-9.4, 5.6], why: "spike" },
    { point: [-14, 1.9], why: "spatter" },
    { point: [1.6, 7.4], why: "ghost" },
  ],
  plates: [
    { plate: "a", from: [-28, -0.2], to: [3.4, -0.2], rms_mm: 0.031, points: 130 },
    { plate: "b", from: [3.4, -0.2], to: [3.4, 19], rms_mm: 0.042, points: 70 },
  ],
  root: [3.4, -0.2],
  model: [
    [
      [-30, 0],
      [0, 0],
      [0, 20],
    ],
  ],
};
