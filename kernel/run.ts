// Runs notebooks from start to end without Jupyter and leaves a calculation package for each.
import { rm } from "node:fs/promises";
import { join } from "node:path";
import { setImmediate as nextTurn } from "node:timers/promises";
import type { CalculationRecord, Head } from "../lib/sheet/index.ts";
import type { Checker } from "./check/index.ts";
import type { CellFailure } from "./failure.ts";
import type { Library, OpenLedger } from "./library.ts";
import { librarySession } from "./library-session.ts";
import { type Notebook, type NotebookCell, readNotebook } from "./notebook.ts";
import { outline } from "./outline.ts";
import { localFiles } from "./record/local-files.ts";
import { writeWhole } from "./record/write.ts";
import { failureText, outputText, shownPath, summaryText, unusedText } from "./run-words.ts";
import type { Session } from "./session.ts";

/** Where the runner's lines go; each text ends with a line break. */
export interface Terminal {
  out(text: string): void;
  err(text: string): void;
}

export interface RunOptions {
  readonly files: readonly string[];
  /** Folder for the packages, made if need be. */
  readonly out: string;
  /** Givens set from outside: symbol -> measure as text. */
  readonly overrides: ReadonlyMap<string, string>;
  readonly terminal: Terminal;
  /** Loads the library; asked for once, after the type check has been started. */
  readonly library: () => Promise<Library>;
  /** Absolute declaration file of the library, when it is not where it is usually found. */
  readonly types?: string;
  readonly versions: Readonly<Record<string, string>>;
  /** Takes each record, complete or not, in place of a package being written to `out`. */
  readonly deliver?: (record: CalculationRecord) => void;
  /** Adds to a complete record before it is written. */
  readonly enrich?: (record: CalculationRecord, path: string) => Promise<CalculationRecord>;
  /** A checker kept by the caller for runs of one notebook. */
  readonly checker?: Checker;
}

/** How a notebook came out. */
export type RunState = "complete" | "incomplete" | "failed";

/** How long a cell may take before the runner says that it is still at it, and between two such lines. */
const PATIENCE_ms = 3000;

const line = (text: string): string => `${text}\n`;

function checkNames(notebooks: readonly Notebook[], out: string): void {
  const seen = new Map<string, string>();
  for (const { name, path } of notebooks) {
    const other = seen.get(name.toLowerCase());
    if (other !== undefined) {
      throw new Error(
        `${other} and ${path} would both be written to ${join(out, `${name}.html`)}; run them one by one with another --out`,
      );
    }
    seen.set(name.toLowerCase(), path);
  }
}

/** The head of a notebook that failed before it opened its sheet. */
function unopenedHead(title: string): Head {
  const unknown = "not reached";
  return { title, job: unknown, preparedBy: unknown, basis: unknown, units: "kN, m", status: "incomplete" };
}

const packageFiles = (out: string, name: string): { good: string; incomplete: string } => ({
  good: join(out, `${name}.html`),
  incomplete: join(out, `${name}.INCOMPLETE.html`),
});

class NotebookRun {
  readonly #options: RunOptions;
  readonly #notebook: Notebook;
  readonly #session: Session;
  readonly #library: Promise<Library>;
  #stray: CellFailure | undefined;

  constructor(options: RunOptions, notebook: Notebook, library: () => Promise<Library>) {
    this.#options = options;
    this.#notebook = notebook;
    const { overrides, types, terminal, checker } = options;
    const { session, library: loading } = librarySession({
      folder: notebook.folder,
      notebook: notebook.fileName,
      overrides,
      library,
      ...(types === undefined ? {} : { types }),
      ...(checker ? { checker } : {}),
      unseen: true,
      onOutput: (event) => {
        if (event.kind === "stray") this.#stray ??= event.failure;
        else terminal.out(outputText(event).replace(/^(?=.)/gm, "      | "));
      },
    });
    this.#session = session;
    this.#library = loading;
    this.#session.foresee(this.#codeCells().map(({ source }) => source));
  }

  #codeCells(): NotebookCell[] {
    return this.#notebook.cells.filter(({ kind }) => kind === "code");
  }

  /** Run every cell; answers the failure that stopped it, if one did. */
  async #cells(): Promise<CellFailure | undefined> {
    const cells = this.#codeCells();
    const words = outline(this.#notebook.cells);
    const width = String(this.#notebook.cells.length).length;
    for (const { number, id, source } of cells) {
      this.#options.terminal.out(line(`  cell ${String(number).padStart(width)}  ${words.get(id) ?? ""}`));
      const result = await this.#patiently(number, () =>
        this.#session.execute(source, { cell: { number, id } }),
      );
      if (result.status === "error") return result.error;
    }
    await nextTurn();
    return this.#stray;
  }

  async #patiently<T>(cell: number, work: () => Promise<T>): Promise<T> {
    let waited = 0;
    const timer = setInterval(() => {
      waited += PATIENCE_ms / 1000;
      this.#options.terminal.out(line(`      … cell ${cell} has been running for ${waited} s`));
    }, PATIENCE_ms);
    try {
      return await work();
    } finally {
      clearInterval(timer);
    }
  }

  async run(): Promise<RunState> {
    this.#options.terminal.out(line(this.#notebook.fileName));
    try {
      const library = await this.#library;
      library.forgetLedger();
      try {
        const failure = await this.#cells();
        return failure ? await this.#incomplete(library, failure) : await this.#complete(library);
      } finally {
        library.attachHost();
        library.forgetLedger();
      }
    } finally {
      await this.#session.close();
    }
  }

  #record(ledger: OpenLedger, failure?: CellFailure): CalculationRecord {
    const { cells, fileName, source } = this.#notebook;
    const reached = failure?.cell ?? Number.POSITIVE_INFINITY;
    for (const { kind, number, id, source: markdown } of cells)
      if (kind === "markdown" && number <= reached) ledger.text({ number, id }, markdown);
    const files = localFiles(this.#notebook);
    const record = ledger.record({
      complete: failure === undefined,
      notebook: { name: fileName, source },
      versions: this.#options.versions,
      ...(failure
        ? {
            failure: {
              cell: failure.cell,
              message: failure.message,
              excerpt: failure.excerpt,
              ...(failure.line === undefined ? {} : { line: failure.line }),
            },
          }
        : {}),
    });
    return files.length === 0 ? record : Object.freeze({ ...record, files });
  }

  async #write(library: Library, file: string, record: CalculationRecord): Promise<void> {
    await writeWhole(file, await library.renderPackage(record));
  }

  async #incomplete(library: Library, failure: CellFailure): Promise<RunState> {
    const { terminal, out } = this.#options;
    const { incomplete } = packageFiles(out, this.#notebook.name);
    terminal.err(failureText(this.#notebook, failure));
    const ledger = library.currentLedger() ?? library.openLedger(unopenedHead(this.#notebook.name));
    const record = this.#record(ledger, failure);
    if (this.#options.deliver) {
      this.#options.deliver(record);
      return "incomplete";
    }
    await this.#write(library, incomplete, record);
    terminal.err(line(`INCOMPLETE: what was calculated before is in ${shownPath(incomplete)}`));
    return "incomplete";
  }

  async #complete(library: Library): Promise<RunState> {
    const { terminal, out } = this.#options;
    const { good, incomplete } = packageFiles(out, this.#notebook.name);
    const ledger = library.currentLedger();
    if (!ledger) {
      terminal.err(line(`${this.#notebook.fileName}: no package, the notebook opens no sheet (openSheet)`));
      return "failed";
    }
    const record = this.#record(ledger);
    const unused = ledger.unusedOverrides();
    if (unused.length > 0) {
      terminal.err(line(unusedText(this.#notebook.fileName, unused, record.entries)));
      return "failed";
    }
    if (this.#options.deliver) {
      this.#options.deliver(record);
      return "complete";
    }
    const full = (await this.#options.enrich?.(record, this.#notebook.path)) ?? record;
    await this.#write(library, good, full);
    await rm(incomplete, { force: true });
    terminal.out(summaryText(full, library.promptsLeft(full), good));
    return "complete";
  }
}

/** Run notebooks, each in a session of its own. Answers how each came out; throws before anything runs when a file
 *  cannot be read or two would be written to the same place. */
export async function runNotebooks(options: RunOptions): Promise<readonly RunState[]> {
  const { files, out, terminal } = options;
  const notebooks = files.map(readNotebook);
  checkNames(notebooks, out);
  let loading: Promise<Library> | undefined;
  const library = (): Promise<Library> => {
    loading ??= options.library();
    return loading;
  };
  const states: RunState[] = [];
  for (const notebook of notebooks) states.push(await new NotebookRun(options, notebook, library).run());
  if (states.length > 1) {
    const done = states.filter((state) => state === "complete").length;
    terminal.out(line(`${states.length} notebooks: ${done} complete, ${states.length - done} not`));
    for (const [index, state] of states.entries())
      if (state !== "complete") terminal.out(line(`  ${state}: ${notebooks[index]?.fileName ?? ""}`));
  }
  return states;
}
