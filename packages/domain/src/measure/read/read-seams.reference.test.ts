import { readFileSync } from "node:fs";
import { describe, expect, test } from "vitest";
import { readSharedBytes } from "../../../vectors/shared-vectors.ts";
import type { ScanCloud } from "../scan-cloud.ts";
import { readScan } from "./read-scan.ts";
import type { ScanFile } from "./scan-input.ts";

interface Seam {
  readonly profiles: ScanFile;
  readonly poses: ScanFile;
  readonly cloud: ScanFile;
}

function cloudOf(outcome: ReturnType<typeof readScan>): ScanCloud {
  if (!outcome.ok) throw new Error(JSON.stringify(outcome.faults));
  return outcome.value;
}

/** Both ways of writing a seam, and the largest distance between their coordinates. */
function compare({ profiles, poses, cloud }: Seam) {
  const carried = cloudOf(readScan({ ...profiles, units: "mm", poses }));
  const plain = cloudOf(readScan({ ...cloud, units: "mm" }));
  expect(carried.count).toBe(plain.count);
  let largest_mm = 0;
  carried.xyz_mm.forEach((value, i) => {
    largest_mm = Math.max(largest_mm, Math.abs(value - plain.xyz_mm[i]!));
  });
  return { carried, largest_mm };
}

/** Rows without a z in a profiles file: returns the sensor lost. */
function emptyRows({ bytes }: ScanFile): number {
  return new TextDecoder()
    .decode(bytes)
    .split("\n")
    .filter((row) => row.endsWith(",")).length;
}

function sharedSeam(folder: string): Seam | null {
  const file = (name: string) => ({ name, bytes: readSharedBytes(`data/scans/${folder}/${name}`) });
  const seam = { profiles: file("profiles.csv"), poses: file("poses.csv"), cloud: file("cloud.ply") };
  const isHere = Object.values(seam).every(({ bytes }) => bytes !== undefined);
  return isHere ? (seam as Seam) : null;
}

describe("profiles carried by their poses against the same points in the part frame", () => {
  test("agree along an arc, to the rounding of 32-bit floats", () => {
    const folder = new URL("../../../vectors/formats/corner-arc/", import.meta.url);
    const file = (name: string) => ({ name, bytes: new Uint8Array(readFileSync(new URL(name, folder))) });
    const seam = { profiles: file("profiles.csv"), poses: file("poses.csv"), cloud: file("cloud.ply") };
    const { carried, largest_mm } = compare(seam);
    expect(largest_mm).toBeLessThan(1e-5);
    expect(carried.lost).toBe(emptyRows(seam.profiles));
    expect(new Set(carried.profiles)).toEqual(new Set([0, 1, 2]));
  });

  // The ascii cloud of the third case is rounded to 0.001 mm, the others are 32-bit floats.
  test.each([
    ["01-two-uprights/seam-1", 1e-5],
    ["01-two-uprights/seam-2", 1e-5],
    ["02-butt-v-hilo", 1e-5],
    ["03-lap-gap", 5.1e-4],
    ["04-corner-arc", 1e-5],
  ])("agree in the simulated scan %s within %f mm", (folder, tolerance_mm) => {
    const seam = sharedSeam(folder);
    if (seam === null) return expect(seam).toBeNull();
    const { carried, largest_mm } = compare(seam);
    expect(largest_mm).toBeLessThan(tolerance_mm);
    expect(carried.lost).toBe(emptyRows(seam.profiles));
    const profiles = carried.profiles!;
    expect(profiles.every((profile, i) => i === 0 || profile >= profiles[i - 1]!)).toBe(true);
  });
});
