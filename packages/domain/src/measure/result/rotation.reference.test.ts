import { readFileSync } from "node:fs";
import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { type Matrix, product, rotationOf, type Vector, vectorOf } from "./rotation.ts";
import { solveDetermined, symmetricEigen } from "./symmetric-solve.ts";

const DEG = 180 / Math.PI;
const near = (a: Matrix, b: readonly (readonly number[])[], digits: number) => {
  for (const [i, row] of a.entries())
    for (const [j, x] of row.entries()) expect(x).toBeCloseTo(b[i]?.[j] ?? Number.NaN, digits);
};

interface Golden {
  readonly rigid: readonly {
    readonly id: string;
    readonly expected: {
      readonly R?: readonly (readonly number[])[];
      readonly rotation_vector_deg?: readonly number[];
    };
  }[];
}
const golden: Golden = JSON.parse(
  readFileSync(new URL("../../../vectors/geometry/registration.json", import.meta.url), "utf8"),
);

interface Turn {
  readonly fixed_xyz_roll_pitch_yaw_deg: readonly [number, number, number];
  readonly matrix: Matrix;
  readonly rotation_vector_deg: Vector;
}
/** Turns by roll, pitch and yaw with their matrices and rotation vectors: scipy. */
const rotations: { readonly cases: readonly Turn[] } = JSON.parse(
  readFileSync(new URL("../../../vectors/geometry/rotations.json", import.meta.url), "utf8"),
);

describe("turns about fixed axes", () => {
  it.each(rotations.cases)("roll, pitch, yaw $fixed_xyz_roll_pitch_yaw_deg", (turn) => {
    const [roll, pitch, yaw] = turn.fixed_xyz_roll_pitch_yaw_deg;
    const [x, y, z] = turn.rotation_vector_deg;
    near(rotationOf([x / DEG, y / DEG, z / DEG]), turn.matrix, 12);
    const aboutX = rotationOf([roll / DEG, 0, 0]);
    const aboutY = rotationOf([0, pitch / DEG, 0]);
    const aboutZ = rotationOf([0, 0, yaw / DEG]);
    near(product(aboutZ, product(aboutY, aboutX)), turn.matrix, 12);
    if (Math.hypot(x, y, z) < 179.999)
      for (const [k, angle] of vectorOf(turn.matrix).entries())
        expect(angle * DEG).toBeCloseTo(turn.rotation_vector_deg[k] ?? 0, 9);
  });
});

describe("rotation vector and matrix", () => {
  it.each(golden.rigid.filter(({ expected }) => expected.rotation_vector_deg && expected.R))(
    "agree with scipy: $id",
    ({ id, expected }) => {
      const [x = 0, y = 0, z = 0] = expected.rotation_vector_deg ?? [];
      near(rotationOf([x / DEG, y / DEG, z / DEG]), expected.R ?? [], 9);
      // Half a turn may be told about either of two opposite axes.
      if (id !== "half-turn")
        for (const [k, angle] of vectorOf(expected.R as unknown as Matrix).entries())
          expect(angle * DEG).toBeCloseTo([x, y, z][k] ?? 0, 6);
    },
  );

  it("come back from each other, and turns one after the other add about one axis", () => {
    const part = fc.double({ min: -1.5, max: 1.5, noNaN: true });
    fc.assert(
      fc.property(part, part, part, (x, y, z) => {
        const v: Vector = [x, y, z];
        for (const [k, value] of vectorOf(rotationOf(v)).entries()) expect(value).toBeCloseTo(v[k] ?? 0, 8);
        near(product(rotationOf(v), rotationOf(v)), rotationOf([2 * x, 2 * y, 2 * z]), 9);
      }),
    );
  });
});

describe("small turns", () => {
  it("are rotations to the last digits, on both sides of where the series takes over", () => {
    for (const size of [1e-6, 9e-5, 1.1e-4, 1e-2])
      for (const row of rotationOf([size, 0, 0])) expect(Math.hypot(...row)).toBeCloseTo(1, 12);
  });

  it("keep their digits: a thousandth of a second of arc comes back to one part in a million", () => {
    for (const size of [1e-9, 1e-7, 9e-5, 1.1e-4, 1e-3]) {
      const [x, y, z] = vectorOf(rotationOf([size, -2 * size, 0.5 * size]));
      expect(x / size).toBeCloseTo(1, 6);
      expect(y / size).toBeCloseTo(-2, 6);
      expect(z / size).toBeCloseTo(0.5, 6);
    }
  });
});

describe("symmetric matrices", () => {
  it("are made again from their eigenvalues and unit eigenvectors", () => {
    const part = fc.double({ min: -5, max: 5, noNaN: true });
    fc.assert(
      fc.property(fc.array(part, { minLength: 21, maxLength: 21 }), (parts) => {
        const at = (i: number, j: number) =>
          parts[(Math.max(i, j) * (Math.max(i, j) + 1)) / 2 + Math.min(i, j)]!;
        const matrix = Array.from({ length: 6 }, (_, i) => Array.from({ length: 6 }, (__, j) => at(i, j)));
        const { values, vectors } = symmetricEigen(matrix);
        for (let i = 0; i < 6; i++)
          for (let j = 0; j < 6; j++) {
            const again = values.reduce(
              (sum, value, k) => sum + value * vectors[i]![k]! * vectors[j]![k]!,
              0,
            );
            expect(again).toBeCloseTo(matrix[i]![j]!, 9);
            const square = vectors.reduce((sum, row) => sum + row[i]! * row[j]!, 0);
            expect(square).toBeCloseTo(i === j ? 1 : 0, 10);
          }
      }),
    );
  });

  it("have the eigenvalues of the second difference matrix: 2 - 2 cos(kπ/5)", () => {
    const matrix = Array.from({ length: 4 }, (_, i) =>
      Array.from({ length: 4 }, (__, j) => (i === j ? 2 : Math.abs(i - j) === 1 ? -1 : 0)),
    );
    const values = [...symmetricEigen(matrix).values].sort((a, b) => a - b);
    for (const [k, value] of values.entries())
      expect(value).toBeCloseTo(2 - 2 * Math.cos(((k + 1) * Math.PI) / 5), 12);
  });

  it("are solved with the least norm, and what they leave free is named", () => {
    const { x, free } = solveDetermined(
      [
        [2, 0],
        [0, 0],
      ],
      [4, 0],
      1e-9,
    );
    expect(x).toEqual([2, 0]);
    expect(free.map((direction) => direction.map(Math.abs))).toEqual([[0, 1]]);
  });
});
