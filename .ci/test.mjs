// npm test: types, lint and format, tests; then one closing line with the counts. Anything but success exits non-zero.
import { spawnSync } from "node:child_process";
import { existsSync, mkdirSync, readFileSync, rmSync } from "node:fs";
import { join } from "node:path";

const top = new URL("..", import.meta.url).pathname;
const report = join(top, "out/test-report.json");
const wanted = process.argv.slice(2);

function run(words, args) {
  console.log(`hingebook: ${words} ...`);
  const done = spawnSync(process.execPath, args, { cwd: top, stdio: "inherit" });
  if (done.status === 0) return true;
  console.error(`hingebook: ${words} FAILED`);
  return false;
}

mkdirSync(join(top, "out"), { recursive: true });
rmSync(report, { force: true });
const checks = [
  run("types", ["node_modules/typescript-native/bin/tsc", "-p", "tsconfig.json"]),
  run("lint and format", ["node_modules/@biomejs/biome/bin/biome", "ci", "--error-on-warnings", "."]),
  run("tests", [
    "node_modules/vitest/vitest.mjs",
    "run",
    "--reporter=default",
    "--reporter=json",
    `--outputFile.json=${report}`,
    ...wanted,
  ]),
];
if (existsSync(report)) {
  const { numPassedTests, numFailedTests, numPendingTests, numTodoTests } = JSON.parse(
    readFileSync(report, "utf8"),
  );
  const skipped = numPendingTests + numTodoTests;
  if (skipped > 0)
    console.log(
      `hingebook: ${skipped} TESTS SKIPPED (they need Chromium, poppler, Jupyter or Python packages from Debian)`,
    );
  console.log(`tests: ${numPassedTests} passed, ${numFailedTests} failed, ${skipped} skipped`);
}
process.exit(checks.every(Boolean) ? 0 : 1);
