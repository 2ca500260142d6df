// A package held against the register of issues: the seal of an altered file can be made afresh, the register's row not.
import { existsSync } from "node:fs";
import { basename } from "node:path";
import { canonicalDigest, sha256 } from "../../lib/sheet/index.ts";
import type { PackageFile } from "./package-file.ts";
import { chainFault, type Row, registerRows } from "./register.ts";
import type { Finding } from "./verify.ts";

const about = "register";

/** What the register says of a file. `asked` tells that the register was named, so that it must be there. */
export async function registerFinding(file: PackageFile, path: string, asked: boolean): Promise<Finding> {
  const { issue } = file.record;
  if (!existsSync(path)) return withoutRegister(file, path, asked);
  let rows: readonly Row[];
  try {
    rows = registerRows(path);
  } catch (error) {
    return { about, holds: false, words: (error as Error).message };
  }
  const fault = await chainFault(rows);
  const digest = await sha256(file.bytes);
  const row = rows.find((one) => one.fileDigest === digest) ?? rowMeant(file, rows);
  if (row === undefined) {
    const words = "the register does not know it";
    return issue === undefined
      ? { about, holds: fault === undefined, words: fault ?? `not an issue; ${words}` }
      : { about, holds: false, words: `revision ${issue.revision} says that it is an issue, but ${words}` };
  }
  const faults = [...(await rowFaults(file, row, digest)), ...(fault === undefined ? [] : [fault])];
  const state = row.state === "current" ? "the current one" : `superseded by ${row.supersededBy}`;
  return {
    about,
    holds: faults.length === 0,
    words:
      faults.length === 0
        ? `issue ${row.number} of ${rows.length}, ${row.notebook} ${row.revision} of ${row.date}, ${state}`
        : `not the file that was issued as ${row.notebook} ${row.revision} on ${row.date}`,
    faults,
  };
}

function withoutRegister({ record: { issue } }: PackageFile, path: string, asked: boolean): Finding {
  if (asked) return { about, holds: false, words: `${path} is not there` };
  if (issue === undefined) return { about, holds: true, words: "not an issue, and no register beside it" };
  return {
    about,
    holds: true,
    words: `issue ${issue.number}, revision ${issue.revision}; no register beside it, so that a file sealed afresh would not show`,
  };
}

/** The row a file claims to be, by its record or by its name. */
function rowMeant({ path, record }: PackageFile, rows: readonly Row[]): Row | undefined {
  const { issue, notebook } = record;
  return (
    rows.find(
      (row) => issue !== undefined && row.notebook === notebook.name && row.revision === issue.revision,
    ) ?? rows.find((row) => row.file === basename(path))
  );
}

async function rowFaults({ record }: PackageFile, row: Row, digest: string): Promise<string[]> {
  const faults: string[] = [];
  if (row.fileDigest !== digest)
    faults.push(`the register says SHA-256 ${row.fileDigest}, the file has ${digest}`);
  const found = await canonicalDigest(record);
  if (row.recordDigest !== found)
    faults.push(
      `its record was altered: the register says SHA-256 ${row.recordDigest}, the record has ${found}`,
    );
  if (record.issue !== undefined && record.issue.follows !== row.follows)
    faults.push("the file follows another row than the register says; rows before it were changed");
  return faults;
}
