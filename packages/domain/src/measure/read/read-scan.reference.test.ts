import { readFileSync } from "node:fs";
import { describe, expect, test } from "vitest";
import { z } from "zod";
import type { ScanCloud } from "../scan-cloud.ts";
import { readScan } from "./read-scan.ts";

const folder = new URL("../../../vectors/formats/", import.meta.url);
const fileOf = (name: string) => ({ name, bytes: new Uint8Array(readFileSync(new URL(name, folder))) });

const Formats = z.object({
  points: z.number(),
  sum_xyz_all_points: z.array(z.number()),
  sum_xyz_without_nan_rows: z.array(z.number()),
  first: z.array(z.number()),
  last: z.array(z.number()),
  nan_rows: z.array(z.number()),
  files: z.record(z.string(), z.object({ nan_points: z.number().optional(), expect: z.string().optional() })),
});
const formats = Formats.parse(JSON.parse(readFileSync(new URL("formats.json", folder), "utf8")));
const good = Object.entries(formats.files).filter(([, { expect: error }]) => error === undefined);

function cloudOf(name: string): ScanCloud {
  const outcome = readScan({ ...fileOf(name), units: "mm" });
  if (!outcome.ok) throw new Error(JSON.stringify(outcome.faults));
  return outcome.value;
}

function sums({ xyz_mm }: ScanCloud): number[] {
  const sum = [0, 0, 0];
  xyz_mm.forEach((value, i) => {
    sum[i % 3] = sum[i % 3]! + value;
  });
  return sum;
}

describe("one T joint in every layout, written by PCL, Open3D and numpy", () => {
  test("the set holds thirteen good files", () => {
    expect(good).toHaveLength(13);
  });

  test.each(good)("%s has the points, the lost returns and the sums that numpy counted", (name, file) => {
    const cloud = cloudOf(name);
    const lost = file.nan_points ?? 0;
    expect(cloud.count).toBe(formats.points - lost);
    expect(cloud.xyz_mm).toHaveLength(3 * cloud.count);
    expect(cloud.lost).toBe(lost);
    const expected = lost > 0 ? formats.sum_xyz_without_nan_rows : formats.sum_xyz_all_points;
    sums(cloud).forEach((sum, axis) => {
      expect(Math.abs(sum - expected[axis]!), `axis ${axis}`).toBeLessThan(1e-4);
    });
  });

  test.each(good)("%s keeps the order of the points", (name, file) => {
    const cloud = cloudOf(name);
    const plain = cloudOf("tjoint.xyz");
    const rows = Array.from({ length: plain.count }, (_, row) => row).filter(
      (row) => file.nan_points === undefined || !formats.nan_rows.includes(row),
    );
    rows.forEach((row, at) => {
      for (let axis = 0; axis < 3; axis++) {
        const difference = cloud.xyz_mm[3 * at + axis]! - plain.xyz_mm[3 * row + axis]!;
        expect(Math.abs(difference)).toBeLessThan(1e-6);
      }
    });
    expect(cloud.xyz_mm[1]).toBeCloseTo(formats.first[1]!, 6);
    expect(cloud.xyz_mm.at(-1)).toBeCloseTo(formats.last[2]!, 6);
  });

  test.each(["tjoint-profiles.csv", "tjoint-decimal-comma.csv"])(
    "%s tells the six profiles apart by their station",
    (name) => {
      const { profiles } = cloudOf(name);
      expect([...profiles!]).toEqual(Array.from({ length: 384 }, (_, i) => Math.floor(i / 64)));
    },
  );

  test("a plain cloud has no profiles", () => {
    expect(cloudOf("tjoint.xyz").profiles).toBeNull();
  });

  test("refuses a body shorter than its header says, naming the byte and how many vertices are whole", () => {
    const outcome = readScan({ ...fileOf("broken-truncated-be.ply"), units: "mm" });
    expect(outcome).toEqual({
      ok: false,
      faults: [
        {
          code: "file-truncated",
          detail:
            'broken-truncated-be.ply, byte 3000: the header says 384 of element "vertex", the file ends after 214',
          byte: 3000,
          field: "vertex",
        },
      ],
    });
  });

  test("refuses POINTS that is not WIDTH x HEIGHT, naming the line", () => {
    const outcome = readScan({ ...fileOf("broken-count.pcd"), units: "mm" });
    expect(outcome.ok ? [] : outcome.faults).toMatchObject([
      { code: "file-header-invalid", line: 10, field: "POINTS", detail: expect.stringContaining("385") },
    ]);
  });

  test("refuses a packed block shorter than it says, naming both sizes", () => {
    const outcome = readScan({ ...fileOf("broken-lzf.pcd"), units: "mm" });
    expect(outcome.ok ? [] : outcome.faults).toMatchObject([
      { code: "file-truncated", byte: 2193, detail: expect.stringMatching(/3981 bytes.*1990/) },
    ]);
  });
});
