// Type-checks the cells of a notebook, in order, as one strict program.
import { readFileSync } from "node:fs";
import { basename } from "node:path";
import { positionAt } from "../position.ts";
import { parse, type Tree } from "../syntax.ts";
import { Compiler, type CompilerOptions, type Finding, type Needs } from "./compiler.ts";
import { askedFor } from "./imports.ts";
import { type Joined, join } from "./joined.ts";
import { type UnitsOf, words } from "./wording.ts";

export type { UnitsOf } from "./wording.ts";

/** What is wrong with a cell, before it runs. Line and column from 1, in the cell or in `file`. */
export interface CellDiagnostic {
  readonly kind: "syntax" | "type";
  /** Index in the list of cells that was checked. */
  readonly index: number;
  readonly line: number;
  readonly column: number;
  /** How many characters of the line it is about. */
  readonly length: number;
  /** The compiler's number, e.g. 2322; absent for text that is not TypeScript. */
  readonly code?: number;
  readonly message: string;
  /** Name of a local module the fault is in; `index` is then the first cell that leads to it. */
  readonly file?: string;
}

export interface CheckerOptions extends CompilerOptions {
  readonly unitsOf?: UnitsOf | Promise<UnitsOf>;
}

/** Checks notebooks of one folder. Close it to end the compiler's process. */
export interface Checker {
  /** Check cells in order; a cell sees those before it. Cells after one that is not TypeScript are not looked at. */
  check(cells: readonly string[]): Promise<readonly CellDiagnostic[]>;
  close(): Promise<void>;
}

function syntaxDiagnostic(tree: Tree, index: number): CellDiagnostic[] {
  return tree.faults.map(({ message, start, end }) =>
    Object.freeze({
      kind: "syntax" as const,
      index,
      ...positionAt(tree.source, start),
      length: Math.max(1, end - start),
      message,
    }),
  );
}

interface Checked {
  readonly joined: Joined;
  readonly trees: readonly Tree[];
  readonly files: ReadonlyMap<string, number>;
  readonly unitsOf: UnitsOf;
}

function diagnostic(finding: Finding, { joined, trees, files, unitsOf }: Checked): CellDiagnostic {
  const { code, text, start, end, file } = finding;
  const length = Math.max(1, end - start);
  if (file !== undefined) {
    const at = positionAt(readFileSync(file, "utf8"), start);
    const message = words(text, undefined, start, unitsOf);
    const index = files.get(file) ?? 0;
    return Object.freeze({ kind: "type", index, ...at, length, code, message, file: basename(file) });
  }
  const { index, offset } = joined.origin(start);
  const tree = trees[index];
  const at = positionAt(tree?.source ?? "", offset);
  return Object.freeze({
    kind: "type",
    index,
    ...at,
    length,
    code,
    message: words(text, tree, offset, unitsOf),
  });
}

/** Results kept for texts that may be asked about again. */
const MOST_KNOWN = 50;

class NotebookChecker implements Checker {
  readonly #options: CheckerOptions;
  readonly #compilers = new Map<string, Compiler>();
  readonly #known = new Map<string, readonly CellDiagnostic[]>();
  #trees: ReadonlyMap<string, Tree> = new Map();
  #last: Promise<unknown> = Promise.resolve();

  constructor(options: CheckerOptions) {
    this.#options = options;
  }

  check(cells: readonly string[]): Promise<readonly CellDiagnostic[]> {
    const next = this.#last.then(() => this.#check(cells));
    this.#last = next.catch(() => undefined);
    return next;
  }

  async #check(cells: readonly string[]): Promise<readonly CellDiagnostic[]> {
    const trees = this.#parsed(cells);
    const broken = trees.findIndex(({ faults }) => faults.length > 0);
    const whole = broken < 0 ? trees : trees.slice(0, broken);
    const joined = join(whole);
    const found = await this.#typed(joined, whole);
    const tree = trees[broken];
    return Object.freeze(tree ? [...found, ...syntaxDiagnostic(tree, broken)] : found);
  }

  /** Trees of the cells, those parsed for the last check used again. */
  #parsed(cells: readonly string[]): Tree[] {
    const before = this.#trees;
    this.#trees = new Map(cells.map((cell) => [cell, before.get(cell) ?? parse(cell)]));
    return cells.map((cell) => this.#trees.get(cell) ?? parse(cell));
  }

  async #typed(joined: Joined, trees: readonly Tree[]): Promise<readonly CellDiagnostic[]> {
    if (trees.length === 0) return [];
    const { needs, files } = askedFor(trees, this.#options);
    const fixed = files.size === 0;
    const known = fixed ? this.#known.get(joined.text) : undefined;
    if (known) return known;
    const findings = await this.#compiler(needs).check(joined.text, [...files.keys()]);
    if (findings.length === 0) return this.#keep(joined.text, fixed, []);
    const unitsOf = (await this.#options.unitsOf) ?? (() => []);
    const found = findings.map((finding) => diagnostic(finding, { joined, trees, files, unitsOf }));
    return this.#keep(joined.text, fixed, found);
  }

  #keep(text: string, fixed: boolean, found: readonly CellDiagnostic[]): readonly CellDiagnostic[] {
    if (!fixed) return found;
    this.#known.set(text, found);
    const [oldest] = this.#known.keys();
    if (this.#known.size > MOST_KNOWN && oldest !== undefined) this.#known.delete(oldest);
    return found;
  }

  #compiler(needs: Needs): Compiler {
    const key = JSON.stringify(needs);
    const compiler = this.#compilers.get(key) ?? new Compiler(this.#options, needs);
    this.#compilers.set(key, compiler);
    return compiler;
  }

  async close(): Promise<void> {
    await this.#last;
    for (const compiler of this.#compilers.values()) await compiler.close();
    this.#compilers.clear();
  }
}

/** A checker for notebooks in one folder. Its process starts with the first check. */
export function createChecker(options: CheckerOptions): Checker {
  return new NotebookChecker(options);
}
