// Runs notebooks from start to end without Jupyter and leaves a calculation package for each.
import { mkdir, rm } from "node:fs/promises";
import { join, relative } from "node:path";
import writeFileAtomic from "write-file-atomic";
import type { CalculationRecord, Entry } from "../lib/sheet/index.ts";
import type { CellFailure } from "./failure.ts";
import { type Library, libraryTypes, type OpenLedger } from "./library.ts";
import { type Notebook, type NotebookCell, readNotebook } from "./notebook.ts";
import { outline } from "./outline.ts";
import { Session } from "./session.ts";

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
}

/** How a notebook came out. */
export type RunState = "complete" | "incomplete" | "failed";

const UNIT_OF_WAIT = 3000;

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
    let loaded: Library | undefined;
    // The compiler's process is started before the library is loaded, so that they start side by side.
    const asked = new Promise<void>((go) => setImmediate(go));
    this.#library = asked.then(library);
    this.#library.then(
      (ready) => {
        loaded = ready;
      },
      () => undefined,
    );
    const { overrides, types = libraryTypes(), terminal } = options;
    this.#session = new Session({
      folder: notebook.folder,
      modules: { hingebook: this.#library.then(({ module }) => module) },
      libraryTypes: types,
      unitsOf: this.#library.then(({ unitsOf }) => unitsOf),
      beforeCell: (cell) => loaded?.attachHost({ cell, overrides, notebook: notebook.fileName }),
      afterCell: (cell) => loaded?.currentLedger()?.endCell(cell.id),
      onOutput: (event) => {
        if (event.kind === "stray") this.#stray ??= event.failure;
        else terminal.out(event.text.replace(/^(?=.)/gm, "      | "));
      },
    });
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
    await new Promise((turn) => setImmediate(turn));
    return this.#stray;
  }

  async #patiently<T>(cell: number, work: () => Promise<T>): Promise<T> {
    let waited = 0;
    const timer = setInterval(() => {
      waited += UNIT_OF_WAIT / 1000;
      this.#options.terminal.out(line(`      … cell ${cell} has been running for ${waited} s`));
    }, UNIT_OF_WAIT);
    try {
      return await work();
    } finally {
      clearInterval(timer);
    }
  }

  async run(): Promise<RunState> {
    const { terminal } = this.#options;
    terminal.out(line(this.#notebook.fileName));
    const library = await this.#library;
    library.forgetLedger();
    try {
      const failure = await this.#cells();
      return failure ? await this.#incomplete(library, failure) : await this.#complete(library);
    } finally {
      await this.#session.close();
      library.attachHost();
      library.forgetLedger();
    }
  }

  #record(ledger: OpenLedger, failure?: CellFailure): CalculationRecord {
    const { cells, fileName, source } = this.#notebook;
    const reached = failure?.cell ?? Number.POSITIVE_INFINITY;
    for (const { kind, number, id, source: markdown } of cells)
      if (kind === "markdown" && number <= reached) ledger.text({ number, id }, markdown);
    return ledger.record({
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
  }

  async #write(library: Library, file: string, record: CalculationRecord): Promise<void> {
    await mkdir(this.#options.out, { recursive: true });
    await writeFileAtomic(file, await library.renderPackage(record));
  }

  async #incomplete(library: Library, failure: CellFailure): Promise<RunState> {
    const { terminal, out } = this.#options;
    const { incomplete } = packageFiles(out, this.#notebook.name);
    terminal.err(failureText(this.#notebook, failure));
    const ledger = library.currentLedger();
    if (!ledger) {
      terminal.err(line("No package was written: the calculation had not been opened yet."));
      return "failed";
    }
    await this.#write(library, incomplete, this.#record(ledger, failure));
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
    await this.#write(library, good, record);
    await rm(incomplete, { force: true });
    terminal.out(summaryText(record, good));
    return "complete";
  }
}

function shownPath(path: string): string {
  const near = relative(process.cwd(), path);
  return near.startsWith("..") ? path : near;
}

/** What a failed cell says: notebook, cell, line, message, and the engineer's own code around it. */
export function failureText({ fileName, cells }: Notebook, failure: CellFailure): string {
  const { cell, line: row, column, name, message, excerpt, traceback } = failure;
  const code = cells.filter(({ kind, number }) => kind === "code" && number <= cell).length;
  const where = [`${fileName}, cell ${cell} (code cell ${code})`];
  if (row !== undefined) where.push(`line ${row}`, `column ${column}`);
  const further = traceback.slice(1).filter((text) => text.trim() !== "");
  return [`${where.join(", ")}: ${name}`, message, ...(excerpt === "" ? [] : ["", excerpt]), ...further, ""]
    .map(line)
    .join("");
}

function unusedText(fileName: string, unused: readonly string[], entries: readonly Entry[]): string {
  const givens = entries.flatMap((entry) => (entry.kind === "given" ? [entry.symbol] : []));
  const what = unused.map((symbol) => `"${symbol}"`).join(", ");
  return `${fileName}: --set ${what} was not used; the givens are ${givens.join(", ") || "none"}. No package was written.`;
}

function summaryText({ head, entries }: CalculationRecord, file: string): string {
  const checks = entries.filter((entry) => entry.kind === "check");
  const failed = checks.filter((entry) => !entry.passed);
  const lines = [`  ${head.title}: ${head.status}`];
  for (const entry of entries)
    if (entry.kind === "result" && entry.governing)
      lines.push(`    ${entry.symbol} = ${entry.value.text}  ${entry.description}`);
  if (checks.length > 0)
    lines.push(`    checks: ${checks.length - failed.length} of ${checks.length} satisfied`);
  for (const { formula, description } of failed) lines.push(`    NOT SATISFIED: ${formula}  ${description}`);
  lines.push(`  package: ${shownPath(file)}`);
  return lines.map(line).join("");
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
