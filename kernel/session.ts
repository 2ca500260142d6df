// One notebook being run: a context of its own, its checker, its modules. The headless runner and the Jupyter kernel
// drive the same class, so that their outputs are the same.
import { setImmediate as nextTurn } from "node:timers/promises";
import { types } from "node:util";
import { type CellDisplay, cellDisplay, type DisplayEvent } from "./cell-display.ts";
import { type Checker, type CheckerOptions, createChecker, type UnitsOf } from "./check/index.ts";
import { display, isLibraryShown, type MimeBundle } from "./display.ts";
import { startEngine } from "./engine.ts";
import type { Evaluator, Outcome } from "./evaluate.ts";
import {
  type CellFailure,
  checkFailure,
  interruptedFailure,
  syntaxFailure,
  thrownFailure,
} from "./failure.ts";
import { ownFolder as hingebookFolder } from "./folders.ts";
import { Foresight } from "./foresight.ts";
import { cellGlobals } from "./globals.ts";
import { completedPart } from "./history.ts";
import { Activity, Interruption } from "./interruption.ts";
import { marked } from "./out-of-date.ts";
import type { Position } from "./position.ts";
import { type Rewritten, rewriteCell, SyntaxRefusal } from "./rewrite/index.ts";
import { nextCellScript, Scripts } from "./scripts.ts";

/** A cell: its place in the notebook (from 1) and an id that survives editing. */
export interface CellName {
  readonly number: number;
  readonly id: string;
}

/** What a cell prints and shows while it runs, and what is thrown outside any cell (in a timer, in a promise nobody
 *  awaits). */
export type OutputEvent =
  | DisplayEvent
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
  /** What a value stands on that has changed since it was worked out: it is then shown as out of date. */
  readonly changedBelow?: (value: unknown) => readonly string[];
  /** Nobody sees what cells show: what the library would draw for a display is left undrawn. A cell's own display is made
   *  all the same, since it may fail. */
  readonly unseen?: boolean;
  /** Whether cells are type-checked before they run; true unless said otherwise. */
  readonly check?: boolean;
  /** A checker kept by the caller, which outlives the session; otherwise the session makes its own. */
  readonly checker?: Checker;
  /** Told what is going on, for a thread that is to end loops. */
  readonly activity?: Activity;
  /** Folder whose packages serve notebooks that have none of their own; hingebook's folder unless said otherwise. */
  readonly ownFolder?: string;
}

/** What is known of the cell that is running. */
interface Running {
  readonly cell: CellName;
  readonly code: string;
  readonly script: string;
  shown?: unknown;
  thrown?: { readonly value: unknown; readonly stack: string | undefined };
  readonly strays: unknown[];
}

export interface ExecuteOptions {
  readonly cell: CellName;
  /** Whether later cells are checked as following this one; true unless said otherwise. */
  readonly keep?: boolean;
}

export class Session {
  readonly #options: SessionOptions;
  readonly #scripts = new Scripts();
  readonly #foresight: Foresight;
  readonly #clearTimers: (upTo?: number) => void;
  readonly #globals: Record<string, unknown>;
  readonly #activity: Activity;
  readonly #shows: CellDisplay;
  #engine: Promise<Evaluator> | undefined;
  #queue: Promise<unknown> = Promise.resolve();
  #running: Running | undefined;
  #interruption: Interruption | undefined;
  #lastCell = 0;

  constructor(options: SessionOptions) {
    this.#options = options;
    const { checker, check = true, activity = new Activity() } = options;
    this.#activity = activity;
    this.#foresight = new Foresight(check ? (checker ?? createChecker(checkerOptions(options))) : undefined);
    this.#shows = cellDisplay((event) => this.#emit(event));
    const hooks = {
      write: (name: "stdout" | "stderr", text: string) => this.#emit({ kind: "stream", name, text }),
      stray: (thrown: unknown) => this.stray(thrown),
      activity,
      shows: this.#shows.globals,
    };
    ({ globals: this.#globals, clearTimers: this.#clearTimers } = cellGlobals(hooks));
    process.on("unhandledRejection", this.#rejected);
  }

  /** Sources of the cells that have run and can still be seen, in order. */
  get sources(): readonly string[] {
    return this.#foresight.history.sources;
  }

  #emit(event: OutputEvent): void {
    this.#options.onOutput?.(event);
  }

  readonly #rejected = (reason: unknown): void => {
    const stack = (reason as { stack?: unknown } | null)?.stack;
    const ours = this.#running || (typeof stack === "string" && this.#scripts.frames(stack).length > 0);
    if (!ours) throw reason;
    this.stray(reason);
  };

  /** Something thrown where no cell waits for it: it fails the cell that is running, or is reported by itself. */
  stray(thrown: unknown): void {
    if (this.#running) {
      this.#running.strays.push(thrown);
      return;
    }
    const failure = thrownFailure(thrown, {
      cell: this.#lastCell,
      source: "",
      script: "",
      scripts: this.#scripts,
    });
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
        // A cell that was interrupted may come to its end later: what it shows then belongs to no other cell.
        const running = this.#running;
        if (running && new Error("shown here").stack?.includes(`${running.script}:`)) running.shown = value;
      },
      onThrow: (value) => {
        const stackless = typeof value !== "object" || value === null || !("stack" in value);
        if (!this.#running) return;
        if (stackless) this.#running.thrown = { value, stack: new Error("thrown here").stack };
        else delete this.#running.thrown;
      },
    });
  }

  /** Start what the first cell will need, so that it need not wait. */
  warm(): void {
    this.#open().catch(() => undefined); // the first cell reports it
  }

  /** Say which cells are going to be run, in order: they are checked together, while the rest is still starting. */
  foresee(cells: readonly string[]): void {
    this.#foresight.foresee(cells);
  }

  /** Run one cell, after those asked for before it. Never throws for what the cell does: that is its result. */
  execute(code: string, options: ExecuteOptions): Promise<CellResult> {
    const result = this.#queue.then(() => this.#interruptible(code, options));
    this.#queue = result.catch(() => undefined);
    return result;
  }

  /** Cut off the cell that is running, if one is, and stop the timers cells have started. What the cell waits for is
   *  abandoned, not undone. `run` is the run that was meant, as `Activity.run` told it then: a later one is left alone.
   *  A loop that never lets go is ended from another thread; see kernel/jupyter/lifeline.ts. */
  interrupt(run: number = this.#activity.run): void {
    this.#clearTimers(Math.abs(run));
    if (run > 0 && run === this.#activity.run) this.#interruption?.ask();
  }

  async #interruptible(code: string, options: ExecuteOptions): Promise<CellResult> {
    const interruption = new Interruption();
    this.#interruption = interruption;
    this.#activity.begin();
    try {
      const cut = interruption.asked.then(() => this.#cutOff(options.cell));
      return await Promise.race([this.#execute(code, options, interruption), cut]);
    } finally {
      this.#interruption = undefined;
      this.#activity.end();
    }
  }

  #cutOff(cell: CellName): CellResult {
    if (this.#running) {
      // The checker is to know the names the cell may have set.
      this.#foresight.history.add(cell.id, this.#running.code);
      this.#ended(this.#running);
    }
    return Object.freeze({ status: "error" as const, error: interruptedFailure(cell.number) });
  }

  async #execute(
    code: string,
    { cell, keep = true }: ExecuteOptions,
    interruption: Interruption,
  ): Promise<CellResult> {
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
    if (interruption.isAsked) return this.#cutOff(cell);
    const script = nextCellScript();
    this.#scripts.add(script, { source: code, cell: cell.number, locate: rewritten.locate });
    const running: Running = { cell, code, script, strays: [] };
    return this.#run(evaluator, rewritten.code, running, keep);
  }

  async #run(evaluator: Evaluator, text: string, running: Running, keep: boolean): Promise<CellResult> {
    const { cell, code, script } = running;
    this.#running = running;
    this.#lastCell = cell.number;
    try {
      this.#options.beforeCell?.(cell);
      this.#activity.enter();
      const outcome = await this.#settled(await evaluator.run(text, script), running);
      if (outcome.ok) {
        const forms = await this.#forms(running.shown);
        const shown = forms && marked(forms, this.#options.changedBelow?.(running.shown) ?? []);
        await this.#shows.settled();
        if (keep) this.#foresight.history.add(cell.id, code);
        return Object.freeze({
          status: "ok" as const,
          value: running.shown,
          ...(shown ? { display: shown } : {}),
        });
      }
      if (outcome.terminated) return this.#cutOff(cell);
      return this.#failed(outcome.thrown, running, outcome.at);
    } catch (thrown) {
      return this.#failed(thrown, running, undefined);
    } finally {
      this.#ended(running);
    }
  }

  async #forms(value: unknown): Promise<MimeBundle | undefined> {
    return this.#options.unseen && isLibraryShown(value) ? undefined : display(value);
  }

  /** Let go of a cell that has ended or been cut off; a second time does nothing. */
  #ended(running: Running): void {
    if (this.#running !== running) return;
    this.#running = undefined;
    this.#options.afterCell?.(running.cell);
  }

  #failed(thrown: unknown, running: Running, at: Position | undefined): CellResult {
    const { cell, code, script } = running;
    const stack = running.thrown?.value === thrown ? running.thrown?.stack : undefined;
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
    if (done !== "" && this.#running === running) this.#foresight.history.add(cell.id, done);
    return Object.freeze({ status: "error" as const, error });
  }

  /** The outcome once a promise shown last has settled and what the cell left behind had its turn to fail. */
  async #settled(outcome: Outcome, running: Running): Promise<Outcome> {
    let result = outcome;
    if (result.ok && types.isPromise(running.shown)) {
      try {
        running.shown = await running.shown;
      } catch (thrown) {
        result = { ok: false, thrown };
      }
    }
    await nextTurn();
    if (result.ok && running.strays.length > 0) result = { ok: false, thrown: running.strays[0] };
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
    if (!this.#options.checker) await this.#foresight.close();
    const engine = await this.#engine;
    engine?.close();
  }
}

/** What a checker is to know of a session's notebook. */
export function checkerOptions(options: SessionOptions): CheckerOptions {
  const { folder, libraryTypes, unitsOf, ownFolder = hingebookFolder() } = options;
  const paths = libraryTypes === undefined ? {} : { hingebook: libraryTypes };
  return { folder, ownFolder, paths, ...(unitsOf ? { unitsOf } : {}) };
}
