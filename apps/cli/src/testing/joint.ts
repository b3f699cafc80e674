import type { SeamModel } from "@beadroll/domain/schemas/seam-model";

type Vector = [number, number, number];

/** A straight T joint of 40 mm along x, its root at y = 100, upright to +y. */
export function aModel(length_mm = 40): SeamModel {
  const vertices = [];
  for (let station_mm = 0; station_mm <= length_mm; station_mm += 2)
    vertices.push({
      station_mm,
      point: [station_mm, 100, 0] as Vector,
      tangent: [1, 0, 0] as Vector,
      lateral: [0, 1, 0] as Vector,
      normal: [0, 0, 1] as Vector,
    });
  return {
    case: "test-t-joint",
    joint_type: "fillet_t",
    seam: { length_mm, closed: false, vertices },
    section: {
      plate_a: { thickness_mm: 12 },
      plate_b: { thickness_mm: 6, height_mm: 20 },
      gap_mm: 0,
      included_angle_deg: 90,
    },
  };
}

interface Profiled {
  readonly profiles: string;
  readonly poses: string;
  readonly cloud: string;
}

/**
 * A clean scan of that joint, as profiles with poses and as a cloud in the part frame.
 * @param lateral_mm how far the upright stands toward +y
 */
export function aScan(lateral_mm = 0, length_mm = 40): Profiled {
  const profiles = ["station_mm,x_mm,z_mm"];
  const poses = ["station_mm,px_mm,py_mm,pz_mm,qw,qx,qy,qz"];
  const cloud: string[] = [];
  // The sensor's x runs along +y of the part, its z along +z: a quarter turn about z.
  const quarter = Math.SQRT1_2.toFixed(9);
  for (let x = 0; x <= length_mm; x += 1) {
    poses.push(`${x},${x},100,50,${quarter},0,0,${quarter}`);
    for (let d = 0.4; d <= 16; d += 0.2) {
      const wave = 0.01 * Math.sin(12.9898 * d + 78.233 * x);
      for (const [y, z] of [
        [lateral_mm - d, wave],
        [lateral_mm + wave, d],
      ] as const) {
        profiles.push(`${x},${y.toFixed(4)},${(z - 50).toFixed(4)}`);
        cloud.push(`${x} ${(100 + y).toFixed(4)} ${z.toFixed(4)}`);
      }
    }
  }
  const text = (lines: string[]): string => `${lines.join("\n")}\n`;
  return { profiles: text(profiles), poses: text(poses), cloud: text(cloud) };
}

/** A log of one steady pass of eight seconds. */
export function aLog(current_a = 250): string {
  const lines = ["time_s,current_a,voltage_v,travel_mm_s"];
  for (let i = 0; i <= 80; i += 1) {
    const burns = i >= 10 && i <= 70;
    lines.push(burns ? `${i / 10},${current_a},28,6.5` : `${i / 10},0,0,0`);
  }
  return `${lines.join("\n")}\n`;
}

/** A clean scan of the same joint once welded: a flat fillet with legs of 7.2 mm, and an undercut if asked for. */
export function aBead({ undercut_mm = 0, length_mm = 40 } = {}): string {
  const leg_mm = 7.2;
  const cloud: string[] = [];
  for (let x = 0; x <= length_mm; x += 1) {
    const put = (y: number, z: number) => cloud.push(`${x} ${(100 + y).toFixed(4)} ${z.toFixed(4)}`);
    for (let d = leg_mm; d <= 19; d += 0.1) {
      const dip = d < leg_mm + 1.6 ? (undercut_mm * (1 - Math.cos((Math.PI * (d - leg_mm)) / 0.8))) / 2 : 0;
      put(-d, 0);
      put(dip, d);
    }
    for (let share = 0; share <= 1; share += 0.01) put(-leg_mm * (1 - share), leg_mm * share);
  }
  return `${cloud.join("\n")}\n`;
}
