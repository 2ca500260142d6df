// Which findings of the type checker belong to a cell that is about to run.
import type { CellDiagnostic, Checker } from "./check/index.ts";
import { History } from "./history.ts";

/** The checker of a session, with the cells that have run and those that are going to. */
export class Foresight {
  readonly history: History = new History();
  readonly #checker: Checker | undefined;
  #foreseen:
    | { readonly cells: readonly string[]; readonly found: Promise<readonly CellDiagnostic[]> }
    | undefined;

  constructor(checker: Checker | undefined) {
    this.#checker = checker;
  }

  /** Check cells that are going to run, in order, together. */
  foresee(cells: readonly string[]): void {
    if (!this.#checker) return;
    const found = this.#checker.check(cells);
    found.catch(() => undefined); // whoever asks for a cell's findings sees it
    this.#foreseen = { cells: [...cells], found };
  }

  /** What is wrong with a cell, run after those that have run: as foreseen, or else checked now. */
  async found(code: string): Promise<readonly CellDiagnostic[]> {
    if (!this.#checker) return [];
    const before = this.history.sources;
    const foreseen = this.#foreseen;
    const asForeseen =
      foreseen?.cells[before.length] === code &&
      before.every((source, index) => foreseen.cells[index] === source);
    const found = asForeseen ? await foreseen.found : await this.#checker.check([...before, code]);
    return found.filter(({ index }) => index === before.length);
  }

  async close(): Promise<void> {
    await this.#checker?.close();
  }
}
