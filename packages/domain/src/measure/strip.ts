import type { StationResult } from "../schemas/scan-result.ts";
import type { Strip } from "../schemas/seam.ts";
import type { LimitSet, SeamModel } from "../schemas/seam-model.ts";
import { limitShare } from "./limit-share.ts";

/** Bins of a strip at list size. */
export const STRIP_BINS = 64;

/** Shares are kept in fiftieths, up to 2.54 of the limit. */
const STEPS = 50;
const LARGEST_STEP = 127;
const NOT_MEASURED = -128;

interface Bin {
  stations: number;
  worst: number;
  signed: number;
}

/** The worse of a bin and a station; equal shares keep the first. */
function take(bin: Bin, share: number, lateral_mm: number): void {
  if (bin.stations > 0 && share <= bin.worst) return;
  bin.worst = share;
  bin.signed = lateral_mm < 0 ? -share : share;
}

/**
 * A seam's bead strip at list size: evenly spaced bins from start to end, each with the worst share of the limits
 * used in it, signed as the lateral deviation there. A bin is null when any of its stations was not measured, so
 * that a blind stretch never hides behind a neighbour, or when it holds no station.
 * @param length_mm length of the seam, > 0
 * @param bins 1 to 96; fewer are made when there are fewer stations
 */
export function stripOf(
  stations: readonly StationResult[],
  scale: { readonly section: SeamModel["section"]; readonly limits: LimitSet; readonly length_mm: number },
  bins: number = STRIP_BINS,
): Strip {
  if (!(scale.length_mm > 0)) throw new RangeError(`length_mm: expected > 0, got ${scale.length_mm}`);
  const count = Math.max(1, Math.min(bins, stations.length));
  const filled: (Bin | null)[] = Array.from({ length: count }, () => ({ stations: 0, worst: 0, signed: 0 }));
  for (const station of stations) {
    const index = Math.min(
      count - 1,
      Math.max(0, Math.floor((station.station_mm / scale.length_mm) * count)),
    );
    const bin = filled[index];
    if (!bin) continue;
    const share = limitShare(station, scale.section, scale.limits);
    if (share === null) {
      filled[index] = null;
    } else {
      take(bin, share, station.lateral_mm ?? 0);
      bin.stations += 1;
    }
  }
  return filled.map((bin) =>
    bin === null || bin.stations === 0 ? null : Math.round(bin.signed * STEPS) / STEPS,
  );
}

/** A strip as bytes, one a bin: fiftieths of the limit as signed bytes, -128 where not measured. */
export function encodeStrip(strip: Strip): Uint8Array {
  return Uint8Array.from(strip, (share) => {
    if (share === null) return NOT_MEASURED & 0xff;
    const step = Math.round(Math.abs(share) * STEPS);
    const capped = Math.min(LARGEST_STEP, step);
    return (share < 0 ? -capped : capped) & 0xff;
  });
}

/** The strip that {@link encodeStrip} wrote; shares beyond 2.54 come back as 2.54. */
export function decodeStrip(bytes: Uint8Array): Strip {
  return Array.from(Int8Array.from(bytes), (step) => (step === NOT_MEASURED ? null : step / STEPS));
}
