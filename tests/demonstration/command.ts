// The built command on a notebook, as a person would call it.
import { spawnSync } from "node:child_process";
import { mkdtempSync, readdirSync, readFileSync, writeFileSync } from "node:fs";
import { tmpdir } from "node:os";
import { join, resolve } from "node:path";
import type { CalculationRecord } from "../../lib/sheet/record.ts";

export const top: string = resolve(import.meta.dirname, "../..");
export const demonstration: string = join(top, "notebooks/boat-shed-frame.ipynb");

export interface Outcome {
  readonly code: number | null;
  readonly out: string;
  readonly err: string;
  readonly files: readonly string[];
  readonly folder: string;
}

export const newFolder = (): string => mkdtempSync(join(tmpdir(), "hingebook-"));

/** `hingebook run` on a notebook into `folder` (otherwise a new one). */
export function run(notebook: string, words: readonly string[] = [], folder: string = newFolder()): Outcome {
  const done = spawnSync(
    process.execPath,
    [join(top, "dist/cli.js"), "run", notebook, "--out", folder, ...words],
    {
      encoding: "utf8",
    },
  );
  return { code: done.status, out: done.stdout, err: done.stderr, files: readdirSync(folder).sort(), folder };
}

/** The record inside a package. */
export function recordIn(folder: string, file: string): CalculationRecord {
  const html = readFileSync(join(folder, file), "utf8");
  const found = /<script type="application\/json" id="record">(.*?)<\/script>/s.exec(html);
  return JSON.parse(found?.[1] ?? "null");
}

/** The demonstration notebook with the source of its code cells changed, written to a new folder. */
export function variant(change: (source: string) => string): string {
  const notebook = JSON.parse(readFileSync(demonstration, "utf8"));
  for (const cell of notebook.cells)
    if (cell.cell_type === "code") cell.source = change([cell.source].flat().join(""));
  const path = join(newFolder(), "boat-shed-frame.ipynb");
  writeFileSync(path, JSON.stringify(notebook));
  return path;
}
