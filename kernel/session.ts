// One notebook being run: a context of its own, its checker, its modules. The headless runner and the Jupyter kernel
// drive the same class, so that their outputs are the same.
import { setImmediate as nextTurn } from "node:timers/promises";
import { types } from "node:util";
import { createChecker, type UnitsOf } from "./check/index.ts";
import { display, type MimeBundle } from "./display.ts";
import { startEngine } from "./engine.ts";
import type { Evaluator, Outcome } from "./evaluate.ts";
import { type CellFailure, checkFailure, syntaxFailure, thrownFailure } from "./failure.ts";
import { ownFolder as hingebookFolder } from "./folders.ts";
import { Foresight } from "./foresight.ts";
import { cellGlobals } from "./globals.ts";
import { completedPart } from "./history.ts";
import type { Position } from "./position.ts";
import { type Rewritten, rewriteCell, SyntaxRefusal } from "./rewrite/index.ts";
import { nextCellScript, Scripts } from "./scripts.ts";

/** A cell: its place in the notebook (from 1) and an id that survives editing. */
export interface CellName {
  readonly number: number;
  readonly id: string;
}

/** What a cell prints while it runs, and what is thrown outside any cell (in a timer, in a promise nobody awaits). */
export type OutputEvent =
  | { readonly kind: "stream"; readonly name: "stdout" | "stderr"; readonly text: string }
  | { readonly kind: "stray"; readonly failure: CellFailure };

export type CellResult =
  | { readonly status: "ok"; readonly value?: unknown; readonly display?: MimeBundle }
  | { readonly status: "error"; readonly error: CellFailure };

export interface SessionOptions {
  /** Where the notebook lies: relative imports and packages are looked for from here. */
  readonly folder: string;
  /** Modules handed to cells as they are, e.g. the kernel's own library under "hingebook"; or promises of them. */
  readonly modules?: Readonly<Record<string, object>>;
  /** Absolute declaration file of "hingebook", for the type checker. */
  readonly libraryTypes?: string;
  /** Units by dimension, for the checker's words; or a promise of them. */
  readonly unitsOf?: UnitsOf | Promise<UnitsOf>;
  readonly onOutput?: (event: OutputEvent) => void;
  /** Called before a cell's code runs, after its check, and once it has ended, well or not. */
  readonly beforeCell?: (cell: CellName) => void;
  readonly afterCell?: (cell: CellName) => void;
  /** Whether cells are type-checked before they run; true unless said otherwise. */
  readonly check?: boolean;
  /** Folder whose packages serve notebooks that have none of their own; hingebook's folder unless said otherwise. */
  readonly ownFolder?: string;
}

export class Session {
  readonly #options: SessionOptions;
  readonly #scripts = new Scripts();
  readonly #foresight: Foresight;
  readonly #strays: unknown[] = [];
  readonly #clearTimers: () => void;
  readonly #globals: Record<string, unknown>;
  #engine: Promise<Evaluator> | undefined;
  #queue: Promise<unknown> = Promise.resolve();
  #shown: unknown;
  #running: CellName = { number: 0, id: "" };
  #busy = false;
  #thrown: { readonly value: unknown; readonly stack: string | undefined } | undefined;

  constructor(options: SessionOptions) {
    this.#options = options;
    const { folder, libraryTypes, unitsOf, ownFolder = hingebookFolder(), check = true } = options;
    const paths = libraryTypes === undefined ? {} : { hingebook: libraryTypes };
    const about = { folder, ownFolder, paths, ...(unitsOf ? { unitsOf } : {}) };
    this.#foresight = new Foresight(check ? createChecker(about) : undefined);
    const hooks = {
      write: (name: "stdout" | "stderr", text: string) => this.#emit({ kind: "stream", name, text }),
      stray: (thrown: unknown) => this.#stray(thrown),
    };
    ({ globals: this.#globals, clearTimers: this.#clearTimers } = cellGlobals(hooks));
    process.on("unhandledRejection", this.#rejected);
  }

  #emit(event: OutputEvent): void {
    this.#options.onOutput?.(event);
  }

  readonly #rejected = (reason: unknown): void => {
    const stack = (reason as { stack?: unknown } | null)?.stack;
    const ours = this.#busy || (typeof stack === "string" && this.#scripts.frames(stack).length > 0);
    if (!ours) throw reason;
    this.#stray(reason);
  };

  /** Something thrown where no cell waits for it: it fails the cell that is running, or is reported by itself. */
  #stray(thrown: unknown): void {
    if (this.#busy) {
      this.#strays.push(thrown);
      return;
    }
    const { number } = this.#running;
    const failure = thrownFailure(thrown, { cell: number, source: "", script: "", scripts: this.#scripts });
    this.#emit({ kind: "stray", failure });
  }

  #open(): Promise<Evaluator> {
    this.#engine ??= this.#start();
    return this.#engine;
  }

  #start(): Promise<Evaluator> {
    const { folder, modules: given = {}, ownFolder = hingebookFolder() } = this.#options;
    return startEngine({
      folder,
      ownFolder,
      given,
      globals: this.#globals,
      scripts: this.#scripts,
      show: (value) => {
        this.#shown = value;
      },
      onThrow: (value) => {
        const stackless = typeof value !== "object" || value === null || !("stack" in value);
        this.#thrown = stackless ? { value, stack: new Error("thrown here").stack } : undefined;
      },
    });
  }

  /** Say which cells are going to be run, in order: they are checked together, while the rest is still starting. */
  foresee(cells: readonly string[]): void {
    this.#foresight.foresee(cells);
  }

  /** Run one cell, after those asked for before it. Never throws for what the cell does: that is its result. */
  execute(code: string, { cell }: { readonly cell: CellName }): Promise<CellResult> {
    const result = this.#queue.then(() => this.#execute(code, cell));
    this.#queue = result.catch(() => undefined);
    return result;
  }

  async #execute(code: string, cell: CellName): Promise<CellResult> {
    const refused = await this.#refused(code, cell);
    if (refused) return { status: "error", error: refused };
    let rewritten: Rewritten;
    try {
      rewritten = rewriteCell(code);
    } catch (error) {
      if (!(error instanceof SyntaxRefusal)) throw error;
      return { status: "error", error: syntaxFailure(error, cell.number, code) };
    }
    const evaluator = await this.#open();
    return this.#run(evaluator, code, rewritten, cell);
  }

  async #run(
    evaluator: Evaluator,
    code: string,
    { code: text, locate }: Rewritten,
    cell: CellName,
  ): Promise<CellResult> {
    const script = nextCellScript();
    this.#scripts.add(script, { source: code, cell: cell.number, locate });
    this.#running = cell;
    this.#shown = undefined;
    this.#thrown = undefined;
    this.#busy = true;
    try {
      this.#options.beforeCell?.(cell);
      const outcome = await this.#settled(await evaluator.run(text, script));
      if (outcome.ok) {
        const value = this.#shown;
        const shown = await display(value);
        this.#foresight.history.add(cell.id, code);
        return Object.freeze({ status: "ok" as const, value, ...(shown ? { display: shown } : {}) });
      }
      return this.#failed(outcome.thrown, code, cell, script, outcome.at);
    } catch (thrown) {
      return this.#failed(thrown, code, cell, script, undefined);
    } finally {
      this.#busy = false;
      this.#strays.length = 0;
      this.#options.afterCell?.(cell);
    }
  }

  #failed(
    thrown: unknown,
    code: string,
    cell: CellName,
    script: string,
    at: Position | undefined,
  ): CellResult {
    const stack = this.#thrown?.value === thrown ? this.#thrown?.stack : undefined;
    const error = thrownFailure(thrown, {
      cell: cell.number,
      source: code,
      script,
      scripts: this.#scripts,
      at,
      stack,
    });
    const { line, column } = error;
    const place = line !== undefined && column !== undefined ? { line, column } : undefined;
    const done = completedPart(code, place);
    if (done !== "") this.#foresight.history.add(cell.id, done);
    return Object.freeze({ status: "error" as const, error });
  }

  /** The outcome once a promise shown last has settled and what the cell left behind had its turn to fail. */
  async #settled(outcome: Outcome): Promise<Outcome> {
    let result = outcome;
    if (result.ok && types.isPromise(this.#shown)) {
      try {
        this.#shown = await this.#shown;
      } catch (thrown) {
        result = { ok: false, thrown };
      }
    }
    await nextTurn();
    if (result.ok && this.#strays.length > 0) result = { ok: false, thrown: this.#strays[0] };
    return result;
  }

  async #refused(code: string, cell: CellName): Promise<CellFailure | undefined> {
    const found = await this.#foresight.found(code);
    const [first, ...rest] = found;
    return first ? checkFailure([first, ...rest], cell.number, code) : undefined;
  }

  /** End it: timers stop, the checker's process ends, the context is let go. */
  async close(): Promise<void> {
    process.off("unhandledRejection", this.#rejected);
    this.#clearTimers();
    await this.#foresight.close();
    const engine = await this.#engine;
    engine?.close();
  }
}
