// hingebook kernel …: install, remove, list, serve.
import { realpathSync } from "node:fs";
import { basename, resolve } from "node:path";
import type { Library } from "../library.ts";
import type { Terminal } from "../run.ts";
import type { AskedKernel } from "./arguments.ts";
import { installedKernels, installKernel, removeKernel } from "./installation.ts";

export interface KernelParts {
  readonly version: string;
  readonly library: () => Promise<Library>;
}

async function serveNotebook(connectionFile: string, { version, library }: KernelParts): Promise<void> {
  const { readConnectionFile, serve } = await import("./index.ts");
  const { JPY_SESSION_NAME: notebook } = process.env;
  await serve({
    connection: readConnectionFile(resolve(connectionFile)),
    folder: process.cwd(),
    version,
    library,
    ...(notebook === undefined ? {} : { notebook: basename(notebook) }),
  });
}

function list(terminal: Terminal): void {
  const found = installedKernels();
  if (found.length === 0) terminal.out("not installed; hingebook kernel install makes it known to Jupyter\n");
  for (const { folder, command, works } of found)
    terminal.out(`${folder}\n  starts ${command}${works ? "" : ", WHICH IS NOT THERE: install again"}\n`);
}

/** Do what is asked of the kernel; answers the exit code. */
export async function kernelCommand(
  asked: AskedKernel,
  parts: KernelParts,
  terminal: Terminal,
): Promise<number> {
  if (asked.command === "kernel serve") await serveNotebook(asked.connectionFile, parts);
  else if (asked.command === "kernel list") list(terminal);
  else if (asked.command === "kernel remove") terminal.out(`removed: ${removeKernel(asked.place)}\n`);
  else {
    const command = realpathSync(process.argv[1] ?? "");
    const folder = installKernel(asked.place, { node: process.execPath, command, version: parts.version });
    terminal.out(`installed: ${folder}\nchoose "hingebook" as the kernel of a notebook\n`);
  }
  return 0;
}
