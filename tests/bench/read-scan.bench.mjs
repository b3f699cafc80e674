// Reads scans of a million points beside reading their bare files: `node tests/bench/read-scan.bench.mjs [POINTS]`.
// Prints medians and ratios; asserts nothing, since times belong to a machine.
import { mkdtempSync, readFileSync, rmSync, writeFileSync } from "node:fs";
import { tmpdir } from "node:os";
import { join } from "node:path";
import { fileURLToPath, pathToFileURL } from "node:url";
import { build } from "esbuild";

const POINTS = Number(process.argv[2] ?? 1_000_000);
const PROFILES = 1000;
const RUNS = 7;
const source = fileURLToPath(new URL("../../packages/domain/src/measure/read/read-scan.ts", import.meta.url));
const folder = mkdtempSync(join(tmpdir(), "read-scan-bench-"));

/** Numbers between 0 and 1, the same in every run (a linear congruential generator). */
let state = 7;
const random = () => {
  state = (Math.imul(state, 1664525) + 1013904223) >>> 0;
  return state / 2 ** 32;
};

const rows = Array.from({ length: POINTS }, (_, i) => ({
  station: Math.floor((i * PROFILES) / POINTS) * 0.5,
  x: (random() - 0.5) * 50,
  z: (random() - 0.5) * 80,
}));

const poses = `station_mm,px_mm,py_mm,pz_mm,qw,qx,qy,qz\n${Array.from(
  { length: PROFILES },
  (_, i) => `${(i * 0.5).toFixed(3)},${(i * 0.5).toFixed(4)},0.0000,0.0000,1,0,0,0`,
).join("\n")}\n`;

const plyHead = (format) =>
  `ply\nformat ${format} 1.0\nelement vertex ${POINTS}\n` +
  "property float x\nproperty float y\nproperty float z\nend_header\n";

function plyBody() {
  const body = Buffer.alloc(12 * POINTS);
  rows.forEach(({ station, x, z }, i) => {
    body.writeFloatLE(station, 12 * i);
    body.writeFloatLE(x, 12 * i + 4);
    body.writeFloatLE(z, 12 * i + 8);
  });
  return body;
}

const text = (row) => `${rows.map(row).join("\n")}\n`;
const files = {
  "profiles.csv": Buffer.from(
    `station_mm,x_mm,z_mm\n${text(({ station, x, z }) => `${station.toFixed(3)},${x.toFixed(3)},${z.toFixed(3)}`)}`,
  ),
  "cloud.xyz": Buffer.from(
    text(({ station, x, z }) => `${station.toFixed(4)} ${x.toFixed(4)} ${z.toFixed(4)}`),
  ),
  "long-digits.xyz": Buffer.from(text(({ station, x, z }) => `${station} ${x} ${z}`)),
  "ascii.ply": Buffer.from(
    plyHead("ascii") + text(({ station, x, z }) => `${station.toFixed(3)} ${x.toFixed(3)} ${z.toFixed(3)}`),
  ),
  "binary.ply": Buffer.concat([Buffer.from(plyHead("binary_little_endian")), plyBody()]),
  "profiles.json": Buffer.from(profilesJson()),
};

function profilesJson() {
  const byStation = Map.groupBy?.(rows, ({ station }) => station) ?? groups();
  const profiles = [...byStation].map(([station_mm, list]) => ({
    station_mm,
    pose: { point: [station_mm, 0, 0], quaternion: [1, 0, 0, 0] },
    x_mm: list.map(({ x }) => Number(x.toFixed(3))),
    z_mm: list.map(({ z }) => Number(z.toFixed(3))),
  }));
  return JSON.stringify({ units: "mm", profiles });
}

function groups() {
  const map = new Map();
  for (const row of rows) {
    if (!map.has(row.station)) map.set(row.station, []);
    map.get(row.station).push(row);
  }
  return map;
}

/** Median time of a step in ms. */
function median(step) {
  const times = Array.from({ length: RUNS }, () => {
    const start = performance.now();
    step();
    return performance.now() - start;
  });
  return times.sort((a, b) => a - b)[Math.floor(RUNS / 2)];
}

try {
  const outfile = join(folder, "read-scan.mjs");
  await build({ entryPoints: [source], bundle: true, format: "esm", outfile, logLevel: "error" });
  const { readScan } = await import(pathToFileURL(outfile).href);
  const posesFile = { name: "poses.csv", bytes: Buffer.from(poses) };
  console.log(`${POINTS} points, median of ${RUNS} runs, Node ${process.version}`);
  for (const [name, bytes] of Object.entries(files)) {
    const path = join(folder, name);
    writeFileSync(path, bytes);
    const bare_ms = median(() => readFileSync(path));
    const input = { name, bytes: readFileSync(path), units: "mm", poses: posesFile };
    let count = 0;
    const read_ms = median(() => {
      const outcome = readScan(input);
      if (!outcome.ok) throw new Error(JSON.stringify(outcome.faults));
      count = outcome.value.count;
    });
    if (count !== POINTS) throw new Error(`${name}: ${count} points`);
    const size = (bytes.length / 1e6).toFixed(1);
    console.log(
      `${name.padEnd(16)} ${size.padStart(6)} MB  file ${bare_ms.toFixed(1).padStart(6)} ms  ` +
        `scan ${read_ms.toFixed(1).padStart(6)} ms  ratio ${(read_ms / bare_ms).toFixed(1).padStart(5)}  ` +
        `${(bytes.length / 1e3 / read_ms).toFixed(0).padStart(4)} MB/s`,
    );
  }
} finally {
  rmSync(folder, { recursive: true });
}
