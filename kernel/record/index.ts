// The commands that deal with records, each loaded when it is asked for.
import type { Terminal } from "../run.ts";
import type { AskedRecord } from "./arguments.ts";
import { UnreadableError } from "./package-file.ts";
import type { Runner } from "./run-quietly.ts";

export type { Runner } from "./run-quietly.ts";

/** Exit code where a file cannot be read as what it should be. */
const UNREADABLE = 3;

/** Today where the clock stands, YYYY-MM-DD. */
function today(): string {
  const now = new Date();
  const two = (n: number): string => String(n).padStart(2, "0");
  return `${now.getFullYear()}-${two(now.getMonth() + 1)}-${two(now.getDate())}`;
}

/** Do what was asked; answers the exit code: 0 done and all holds, 1 not, 3 a file cannot be read as a package. */
export async function recordCommand(
  asked: Exclude<AskedRecord, { readonly command: "help" }>,
  runner: Runner,
  terminal: Terminal,
): Promise<number> {
  try {
    switch (asked.command) {
      case "issue":
        return await (await import("./issue.ts")).issue(asked, today(), runner, terminal);
      case "changes":
        return await (await import("./changes-command.ts")).changes(asked, runner, terminal);
      case "verify":
        return await (await import("./verify.ts")).verify(asked, runner, terminal);
    }
  } catch (error) {
    if (!(error instanceof UnreadableError)) throw error;
    terminal.err(`hingebook: ${error.message}\n`);
    return UNREADABLE;
  }
}
