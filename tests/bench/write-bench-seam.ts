// Writes a simulated seam as model.json, cloud.csv (x, y, z), profiles.csv with poses.csv, and cloud.ply.
import { writeFileSync } from "node:fs";
import { join } from "node:path";
import { type BenchSeam, benchSeam } from "./bench-seam.ts";

type Row = (i: number) => string;

function csv(head: string, rows: number, row: Row): string {
  return `${head}\n${Array.from({ length: rows }, (_, i) => row(i)).join("\n")}\n`;
}

function ply({ xyz_mm, count }: BenchSeam["cloud"]): Buffer {
  const head = [
    "ply",
    "format binary_little_endian 1.0",
    `element vertex ${count}`,
    "property float x",
    "property float y",
    "property float z",
    "end_header\n",
  ].join("\n");
  const body = Buffer.alloc(12 * count);
  xyz_mm.forEach((value, i) => {
    body.writeFloatLE(value, 4 * i);
  });
  return Buffer.concat([Buffer.from(head), body]);
}

/** The sensor's frame in every pose: x along lateral (y of the part), z along normal. */
const QUATERNION = "0.7071068,0,0,0.7071068";

const [folder = ".", profiles = "400"] = process.argv.slice(2);
const { model, cloud } = benchSeam(Number(profiles));
const at = (i: number, axis: number) => (cloud.xyz_mm[3 * i + axis] ?? 0).toFixed(axis === 0 ? 3 : 4);

writeFileSync(join(folder, "model.json"), JSON.stringify(model));
writeFileSync(
  join(folder, "cloud.csv"),
  csv("x_mm,y_mm,z_mm", cloud.count, (i) => `${at(i, 0)},${at(i, 1)},${at(i, 2)}`),
);
writeFileSync(
  join(folder, "profiles.csv"),
  csv("station_mm,x_mm,z_mm", cloud.count, (i) => `${at(i, 0)},${at(i, 1)},${at(i, 2)}`),
);
writeFileSync(
  join(folder, "poses.csv"),
  csv(
    "station_mm,px_mm,py_mm,pz_mm,qw,qx,qy,qz",
    Number(profiles),
    (k) => `${k.toFixed(3)},${k.toFixed(4)},0,0,${QUATERNION}`,
  ),
);
writeFileSync(join(folder, "cloud.ply"), ply(cloud));
