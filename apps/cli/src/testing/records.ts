import type { BeadResult } from "@beadroll/domain/schemas/bead-result";
import type { PassRecord } from "@beadroll/domain/schemas/pass";
import type { ScanPage } from "@beadroll/domain/schemas/scan";
import type { ScanResult, Verdict, VerdictReason } from "@beadroll/domain/schemas/scan-result";
import type { Kept } from "./record-server.ts";

type Mutable<T> = { -readonly [K in keyof T]: T[K] };

const ID = "0193782a-5c1e-7c3a-9d52-6b1f0e4c8a77";

/** A reason: a gap at 90 mm beyond the limits that allow following. */
const HELD: VerdictReason = {
  check: "gap",
  station_mm: 90,
  value: 1.92,
  limit: 1.5,
  unit: "mm",
  level: "adapt",
  proof: "outside",
  text: "Gap 1.92 mm at 90 mm: above 1.50 mm",
};

/** A result as the measuring code gives it, of two stations. */
export function aScanResult(verdict: Verdict = "within"): ScanResult {
  return {
    engine: "beadroll-measure 0.1.0",
    model: "test-t-joint",
    joint_type: "fillet_t",
    points: 1200,
    points_used: 1100,
    points_lost: 3,
    verdict,
    reasons: verdict === "hold" ? [HELD] : [],
    warnings: [],
    coverage: { share: 0.5, longest_blind_mm: 20, blind_from_mm: 10, blind_to_mm: 30 },
    ends: { start_mm: 0, end_mm: 40, start_seen: true, end_seen: false },
    rigid: { translation_mm: [0, 0.2, 0], rotation_deg: [0, 0, -0.1], unobservable: ["along_seam"] },
    summary: { gap_mm: { max_abs: 1.92, at_mm: 90, rms: 0.4, p95_abs: 1.2 } },
    stations: [
      { station_mm: 0, measured: true, lateral_mm: 0.2, normal_mm: 0, gap_mm: 0.1, angle_deg: 0 },
      { station_mm: 40, measured: false, why: "no_points" },
    ],
  };
}

/** A result of a finished bead as the measuring code gives it, of one station. */
export function aBeadResult(verdict: Verdict = "within"): BeadResult {
  return {
    engine: "beadroll-measure 0.1.0",
    stage: "bead",
    model: "test-t-joint",
    joint_type: "fillet_t",
    points: 1200,
    points_lost: 3,
    requirement: { weld_size_mm: 5, quality_level: "C", edition: "2023" },
    verdict,
    reasons:
      verdict === "hold" ? ["5011 continuous undercut, plate B: 0.72 mm at 12 mm, 0.50 mm allowed"] : [],
    findings: [],
    warnings: [],
    coverage: { share: 1, longest_blind_mm: 0 },
    summary: { throat_mm: { mean: 5.1, min: 5.1, max: 5.1 } },
    stations: [{ station_mm: 0, measured: true, throat_mm: 5.1, u_throat_mm: 0.02 }],
  };
}

/** The record of a scan that was pushed. */
export function aScanRecord(kept: Kept, verdict: Verdict): Mutable<ScanPage> {
  const record = {
    id: ID,
    seam_tag: kept.seam,
    attempt: 1,
    verdict,
    points: 1200,
    file_name: kept.names[0] ?? "",
    file_digest: kept.digests["scan"] ?? "",
    poses_digest: kept.digests["poses"] ?? null,
    units: "mm" as const,
    engine: "beadroll-measure 0.1.0",
    cell_name: "Cell 2",
    taken_at: kept.fields["taken_at"] ?? kept.at,
    received_at: kept.at,
    received_from: "key Cell 2 PC",
    ledger_seq: 412,
  };
  return kept.fields["stage"] === "bead"
    ? { ...record, stage: "bead", result: aBeadResult(verdict) }
    : { ...record, stage: "fitup", result: aScanResult(verdict) };
}

/** The record of a pass that was pushed. */
export function aPassRecord(kept: Kept): Mutable<PassRecord> {
  const started_at = kept.fields["started_at"] ?? kept.at;
  return {
    id: ID,
    seam_tag: kept.seam,
    attempt: 1,
    pass_number: Number(kept.fields["pass_number"] ?? 1),
    procedure_name: "PB-135-07 rev 2",
    operator_tag: kept.fields["operator_tag"] ?? null,
    operator_name: null,
    operator_valid_until: null,
    cell_tag: "C-F0GT5KKGY",
    cell_name: "Cell 2",
    program: kept.fields["program"] ?? null,
    file_name: kept.names[0] ?? "",
    file_digest: kept.digests["log"] ?? "",
    started_at,
    ended_at: started_at,
    received_at: kept.at,
    received_from: "key Cell 2 PC",
    ledger_seq: 413,
    result: {
      duration_s: 8,
      samples: 81,
      sample_interval_s: 0.1,
      arc_on_s: 6,
      intervals: [{ start_s: 1, end_s: 7 }],
      restarts: [],
      statistics: {
        current_a: null,
        voltage_v: null,
        wire_feed_m_min: null,
        travel_mm_s: null,
        gas_l_min: null,
      },
      interpass_c: null,
      length_mm: 39,
      length_source: "travel",
      process: "135",
      arc_efficiency_k: 0.8,
      heat_input_kj_mm: 0.861,
      heat_input_instant_kj_mm: 0.86,
      judgement: {
        verdict: "outside",
        reasons: [
          {
            quantity: "travel_mm_s",
            kind: "mean-outside",
            value: 6.5,
            range: { min: 4, max: 6 },
            detail: "Travel speed was on average 6.50 mm/s, outside 4 to 6 mm/s.",
          },
        ],
      },
      series: {
        time_s: [],
        station_mm: null,
        current_a: null,
        voltage_v: null,
        wire_feed_m_min: null,
        travel_mm_s: null,
        gas_l_min: null,
      },
    },
  };
}
