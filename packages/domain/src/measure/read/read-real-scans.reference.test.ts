import { describe, expect, test } from "vitest";
import { readSharedBytes } from "../../../vectors/shared-vectors.ts";
import { readScan } from "./read-scan.ts";

/** Rows of a table of numbers, the slow and obvious way; an empty cell is nan. */
function rowsOf(bytes: Uint8Array): number[][] {
  const lines = new TextDecoder().decode(bytes).trim().split(/\r?\n/).slice(1);
  return lines.map((line) => line.split(",").map((cell) => (cell === "" ? Number.NaN : Number(cell))));
}

type Turn = readonly [w: number, x: number, y: number, z: number];
const half = (deg: number): number => (deg * Math.PI) / 360;

/** Hamilton product. */
const times = ([a, b, c, d]: Turn, [e, f, g, h]: Turn): Turn => [
  a * e - b * f - c * g - d * h,
  a * f + b * e + c * h - d * g,
  a * g - b * h + c * e + d * f,
  a * h + b * g - c * f + d * e,
];

/** The quaternion of Rz(r) Ry(p) Rx(w). */
function quaternion(w_deg: number, p_deg: number, r_deg: number): Turn {
  const z: Turn = [Math.cos(half(r_deg)), 0, 0, Math.sin(half(r_deg))];
  const y: Turn = [Math.cos(half(p_deg)), 0, Math.sin(half(p_deg)), 0];
  const x: Turn = [Math.cos(half(w_deg)), Math.sin(half(w_deg)), 0, 0];
  return times(times(z, y), x);
}

/** Rz(r) Ry(p) Rx(w) (x, 0, z), one turn after the other. */
function turned(w_deg: number, p_deg: number, r_deg: number, [x, z]: readonly [number, number]): number[] {
  const [w, p, r] = [2 * half(w_deg), 2 * half(p_deg), 2 * half(r_deg)];
  const afterX = [x, -Math.sin(w) * z, Math.cos(w) * z] as const;
  const afterY = [
    Math.cos(p) * afterX[0] + Math.sin(p) * afterX[2],
    afterX[1],
    -Math.sin(p) * afterX[0] + Math.cos(p) * afterX[2],
  ] as const;
  return [
    Math.cos(r) * afterY[0] - Math.sin(r) * afterY[1],
    Math.sin(r) * afterY[0] + Math.cos(r) * afterY[1],
    afterY[2],
  ];
}

describe("profiles of real line scanners", () => {
  test.each(["line-scanner-grooves", "line-scanner-sphere/set-a", "line-scanner-sphere/set-c"])(
    "%s: every return stands where the robot's pose puts it, lost ones counted",
    (folder) => {
      const bytes = readSharedBytes(`data/${folder}/profiles.csv`);
      const flange = readSharedBytes(`data/${folder}/poses.csv`);
      if (bytes === undefined || flange === undefined) return expect(bytes).toBeUndefined();
      const poses = rowsOf(flange);
      const text = poses.map(([n, x, y, z, w, p, r]) => [n, x, y, z, ...quaternion(w!, p!, r!)].join(","));
      const head = "profile,px_mm,py_mm,pz_mm,qw,qx,qy,qz";
      const posesFile = { name: "poses.csv", bytes: new TextEncoder().encode([head, ...text].join("\n")) };
      const outcome = readScan({ name: "profiles.csv", bytes, units: "mm", poses: posesFile });
      if (!outcome.ok) throw new Error(JSON.stringify(outcome.faults));
      const { xyz_mm, count, lost, profiles } = outcome.value;
      const all = rowsOf(bytes);
      const returned = all.filter(([, , x, z]) => Number.isFinite(x! + z!));
      expect([count, lost]).toEqual([returned.length, all.length - returned.length]);
      const numbers = poses.map(([n]) => n!).toSorted((a, b) => a - b);
      let largest_mm = 0;
      returned.forEach(([n, , x, z], i) => {
        const [, px, py, pz, w, p, r] = poses.find(([number]) => number === n)!;
        const from = turned(w!, p!, r!, [x!, z!]);
        [px!, py!, pz!].forEach((origin, axis) => {
          largest_mm = Math.max(largest_mm, Math.abs(origin + from[axis]! - xyz_mm[3 * i + axis]!));
        });
        if (numbers[profiles![i]!] !== n) throw new Error(`point ${i} is not from profile ${n}`);
      });
      expect(largest_mm).toBeLessThan(1e-9);
    },
  );

  test("slot-heightmap: stations along y give the height map back", () => {
    const bytes = readSharedBytes("data/slot-heightmap/profiles.csv");
    if (bytes === undefined) return expect(bytes).toBeUndefined();
    const rows = rowsOf(bytes);
    const stations = [...new Set(rows.map(([s]) => s!))].toSorted((a, b) => a - b);
    const poses = stations.map((s) => `${s},0,${s},0,1,0,0,0`).join("\n");
    const text = `station_mm,px_mm,py_mm,pz_mm,qw,qx,qy,qz\n${poses}\n`;
    const posesFile = { name: "poses.csv", bytes: new TextEncoder().encode(text) };
    const outcome = readScan({ name: "profiles.csv", bytes, units: "mm", poses: posesFile });
    if (!outcome.ok) throw new Error(JSON.stringify(outcome.faults));
    expect([...outcome.value.xyz_mm]).toEqual(rows.flatMap(([s, x, z]) => [x, s, z]));
    expect(outcome.value.profiles!.every((profile, i) => stations[profile] === rows[i]![0])).toBe(true);
  });
});
