// `hingebook run` on files and folders: a folder stands for the notebooks in it and gets an index page.
import { readdirSync, statSync } from "node:fs";
import { join } from "node:path";
import { type RunOptions, type RunState, runNotebooks } from "../run.ts";

export interface JobOptions extends RunOptions {
  /** Run again with each assumption changed, and list what it moves. */
  readonly sensitivity: boolean;
}

const isFolder = (path: string): boolean => statSync(path, { throwIfNoEntry: false })?.isDirectory() ?? false;

/** The notebooks in a folder, by name. Throws when there is none. */
export function notebooksIn(folder: string): readonly string[] {
  const found = readdirSync(folder)
    .filter((name) => name.endsWith(".ipynb") && !name.startsWith("."))
    .sort()
    .map((name) => join(folder, name));
  if (found.length === 0) throw new Error(`${folder}: there is no notebook (.ipynb) in this folder`);
  return found;
}

/** Run notebooks and folders of notebooks. Answers how each notebook came out. */
export async function runJob(options: JobOptions): Promise<readonly RunState[]> {
  const { sensitivity, ...asked } = options;
  const folders = asked.files.filter(isFolder);
  const files = asked.files.flatMap((file) => (isFolder(file) ? notebooksIn(file) : [file]));
  const run: RunOptions = sensitivity
    ? { ...asked, files, enrich: await sensitive(asked) }
    : { ...asked, files };
  const states = await runNotebooks(run);
  if (folders.length > 0) {
    const { writeIndex } = await import("./index-page.ts");
    await writeIndex(files, states, options);
  }
  return states;
}

/** Adds to a record what its assumptions move. */
async function sensitive({
  library,
  versions,
  terminal,
}: RunOptions): Promise<NonNullable<RunOptions["enrich"]>> {
  const { movements } = await import("./sensitivity.ts");
  return async (record, path) => {
    terminal.out("  each assumption changed in turn\n");
    return {
      ...record,
      moves: await movements(path, record, { library, versions }, (text) => terminal.out(`  ${text}`)),
    };
  };
}
