// The command line: from words to exit code.
import { readFileSync } from "node:fs";
import { join } from "node:path";
import { type Asked, HELP, readArguments, UsageError } from "./arguments.ts";
import { ownFolder } from "./folders.ts";
import type { Library } from "./library.ts";
import type { Terminal } from "./run.ts";

function version(): string {
  const { version: text } = JSON.parse(readFileSync(join(ownFolder(), "package.json"), "utf8")) as {
    version: string;
  };
  return text;
}

const versions = (): Readonly<Record<string, string>> => ({
  hingebook: version(),
  node: process.versions.node,
});

async function loaded(): Promise<Library> {
  const { loadLibrary } = await import("./library.ts");
  return loadLibrary();
}

async function run(asked: Extract<Asked, { command: "run" }>, terminal: Terminal): Promise<number> {
  const { files, out, overrides, watch, sensitivity } = asked;
  if (watch) {
    const { watchNotebook } = await import("./watch/index.ts");
    const [file = ""] = files;
    return watchNotebook({ file, out, overrides, terminal, versions: versions(), library: loaded });
  }
  const { runJob } = await import("./record/job.ts");
  const options = { files, out, overrides, terminal, sensitivity };
  const states = await runJob({ ...options, versions: versions(), library: loaded });
  return states.every((state) => state === "complete") ? 0 : 1;
}

/** Do what the words after "hingebook" ask; answers the exit code: 0 done, 1 failed, 2 not understood. */
export async function main(words: readonly string[], terminal: Terminal): Promise<number> {
  try {
    const asked = readArguments(words);
    if (asked.command === "run") return await run(asked, terminal);
    if (asked.command === "new" || asked.command === "templates") {
      const { newCommand } = await import("./new/index.ts");
      return await newCommand(asked, terminal);
    }
    if (asked.command === "issue" || asked.command === "changes" || asked.command === "verify") {
      const { recordCommand } = await import("./record/index.ts");
      return await recordCommand(asked, { library: loaded, versions: versions() }, terminal);
    }
    if (asked.command === "help" || asked.command === "version") {
      terminal.out(asked.command === "help" ? HELP : `${version()}\n`);
      return 0;
    }
    const { kernelCommand } = await import("./jupyter/command.ts");
    return await kernelCommand(asked, { version: version(), library: loaded }, terminal);
  } catch (error) {
    if (error instanceof UsageError) {
      terminal.err(`hingebook: ${error.message}\nhingebook --help tells more\n`);
      return 2;
    }
    terminal.err(`hingebook: ${error instanceof Error ? error.message : String(error)}\n`);
    return 1;
  }
}
