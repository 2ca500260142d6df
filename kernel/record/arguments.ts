// The grammar of the commands that deal with records: issue, changes, verify.
import { type Flags, readWords, UsageError } from "../usage.ts";

export interface AskedIssue {
  readonly command: "issue";
  readonly file: string;
  readonly rev: string;
  readonly why: string;
  readonly checked?: string;
  readonly approved?: string;
  /** YYYY-MM-DD; otherwise today. */
  readonly date?: string;
  /** Folder of the frozen files and their register; otherwise "issued" beside the notebook. */
  readonly out?: string;
  readonly sensitivity: boolean;
}

export interface AskedChanges {
  readonly command: "changes";
  readonly before: string;
  readonly after: string;
  readonly json: boolean;
  /** Where revisions are looked up. */
  readonly register?: string;
}

export interface AskedVerify {
  readonly command: "verify";
  readonly files: readonly string[];
  readonly run: boolean;
  readonly register?: string;
}

export type AskedRecord = AskedIssue | AskedChanges | AskedVerify | { readonly command: "help" };

export const RECORD_HELP = `  hingebook issue NOTEBOOK --rev P2 --why "REASON" [--checked NAME] [--approved NAME]
      run a notebook and freeze its package as NAME-P2.html with a row in register.json; never overwrites
      --date 2031-04-30      date of the issue (default: today)
      --out DIR              folder of issues and register (default: issued, beside the notebook)
      --sensitivity          run again with each assumption changed and list what it moves

  hingebook changes OLD NEW [--json]
      what changed between two packages, or between two revisions: hingebook changes P1 P2 --register issued/register.json
      exit code 0: compared; 3: a file cannot be read as a package

  hingebook verify FILE.html… [--run] [--register FILE]
      whether a package is as it was made: seal, record, page, register, every equation and formula worked out again
      --run                  also run the notebook inside the file and compare every value
      --register FILE        register of issues (default: register.json beside the file)
      exit code 0: all holds; 1: something does not; 3: the file cannot be read as a package
`;

export const RECORD_COMMANDS: readonly string[] = ["issue", "changes", "verify"];

const ISSUE: Flags = {
  "--rev": "a revision, for example --rev P2",
  "--why": 'a reason, for example --why "snow load revised"',
  "--checked": "the name of who checked it",
  "--approved": "the name of who approved it",
  "--date": "a date, for example --date 2031-04-30",
  "--out": "a folder, for example --out issued",
  "--sensitivity": undefined,
};

function needed(given: ReadonlyMap<string, string>, flag: string): string {
  const value = given.get(flag)?.trim();
  if (value === undefined || value === "") throw new UsageError(`issue needs ${flag}: ${ISSUE[flag]}`);
  return value;
}

function checkedRevision(rev: string): string {
  if (/^[A-Za-z0-9][A-Za-z0-9._-]{0,19}$/.test(rev)) return rev;
  throw new UsageError(
    `"${rev}" cannot be a revision: at most 20 letters, digits, dots, underscores and hyphens, such as P2`,
  );
}

function checkedDate(date: string): string {
  const [year, month, day] = /^(\d{4})-(\d{2})-(\d{2})$/.exec(date)?.slice(1).map(Number) ?? [];
  if (year !== undefined && month !== undefined && day !== undefined) {
    const read = new Date(Date.UTC(year, month - 1, day));
    if (read.getUTCMonth() === month - 1 && read.getUTCDate() === day) return date;
  }
  throw new UsageError(`"${date}" is no date; write year, month and day, for example 2031-04-30`);
}

const optional = <K extends string>(key: K, value: string | undefined): Partial<Record<K, string>> =>
  value === undefined ? {} : ({ [key]: value } as Record<K, string>);

function readIssue(words: readonly string[]): AskedRecord {
  const { given, others, help } = readWords("issue", words, ISSUE);
  if (help) return { command: "help" };
  const [file] = others;
  if (file === undefined || others.length > 1)
    throw new UsageError(
      'issue needs one notebook, for example: hingebook issue roof.ipynb --rev P1 --why "first issue"',
    );
  const date = given.get("--date");
  return {
    command: "issue",
    file,
    rev: checkedRevision(needed(given, "--rev")),
    why: needed(given, "--why"),
    sensitivity: given.has("--sensitivity"),
    ...optional("checked", given.get("--checked")),
    ...optional("approved", given.get("--approved")),
    ...optional("date", date === undefined ? undefined : checkedDate(date)),
    ...optional("out", given.get("--out")),
  };
}

const REGISTER = "a register, for example --register issued/register.json";

function readChanges(words: readonly string[]): AskedRecord {
  const { given, others, help } = readWords("changes", words, {
    "--json": undefined,
    "--register": REGISTER,
  });
  if (help) return { command: "help" };
  const [before, after] = others;
  if (before === undefined || after === undefined || others.length > 2)
    throw new UsageError(
      "changes needs two packages or revisions, for example: hingebook changes roof-P1.html roof-P2.html",
    );
  return {
    command: "changes",
    before,
    after,
    json: given.has("--json"),
    ...optional("register", given.get("--register")),
  };
}

function readVerify(words: readonly string[]): AskedRecord {
  const { given, others, help } = readWords("verify", words, { "--run": undefined, "--register": REGISTER });
  if (help) return { command: "help" };
  if (others.length === 0)
    throw new UsageError("verify needs a package, for example: hingebook verify roof-P2.html");
  return {
    command: "verify",
    files: others,
    run: given.has("--run"),
    ...optional("register", given.get("--register")),
  };
}

/** Read the words of one of the commands that deal with records. Throws `UsageError`. */
export function readRecordArguments(command: string, words: readonly string[]): AskedRecord {
  if (command === "issue") return readIssue(words);
  return command === "changes" ? readChanges(words) : readVerify(words);
}
