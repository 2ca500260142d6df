// `hingebook new`: a calculation begun from a template.
import { writeNew } from "../record/write.ts";
import type { Terminal } from "../run.ts";
import { shownPath } from "../run-words.ts";
import { nearest, UsageError } from "../usage.ts";
import type { AskedNew } from "./arguments.ts";
import { filled } from "./fill.ts";
import { readTemplate, templateNames } from "./template.ts";

/** The templates, a line each. */
function listed(): string {
  const names = templateNames();
  const width = Math.max(...names.map((name) => name.length));
  return names
    .map((name) => `  ${name.padEnd(width)}  ${readTemplate(name).notebook.metadata.hingebook.line}\n`)
    .join("");
}

function checkedName(name: string): string {
  const names = templateNames();
  if (names.includes(name)) return name;
  throw new UsageError(
    `"${name}" is not a template; ${nearest(name, names)} The templates are ${names.join(", ")}`,
  );
}

/** Numbers of the cells with a prompt, from 1. */
function promptCells(text: string): readonly number[] {
  const { cells } = JSON.parse(text) as { readonly cells: readonly { readonly source: readonly string[] }[] };
  return cells.flatMap(({ source }, i) => (/‹[^‹›]+›/u.test(source.join("")) ? [i + 1] : []));
}

/** List the templates, or write a notebook from one; answers the exit code. Never overwrites. */
export async function newCommand(
  asked: Exclude<AskedNew, { command: "help" }>,
  terminal: Terminal,
): Promise<number> {
  if (asked.command === "templates") {
    terminal.out(listed());
    return 0;
  }
  const { template, file, units } = asked;
  const name = checkedName(template);
  const text = filled(readTemplate(name), asked);
  await writeNew(file, text);
  const cells = promptCells(text);
  terminal.out(`${shownPath(file)}: ${name}, ${units}\n`);
  if (cells.length > 0) terminal.out(`  ‹…› to be written: cells ${cells.join(", ")}\n`);
  terminal.out(`  runs as it is: hingebook run ${quoted(shownPath(file))}\n`);
  return 0;
}

const quoted = (path: string): string => (/^[\w./\\:-]+$/.test(path) ? path : JSON.stringify(path));
