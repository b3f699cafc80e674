// Reads and measures a seam of a million points: `node tests/bench/measure-million.bench.mjs [ROUNDS]`.
// Each case runs in a process of its own, ROUNDS times (5), beside numpy and scipy where python3 has them.
// Prints minima, medians and ratios; asserts nothing, since times belong to a machine.
import { spawnSync } from "node:child_process";
import { mkdirSync, mkdtempSync, rmSync, statSync } from "node:fs";
import { cpus, tmpdir } from "node:os";
import { join } from "node:path";
import { fileURLToPath } from "node:url";
import { build } from "esbuild";

const ROUNDS = Number(process.argv[2] ?? 5);
const MILLION_PROFILES = 1580;
const TYPICAL_PROFILES = 400;
const here = (name) => fileURLToPath(new URL(name, import.meta.url));
const folder = mkdtempSync(join(tmpdir(), "measure-bench-"));
const ONE_THREAD = { OMP_NUM_THREADS: "1", OPENBLAS_NUM_THREADS: "1", MKL_NUM_THREADS: "1" };

async function bundled(name) {
  const outfile = join(folder, name.replace(/\.ts$/, ".mjs"));
  await build({
    entryPoints: [here(name)],
    bundle: true,
    platform: "node",
    format: "esm",
    outfile,
    logLevel: "error",
  });
  return outfile;
}

/** What a child process prints; null where it cannot run. */
function said(command, args) {
  const { status, stdout, stderr } = spawnSync(command, args, {
    encoding: "utf8",
    env: { ...process.env, ...ONE_THREAD },
  });
  return { ok: status === 0, stdout: stdout ?? "", stderr: stderr ?? "" };
}

function asked(command, args) {
  const { ok, stdout, stderr } = said(command, args);
  if (!ok) throw new Error(`${command} ${args.join(" ")}: ${stderr}`);
  return JSON.parse(stdout);
}

const least = (values) => Math.min(...values);
const middle = (values) => [...values].sort((a, b) => a - b)[Math.floor(values.length / 2)];

/** Rows of the table, each with all that its processes said; the cases take turns, so that noise falls on all. */
function rows(cases) {
  const runs = cases.map(() => []);
  for (let round = 0; round < ROUNDS; round++)
    cases.forEach(({ command, args }, i) => {
      runs[i].push(asked(command, args));
    });
  return cases.map((one, i) => {
    const { key = "cold_ms" } = one;
    const times = runs[i].flatMap((run) => run[key]);
    return {
      ...one,
      ms: least(times),
      median_ms: middle(times),
      peak_mb: least(runs[i].map((run) => run.peak_mb)),
    };
  });
}

function casesOf(script, data, seam) {
  const node = (label, what, name, rest = {}) => ({
    label: `${seam}: ${label}`,
    id: `${seam} ${what} ${name}${rest.key ?? ""}`,
    command: process.execPath,
    args: [script, what, data, name],
    ...rest,
  });
  const reading = ["cloud.csv", "profiles.csv", "cloud.ply"].flatMap((name) => [
    node(`${name}, bare file`, "bare", name),
    node(`${name}, read`, "read", name),
    node(`${name}, read, warm`, "read-warm", name, { key: "warm_ms" }),
  ]);
  const measuring = ["cloud.csv", "profiles.csv", "cloud.ply"].flatMap((name) => [
    node(`${name}, evaluate, cold`, "evaluate", name),
    node(`${name}, evaluate, warm`, "evaluate-warm", name, { key: "warm_ms" }),
  ]);
  return seam === "typical" ? measuring : [...reading, ...measuring];
}

function pythonCases(data) {
  const has = (module) => said("python3", ["-c", `import ${module}`]).ok;
  const python = (label, what) => ({
    label,
    id: what,
    command: "python3",
    args: [here("numpy-case.py"), what, data],
  });
  if (!has("numpy")) {
    console.log("python3 with numpy is not here: no comparison with it");
    return [];
  }
  const numpy = [
    python("million: cloud.csv, numpy.loadtxt", "csv"),
    python("million: cloud.ply, numpy.fromfile", "ply"),
  ];
  if (has("scipy")) return [...numpy, python("million: cKDTree, planes at all stations", "planes")];
  console.log("python3 with scipy is not here: no comparison with its tree");
  return numpy;
}

function printTable(table) {
  const wide = Math.max(...table.map(({ label }) => label.length));
  console.log(`${"".padEnd(wide)}       min    median   peak`);
  for (const { label, ms, median_ms, peak_mb } of table)
    console.log(
      `${label.padEnd(wide)}  ${ms.toFixed(1).padStart(8)}  ${median_ms.toFixed(1).padStart(8)}  ${peak_mb.toFixed(0).padStart(5)}`,
    );
}

function printRatios(table) {
  const ms = (id) => table.find((row) => row.id === id)?.ms;
  const ratio = (label, above, below, aim) => {
    const [a, b] = [ms(above), ms(below)];
    if (a === undefined || b === undefined) return;
    console.log(`${label.padEnd(58)} ${(a / b).toFixed(2).padStart(6)}   ${aim}`);
  };
  console.log("\nratios of minima");
  ratio("cloud.csv read / numpy.loadtxt", "million read cloud.csv", "csv", "aim 1.5");
  ratio("cloud.csv read / bare file", "million read cloud.csv", "million bare cloud.csv", "");
  ratio("cloud.ply read / bare file", "million read cloud.ply", "million bare cloud.ply", "aim 3");
  ratio("cloud.ply read / numpy.fromfile", "million read cloud.ply", "ply", "");
  ratio("evaluate cold / tree and planes", "million evaluate cloud.ply", "planes", "");
  ratio("evaluate warm / tree and planes", "million evaluate-warm cloud.plywarm_ms", "planes", "");
}

try {
  const script = await bundled("measure-case.ts");
  const writer = await bundled("write-bench-seam.ts");
  const data = { million: join(folder, "million"), typical: join(folder, "typical") };
  for (const [seam, profiles] of [
    ["million", MILLION_PROFILES],
    ["typical", TYPICAL_PROFILES],
  ]) {
    mkdirSync(data[seam]);
    const { ok, stderr } = said(process.execPath, [writer, data[seam], String(profiles)]);
    if (!ok) throw new Error(stderr);
    const { points, stations } = asked(process.execPath, [script, "evaluate", data[seam], "cloud.ply"]);
    console.log(`${seam}: ${profiles} profiles, ${points} points, ${stations} stations measured`);
  }
  const sizes = ["cloud.csv", "profiles.csv", "cloud.ply"].map(
    (name) => `${name} ${(statSync(join(data.million, name)).size / 1e6).toFixed(1)} MB`,
  );
  console.log(`${sizes.join(", ")}; Node ${process.version}, ${cpus().length} cores, ${ROUNDS} rounds\n`);
  const table = rows([
    { label: "Node, nothing done", id: "empty", command: process.execPath, args: [script, "empty"] },
    ...casesOf(script, data.million, "million"),
    ...casesOf(script, data.typical, "typical"),
    ...pythonCases(data.million),
  ]);
  console.log("times in ms, peak of the process in MB");
  printTable(table);
  printRatios(table);
} finally {
  rmSync(folder, { recursive: true });
}
