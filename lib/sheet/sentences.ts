// Sentences of the sheet that are no lines of the calculation, each kept by the cell that said it: a cell run again
// replaces its own.

import { type CellRef, type Host, host } from "./host.ts";

interface Said {
  readonly cell: CellRef | undefined;
  readonly run: Host;
  readonly sentences: readonly string[];
}

export class Sentences {
  readonly #byCell = new Map<string, Said>();

  /** Adds to what the running cell has said in this run. */
  add(sentences: readonly string[]): void {
    const run = host();
    const key = run.cell?.id ?? "";
    const before = this.#byCell.get(key);
    const said = before?.run === run ? before.sentences : [];
    this.#byCell.set(key, { cell: run.cell, run, sentences: [...said, ...sentences] });
  }

  /** Drops what earlier runs of a cell said and its last run did not. */
  endCell(cellId: string): void {
    const said = this.#byCell.get(cellId);
    if (said !== undefined && said.run !== host()) this.#byCell.delete(cellId);
  }

  /** All of them in the order of the cells, each once. */
  all(): readonly string[] {
    const cells = [...this.#byCell.values()].sort((a, b) => (a.cell?.number ?? 0) - (b.cell?.number ?? 0));
    return Object.freeze([...new Set(cells.flatMap(({ sentences }) => sentences))]);
  }
}
