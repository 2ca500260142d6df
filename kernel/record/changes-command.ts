// `hingebook changes`: what differs between two packages or two revisions.
import { existsSync } from "node:fs";
import { dirname, join } from "node:path";
import { type CalculationRecord, changesBetween } from "../../lib/sheet/index.ts";
import type { Terminal } from "../run.ts";
import type { AskedChanges } from "./arguments.ts";
import { changesText } from "./changes-words.ts";
import { readPackage, UnreadableError } from "./package-file.ts";
import { REGISTER_FILE, readRegister } from "./register.ts";
import type { Runner } from "./run-quietly.ts";

/** Compare; answers the exit code. */
export async function changes(
  asked: AskedChanges,
  { versions }: Runner,
  terminal: Terminal,
): Promise<number> {
  const own = `hingebook ${versions.hingebook ?? ""}`.trim();
  const [before, after] = await Promise.all(
    [asked.before, asked.after].map(
      async (name) => (await readPackage(await pathOf(name, asked.register), own)).record,
    ),
  );
  if (before === undefined || after === undefined) throw new Error("changes needs two packages");
  const found = changesBetween(before, after);
  const about = (record: CalculationRecord, file: string): object => ({
    file,
    notebook: record.notebook.name,
    ...(record.head.revision === undefined ? {} : { revision: record.head.revision }),
  });
  terminal.out(
    asked.json
      ? `${JSON.stringify({ before: about(before, asked.before), after: about(after, asked.after), changes: found }, null, 2)}\n`
      : changesText(before, after, found),
  );
  return 0;
}

/** A file as it is named, or the file of a revision in the register. */
async function pathOf(name: string, register: string | undefined): Promise<string> {
  if (existsSync(name)) return name;
  const path = register ?? [REGISTER_FILE, join("issued", REGISTER_FILE)].find((one) => existsSync(one));
  if (path === undefined)
    throw new UnreadableError(
      `"${name}" is no file, and there is no register to look it up as a revision; name a file or give --register FILE`,
    );
  const { rows } = await readRegister(path);
  const found = rows.filter((row) => row.revision === name);
  const [only] = found;
  if (only === undefined)
    throw new UnreadableError(
      `"${name}" is no file and no revision in ${path}; revisions are ${rows.map((row) => row.revision).join(", ") || "none yet"}`,
    );
  if (found.length > 1)
    throw new UnreadableError(
      `revision "${name}" is in ${path} for ${found.map((row) => row.notebook).join(" and ")}; name the file, such as ${only.file}`,
    );
  return join(dirname(path), only.file);
}
