// Debian's Python, when it and the packages asked for are there.
import { spawnSync } from "node:child_process";
import { mkdtempSync, rmSync, writeFileSync } from "node:fs";
import { tmpdir } from "node:os";
import { join } from "node:path";

const python = "/usr/bin/python3";

/** Whether Python can import all of these; says aloud which it cannot. */
export function pythonHas(...packages: readonly string[]): boolean {
  const missing = packages.filter((name) => spawnSync(python, ["-c", `import ${name}`]).status !== 0);
  if (missing.length > 0)
    console.warn(
      `SKIPPED: ${python} cannot import ${missing.join(", ")} (Debian: ${missing.map((m) => `python3-${m}`).join(", ")})`,
    );
  return missing.length === 0;
}

/** Runs a script beside this file on a value given as JSON, and reads the JSON it writes. */
export function runPython(script: string, value: unknown): unknown {
  const folder = mkdtempSync(join(tmpdir(), "hingebook-"));
  try {
    const file = join(folder, "input.json");
    writeFileSync(file, JSON.stringify(value));
    const done = spawnSync(python, [join(import.meta.dirname, script), file], {
      encoding: "utf8",
      maxBuffer: 1e9,
    });
    if (done.status !== 0) throw new Error(`${script} failed: ${done.stderr || String(done.error)}`);
    return JSON.parse(done.stdout);
  } finally {
    rmSync(folder, { recursive: true });
  }
}
