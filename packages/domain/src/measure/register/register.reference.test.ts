import { readFileSync } from "node:fs";
import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { cross, dot, plus, rotationOf, turned, type Vector } from "../result/rotation.ts";
import { observability, registerPlanes } from "./register-planes.ts";
import { registerPoints } from "./register-points.ts";
import { expectedResidual, targetError } from "./registration-error.ts";
import { svd3 } from "./svd3.ts";

type Rows = readonly (readonly number[])[];

interface Golden {
  readonly rigid: readonly {
    readonly id: string;
    readonly source_points: readonly Vector[];
    readonly target_points: readonly Vector[];
    readonly weights: readonly number[] | null;
    readonly expected: { readonly R?: Rows; readonly t?: Vector; readonly rms_mm: number };
  }[];
  readonly point_to_plane: {
    readonly target_points: readonly Vector[];
    readonly target_normals: readonly Vector[];
    readonly source_points: readonly Vector[];
    readonly converged_known_pairs: { readonly T: Rows };
  };
}
/** numpy's SVD, scipy and Horn's quaternion agree on these; the point-to-plane pose is Open3D 0.16.1's too. */
const golden: Golden = JSON.parse(
  readFileSync(new URL("../../../vectors/geometry/registration.json", import.meta.url), "utf8"),
);

const near = (a: Rows, b: Rows, digits: number) => {
  for (const [i, row] of a.entries())
    for (const [j, x] of row.entries()) expect(x).toBeCloseTo(b[i]?.[j] ?? Number.NaN, digits);
};

const pairsOf = ({ source_points, target_points, weights }: Golden["rigid"][number]) =>
  source_points.map((measured, i) => ({
    measured,
    nominal: target_points[i] ?? measured,
    ...(weights && { weight: weights[i] ?? 1 }),
  }));

describe("datum points", () => {
  it.each(golden.rigid.filter(({ id }) => id !== "collinear-4"))("give the golden pose: $id", (example) => {
    const found = registerPoints(pairsOf(example));
    if (!found.ok) throw new Error(JSON.stringify(found.faults));
    const digits = example.id === "far-from-origin" ? 6 : 8;
    near(found.value.rotation, example.expected.R ?? [], digits);
    near([found.value.translation_mm], [example.expected.t ?? []], example.id === "far-from-origin" ? 3 : 6);
    if (!example.weights) expect(found.value.rms_mm).toBeCloseTo(example.expected.rms_mm, 6);
    expect(found.value.mirrored).toBe(example.id === "mirror-trap");
  });

  it("on one line are refused, with the direction about which nothing is known", () => {
    const line = golden.rigid.find(({ id }) => id === "collinear-4");
    if (!line) throw new Error("no example");
    const found = registerPoints(pairsOf(line));
    expect(found.ok ? [] : found.faults).toEqual([
      { code: "registration-undetermined", detail: expect.stringMatching(/one line.*direction \(/) },
    ]);
    expect(registerPoints(pairsOf(line).slice(0, 2)).ok).toBe(false);
  });

  it("find any motion again", () => {
    const part = fc.double({ min: -3, max: 3, noNaN: true });
    const shape: Vector[] = [
      [0, 0, 0],
      [400, 0, 0],
      [400, 250, 0],
      [0, 250, 60],
    ];
    fc.assert(
      fc.property(part, part, part, part, (a, b, c, t) => {
        const turn = rotationOf([a / 2, b / 2, c / 2]);
        const found = registerPoints(
          shape.map((p) => ({ measured: p, nominal: plus(turned(turn, p), [t, -2 * t, 5]) })),
        );
        if (!found.ok) throw new Error("refused");
        near(found.value.rotation, turn, 9);
        expect(found.value.rms_mm).toBeLessThan(1e-9);
      }),
    );
  });
});

describe("error of a registration", () => {
  const datums: Vector[] = [
    [0, 0, 0],
    [400, 0, 0],
    [400, 250, 0],
    [0, 250, 60],
  ];
  const error_mm = 0.03 * Math.sqrt(3);

  /** Fitzpatrick's formula; Monte Carlo (numpy): 0.02598, 0.03499, 0.06415. */
  it.each([
    [[200, 125, 15], 0.02598076211353316],
    [[200, 300, 15], 0.03503280876822019],
    [[800, 125, 15], 0.06436316038992067],
  ] as const)("at %j is %d mm", (place, expected) => {
    expect(targetError(datums, error_mm, [...place])).toBeCloseTo(expected, 9);
  });

  it("at the points themselves is √(1 - 2/N) of a point's", () => {
    expect(expectedResidual(4, 0.05196152422706632)).toBeCloseTo(0.03674234614174767, 12);
  });
});

describe("plates", () => {
  const { target_points, target_normals, source_points, converged_known_pairs } = golden.point_to_plane;
  const pairing = (moved: (p: Vector) => Vector) =>
    source_points.map((p, i) => ({
      point: moved(p),
      on: target_points[i] ?? p,
      normal: target_normals[i] ?? [0, 0, 1],
    }));

  it("give Open3D's pose", () => {
    const found = registerPlanes(pairing, { robust: false });
    if (!found.ok) throw new Error(JSON.stringify(found.faults));
    near(
      found.value.rotation.map((row, i) => [...row, found.value.translation_mm[i] ?? 0]),
      converged_known_pairs.T.slice(0, 3),
      8,
    );
  });

  it("of a T joint do not show a slide along the seam: refused, or left out", () => {
    const grid = Array.from({ length: 60 }, (_, i) => [i % 10, Math.floor(i / 10)] as const);
    const two = () => [
      ...grid.map(([x, y]) => ({
        point: [x, y, 0.1] as Vector,
        on: [x, y, 0] as Vector,
        normal: [0, 0, 1] as Vector,
      })),
      ...grid.map(([x, z]) => ({
        point: [x, 0.2, z] as Vector,
        on: [x, 0, z] as Vector,
        normal: [0, 1, 0] as Vector,
      })),
    ];
    expect(observability(two())[0]?.value).toBeCloseTo(0, 12);
    const refused = registerPlanes(two);
    expect(refused.ok ? "" : refused.faults[0]?.detail).toMatch(
      /sliding along \(-?1\.00, -?0\.00, -?0\.00\)/,
    );
    const kept = registerPlanes((moved) => two().map((pair) => ({ ...pair, point: moved(pair.point) })), {
      leave_out: true,
    });
    if (!kept.ok) throw new Error("refused");
    expect(kept.value.translation_mm[0]).toBeCloseTo(0, 9);
    expect(kept.value.free.length).toBe(1);
    expect(kept.value.rms_mm).toBeLessThan(1e-9);
  });
});

describe("singular values", () => {
  it("build the matrix again, with orthonormal sides", () => {
    const x = fc.double({ min: -10, max: 10, noNaN: true });
    const row = fc.tuple(x, x, x);
    fc.assert(
      fc.property(row, row, row, (a, b, c) => {
        const { u, s, v } = svd3([a, b, c]);
        const again = [0, 1, 2].map((i) =>
          [0, 1, 2].map((j) =>
            [0, 1, 2].reduce((sum, k) => sum + (u[k]?.[i] ?? 0) * (s[k] ?? 0) * (v[k]?.[j] ?? 0), 0),
          ),
        );
        near(again, [a, b, c], 9);
        for (const side of [u, v]) {
          expect(dot(side[0], side[1])).toBeCloseTo(0, 9);
          expect(Math.abs(dot(cross(side[0], side[1]), side[2]))).toBeCloseTo(1, 9);
        }
        expect(s[0] >= s[1] && s[1] >= s[2]).toBe(true);
      }),
    );
  });
});
