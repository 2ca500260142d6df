// The index page of a folder of notebooks: what came out, what was issued.
import { existsSync } from "node:fs";
import { basename, dirname, join, relative, sep } from "node:path";
import { type JobRow, renderIndex } from "../../lib/report/index.ts";
import type { RunOptions, RunState } from "../run.ts";
import { shownPath } from "../run-words.ts";
import { type PackageFile, readPackage } from "./package-file.ts";
import { issuedFolder, latestIssue, REGISTER_FILE, registerRows } from "./register.ts";
import { writeWhole } from "./write.ts";

const INDEX = "index.html";

/** Write index.html beside the packages of these notebooks. */
export async function writeIndex(
  files: readonly string[],
  states: readonly RunState[],
  { out, terminal }: Pick<RunOptions, "out" | "terminal">,
): Promise<void> {
  const rows = await Promise.all(files.map((file, i) => rowOf(file, states[i] ?? "failed", out)));
  const path = join(out, INDEX);
  await writeWhole(path, await renderIndex(rows));
  terminal.out(`index: ${shownPath(path)}\n`);
}

async function rowOf(notebook: string, state: RunState, out: string): Promise<JobRow> {
  const name = basename(notebook).replace(/\.ipynb$/i, "");
  const file = `${name}${state === "complete" ? "" : ".INCOMPLETE"}.html`;
  const written = state !== "failed" && existsSync(join(out, file));
  const read: PackageFile | undefined = written
    ? await readPackage(join(out, file), "this hingebook")
    : undefined;
  const rows = registerRows(join(issuedFolder(dirname(notebook)), REGISTER_FILE));
  const last = latestIssue(rows, basename(notebook));
  return {
    notebook: basename(notebook),
    ...(read === undefined ? {} : { file, record: read.record }),
    ...(last === undefined
      ? {}
      : {
          issued: {
            revision: last.revision,
            date: last.date,
            file: relative(out, join(issuedFolder(dirname(notebook)), last.file))
              .split(sep)
              .join("/"),
          },
        }),
  };
}
