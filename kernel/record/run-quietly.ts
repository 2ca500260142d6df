// A notebook run for its record alone: nothing written, nothing said but what went wrong.
import type { CalculationRecord } from "../../lib/sheet/index.ts";
import type { Library } from "../library.ts";
import { type RunOptions, runNotebooks, type Terminal } from "../run.ts";

export interface QuietRun {
  /** The record of a run that reached its end. */
  readonly record?: CalculationRecord;
  /** What the runner said of a failure. */
  readonly said: string;
}

export interface Runner {
  readonly library: () => Promise<Library>;
  readonly versions: Readonly<Record<string, string>>;
}

/** Run one notebook to its record; `progress` hears what the runner says on its way. */
export async function runForRecord(
  file: string,
  overrides: RunOptions["overrides"],
  { library, versions }: Runner,
  progress: (text: string) => void = () => undefined,
): Promise<QuietRun> {
  let said = "";
  const records: CalculationRecord[] = [];
  const terminal: Terminal = {
    out: progress,
    err: (text) => {
      said += text;
    },
  };
  await runNotebooks({
    files: [file],
    out: ".",
    overrides,
    terminal,
    versions,
    library,
    deliver: (record) => {
      records.push(record);
    },
  });
  const [record] = records;
  return record?.complete === true ? { record, said } : { said };
}
