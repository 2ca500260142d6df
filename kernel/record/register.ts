// The register of issues: one row for each frozen file, each row holding the digest of the row before, so that an issue
// or a row that is changed afterwards no longer fits. Whether an issue is superseded follows from the rows after it.
import { existsSync, readFileSync } from "node:fs";
import { join } from "node:path";
import { z } from "zod";
import { canonicalDigest } from "../../lib/sheet/index.ts";
import { digest, fileName, revision, text } from "../../lib/sheet/schema-parts.ts";

export const REGISTER_FILE = "register.json";
const FORMAT = "hingebook register";
const VERSION = 0;
/** What the first row follows. */
export const NOTHING_BEFORE: string = "0".repeat(64);

/** What a row says of an issue; its digest is taken over this. */
export interface Issue {
  readonly number: number;
  readonly notebook: string;
  readonly title: string;
  readonly job: string;
  readonly revision: string;
  readonly date: string;
  readonly why: string;
  readonly preparedBy: string;
  readonly checkedBy?: string;
  readonly approvedBy?: string;
  readonly file: string;
  readonly fileDigest: string;
  readonly recordDigest: string;
  readonly failedChecks: number;
  /** The revision of the same notebook this one takes the place of. */
  readonly supersedes?: string;
  /** Digest of the row before. */
  readonly follows: string;
}

export interface Row extends Issue {
  readonly digest: string;
  readonly state: "current" | "superseded";
  readonly supersededBy?: string;
}

export interface Register {
  readonly path: string;
  readonly rows: readonly Row[];
  /** The file as it was read; empty where there was none. */
  readonly source: string;
}

const row = z.strictObject({
  number: z.int().min(1).max(100_000),
  notebook: fileName,
  title: text,
  job: text,
  revision,
  date: z.iso.date(),
  why: text,
  preparedBy: text,
  checkedBy: z.exactOptional(text),
  approvedBy: z.exactOptional(text),
  file: fileName,
  fileDigest: digest,
  recordDigest: digest,
  failedChecks: z.int().min(0),
  supersedes: z.exactOptional(revision),
  follows: digest,
  digest,
  state: z.enum(["current", "superseded"]),
  supersededBy: z.exactOptional(revision),
}) satisfies z.ZodType<Row>;

const register = z.strictObject({
  format: z.literal(FORMAT),
  version: z.literal(VERSION),
  issues: z.array(row).max(100_000),
});

const issueOf = ({ digest: _, state: __, supersededBy: ___, ...issue }: Row): Issue => issue;

/** The register of a folder; without rows where there is none yet. Throws on a file that is no register, on a newer
 *  version, and on a chain that does not hold, naming the row. */
export async function readRegister(path: string): Promise<Register> {
  if (!existsSync(path)) return { path, rows: [], source: "" };
  const source = readFileSync(path, "utf8");
  const rows = parsed(path, source);
  const fault = await chainFault(rows);
  if (fault !== undefined) throw new Error(`${path}: ${fault}`);
  return { path, rows, source };
}

/** The rows as they stand in the file, their chain not looked at. */
export function registerRows(path: string): readonly Row[] {
  return existsSync(path) ? parsed(path, readFileSync(path, "utf8")) : [];
}

function parsed(path: string, source: string): readonly Row[] {
  let data: unknown;
  try {
    data = JSON.parse(source);
  } catch (cause) {
    throw new Error(`${path}: the register is not JSON: ${(cause as Error).message}`, { cause });
  }
  const { format, version } = (data ?? {}) as { format?: unknown; version?: unknown };
  if (format === FORMAT && typeof version === "number" && version > VERSION)
    throw new Error(
      `${path}: the register has version ${version}; this hingebook reads versions up to ${VERSION}`,
    );
  const found = register.safeParse(data);
  if (found.success) return found.data.issues;
  const [first] = found.error.issues;
  throw new Error(
    `${path}: no register of issues: ${first?.path.join(".") || "the file"}: ${first?.message}`,
  );
}

/** What is wrong with the chain, if anything is. */
export async function chainFault(rows: readonly Row[]): Promise<string | undefined> {
  let follows = NOTHING_BEFORE;
  for (const [i, one] of rows.entries()) {
    const name = `row ${i + 1} (${one.notebook}, ${one.revision})`;
    if (one.number !== i + 1) return `${name} has number ${one.number}; a row is missing or was moved`;
    if (one.follows !== follows)
      return `${name} does not follow the row before it; a row was changed or taken out`;
    if ((await canonicalDigest(issueOf(one))) !== one.digest)
      return `${name} was changed after it was written`;
    follows = one.digest;
  }
  const due = withStates(rows);
  const other = rows.findIndex(
    (one, i) => one.state !== due[i]?.state || one.supersededBy !== due[i]?.supersededBy,
  );
  const wrong = rows[other];
  if (wrong === undefined) return undefined;
  return `row ${other + 1} (${wrong.notebook}, ${wrong.revision}) is marked ${wrong.state}; by the rows after it it is ${due[other]?.state}`;
}

/** Rows marked by what came after them. */
function withStates(rows: readonly Row[]): readonly Row[] {
  return rows.map((one) => {
    const next = rows.find((later) => later.number > one.number && later.notebook === one.notebook);
    const { state: _, supersededBy: __, ...rest } = one;
    return next === undefined
      ? { ...rest, state: "current" }
      : { ...rest, state: "superseded", supersededBy: next.revision };
  });
}

/** The text of a register with one issue more. */
export async function extended({ rows }: Register, issue: Issue): Promise<string> {
  const added: Row = { ...issue, digest: await canonicalDigest(issue), state: "current" };
  const issues = withStates([...rows, added]);
  return `${JSON.stringify({ format: FORMAT, version: VERSION, issues }, null, 2)}\n`;
}

/** The last issue of a notebook. */
export const latestIssue = (rows: readonly Row[], notebook: string): Row | undefined =>
  rows.filter((one) => one.notebook === notebook).at(-1);

/** Where the issues of notebooks in a folder lie. */
export const issuedFolder = (folder: string): string => join(folder, "issued");
