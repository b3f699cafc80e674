import { gunzipSync, gzipSync } from "node:zlib";
import { describe, expect, test } from "vitest";
import type { LengthUnit } from "../scan-cloud.ts";
import { readScan } from "./read-scan.ts";
import type { ScanInput } from "./scan-input.ts";

const file = (name: string, text: string) => ({ name, bytes: new TextEncoder().encode(text) });

/** Points of a scan as rows of x, y, z; throws the faults where there are any. */
function points(name: string, text: string, more: Partial<ScanInput> = {}): number[][] {
  const outcome = readScan({ ...file(name, text), units: "mm", ...more });
  if (!outcome.ok) throw new Error(JSON.stringify(outcome.faults));
  const { xyz_mm, count } = outcome.value;
  return Array.from({ length: count }, (_, i) => [...xyz_mm.subarray(3 * i, 3 * i + 3)]);
}

const POINTS = [
  [1, 2, 3],
  [-4.5, 0.25, 1000],
];
const POSES = "station_mm,px_mm,py_mm,pz_mm,qw,qx,qy,qz\n";

describe("text clouds", () => {
  test.each([
    ["blanks", "1 2 3\n-4.5 0.25 1000\n"],
    ["several blanks and blanks around", "  1   2 3  \n -4.5 0.25 1000\n"],
    ["tabs", "1\t2\t3\n-4.5\t0.25\t1000\n"],
    ["blanks and tabs in one row", "1 \t2 3\n-4.5 0.25\t1000\n"],
    ["commas", "1,2,3\n-4.5,0.25,1000\n"],
    ["commas and blanks", "1, 2, 3\n-4.5, 0.25, 1000\n"],
    ["semicolons", "1;2;3\n-4.5;0.25;1000\n"],
    ["semicolons and a decimal comma", "1,0;2,0;3,0\n-4,5;0,25;1000\n"],
    ["semicolons and a decimal comma that comes late", "1;2;3\n-4,5;0,25;1000\n"],
    ["tabs and a decimal comma", "1\t2\t3\n-4,5\t0,25\t1000\n"],
    ["blanks and a decimal comma", "1,0 2,0 3,0\n-4,5 0,25 1000\n"],
    ["CR LF", "1 2 3\r\n-4.5 0.25 1000\r\n"],
    ["CR alone", "1 2 3\r-4.5 0.25 1000\r"],
    ["no end of the last line", "1 2 3\n-4.5 0.25 1000"],
    ["blank lines and comments", "# two points\n\n1 2 3\n// half way\n   \n-4.5 0.25 1000\n\n"],
    ["a byte order mark", "\uFEFF1 2 3\n-4.5 0.25 1000\n"],
    ["a count line", "2\n1 2 3\n-4.5 0.25 1000\n"],
    ["a header", "x y z\n1 2 3\n-4.5 0.25 1000\n"],
    ["a count line and a header", "2\nx,y,z\n1,2,3\n-4.5,0.25,1000\n"],
    ["a header with units", "x_mm;y_mm;z_mm\n1;2;3\n-4.5;0.25;1000\n"],
    ["a header with units in brackets", "X [mm] Y (mm) Z[mm]\n1 2 3\n-4.5 0.25 1000\n"],
    ["a header in quotes", '"x","y","z"\n1,2,3\n-4.5,0.25,1000\n'],
    ["columns in another order", "z,intensity,x,y\n3,9,1,2\n1000,9,-4.5,0.25\n"],
    [
      "comments under a first column that nobody needs",
      "n,x,y,z\n1,1,2,3\n# 9,9,9\n#,9,9,9\n2,-4.5,0.25,1000\n",
    ],
    ["names in a comment", "# z y x\n3 2 1\n1000 0.25 -4.5\n"],
    ["a comment that only looks like names", "# x y z and intensity\n1 2 3 9\n-4.5 0.25 1000 9\n"],
    ["intensity and colour", "1 2 3 0.5 255 0 10\n-4.5 0.25 1000 0.5 255 0 10\n"],
    ["a separator at the end of each row", "x,y,z,\n1,2,3,\n-4.5,0.25,1000,\n"],
    ["exponents", "1e0 2.0E+0 .3e1\n-45e-1 +0.25 1.e3\n"],
    ["the unit stated and right", "# units: mm\n1 2 3\n-4.5 0.25 1000\n"],
  ])("are read with %s", (_, text) => {
    expect(points("cloud.xyz", text)).toEqual(POINTS);
  });

  test.each<[LengthUnit, number]>([
    ["mm", 1],
    ["in", 25.4],
    ["m", 1000],
  ])("in %s become millimetres once", (units, scale) => {
    const expected = POINTS.map((point) => point.map((value) => value * scale));
    expect(points("cloud.xyz", "1 2 3\n-4.5 0.25 1000\n", { units })).toEqual(expected);
  });

  test("count nan, infinity and an empty z as lost and keep the rest in order", () => {
    const text =
      "1,2,3\nnan,2,3\n1,NaN,3\n1,2,inf\n1,2,-Infinity\n1,2,-nan(ind)\n1,2,1.#QNAN\n1,2,1e999\n1,2,\n,,\n4,5,6\n";
    const outcome = readScan({ ...file("a.csv", text), units: "mm" });
    expect(outcome).toMatchObject({ ok: true, value: { count: 2, lost: 9 } });
    expect(outcome.ok && [...outcome.value.xyz_mm]).toEqual([1, 2, 3, 4, 5, 6]);
  });

  test("with a column station keep the points of one station together as a profile, in ascending order", () => {
    const text = "station_mm,x_mm,y_mm,z_mm\n5,1,2,3\n0,1,2,3\n5,1,2,3\n2.5,1,2,3\n";
    const outcome = readScan({ ...file("a.csv", text), units: "mm" });
    expect(outcome.ok && [...outcome.value.profiles!]).toEqual([2, 0, 2, 1]);
  });

  test("with station, y and z take the station for x", () => {
    expect(points("a.csv", "station_in,y_in,z_in\n2,1,3\n", { units: "in" })).toEqual([
      [50.8, 25.4, 3 * 25.4],
    ]);
  });
});

describe("profiles", () => {
  // Turned by a quarter about the part's z: the sensor's x axis is the part's y axis.
  const poses = file("poses.csv", `${POSES}10,100,200,300,0.70710678,0,0,0.70710678\n0,0,0,50,1,0,0,0\n`);

  test("are carried into the part frame by p = P + R(q) (x, 0, z), the pose found by station", () => {
    const found = points("p.csv", "station_mm,x_mm,z_mm\n10.000,3,-4\n0,1,2\n", { poses });
    expect(found[0]!.map((value) => Math.round(value * 1e9) / 1e9)).toEqual([100, 203, 296]);
    expect(found[1]).toEqual([1, 0, 52]);
  });

  test("number their points by the pose's place in ascending order", () => {
    const text = "station_mm,x_mm,z_mm\n10,3,-4\n0,1,2\n0,1,2\n";
    const outcome = readScan({ ...file("p.csv", text), units: "mm", poses });
    expect(outcome.ok && [...outcome.value.profiles!]).toEqual([1, 0, 0]);
  });

  test("count an empty z as a lost return, even where x is empty too", () => {
    const text = "station_mm,x_mm,z_mm\n0,1,2\n0,1,\n0,,\n0,1,nan\n";
    expect(readScan({ ...file("p.csv", text), units: "mm", poses })).toMatchObject({
      ok: true,
      value: { count: 1, lost: 3 },
    });
  });

  test("take poses in another unit, and stations that differ by rounding", () => {
    const inches = file("poses.csv", "station_in,px_in,py_in,pz_in,qw,qx,qy,qz\n0.3937,1,0,0,1,0,0,0\n");
    const found = points("p.csv", "station_mm,x_mm,z_mm\n10,1,2\n", { poses: inches, poses_units: "in" });
    expect(found).toEqual([[26.4, 0, 2]]);
  });

  test("are joined by the profile's number where there is no station", () => {
    const numbered = file("poses.csv", "profile,px,py,pz,qw,qx,qy,qz\n2,0,0,0,1,0,0,0\n1,5,0,0,1,0,0,0\n");
    expect(points("p.csv", "profile,index,x,z\n1,0,1,2\n2,0,1,2\n", { poses: numbered })).toEqual([
      [6, 0, 2],
      [1, 0, 2],
    ]);
  });

  test("bring a quaternion that is nearly one to length one", () => {
    const rounded = file("poses.csv", `${POSES}0,0,0,0,1.0009,0,0,0\n`);
    expect(points("p.csv", "station_mm,x_mm,z_mm\n0,3,4\n", { poses: rounded })).toEqual([[3, 0, 4]]);
  });
});

describe("profiles in JSON", () => {
  const pose = { point: [100, 200, 300], quaternion: [Math.SQRT1_2, 0, 0, Math.SQRT1_2] };

  test("carry their poses", () => {
    const profiles = [
      { station_mm: 10, pose, x_mm: [3, 4, null], z_mm: [-4, null, null] },
      { station_mm: 0, pose: { point: [0, 0, 50], quaternion: [1, 0, 0, 0] }, x_mm: [1], z_mm: [2] },
    ];
    const text = JSON.stringify({ units: "mm", scanner: "µ-scan \\ \n", profiles }, null, 2);
    const outcome = readScan({ ...file("p.json", text), units: "mm" });
    expect(outcome).toMatchObject({ ok: true, value: { count: 2, lost: 2 } });
    expect(outcome.ok && [...outcome.value.profiles!]).toEqual([1, 0]);
    const rounded = points("p.json", text).map((p) => p.map((value) => Math.round(value * 1e9) / 1e9));
    expect(rounded).toEqual([
      [100, 203, 296],
      [1, 0, 52],
    ]);
  });

  test("take their poses from the file beside them where they carry none", () => {
    const text = JSON.stringify({ profiles: [{ station_in: 1, x_in: [1], z_in: [2] }] });
    const poses = file("poses.csv", `${POSES}25.4,0,0,0,1,0,0,0\n`);
    const found = points("p.json", text, { units: "in", poses, poses_units: "mm" });
    expect(found).toEqual([[25.4, 0, 50.8]]);
  });
});

describe("PLY and PCD", () => {
  const head = (format: string, more = "") =>
    `ply\nformat ${format} 1.0\ncomment units: mm\n${more}element vertex 2\n`;

  test("ascii PLY with lists before and inside the vertex gives x, y and z by name", () => {
    const text =
      head("ascii", "element strip 2\nproperty list uchar int cells\nproperty float w\n") +
      "property list uchar int hits\nproperty double z\nproperty float x\nproperty int y\nend_header\n" +
      "0 1.5\n3 7 8 9 1.5\n2 5 6 3 1 2\n0 1000 -4.5 0\n";
    expect(points("a.ply", text)).toEqual([
      [1, 2, 3],
      [-4.5, 0, 1000],
    ]);
  });

  test("ascii PLY counts vertices with nan as lost", () => {
    const text = `${head("ascii")}property float x\nproperty float y\nproperty float z\nend_header\n1 2 3\nnan 0 0\n`;
    expect(readScan({ ...file("a.ply", text), units: "mm" })).toMatchObject({
      ok: true,
      value: { count: 1, lost: 1 },
    });
  });

  test("PCD without COUNT, VIEWPOINT and POINTS is read", () => {
    const text =
      "VERSION .7\nFIELDS x y z\nSIZE 4 4 4\nTYPE F F F\nWIDTH 2\nHEIGHT 1\nDATA ascii\n1 2 3\n4 5 6\n";
    expect(points("a.pcd", text)).toEqual([
      [1, 2, 3],
      [4, 5, 6],
    ]);
  });

  test("PCD with several values a field before x finds x behind them", () => {
    const text =
      "FIELDS h x y z\nSIZE 4 4 4 4\nTYPE F F F F\nCOUNT 3 1 1 1\nPOINTS 1\nDATA ascii\n9 9 9 1 2 3\n";
    expect(points("a.pcd", text)).toEqual([[1, 2, 3]]);
  });

  test("the content decides, not the name", () => {
    const text = `${head("ascii")}property float x\nproperty float y\nproperty float z\nend_header\n1 2 3\n4 5 6\n`;
    expect(points("scan.csv", text)).toHaveLength(2);
  });

  test("poses beside a cloud are passed over", () => {
    expect(points("a.xyz", "1 2 3\n", { poses: file("poses.csv", `${POSES}0,0,0,9,1,0,0,0\n`) })).toEqual([
      [1, 2, 3],
    ]);
  });
});

describe("packed files", () => {
  const packed = { name: "a.xyz.gz", bytes: new Uint8Array(gzipSync("1 2 3\n")) };

  test("are unpacked by the caller's unpacker", () => {
    const outcome = readScan({ ...packed, units: "mm", gunzip: (bytes) => gunzipSync(bytes) });
    expect(outcome.ok && [...outcome.value.xyz_mm]).toEqual([1, 2, 3]);
  });

  test("are refused where there is none", () => {
    expect(readScan({ ...packed, units: "mm" })).toMatchObject({
      ok: false,
      faults: [{ code: "file-compressed", detail: expect.stringContaining("a.xyz.gz") }],
    });
  });

  test("that cannot be unpacked are refused with the unpacker's reason", () => {
    const cut = { name: "a.gz", bytes: packed.bytes.subarray(0, 15) };
    expect(readScan({ ...cut, units: "mm", gunzip: (bytes) => gunzipSync(bytes) })).toMatchObject({
      ok: false,
      faults: [{ code: "file-truncated", detail: expect.stringContaining("unexpected end of file") }],
    });
  });
});
