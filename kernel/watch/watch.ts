// hingebook run --watch: runs a notebook again whenever it, or a file beside it, is saved. The library and the compiler
// stay loaded; every run has a session of its own.
import { join } from "node:path";
import { createChecker } from "../check/index.ts";
import { libraryChecker } from "../library-session.ts";
import { readNotebook } from "../notebook.ts";
import { type RunOptions, type RunState, runNotebooks } from "../run.ts";
import { sourcesDigest, watchSources } from "./sources.ts";
import { startViewer, type Viewer } from "./viewer.ts";

export interface WatchOptions extends Omit<RunOptions, "files" | "checker"> {
  readonly file: string;
  /** Ends the watch; otherwise an interrupt of the process does. */
  readonly signal?: AbortSignal;
}

class Watch {
  readonly #options: WatchOptions;
  readonly #run: RunOptions;
  readonly #viewer: Viewer;
  readonly #name: string;
  #digest = "";
  #running: Promise<void> | undefined;
  #again = false;

  constructor(options: WatchOptions, run: RunOptions, viewer: Viewer, name: string) {
    this.#options = options;
    this.#run = run;
    this.#viewer = viewer;
    this.#name = name;
  }

  /** Something was saved: run, and once more if something is saved meanwhile. */
  changed(): void {
    if (this.#running) {
      this.#again = true;
      return;
    }
    this.#running = this.#once().finally(() => {
      this.#running = undefined;
      if (!this.#again) return;
      this.#again = false;
      this.changed();
    });
  }

  async settled(): Promise<void> {
    while (this.#running) await this.#running;
  }

  async #once(): Promise<void> {
    const { file, terminal } = this.#options;
    const begun = performance.now();
    try {
      const digest = sourcesDigest(file);
      if (digest === this.#digest) return;
      this.#digest = digest;
      this.#viewer.tell("running");
      const [state = "failed"] = await runNotebooks(this.#run);
      this.#show(state);
      terminal.out(`  ${((performance.now() - begun) / 1000).toFixed(2)} s; waiting for a change\n`);
    } catch (error) {
      // A notebook that is being written may be half there: the next saving will tell.
      terminal.err(`hingebook: ${error instanceof Error ? error.message : String(error)}\n`);
    }
  }

  #show(state: RunState): void {
    const { out } = this.#options;
    if (state === "complete") this.#viewer.tell("written", join(out, `${this.#name}.html`));
    else this.#viewer.tell("failed", join(out, `${this.#name}.INCOMPLETE.html`));
  }
}

function ended(signal: AbortSignal | undefined): Promise<void> {
  return new Promise((settle) => {
    if (signal?.aborted) settle();
    signal?.addEventListener("abort", () => settle());
    if (!signal) for (const name of ["SIGINT", "SIGTERM"] as const) process.once(name, () => settle());
  });
}

/** Run a notebook, serve its package, and do so again on every change until it is ended; answers the exit code. */
export async function watchNotebook(options: WatchOptions): Promise<number> {
  const { file, terminal, signal } = options;
  const { folder, name, fileName } = readNotebook(file);
  const checker = createChecker(libraryChecker({ ...options, folder, onOutput: () => {} }));
  const viewer = await startViewer(fileName);
  const run = new Watch(options, { ...options, files: [file], checker }, viewer, name);
  const watching = watchSources(file, () => run.changed());
  terminal.out(`${fileName}: ${viewer.address} shows the package; end with Ctrl+C\n`);
  run.changed();
  await ended(signal);
  watching.close();
  await run.settled();
  await Promise.all([viewer.close(), checker.close()]);
  return 0;
}
