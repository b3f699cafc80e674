import { readFileSync } from "node:fs";
import { describe, expect, it } from "vitest";
import { readScan } from "../read-scan.ts";
import { fromFixedXyz, fromMatrix, fromZyz, quaternionProduct } from "./orientation.ts";

/** scipy's Rotation and the products of the single turns agree on these. */
const golden: {
  readonly cases?: readonly unknown[];
} & Record<string, unknown> = JSON.parse(
  readFileSync(new URL("../../../../vectors/geometry/rotations.json", import.meta.url), "utf8"),
);

const near = (a: ArrayLike<number>, b: readonly number[]) => {
  // A quaternion and its negative are the same turn.
  const sign = Math.sign(Array.from(a).reduce((sum, x, i) => sum + x * (b[i] ?? 0), 0));
  for (const [i, x] of Array.from(a).entries()) expect(sign * x).toBeCloseTo(b[i] ?? Number.NaN, 9);
};

describe("orientations", () => {
  it("by fixed axes: roll 10, pitch 20, yaw 30 degrees (scipy)", () => {
    near(
      fromFixedXyz(10, 20, 30),
      [0.9515485246437885, 0.03813457647485015, 0.18930785741199999, 0.2392983377447303],
    );
  });

  it("by z, y, z: 30, 40, 50 degrees (scipy)", () => {
    near(
      fromZyz(30, 40, 50),
      [0.7198463103929542, 0.05939117461388474, 0.33682408883346515, 0.6040227735550537],
    );
  });

  it("by matrix, also for half a turn about (0.36, 0.48, 0.8)", () => {
    near(
      fromMatrix([
        0.04341204441673252, -0.8295983733257066, 0.5566703992264194, 0.9096158864219905, 0.26325835480968673,
        0.3213938048432696, -0.41317591116653474, 0.49240387650610407, 0.7660444431189781,
      ]),
      [0.7198463103929542, 0.05939117461388474, 0.33682408883346515, 0.6040227735550537],
    );
    near(
      fromMatrix([-0.7408, 0.3456, 0.576, 0.3456, -0.5392, 0.768, 0.576, 0.768, 0.28]),
      [0, 0.36, 0.48, 0.8],
    );
  });

  it("multiply as Hamilton's", () => {
    const a = [0.9515485246437885, 0.03813457647485015, 0.18930785741199999, 0.2392983377447303] as const;
    const b = [0.5920194834964052, -0.25103632047595215, -0.2354061584432536, 0.728750737584213] as const;
    near(
      quaternionProduct(a, b),
      [0.44308382518487105, -0.02200628498307736, -0.19978961772883394, 0.8736570013046039],
    );
    expect(Object.keys(golden).length).toBeGreaterThan(0);
  });
});

const bytes = (text: string) => new TextEncoder().encode(text);
const scan = (poses: string) =>
  readScan({
    name: "profiles.csv",
    bytes: bytes("station_mm,x_mm,z_mm\n0,1,2\n0,-1,3\n"),
    units: "mm",
    poses: { name: "poses.csv", bytes: bytes(poses) },
  });

describe("poses files", () => {
  it("give the same points however they write the turn", () => {
    const [qw, qx, qy, qz] = fromFixedXyz(10, 20, 30);
    const ways = [
      `station_mm,px_mm,py_mm,pz_mm,qw,qx,qy,qz\n0,5,6,7,${qw},${qx},${qy},${qz}\n`,
      "station_mm,px_mm,py_mm,pz_mm,fixed_x_deg,fixed_y_deg,fixed_z_deg\n0,5,6,7,10,20,30\n",
    ].map(scan);
    const [one, other] = ways.map((way) => (way.ok ? Array.from(way.value.xyz_mm) : []));
    expect(one).toHaveLength(6);
    for (const [i, x] of (one ?? []).entries()) expect(other?.[i]).toBeCloseTo(x, 9);
  });

  it("are refused, with line and field, where a matrix is no rotation", () => {
    const wrong = scan(
      "station_mm,px_mm,py_mm,pz_mm,r11,r12,r13,r21,r22,r23,r31,r32,r33\n0,5,6,7,1,0,0,0,1,0,0,0,-1\n",
    );
    expect(wrong.ok ? [] : wrong.faults).toMatchObject([
      { code: "scan-pose-invalid", line: 2, field: "r11" },
    ]);
  });
});
