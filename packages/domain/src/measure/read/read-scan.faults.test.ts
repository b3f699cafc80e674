import { describe, expect, test } from "vitest";
import type { Fault } from "../../faults/fault.ts";
import { readScan } from "./read-scan.ts";
import type { ScanInput } from "./scan-input.ts";

const file = (name: string, text: string) => ({ name, bytes: new TextEncoder().encode(text) });

function faults(name: string, text: string, more: Partial<ScanInput> = {}): readonly Fault[] {
  const outcome = readScan({ ...file(name, text), units: "mm", ...more });
  return outcome.ok ? [] : outcome.faults;
}

const POSES = "station_mm,px_mm,py_mm,pz_mm,qw,qx,qy,qz\n";
const poses = file("poses.csv", `${POSES}0,0,0,0,1,0,0,0\n1,1,0,0,1,0,0,0\n`);
const profileFaults = (rows: string): readonly Fault[] =>
  faults("p.csv", `station_mm,x_mm,z_mm\n${rows}`, { poses });

describe("a text that cannot be read says where and what was found", () => {
  test("text in a number column", () => {
    expect(profileFaults("0,1,2\n0,abc,2\n")).toEqual([
      {
        code: "file-value-invalid",
        detail: 'p.csv, line 3: column x_mm holds "abc" where a number was expected',
        line: 3,
        field: "x_mm",
      },
    ]);
  });

  test("an empty cell where z stands", () => {
    expect(profileFaults("0,,2\n")).toMatchObject([
      { code: "file-value-invalid", line: 2, field: "x_mm", detail: expect.stringContaining("is empty") },
    ]);
  });

  test("a station that is no number, even with a lost return", () => {
    expect(profileFaults("nan,1,\n")).toMatchObject([
      { code: "file-value-invalid", line: 2, field: "station_mm", detail: expect.stringContaining('"nan"') },
    ]);
  });

  test("a missing column, with the columns there are", () => {
    const found = faults("p.csv", "station_mm,x_mm,height_mm\n0,1,2\n", { poses });
    expect(found).toMatchObject([
      { code: "file-column-missing", line: 1, field: "z", detail: expect.stringContaining('"height_mm"') },
    ]);
  });

  test("a column that stands there twice", () => {
    expect(faults("a.csv", "x,y,z,x_mm\n1,2,3,4\n")).toMatchObject([
      { code: "file-header-invalid", line: 1, field: "x" },
    ]);
  });

  test("a row with too few columns", () => {
    expect(profileFaults("0,1,2\n0,1\n0,1,2\n")).toMatchObject([
      {
        code: "file-row-invalid",
        line: 3,
        field: "z_mm",
        detail: "p.csv, line 3: the row has 2 columns where 3 were expected; z_mm is missing",
      },
    ]);
  });

  test("a row with too many columns, such as decimal commas between commas make", () => {
    expect(profileFaults("0,1,2\n0,1,5,2,5\n")).toMatchObject([{ code: "file-row-invalid", line: 3 }]);
  });

  test("a last row that is cut between its columns", () => {
    expect(profileFaults("0,1,2\n0,1")).toMatchObject([{ code: "file-truncated", line: 3, field: "z_mm" }]);
  });

  test("a last row that is cut behind the sign of its last number", () => {
    expect(profileFaults("0,1,2\n0,1,-")).toMatchObject([{ code: "file-truncated", line: 3, field: "z_mm" }]);
  });

  test("a last number that is cut: fewer decimals than every row before, and no line end", () => {
    const rows = "0,1.250,-3.125\n".repeat(30);
    expect(profileFaults(`${rows}0,1.250,-3.12`)).toMatchObject([{ code: "file-truncated", line: 32 }]);
    expect(profileFaults(`${rows}0,1.250,-3`)).toMatchObject([{ code: "file-truncated", line: 32 }]);
    expect(profileFaults(`${rows}0,1.250,-3.125`)).toEqual([]);
    expect(profileFaults(`${rows}0,1.250,-3.12\n`)).toEqual([]);
  });

  test("no cut is seen where the decimals differ from row to row", () => {
    expect(profileFaults(`${"0,1,2.5\n0,1,2.25\n".repeat(20)}0,1,2`)).toEqual([]);
  });

  test("a unit in a column's name that contradicts the declaration, naming both", () => {
    expect(faults("p.csv", "station_in,x_in,z_in\n0,1,2\n", { poses })).toMatchObject([
      {
        code: "scan-units-contradict",
        line: 1,
        field: "station_in",
        detail: 'p.csv, line 1: column "station_in" is in in, but the file was declared in "mm"',
      },
      { code: "scan-units-contradict", field: "x_in" },
      { code: "scan-units-contradict", field: "z_in" },
    ]);
    expect(faults("a.csv", "x [cm];y [cm];z [cm]\n1;2;3\n")[0]?.detail).toContain("is in cm");
  });

  test.each(["# units: in", "// unit = inch", "# all units in inches", "#units:metres"])(
    "a comment that states another unit: %s",
    (comment) => {
      expect(faults("a.xyz", `${comment}\n1 2 3\n`)).toMatchObject([
        { code: "scan-units-contradict", line: 1, field: "units" },
      ]);
    },
  );

  test.each(["# unit in use: 4", "# 5 inch lens", "# units: mm"])("no unit is read into %s", (comment) => {
    expect(faults("a.xyz", `${comment}\n1 2 3\n`)).toEqual([]);
  });

  test("a count line that promises more rows than follow, or fewer", () => {
    expect(faults("a.xyz", "3\n1 2 3\n4 5 6\n")).toMatchObject([
      { code: "file-truncated", detail: expect.stringMatching(/says 3 points, 2 rows/) },
    ]);
    expect(faults("a.xyz", "1\n1 2 3\n4 5 6\n")).toMatchObject([{ code: "file-header-invalid" }]);
  });

  test("an empty file, a blank one and one with a header only", () => {
    expect(faults("a.csv", "")).toMatchObject([{ code: "file-empty", detail: "a.csv: it has no byte" }]);
    expect(faults("a.csv", "\uFEFF \r\n\n")).toMatchObject([{ code: "file-empty" }]);
    expect(faults("a.csv", "x,y,z\n")).toMatchObject([{ code: "scan-too-few-points" }]);
    expect(profileFaults("")).toMatchObject([{ code: "scan-too-few-points" }]);
    expect(faults("a.csv", "# nothing here\n")).toMatchObject([{ code: "scan-too-few-points" }]);
  });

  test("a scan whose returns are all lost", () => {
    expect(profileFaults("0,1,\n0,2,nan\n")).toMatchObject([
      { code: "scan-too-few-points", detail: expect.stringContaining("all 2 returns are lost") },
    ]);
  });

  test("many faults are named together, ten at most", () => {
    const found = profileFaults("0,x,1\n0,1,y\n0\n0,1,2\n0,q,r\n");
    expect(found.map(({ line, field }) => [line, field])).toEqual([
      [2, "x_mm"],
      [3, "z_mm"],
      [4, "x_mm"],
      [6, "x_mm"],
      [6, "z_mm"],
    ]);
    expect(profileFaults("0,x,1\n".repeat(100))).toHaveLength(10);
  });

  test("text that is not Unicode's UTF-8, and bytes that are no text", () => {
    const utf16 = new Uint8Array(Buffer.from("\uFEFF1 2 3\n", "utf16le"));
    const outcome = readScan({ name: "a.txt", bytes: utf16, units: "mm" });
    expect(outcome.ok ? [] : outcome.faults).toMatchObject([
      { code: "file-format-unknown", detail: expect.stringContaining("UTF-16") },
    ]);
    const zip = readScan({ name: "a.zip", bytes: Uint8Array.of(0x50, 0x4b, 3, 4, 0, 0), units: "mm" });
    expect(zip.ok ? [] : zip.faults).toMatchObject([{ code: "file-format-unknown", byte: 0 }]);
  });
});

describe("poses that cannot be used", () => {
  const rows = "station_mm,x_mm,z_mm\n0,1,2\n";

  test("profiles without poses", () => {
    expect(faults("p.csv", rows)).toMatchObject([{ code: "scan-poses-missing", line: 1 }]);
  });

  test("a station without its pose, once for each station", () => {
    expect(profileFaults("0,1,2\n0.5,1,2\n0.5,1,3\n1,1,2\n0.5,1,2\n7,1,2\n")).toEqual([
      {
        code: "scan-poses-missing",
        detail: "p.csv, line 3: no pose for station 0.5 mm",
        line: 3,
        field: "station",
        station_mm: 0.5,
      },
      expect.objectContaining({ code: "scan-poses-missing", line: 7, station_mm: 7 }),
    ]);
  });

  test("a quaternion that is not of length one", () => {
    const bad = file("poses.csv", `${POSES}0,0,0,0,1.01,0,0,0\n`);
    expect(faults("p.csv", rows, { poses: bad })).toMatchObject([
      {
        code: "scan-pose-invalid",
        line: 2,
        field: "qw",
        detail: "poses.csv, line 2: the quaternion's length is 1.01 where 1 was expected",
      },
    ]);
  });

  test("two poses for one station", () => {
    const twice = file("poses.csv", `${POSES}0,0,0,0,1,0,0,0\n1,0,0,0,1,0,0,0\n0.0,5,0,0,1,0,0,0\n`);
    expect(faults("p.csv", rows, { poses: twice })).toMatchObject([
      { code: "scan-pose-invalid", line: 4, detail: expect.stringContaining("the first stands at line 2") },
    ]);
  });

  test("a poses file without names, without a column, without rows, or empty", () => {
    const with_ = (text: string) => faults("p.csv", rows, { poses: file("poses.csv", text) });
    expect(with_("0,0,0,0,1,0,0,0\n")).toMatchObject([{ code: "file-header-invalid", line: 1 }]);
    expect(with_("station_mm,px_mm,py_mm,pz_mm,qw,qx,qy\n0,0,0,0,1,0,0\n")).toMatchObject([
      { code: "file-column-missing", field: "qz" },
    ]);
    expect(with_(POSES)).toMatchObject([{ code: "scan-poses-missing" }]);
    expect(with_("")).toMatchObject([{ code: "file-empty", detail: "poses.csv: it has no byte" }]);
  });

  test("faults of both files are named together", () => {
    const bad = file("poses.csv", `${POSES}0,a,0,0,1,0,0,0\n`);
    expect(faults("p.csv", `${rows}0,b,2\n`, { poses: bad }).map(({ detail }) => detail)).toEqual([
      'poses.csv, line 2: column px_mm holds "a" where a number was expected',
      'p.csv, line 3: column x_mm holds "b" where a number was expected',
    ]);
  });

  test("poses in another unit than declared for them", () => {
    const inches = file("poses.csv", "station_in,px_in,py_in,pz_in,qw,qx,qy,qz\n0,0,0,0,1,0,0,0\n");
    const found = faults("p.csv", rows, { poses: inches });
    expect(found.map(({ code, field }) => [code, field])).toEqual(
      ["station_in", "px_in", "py_in", "pz_in"].map((field) => ["scan-units-contradict", field]),
    );
  });
});

describe("JSON profiles that cannot be read", () => {
  const pose = { point: [0, 0, 0], quaternion: [1, 0, 0, 0] };
  const json = (profiles: unknown, more = {}) => faults("p.json", JSON.stringify({ ...more, profiles }));

  test("broken JSON names its line and what stands there", () => {
    expect(faults("p.json", '{\n"profiles": [\n  {"station_mm": 1,}\n]}')).toMatchObject([
      {
        code: "file-header-invalid",
        line: 3,
        detail: expect.stringContaining("a name in quotes was expected"),
      },
    ]);
  });

  test("JSON that ends too early is a cut file", () => {
    for (const text of ["{", '{"profiles": [{"x_mm": [1, 2', '{"profiles": [], "a', '{"profiles": [1, nul']) {
      expect(faults("p.json", text), text).toMatchObject([{ code: "file-truncated", line: 1 }]);
    }
  });

  test("lists nested beyond all need are refused, not followed", () => {
    expect(faults("p.json", "[".repeat(100_000))).toMatchObject([{ code: "file-header-invalid" }]);
  });

  test("another layout, or none of its fields", () => {
    expect(faults("p.json", "[1, 2]")).toMatchObject([{ code: "file-header-invalid" }]);
    expect(json({})).toMatchObject([{ code: "file-header-invalid" }]);
    expect(json([])).toMatchObject([{ code: "scan-too-few-points" }]);
    expect(json([7])).toMatchObject([{ code: "file-value-invalid", pointer: "/profiles/0" }]);
    expect(json([{ station_mm: 0, pose }]).map(({ field }) => field)).toEqual(["x", "z"]);
  });

  test("a value that is no number, by its pointer", () => {
    expect(json([{ station_mm: 0, pose, x_mm: [1, "2", null], z_mm: [1, 2, 3] }])).toMatchObject([
      { code: "file-value-invalid", pointer: "/profiles/0/x_mm/1" },
      { code: "file-value-invalid", pointer: "/profiles/0/x_mm/2" },
    ]);
    expect(json([{ station_mm: "0", pose, x_mm: [1], z_mm: 3 }])).toMatchObject([
      { pointer: "/profiles/0/station_mm" },
      { pointer: "/profiles/0/z_mm" },
    ]);
  });

  test("lists of different length", () => {
    expect(json([{ station_mm: 0, pose, x_mm: [1, 2], z_mm: [1] }])).toMatchObject([
      { code: "file-row-invalid", pointer: "/profiles/0", detail: expect.stringContaining("x_mm has 2") },
    ]);
  });

  test("a pose that is missing, not whole, or given twice", () => {
    const profile = { station_mm: 0, x_mm: [1], z_mm: [1] };
    expect(json([profile])).toMatchObject([{ code: "scan-poses-missing", pointer: "/profiles/0" }]);
    expect(json([{ ...profile, pose: { point: [0, 0], quaternion: [1, 0, 0, "0"] } }])).toMatchObject([
      { code: "scan-pose-invalid", pointer: "/profiles/0/pose/point" },
      { code: "scan-pose-invalid", pointer: "/profiles/0/pose/quaternion" },
    ]);
    expect(json([{ ...profile, pose: { ...pose, quaternion: [2, 0, 0, 0] } }])).toMatchObject([
      {
        code: "scan-pose-invalid",
        pointer: "/profiles/0/pose",
        detail: expect.stringContaining("length is 2"),
      },
    ]);
    expect(
      json([
        { ...profile, pose },
        { ...profile, pose },
      ]),
    ).toMatchObject([{ code: "scan-pose-invalid", pointer: "/profiles/1/pose" }]);
  });

  test("another unit than declared, in the file or in a field's name", () => {
    expect(json([], { units: "in" })).toMatchObject([{ code: "scan-units-contradict", pointer: "/units" }]);
    expect(json([{ station_mm: 0, pose, x_in: [1], z_mm: [1] }])).toMatchObject([
      { code: "scan-units-contradict", pointer: "/profiles/0", field: "x_in" },
    ]);
  });
});
