// The notebook inside a record run again, in a folder of its own that is taken away afterwards.
import { mkdirSync, mkdtempSync, rmSync, writeFileSync } from "node:fs";
import { tmpdir } from "node:os";
import { dirname, join } from "node:path";
import type { CalculationRecord } from "../../lib/sheet/index.ts";
import { reproduction } from "./reproduce.ts";
import { type Runner, runForRecord } from "./run-quietly.ts";
import type { Finding } from "./verify.ts";

const about = "values";

/** Run the notebook of a record with the values set from outside as they were, and compare. */
export async function rerun(record: CalculationRecord, runner: Runner): Promise<Finding> {
  const folder = mkdtempSync(join(tmpdir(), "hingebook-verify-"));
  try {
    const file = takeOut(record, folder);
    const set = new Map(record.overrides.map((one) => [one.symbol, one.set]));
    const { record: again, said } = await runForRecord(file, set, runner);
    if (again === undefined)
      return {
        about,
        holds: false,
        words: "none reproduced: the notebook does not run to its end",
        faults: said.trimEnd().split("\n"),
      };
    return compared(record, again);
  } finally {
    rmSync(folder, { recursive: true, force: true });
  }
}

/** The sources written out. Their names have been checked to be plain when the record was read. */
function takeOut({ notebook, files = [] }: CalculationRecord, folder: string): string {
  for (const { path, text } of files) {
    const target = join(folder, ...path.split("/"));
    mkdirSync(dirname(target), { recursive: true });
    writeFileSync(target, text);
  }
  const file = join(folder, notebook.name);
  writeFileSync(file, notebook.source);
  return file;
}

function compared(record: CalculationRecord, again: CalculationRecord): Finding {
  const { count, values, parts } = reproduction(record, again);
  const faults = [...values, ...parts];
  const other =
    record.versions.hingebook === again.versions.hingebook
      ? ""
      : ` (made by hingebook ${record.versions.hingebook}, run by ${again.versions.hingebook})`;
  const words = `${count - values.length} of ${count} values reproduced${other}`;
  return { about, holds: faults.length === 0, words, faults };
}
