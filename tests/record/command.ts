// The built command and its parts, as the tests of records use them.
import { spawnSync } from "node:child_process";
import { copyFileSync, mkdtempSync, readFileSync, writeFileSync } from "node:fs";
import { tmpdir } from "node:os";
import { join, resolve } from "node:path";
import { loadLibrary } from "../../kernel/library.ts";
import type { Runner } from "../../kernel/record/index.ts";
import { recordText } from "../../kernel/record/package-file.ts";
import { verify } from "../../kernel/record/verify.ts";
import { sealed } from "../../lib/report/index.ts";
import type { CalculationRecord } from "../../lib/sheet/index.ts";

export const top: string = resolve(import.meta.dirname, "../..");
export const cli: string = join(top, "dist/cli.js");
export const demonstration: string = join(top, "notebooks/boat-shed-frame.ipynb");

export const newFolder = (): string => mkdtempSync(join(tmpdir(), "hingebook-record-"));

export interface Outcome {
  readonly code: number | null;
  readonly out: string;
  readonly err: string;
}

/** `hingebook …` in a folder. */
export function hingebook(folder: string, ...words: readonly string[]): Outcome {
  const done = spawnSync(process.execPath, [cli, ...words], { cwd: folder, encoding: "utf8" });
  return { code: done.status, out: done.stdout, err: done.stderr };
}

/** A job folder with the demonstration notebook in it, its code changed where wanted. */
export function jobFolder(change: (source: string) => string = (source) => source): string {
  const folder = newFolder();
  copyFileSync(demonstration, join(folder, "frame.ipynb"));
  rewrite(folder, change);
  return folder;
}

/** Changes the code of the notebook in a job folder. */
export function rewrite(folder: string, change: (source: string) => string): void {
  const path = join(folder, "frame.ipynb");
  const notebook = JSON.parse(readFileSync(path, "utf8"));
  for (const cell of notebook.cells)
    if (cell.cell_type === "code") cell.source = change([cell.source].flat().join(""));
  writeFileSync(path, JSON.stringify(notebook));
}

export function recordOf(path: string): CalculationRecord {
  return JSON.parse(recordText(path, readFileSync(path, "utf8")));
}

/** A runner with the library of the sources, saying it is the version that made `record`. */
export async function runnerFor(record: CalculationRecord): Promise<Runner> {
  const library = await loadLibrary();
  return { library: async () => library, versions: record.versions };
}

/** `verify` without a process of its own. */
export async function verified(
  path: string,
  runner: Runner,
  more: { readonly run?: boolean; readonly register?: string } = {},
): Promise<Outcome> {
  let out = "";
  const hear = (text: string): void => {
    out += text;
  };
  const terminal = { out: hear, err: hear };
  const asked = { command: "verify", files: [path], run: more.run ?? false } as const;
  try {
    const code = await verify(
      more.register === undefined ? asked : { ...asked, register: more.register },
      runner,
      terminal,
    );
    return { code, out, err: "" };
  } catch (error) {
    return { code: 3, out, err: (error as Error).message };
  }
}

/** A page with a record of its own making, sealed afresh. */
export async function forged(record: CalculationRecord, runner: Runner): Promise<string> {
  return (await runner.library()).renderPackage(record);
}

/** A page of nothing but a record, sealed. */
export const bare = (json: string): Promise<string> =>
  sealed(
    `<!doctype html>\n<script type="application/json" id="record">${json.replace(/</g, "\\u003c")}</script>\n`,
  );
