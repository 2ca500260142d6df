// The contract between a calculation and whatever runs its notebook. By default nobody does, and every answer is empty.
//
// A runner attaches a host before the first cell and tells it which cell is running. The library keeps the open
// ledger here, so that the runner can read the record, and the record can name the cell each entry came from.

/** The cell being run: its place in the notebook (1-based) and an id that survives editing, when the front end has one. */
export interface CellRef {
  readonly number: number;
  readonly id: string;
}

export interface Host {
  /** The cell that is running, if a runner says so. */
  readonly cell?: CellRef;
  /** Givens overridden from outside: symbol -> measure as text, e.g. "g" -> "6 kN/m". */
  readonly overrides: ReadonlyMap<string, string>;
  /** File name of the notebook, without folders. */
  readonly notebook?: string;
}

const nobody: Host = Object.freeze({ overrides: new Map<string, string>() });
let current: Host = nobody;

/** The host now attached. */
export function host(): Host {
  return current;
}

/** Attach a host (a runner does this before each cell); call without one to detach. */
export function attachHost(next: Host = nobody): void {
  current = next;
}
