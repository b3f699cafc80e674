// PROVISIONAL
import { good, type Outcome, refused } from "../faults/fault.ts";
import type { ScanResult, StationResult } from "../schemas/scan-result.ts";
import { resolveLimits, type SeamModel } from "../schemas/seam-model.ts";
import type { ScanCloud } from "./scan-cloud.ts";

export interface Line {
  cx: number;
  cy: number;
  dx: number;
  dy: number;
  n: number;
  rms: number;
  pts: [number, number][];
}
type P = [number, number];
function lineThrough(pts: P[]): Line {
  let mx = 0,
    my = 0;
  for (const p of pts) {
    mx += p[0];
    my += p[1];
  }
  mx /= pts.length;
  my /= pts.length;
  let sxx = 0,
    sxy = 0,
    syy = 0;
  for (const p of pts) {
    const a = p[0] - mx,
      b = p[1] - my;
    sxx += a * a;
    sxy += a * b;
    syy += b * b;
  }
  const th = 0.5 * Math.atan2(2 * sxy, sxx - syy);
  const dx = Math.cos(th),
    dy = Math.sin(th);
  let s = 0;
  for (const p of pts) {
    const r = (p[0] - mx) * -dy + (p[1] - my) * dx;
    s += r * r;
  }
  return { cx: mx, cy: my, dx, dy, n: pts.length, rms: Math.sqrt(s / Math.max(1, pts.length - 2)), pts };
}
function ransac(pts: P[], dir: P, seed: number): Line | null {
  if (pts.length < 6) return null;
  let best: P[] = [];
  let s = seed;
  const rnd = () => {
    s = (s * 1103515245 + 12345) & 0x7fffffff;
    return s / 0x7fffffff;
  };
  for (let k = 0; k < 40; k++) {
    const a = pts[Math.floor(rnd() * pts.length)]!,
      b = pts[Math.floor(rnd() * pts.length)]!;
    const dx = b[0] - a[0],
      dy = b[1] - a[1],
      l = Math.hypot(dx, dy);
    if (l < 1 || Math.abs((dx * dir[0] + dy * dir[1]) / l) < 0.95) continue;
    const inl = pts.filter((p) => Math.abs(((p[0] - a[0]) * -dy + (p[1] - a[1]) * dx) / l) < 0.15);
    if (inl.length > best.length) best = inl;
  }
  if (best.length < 5) return null;
  return lineThrough(best);
}
export function sectionPoints(
  _model: SeamModel,
  cloud: ScanCloud,
  v: SeamModel["seam"]["vertices"][number],
  half: number,
): P[] {
  const out: P[] = [];
  const { xyz_mm: x } = cloud;
  for (let i = 0; i < cloud.count; i++) {
    const a = x[3 * i]! - v.point[0],
      b = x[3 * i + 1]! - v.point[1],
      c = x[3 * i + 2]! - v.point[2];
    const t = a * v.tangent[0] + b * v.tangent[1] + c * v.tangent[2];
    if (t > half || t < -half) continue;
    const l = a * v.lateral[0] + b * v.lateral[1] + c * v.lateral[2];
    const n = a * v.normal[0] + b * v.normal[1] + c * v.normal[2];
    if (Math.abs(l) < 30 && Math.abs(n) < 30) out.push([l, n]);
  }
  return out;
}
export function twoPlates(pts: P[]): { a: Line; b: Line; root: P } | null {
  const a = ransac(pts, [1, 0], 7);
  const b = ransac(pts, [0, 1], 11);
  if (!a || !b) return null;
  const det = a.dx * -b.dy + b.dx * a.dy;
  const u = ((b.cx - a.cx) * -b.dy + b.dx * (b.cy - a.cy)) / det;
  return { a, b, root: [a.cx + u * a.dx, a.cy + u * a.dy] };
}
export function evaluateScan(
  model: SeamModel,
  cloud: ScanCloud,
  _o: { scanner_accuracy_mm?: number; step_mm?: number } = {},
): Outcome<ScanResult> {
  const vs = model.seam.vertices;
  const half = (vs[1]!.station_mm - vs[0]!.station_mm) / 2;
  const stations: StationResult[] = vs.map((v) => {
    const pts = sectionPoints(model, cloud, v, half);
    const r = pts.length > 12 ? twoPlates(pts) : null;
    if (!r) return { station_mm: v.station_mm, measured: false, why: "no_points" };
    return {
      station_mm: v.station_mm,
      measured: true,
      lateral_mm: r.root[0],
      normal_mm: r.root[1],
      gap_mm: 0,
      angle_deg: 0,
      u_lateral_mm: 0.03,
      u_normal_mm: 0.03,
    };
  });
  const m = stations.filter((s) => s.measured);
  if (m.length === 0 && !vs.some((v) => sectionPoints(model, cloud, v, 3).length > 5))
    return refused({ code: "scan-units-implausible", detail: "The scan does not fit the model." });
  const lim = resolveLimits(model.limits);
  const worst = Math.max(...m.map((s) => Math.abs(s.lateral_mm ?? 0)), 0);
  const at = m.find((s) => Math.abs(s.lateral_mm ?? 0) === worst)?.station_mm ?? 0;
  const share = m.length / stations.length;
  const verdict =
    worst > lim.adapt.lateral_mm || share < lim.coverage_share
      ? "hold"
      : worst > lim.within.lateral_mm
        ? "adapt"
        : "within";
  return good({
    engine: "provisional 0",
    model: model.case ?? "",
    joint_type: model.joint_type,
    points: cloud.count,
    points_used: cloud.count,
    points_lost: cloud.lost,
    verdict,
    reasons:
      verdict === "within"
        ? []
        : [
            {
              check: "lateral",
              station_mm: at,
              value: worst,
              limit: lim.adapt.lateral_mm,
              unit: "mm",
              level: verdict === "hold" ? "adapt" : "within",
              proof: "outside",
              text: `Lateral ${worst.toFixed(2)} mm at ${at} mm`,
            },
          ],
    warnings: [],
    coverage: { share, longest_blind_mm: 0 },
    ends: { start_mm: 0, end_mm: model.seam.length_mm, start_seen: false, end_seen: false },
    rigid: { translation_mm: [0, 0, 0], rotation_deg: [0, 0, 0], unobservable: [] },
    summary: { lateral_mm: { max_abs: worst, at_mm: at, rms: worst / 2, p95_abs: worst } },
    stations,
  } as unknown as ScanResult);
}
