// `npm test`: every check. Installs what it needs, then lint, types and all tests; ends with `N passed, N failed`.
import { mkdtempSync, readFileSync } from "node:fs";
import { tmpdir } from "node:os";
import { join } from "node:path";
import { build, install, root, run } from "./tools.mjs";

let passed = 0;
let failed = 0;

async function check(name, work) {
  const begun = Date.now();
  console.log(`\n▸ ${name}`);
  try {
    await work();
    passed += 1;
    console.log(`▸ ${name}: passed (${((Date.now() - begun) / 1000).toFixed(1)} s)`);
  } catch (error) {
    failed += 1;
    console.log(`▸ ${name}: failed: ${error instanceof Error ? error.message : error}`);
  }
}

const node = (script, ...args) => run(process.execPath, [join(root, script), ...args]);

/** Runs vitest and counts its tests one by one. */
async function tests(report) {
  const run_ = node(
    "node_modules/vitest/vitest.mjs",
    "run",
    "--reporter=default",
    "--reporter=json",
    `--outputFile.json=${report}`,
  );
  try {
    await run_;
  } finally {
    const { numPassedTests, numFailedTests, numTotalTests, success } = JSON.parse(
      readFileSync(report, "utf8"),
    );
    passed += numPassedTests - (success ? 1 : 0);
    failed += numFailedTests - (numFailedTests > 0 ? 1 : 0);
    if (numTotalTests === 0) failed += 1;
  }
}

await install();
await check("lint and boundaries", () =>
  node("node_modules/@biomejs/biome/bin/biome", "check", "--error-on-warnings", "."),
);
await check("types", () => node("scripts/types.mjs"));
await check("build", build);
await check("tests", () => tests(join(mkdtempSync(join(tmpdir(), "beadroll-")), "report.json")));

console.log(`\n${passed} passed, ${failed} failed`);
process.exitCode = failed === 0 ? 0 : 1;
