import { z } from "zod";
import { lengthMm, share } from "./quantities.ts";

const seconds = (description: string, example: number) =>
  z
    .number()
    .min(0)
    .meta({ description: `${description}, s`, example });

/** The quantities of a weld log that are averaged and held against a procedure, in the order they are shown. */
export const PASS_QUANTITIES = [
  "current_a",
  "voltage_v",
  "wire_feed_m_min",
  "travel_mm_s",
  "gas_l_min",
] as const;
export type PassQuantity = (typeof PASS_QUANTITIES)[number];

/** A procedure's range for one quantity, both ends allowed; in the quantity's own unit. */
export const QuantityRange = z
  .object({
    min: z.number().meta({ description: "Lowest allowed", example: 220 }),
    max: z.number().meta({ description: "Highest allowed", example: 280 }),
  })
  .meta({
    id: "QuantityRange",
    description: "Allowed range, both ends included",
    example: { min: 220, max: 280 },
  });
export type QuantityRange = z.infer<typeof QuantityRange>;

/** One quantity over the time the arc burned, each moment weighing the same however it was sampled. */
export const QuantityStatistics = z
  .object({
    mean: z.number().meta({ description: "Mean over the arc time, in the quantity's unit", example: 251.4 }),
    min: z.number().meta({ description: "Smallest value while the arc burned", example: 236 }),
    max: z.number().meta({ description: "Largest value while the arc burned", example: 268 }),
    sd: z.number().min(0).meta({ description: "Standard deviation over the arc time", example: 4.2 }),
    range: QuantityRange.nullable().meta({
      description: "Range it was held against; null when none was given",
    }),
    share_outside: share("Share of the arc time outside the range; null without a range", 0.012).nullable(),
  })
  .meta({ id: "QuantityStatistics" });
export type QuantityStatistics = z.infer<typeof QuantityStatistics>;

/** One stretch of burning arc. */
export const ArcInterval = z
  .object({ start_s: seconds("Arc on, from the log's start", 0.4), end_s: seconds("Arc off", 62.1) })
  .meta({ id: "ArcInterval" });
export type ArcInterval = z.infer<typeof ArcInterval>;

/** The arc struck again after it had gone out within the pass. */
export const ArcRestart = z
  .object({
    at_s: seconds("When the arc struck again, from the log's start", 31.2),
    off_s: seconds("How long it had been out", 1.8),
    station_mm: lengthMm("Length welded before it; null without travel speed", 186.4).nullable(),
  })
  .meta({ id: "ArcRestart" });
export type ArcRestart = z.infer<typeof ArcRestart>;

/** Why a pass is not simply inside its procedure. */
export const PassReason = z
  .object({
    quantity: z
      .enum([...PASS_QUANTITIES, "interpass_c", "heat_input_kj_mm"])
      .meta({ description: "What the reason is about", example: "voltage_v" }),
    kind: z.enum(["mean-outside", "time-outside", "methods-disagree", "not-measured"]).meta({
      description:
        "mean-outside: the value lies outside the range; time-outside: it was outside for a share of the arc time; methods-disagree: heat input is inside by mean values and outside by the power of each sample; not-measured: the procedure limits it and the log does not say",
      example: "time-outside",
    }),
    value: z
      .number()
      .nullable()
      .meta({ description: "Mean, reading or share that led to it", example: 0.081 }),
    range: QuantityRange.meta({ description: "The procedure's range" }),
    detail: z.string().meta({
      description: "The reason in one sentence",
      example: "Voltage was outside 26 to 30 V for 8.1 % of the arc time.",
    }),
  })
  .meta({ id: "PassReason" });
export type PassReason = z.infer<typeof PassReason>;

/** How a pass stands against its procedure. */
export const PassJudgement = z
  .object({
    verdict: z.enum(["inside", "doubtful", "outside"]).meta({
      description:
        "outside: a mean lies outside; doubtful: too much time outside, or not measured; else inside",
      example: "inside",
    }),
    reasons: z.array(PassReason).meta({ description: "Every reason; empty when inside" }),
  })
  .meta({ id: "PassJudgement" });
export type PassJudgement = z.infer<typeof PassJudgement>;

/** Most buckets a stored series has, so that a plot of any log stays small. */
export const SERIES_BUCKETS_MAX = 600;

const values = (description: string) =>
  z.array(z.number().nullable()).max(SERIES_BUCKETS_MAX).meta({ description });

const Envelope = z
  .object({
    min: values("Smallest value in each bucket; null where none was read"),
    max: values("Largest value in each bucket; null where none was read"),
  })
  .nullable();

/** The whole log thinned for plotting: for each bucket the smallest and largest value, so that no spike is lost. */
export const PassSeries = z
  .object({
    time_s: z
      .array(z.number())
      .max(SERIES_BUCKETS_MAX)
      .meta({ description: "Time of each bucket's first sample, s" }),
    station_mm: z
      .array(z.number())
      .max(SERIES_BUCKETS_MAX)
      .nullable()
      .meta({ description: "Length welded at each bucket's first sample, mm; null without travel speed" }),
    current_a: Envelope,
    voltage_v: Envelope,
    wire_feed_m_min: Envelope,
    travel_mm_s: Envelope,
    gas_l_min: Envelope,
  })
  .meta({ id: "PassSeries" });
export type PassSeries = z.infer<typeof PassSeries>;

const statistics = QuantityStatistics.nullable();

const heatInput = (method: string) =>
  z
    .number()
    .min(0)
    .nullable()
    .meta({
      description: `Heat input, arc efficiency in it, ${method} (ISO/TR 18491, EN 1011-1), kJ/mm; null when the length or the arc efficiency is not known`,
      example: 0.93,
    });

/** What a weld log reduces to. Times run from the log's first sample. */
export const PassResult = z
  .object({
    duration_s: seconds("Length of the log", 64.2),
    samples: z.int().min(2).meta({ description: "Samples in the log", example: 6421 }),
    sample_interval_s: seconds("Median time between samples", 0.01),
    arc_on_s: seconds("Time the arc burned", 60.1),
    intervals: z.array(ArcInterval).meta({ description: "When the arc burned" }),
    restarts: z.array(ArcRestart).meta({ description: "Each time the arc struck again" }),
    statistics: z
      .object({
        current_a: statistics,
        voltage_v: statistics,
        wire_feed_m_min: statistics,
        travel_mm_s: statistics,
        gas_l_min: statistics,
      })
      .meta({ description: "Each quantity over the arc time; null where the log does not have it" }),
    interpass_c: z.number().nullable().meta({
      description: "Workpiece temperature last read before the arc struck, °C; null if not read",
      example: 118,
    }),
    length_mm: lengthMm("Length welded; null when neither travel speed nor the seam's length is known", 360.6)
      .min(0)
      .nullable(),
    length_source: z
      .enum(["travel", "seam"])
      .nullable()
      .meta({ description: "travel: travel speed over the arc time; seam: the seam's length as given" }),
    process: z.string().meta({ description: "Process number, ISO 4063", example: "135" }),
    arc_efficiency_k: z.number().min(0).max(1).nullable().meta({
      description: "Arc efficiency k used (EN 1011-1 Table 1); null for a process without one",
      example: 0.8,
    }),
    heat_input_kj_mm: heatInput("from mean current and mean voltage"),
    heat_input_instant_kj_mm: heatInput("from the power of each sample"),
    judgement: PassJudgement.nullable().meta({ description: "Null when no procedure ranges were given" }),
    series: PassSeries,
  })
  .meta({
    id: "PassResult",
    description: "A weld log reduced: arc time, means, spread, heat input, and what was outside",
  });
export type PassResult = z.infer<typeof PassResult>;
