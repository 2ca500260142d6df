// `hingebook issue`: a notebook run, frozen as a file of its own and entered in the register.
import { existsSync } from "node:fs";
import { rm } from "node:fs/promises";
import { join } from "node:path";
import {
  type CalculationRecord,
  type Changes,
  canonicalDigest,
  changesBetween,
  isUnchanged,
  sha256,
} from "../../lib/sheet/index.ts";
import { type Notebook, readNotebook } from "../notebook.ts";
import type { Terminal } from "../run.ts";
import { shownPath } from "../run-words.ts";
import type { AskedIssue } from "./arguments.ts";
import { readBytes, readPackage } from "./package-file.ts";
import {
  extended,
  type Issue,
  issuedFolder,
  latestIssue,
  NOTHING_BEFORE,
  REGISTER_FILE,
  type Register,
  type Row,
  readRegister,
} from "./register.ts";
import { type Runner, runForRecord } from "./run-quietly.ts";
import { movements } from "./sensitivity.ts";
import { writeNew, writeWhole } from "./write.ts";

const line = (text: string): string => `${text}\n`;

interface Place {
  readonly notebook: Notebook;
  readonly file: string;
  readonly register: Register;
  /** The issue this one takes the place of. */
  readonly before: Row | undefined;
}

/** Issue a notebook; answers the exit code. `today` is the date where none is given, YYYY-MM-DD. */
export async function issue(
  asked: AskedIssue,
  today: string,
  runner: Runner,
  terminal: Terminal,
): Promise<number> {
  const place = await placeFor(asked, today);
  const earlier = place.before === undefined ? undefined : await earlierRecord(place, place.before, runner);
  const { record: run, said } = await runForRecord(asked.file, new Map(), runner, terminal.out);
  if (run === undefined) {
    terminal.err(said);
    terminal.err(
      line(`NOT ISSUED: ${place.notebook.fileName} did not run to its end; only a complete run is issued`),
    );
    return 1;
  }
  const prompts = (await runner.library()).promptsLeft(run);
  if (prompts !== "") {
    terminal.err(line(`NOT ISSUED: ${place.notebook.fileName}: ${prompts}; write what stands in ‹…› first`));
    return 1;
  }
  const moves = asked.sensitivity ? await movements(asked.file, run, runner, terminal.out) : undefined;
  const record = issuedRecord(run, asked, place, today, earlier, moves);
  await freeze(record, place, asked, runner);
  terminal.out(issueWords(record, place));
  return 0;
}

async function placeFor({ file, rev, out, date }: AskedIssue, today: string): Promise<Place> {
  const notebook = readNotebook(file);
  const folder = out ?? issuedFolder(notebook.folder);
  const register = await readRegister(join(folder, REGISTER_FILE));
  const taken = register.rows.find((row) => row.notebook === notebook.fileName && row.revision === rev);
  if (taken !== undefined)
    throw new Error(
      `${notebook.fileName} was issued as ${rev} on ${taken.date} (${taken.file}); an issue is never overwritten, give the next revision`,
    );
  const path = join(folder, `${notebook.name}-${rev}.html`);
  if (existsSync(path))
    throw new Error(
      `${shownPath(path)} is there but not in the register: an issue that was broken off, or another file. An issue is never overwritten: give another revision, or move the file away if nobody has it`,
    );
  const before = latestIssue(register.rows, notebook.fileName);
  if (before !== undefined && (date ?? today) < before.date)
    throw new Error(
      `${rev} would be dated ${date ?? today}, before ${before.revision} of ${before.date}, which it supersedes; ${date === undefined ? "today's date is earlier: give" : "give"} --date ${before.date} or a later one`,
    );
  return { notebook, file: path, register, before };
}

/** The record of the issue before, its file held against the register. */
async function earlierRecord(
  { register }: Place,
  before: Row,
  { versions }: Runner,
): Promise<CalculationRecord> {
  const path = join(register.path, "..", before.file);
  const found = await sha256(readBytes(path));
  if (found !== before.fileDigest)
    throw new Error(
      `${shownPath(path)} is not the file that was issued as ${before.revision}: its SHA-256 is ${found}, the register says ${before.fileDigest}. Put the issued file back first`,
    );
  return (await readPackage(path, `hingebook ${versions.hingebook ?? ""}`.trim())).record;
}

function issuedRecord(
  record: CalculationRecord,
  { rev, why, checked, approved, date }: AskedIssue,
  { register, before }: Place,
  today: string,
  earlier: CalculationRecord | undefined,
  moves: CalculationRecord["moves"],
): CalculationRecord {
  const on = date ?? today;
  const since: { readonly revision: string; readonly changes: Changes } | undefined =
    earlier === undefined || before === undefined
      ? undefined
      : { revision: before.revision, changes: changesBetween(earlier, record) };
  return {
    ...record,
    head: {
      ...record.head,
      revision: rev,
      date: on,
      ...(checked === undefined ? {} : { checkedBy: checked, checkedOn: on }),
      ...(approved === undefined ? {} : { approvedBy: approved, approvedOn: on }),
    },
    issue: {
      revision: rev,
      why,
      number: register.rows.length + 1,
      follows: register.rows.at(-1)?.digest ?? NOTHING_BEFORE,
    },
    ...(since === undefined ? {} : { since }),
    ...(moves === undefined ? {} : { moves }),
  };
}

async function freeze(
  record: CalculationRecord,
  { notebook, file, register, before }: Place,
  { rev, why }: AskedIssue,
  { library }: Runner,
): Promise<void> {
  const html = await (await library()).renderPackage(record);
  const { head, issue: mark } = record;
  const row: Issue = {
    number: mark?.number ?? 0,
    notebook: notebook.fileName,
    title: head.title,
    job: head.job,
    revision: rev,
    date: head.date ?? "",
    why,
    preparedBy: head.preparedBy,
    ...(head.checkedBy === undefined ? {} : { checkedBy: head.checkedBy }),
    ...(head.approvedBy === undefined ? {} : { approvedBy: head.approvedBy }),
    file: `${notebook.name}-${rev}.html`,
    fileDigest: await sha256(html),
    recordDigest: await canonicalDigest(record),
    failedChecks: failedChecks(record),
    ...(before === undefined ? {} : { supersedes: before.revision }),
    follows: mark?.follows ?? NOTHING_BEFORE,
  };
  const text = await extended(register, row);
  await writeNew(file, html);
  try {
    const now = await readRegister(register.path);
    if (now.source !== register.source)
      throw new Error(`${register.path} was changed while the notebook ran; issue it again`);
    await writeWhole(register.path, text);
  } catch (error) {
    await rm(file, { force: true }); // nobody can have it yet, and the register does not know it
    throw error;
  }
}

const failedChecks = ({ entries }: CalculationRecord): number =>
  entries.filter((entry) => entry.kind === "check" && !entry.passed).length;

function issueWords(record: CalculationRecord, { notebook, file, before }: Place): string {
  const { head, entries, since } = record;
  const failed = failedChecks(record);
  const lines = [`issued: ${head.title}, revision ${head.revision}, ${head.date}`];
  if (failed > 0) lines.push(`  WARNING: ${failed} of its checks DO NOT HOLD; the cover says so`);
  for (const entry of entries) if (entry.kind === "query") lines.push(`  OPEN QUERY: ${entry.text}`);
  if (before !== undefined) lines.push(`  supersedes ${before.revision} of ${before.date}`);
  if (since !== undefined && isUnchanged(since.changes))
    lines.push(`  WARNING: nothing changed since ${since.revision}; the package says so`);
  lines.push(`  file: ${shownPath(file)}`, `  register: ${shownPath(join(file, "..", REGISTER_FILE))}`);
  if (notebook.cells.length === 0) lines.push("  the notebook has no cells");
  return lines.map(line).join("");
}
