import { readFileSync } from "node:fs";
import fc from "fast-check";
import { describe, expect, test } from "vitest";
import type { LengthUnit } from "../scan-cloud.ts";
import { readScan } from "./read-scan.ts";
import type { ScanFile } from "./scan-input.ts";

type Point = readonly [number, number, number];

const SCALE: Readonly<Record<LengthUnit, number>> = { mm: 1, in: 25.4, m: 1000 };
const units = fc.constantFrom<LengthUnit>("mm", "in", "m");
/** Without -0, which the language writes as 0. */
const coordinate = fc
  .oneof(
    fc.double({ min: -2000, max: 2000, noNaN: true }),
    fc.integer({ min: -2_000_000, max: 2_000_000 }).map((n) => n / 1000),
  )
  .map((value) => (value === 0 ? 0 : value));
const clouds = fc.array(fc.tuple(coordinate, coordinate, coordinate), { minLength: 1, maxLength: 40 });
const bytesOf = (text: string): Uint8Array => new TextEncoder().encode(text);
const join = (head: string, body: Uint8Array): Uint8Array => Buffer.concat([bytesOf(head), body]);

/** Expects the points back, each exactly as one multiplication makes it, from the numbers that were written. */
function expectPoints(file: ScanFile, unit: LengthUnit, written: readonly Point[]): void {
  const outcome = readScan({ ...file, units: unit });
  if (!outcome.ok) throw new Error(JSON.stringify(outcome.faults));
  expect(outcome.value.count).toBe(written.length);
  expect([...outcome.value.xyz_mm]).toEqual(written.flatMap((p) => p.map((v) => v * SCALE[unit])));
}

interface TextStyle {
  readonly separator: string;
  readonly comma: boolean;
  readonly end: string;
  readonly extra: boolean;
  readonly header: boolean;
  readonly closed: boolean;
}

const textStyles: fc.Arbitrary<TextStyle> = fc
  .record({
    separator: fc.constantFrom(" ", "  ", "\t", ",", ";", ", "),
    comma: fc.boolean(),
    end: fc.constantFrom("\n", "\r\n", "\r"),
    extra: fc.boolean(),
    header: fc.boolean(),
    closed: fc.boolean(),
  })
  .map((style) => ({ ...style, comma: style.comma && !style.separator.startsWith(",") }));

function writeText(points: readonly Point[], style: TextStyle): string {
  const number = (value: number) => (style.comma ? String(value).replace(".", ",") : String(value));
  const names = ["x", "y", "z", ...(style.extra ? ["intensity"] : [])].join(style.separator);
  const rows = points.map((p) => [...p.map(number), ...(style.extra ? ["7"] : [])].join(style.separator));
  const lines = style.header ? [names, ...rows] : rows;
  return lines.join(style.end) + (style.closed ? style.end : "");
}

interface Layout {
  readonly type: "float" | "double";
  readonly big: boolean;
  readonly before: number;
  readonly between: number;
}

const layouts: fc.Arbitrary<Layout> = fc.record({
  type: fc.constantFrom("float", "double"),
  big: fc.boolean(),
  before: fc.nat(3),
  between: fc.nat(3),
});

/** Records of x, y, z with bytes before x and between x and y; also the numbers that the type can hold. */
function writeRecords(points: readonly Point[], { type, big, before, between }: Layout) {
  const size = type === "float" ? 4 : 8;
  const stride = before + between + 3 * size;
  const view = new DataView(new ArrayBuffer(stride * points.length));
  const kept = points.map((point, i) => {
    const at = (axis: number) => i * stride + before + axis * size + (axis > 0 ? between : 0);
    return point.map((value, axis) => {
      if (type === "float") view.setFloat32(at(axis), value, !big);
      else view.setFloat64(at(axis), value, !big);
      return type === "float" ? Math.fround(value) : value;
    }) as unknown as Point;
  });
  return { body: new Uint8Array(view.buffer), kept, size };
}

function plyOf(points: readonly Point[], layout: Layout) {
  const { body, kept } = writeRecords(points, layout);
  const bytes = (count: number, name: string) =>
    Array.from({ length: count }, (_, i) => `property uchar ${name}${i}\n`).join("");
  const head =
    `ply\nformat binary_${layout.big ? "big" : "little"}_endian 1.0\nelement vertex ${points.length}\n` +
    `${bytes(layout.before, "a")}property ${layout.type} x\n${bytes(layout.between, "b")}` +
    `property ${layout.type} y\nproperty ${layout.type} z\nend_header\n`;
  return { file: { name: "a.ply", bytes: join(head, body) }, kept };
}

function pcdHead(points: number, layout: Layout, data: string): string {
  const size = layout.type === "float" ? 4 : 8;
  return (
    `# .PCD v0.7\nVERSION 0.7\nFIELDS _ x b y z\nSIZE 1 ${size} 1 ${size} ${size}\nTYPE U F U F F\n` +
    `COUNT ${layout.before} 1 ${layout.between} 1 1\nWIDTH ${points}\nHEIGHT 1\nPOINTS ${points}\nDATA ${data}\n`
  );
}

/** Packs bytes as LZF: literals, and copies of what stood four to eight bytes before. */
function packLzf(plain: Uint8Array): Uint8Array {
  const out: number[] = [];
  let literal: number[] = [];
  const flush = () => {
    for (let i = 0; i < literal.length; i += 32) {
      const run = literal.slice(i, i + 32);
      out.push(run.length - 1, ...run);
    }
    literal = [];
  };
  for (let at = 0; at < plain.length; ) {
    const best = [4, 8]
      .map((back) => [back, runLength(plain, at, back)] as const)
      .toSorted((a, b) => b[1] - a[1])[0]!;
    const [back, length] = best;
    if (length < 3) {
      literal.push(plain[at++]!);
      continue;
    }
    flush();
    if (length < 9) out.push((length - 2) << 5, back - 1);
    else out.push(0xe0, length - 9, back - 1);
    at += length;
  }
  flush();
  return Uint8Array.from(out);
}

function runLength(plain: Uint8Array, at: number, back: number): number {
  let length = 0;
  while (
    at >= back &&
    at + length < plain.length &&
    length < 264 &&
    plain[at + length] === plain[at + length - back]
  ) {
    length++;
  }
  return length;
}

/** The same records field by field, as a packed PCD body has them. */
function byField(body: Uint8Array, points: number, { before, between, type }: Layout): Uint8Array {
  const size = type === "float" ? 4 : 8;
  const stride = before + between + 3 * size;
  const out: number[] = [];
  let from = 0;
  for (const width of [before, size, between, size, size]) {
    for (let i = 0; i < points; i++) out.push(...body.subarray(i * stride + from, i * stride + from + width));
    from += width;
  }
  return Uint8Array.from(out);
}

describe("whatever is written is read back", () => {
  test("text in any style", () => {
    fc.assert(
      fc.property(clouds, units, textStyles, (points, unit, style) => {
        expectPoints({ name: "a.txt", bytes: bytesOf(writeText(points, style)) }, unit, points);
      }),
      { numRuns: 500 },
    );
  });

  test("ascii PLY and PCD", () => {
    fc.assert(
      fc.property(clouds, units, (points, unit) => {
        const body = points.map((p) => `${p.join(" ")} 7\n`).join("");
        const types = ["x", "y", "z", "i"].map((name) => `property double ${name}\n`).join("");
        const ply = `ply\nformat ascii 1.0\nelement vertex ${points.length}\n${types}end_header\n${body}`;
        const pcd = `FIELDS x y z i\nSIZE 8 8 8 8\nTYPE F F F F\nPOINTS ${points.length}\nDATA ascii\n${body}`;
        expectPoints({ name: "a.ply", bytes: bytesOf(ply) }, unit, points);
        expectPoints({ name: "a.pcd", bytes: bytesOf(pcd) }, unit, points);
      }),
    );
  });

  test("binary PLY of both byte orders, with fields around", () => {
    fc.assert(
      fc.property(clouds, units, layouts, (points, unit, layout) => {
        const { file, kept } = plyOf(points, layout);
        expectPoints(file, unit, kept);
      }),
    );
  });

  test("binary PCD, also with padding behind, and packed PCD", () => {
    fc.assert(
      fc.property(clouds, units, layouts, fc.nat(9), (points, unit, any, padding) => {
        const layout = { ...any, big: false };
        const { body, kept } = writeRecords(points, layout);
        const padded = Buffer.concat([body, Buffer.alloc(padding, 0xa5)]);
        const binary = join(pcdHead(points.length, layout, "binary"), padded);
        expectPoints({ name: "a.pcd", bytes: binary }, unit, kept);
        const plain = byField(body, points.length, layout);
        const packed = packLzf(plain);
        const sizes = Buffer.alloc(8);
        sizes.writeUInt32LE(packed.length, 0);
        sizes.writeUInt32LE(plain.length, 4);
        const block = Buffer.concat([sizes, packed]);
        const compressed = join(pcdHead(points.length, layout, "binary_compressed"), block);
        expectPoints({ name: "a.pcd", bytes: compressed }, unit, kept);
      }),
    );
  });

  test("profiles as rows and as JSON give the same points, and a rigid motion keeps their distances", () => {
    const turn = fc
      .tuple(...Array.from({ length: 4 }, () => fc.double({ min: -1, max: 1, noNaN: true })))
      .filter((q) => Math.hypot(...q) > 0.1)
      .map((q) => q.map((part) => part / Math.hypot(...q)));
    const profile = fc.record({
      quaternion: turn,
      point: fc.tuple(coordinate, coordinate, coordinate),
      returns: fc.array(fc.tuple(coordinate, coordinate), { minLength: 1, maxLength: 8 }),
    });
    fc.assert(
      fc.property(fc.array(profile, { minLength: 1, maxLength: 6 }), (profiles) => {
        const station = (i: number) => 0.25 * (profiles.length - i);
        const rows = profiles.flatMap(({ returns }, i) =>
          returns.map(([x, z]) => `${station(i)},${x},${z}\n`),
        );
        const poses = profiles.map((p, i) => `${[station(i), ...p.point, ...p.quaternion].join(",")}\n`);
        const table = readScan({
          name: "p.csv",
          bytes: bytesOf(`station_mm,x_mm,z_mm\n${rows.join("")}`),
          units: "mm",
          poses: {
            name: "q.csv",
            bytes: bytesOf(`station_mm,px_mm,py_mm,pz_mm,qw,qx,qy,qz\n${poses.join("")}`),
          },
        });
        const json = profiles.map(({ point, quaternion, returns }, i) => ({
          station_mm: station(i),
          pose: { point, quaternion },
          x_mm: returns.map(([x]) => x),
          z_mm: returns.map(([, z]) => z),
        }));
        const text = JSON.stringify({ units: "mm", profiles: json });
        expect(readScan({ name: "p.json", bytes: bytesOf(text), units: "mm" })).toEqual(table);
        if (!table.ok) throw new Error(JSON.stringify(table.faults));
        const expected = profiles.flatMap(({ point, returns }) =>
          returns.map(([x, z]) => [Math.hypot(x, z), ...point] as const),
        );
        expected.forEach(([distance, ...point], i) => {
          const from = point.map((p, axis) => table.value.xyz_mm[3 * i + axis]! - p);
          expect(Math.abs(Math.hypot(...from) - distance)).toBeLessThan(1e-9);
        });
      }),
    );
  });
});

describe("damaged files", () => {
  const folder = new URL("../../../vectors/formats/", import.meta.url);
  const load = (name: string): ScanFile => ({
    name,
    bytes: new Uint8Array(readFileSync(new URL(name, folder))),
  });
  const poses = load("corner-arc/poses.csv");
  const names = [
    "tjoint-ascii.pcd",
    "tjoint-binary.pcd",
    "tjoint-binary-compressed.pcd",
    "tjoint-binary-padded.pcd",
    "tjoint-binary-be.ply",
    "tjoint-list-first-le.ply",
    "tjoint-crlf-ascii.ply",
    "tjoint-open3d-binary-le.ply",
    "tjoint-crlf-comment.asc",
    "tjoint-decimal-comma.csv",
    "corner-arc/profiles.csv",
  ];
  const json = JSON.stringify({
    units: "mm",
    profiles: [0, 1, 2].map((station_mm) => ({
      station_mm,
      pose: { point: [station_mm, 0, 0], quaternion: [1, 0, 0, 0] },
      x_mm: [1.5, 2, null],
      z_mm: [3, -4.25e1, null],
    })),
  });
  const files = [...names.map(load), { name: "p.json", bytes: bytesOf(json) }];
  const anyFile = fc.constantFrom(...files);

  /** Never throws; a refusal names one to ten faults, each beginning with the file's name. */
  function expectOutcome(file: ScanFile, withPoses: ScanFile | undefined = poses): void {
    const outcome = readScan({ ...file, units: "mm", poses: withPoses });
    if (outcome.ok) {
      expect(outcome.value.xyz_mm).toHaveLength(3 * outcome.value.count);
      expect(outcome.value.xyz_mm.every(Number.isFinite)).toBe(true);
      return;
    }
    expect(outcome.faults.length).toBeGreaterThan(0);
    expect(outcome.faults.length).toBeLessThanOrEqual(10);
    for (const { detail } of outcome.faults) {
      expect([file.name, poses.name].some((name) => detail.startsWith(name))).toBe(true);
    }
  }

  test("cut anywhere give an outcome", () => {
    fc.assert(
      fc.property(anyFile, fc.double({ min: 0, max: 1, noNaN: true }), ({ name, bytes }, share) => {
        expectOutcome({ name, bytes: bytes.subarray(0, Math.floor(share * bytes.length)) });
      }),
      { numRuns: 600 },
    );
  });

  test("a binary body that is cut is always refused", () => {
    const bodies = files.filter(({ name }) => /list-first|binary-le|binary-be|binary-padded/.test(name));
    fc.assert(
      fc.property(
        fc.constantFrom(...bodies),
        fc.integer({ min: 1, max: 5000 }),
        ({ name, bytes }, missing) => {
          const outcome = readScan({ name, bytes: bytes.subarray(0, bytes.length - missing), units: "mm" });
          expect(outcome.ok).toBe(false);
        },
      ),
    );
  });

  test("with bytes changed, also in the poses, give an outcome", () => {
    const changes = fc.array(fc.tuple(fc.nat(), fc.nat(255)), { minLength: 1, maxLength: 6 });
    fc.assert(
      fc.property(anyFile, changes, fc.boolean(), ({ name, bytes }, list, inHeader) => {
        const changed = Uint8Array.from(bytes);
        const range = inHeader ? Math.min(300, bytes.length) : bytes.length;
        for (const [at, value] of list) changed[at % range] = value;
        expectOutcome({ name, bytes: changed });
        const wrong = Uint8Array.from(poses.bytes);
        for (const [at, value] of list) wrong[at % wrong.length] = value;
        expectOutcome(load("corner-arc/profiles.csv"), { name: poses.name, bytes: wrong });
      }),
      { numRuns: 600 },
    );
  });

  test("with a piece taken out or written twice give an outcome", () => {
    fc.assert(
      fc.property(anyFile, fc.nat(), fc.nat(40), fc.boolean(), ({ name, bytes }, place, length, twice) => {
        const at = place % bytes.length;
        const tail = twice ? at : at + length;
        const parts = [bytes.subarray(0, at + (twice ? length : 0)), bytes.subarray(tail)];
        expectOutcome({ name, bytes: Buffer.concat(parts) });
      }),
      { numRuns: 600 },
    );
  });

  test("any bytes under any name give an outcome", () => {
    const heads = fc.constantFrom(
      "",
      "ply\nformat ascii 1.0\n",
      "VERSION .7\nFIELDS x y z\n",
      "{",
      "x,y,z\n",
    );
    const name = fc.constantFrom("a.ply", "a.pcd", "a.json", "a.csv", "a.xyz", "a");
    const text = fc.string({ unit: "binary", maxLength: 200 }).map((t) => new TextEncoder().encode(t));
    const body = fc.oneof(fc.uint8Array({ maxLength: 200 }), text);
    fc.assert(
      fc.property(name, heads, body, (named, head, rest) => {
        expectOutcome({ name: named, bytes: join(head, rest) });
      }),
      { numRuns: 1000 },
    );
  });
});
