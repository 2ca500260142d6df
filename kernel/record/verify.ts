// `hingebook verify`: whether a package is what it was when it was made, and whether it adds up.
import { dirname, join } from "node:path";
import { canonicalDigest } from "../../lib/sheet/index.ts";
import type { Terminal } from "../run.ts";
import type { AskedVerify } from "./arguments.ts";
import { type PackageFile, readPackage } from "./package-file.ts";
import { pageDifferences } from "./page-differences.ts";
import { recheck } from "./recheck.ts";
import { REGISTER_FILE } from "./register.ts";
import { registerFinding } from "./register-finding.ts";
import { rerun } from "./rerun.ts";
import type { Runner } from "./run-quietly.ts";

/** What one look at a package found: whether it holds, a line of words, and what does not hold, each in words. */
export interface Finding {
  readonly about: string;
  readonly holds: boolean;
  readonly words: string;
  readonly faults?: readonly string[];
}

const MOST_FAULTS = 20;

/** Verify packages; answers the exit code: 0 when all hold, 1 when something does not. */
export async function verify(asked: AskedVerify, runner: Runner, terminal: Terminal): Promise<number> {
  let code = 0;
  for (const path of asked.files) {
    const file = await readPackage(path, `hingebook ${runner.versions.hingebook ?? ""}`.trim());
    const { head, complete } = file.record;
    const revision = head.revision === undefined ? "no revision" : `revision ${head.revision}`;
    terminal.out(`${path}: ${head.title}, job ${head.job}, ${revision}${complete ? "" : ", INCOMPLETE"}\n`);
    const findings = await findingsOf(file, asked, runner);
    for (const finding of findings) terminal.out(findingText(finding));
    if (asked.run) {
      terminal.out("  --run: the notebook in this file is run now, its code with your rights\n");
      const again = await rerun(file.record, runner);
      terminal.out(findingText(again));
      findings.push(again);
    }
    const wrong = findings.filter(({ holds }) => !holds);
    if (wrong.length === 0) terminal.out("verified\n");
    else {
      terminal.out(`NOT VERIFIED: ${wrong.map(({ about }) => about).join(", ")}\n`);
      code = 1;
    }
  }
  return code;
}

function findingText({ about, holds, words, faults = [] }: Finding): string {
  const lines = [`  ${about.padEnd(10)} ${holds ? "" : "WRONG: "}${words}`];
  for (const fault of faults.slice(0, MOST_FAULTS)) lines.push(`             ${fault}`);
  if (faults.length > MOST_FAULTS) lines.push(`             and ${faults.length - MOST_FAULTS} more`);
  return lines.map((line) => `${line}\n`).join("");
}

async function findingsOf(file: PackageFile, { register }: AskedVerify, runner: Runner): Promise<Finding[]> {
  const registerPath = register ?? join(dirname(file.path), REGISTER_FILE);
  return [
    sealFinding(file),
    await recordFinding(file),
    await pageFinding(file, runner),
    await registerFinding(file, registerPath, register !== undefined),
    ...sumFindings(file),
  ];
}

function sealFinding({ seal }: PackageFile): Finding {
  const about = "seal";
  if (seal.state === "unbroken") return { about, holds: true, words: `unbroken, SHA-256 ${seal.digest}` };
  if (seal.state === "missing")
    return { about, holds: false, words: "not there: the last line of the file was taken away or changed" };
  return {
    about,
    holds: false,
    words: "broken, the file was changed after it was made",
    faults: [`the seal says SHA-256 ${seal.digest}`, `the file has SHA-256 ${seal.found}`],
  };
}

async function recordFinding({ record, html }: PackageFile): Promise<Finding> {
  const about = "record";
  const found = await canonicalDigest(record);
  const printed = /Record SHA-256 ([0-9a-f]{64})/.exec(html)?.[1];
  if (printed === found) return { about, holds: true, words: `agrees with its digest, SHA-256 ${found}` };
  return {
    about,
    holds: false,
    words: "not the one the page was made from",
    faults: [`the page says SHA-256 ${printed ?? "nothing"}`, `the record has SHA-256 ${found}`],
  };
}

/** The page made again from the record: only the version that made it writes the same page to the byte. */
async function pageFinding({ record, html }: PackageFile, { library, versions }: Runner): Promise<Finding> {
  const about = "page";
  const [made, own] = [record.versions.hingebook, versions.hingebook];
  if (made !== own)
    return {
      about,
      holds: true,
      words: `made by hingebook ${made ?? "of no version"}, this is ${own}: not compared with the record; the seal covers it`,
    };
  let due: string;
  try {
    due = await (await library()).renderPackage(record);
  } catch (error) {
    return { about, holds: false, words: `cannot be made from the record: ${(error as Error).message}` };
  }
  const different = pageDifferences(html, due);
  if (different.length === 0)
    return { about, holds: true, words: "shows what the record says, equal to the byte when made again" };
  return {
    about,
    holds: false,
    words: `does not show what the record says in ${different.length} place${different.length === 1 ? "" : "s"}`,
    faults: different.map(({ part, shown, due: right }) => `${part}: shows "${shown}", due is "${right}"`),
  };
}

function sumFindings({ record }: PackageFile): readonly Finding[] {
  const { equations, formulas } = recheck(record);
  const finding = (
    about: string,
    { count, faults }: { count: number; faults: readonly string[] },
    done: string,
  ): Finding => ({
    about,
    holds: faults.length === 0,
    words: faults.length === 0 ? `${count} of ${count} ${done}` : `${faults.length} do not hold, of ${count}`,
    faults,
  });
  return [finding("equations", equations, "re-added"), finding("formulas", formulas, "worked out again")];
}
