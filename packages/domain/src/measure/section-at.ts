// PROVISIONAL
import { good, type Outcome } from "../faults/fault.ts";
import type { SeamModel } from "../schemas/seam-model.ts";
import type { SectionView } from "../schemas/section-view.ts";
import { sectionPoints, twoPlates } from "./evaluate.ts";
import type { ScanCloud } from "./scan-cloud.ts";
export function sectionAt(model: SeamModel, cloud: ScanCloud, station_mm: number): Outcome<SectionView> {
  const v = model.seam.vertices.reduce((a, b) =>
    Math.abs(b.station_mm - station_mm) < Math.abs(a.station_mm - station_mm) ? b : a,
  );
  const pts = sectionPoints(model, cloud, v, 1.5);
  const r = twoPlates(pts);
  const seg = (
    p: "a" | "b",
    l: { cx: number; cy: number; dx: number; dy: number; rms: number; n: number },
  ) => ({
    plate: p,
    from: [l.cx - 8 * l.dx, l.cy - 8 * l.dy] as [number, number],
    to: [l.cx + 8 * l.dx, l.cy + 8 * l.dy] as [number, number],
    rms_mm: l.rms,
    points: l.n,
  });
  return good({
    station_mm,
    measured: r !== null,
    why: null,
    kept: pts.slice(0, 3000),
    rejected: [],
    plates: r ? [seg("a", r.a), seg("b", r.b)] : [],
    root: r?.root ?? null,
    model: [],
  });
}
