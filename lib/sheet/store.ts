// The entries of a ledger: their versions, the cells that made them, their order, and whether they are out of date.

import { type Draft, frozen, substance, symbolOf, type Unique } from "./draft.ts";
import { type CellRef, type Host, host } from "./host.ts";
import type { Entry } from "./record.ts";
import { bandUses } from "./values.ts";

interface Stored {
  readonly draft: Draft;
  readonly version: number;
  readonly cell: CellRef | undefined;
  readonly order: number;
}

interface Past {
  readonly version: number;
  readonly substance: string;
}

export class EntryStore {
  readonly #stored = new Map<string, Stored>();
  // Outlives an entry that is dropped, so that a version is never given to two values.
  readonly #past = new Map<string, Past>();
  // Whether each entry is out of date, as of the last change; emptied when an entry changes that others may use.
  readonly #old = new Map<string, boolean>();
  // Ids that entries use and that are not there.
  readonly #missing = new Set<string>();
  readonly #numbers = new Map<string, number>();
  #made = new Set<string>();
  #host: Host | undefined;
  #order = 0;

  /** Stores an entry made by the running cell and answers with it. A symbol must not belong to another cell;
   *  the id of any other entry gets a number when it is taken. */
  put(draft: Draft, at: CellRef | undefined = host().cell): Entry {
    this.#newRun(at);
    const kept: Draft = frozen({ ...draft, id: this.#freeId(draft, at) });
    const now = substance(kept);
    const before = this.#past.get(kept.id);
    const version = before === undefined ? 1 : before.substance === now ? before.version : before.version + 1;
    this.#past.set(kept.id, { version, substance: now });
    if (this.#disturbs(kept, version)) this.#old.clear();
    this.#stored.set(kept.id, { draft: kept, version, cell: at, order: this.#order++ });
    this.#made.add(kept.id);
    return this.#entry(kept.id);
  }

  /** The entry of an id, if there is one. */
  get(id: string): Entry | undefined {
    return this.#stored.has(id) ? this.#entry(id) : undefined;
  }

  /** All entries in the order of the cells, then of making. */
  all(): readonly Entry[] {
    return [...this.#stored]
      .sort(([, a], [, b]) => this.#number(a.cell) - this.#number(b.cell) || a.order - b.order)
      .map(([id]) => this.#entry(id));
  }

  /** Drops the entries an earlier run of the cell made and its last run did not. */
  endCell(cellId: string): void {
    // A cell that recorded nothing this time has started no run of its own here.
    if (host().cell?.id === cellId) this.#newRun(host().cell);
    for (const [id, { cell }] of [...this.#stored]) {
      if (cell?.id === cellId && !this.#made.has(id)) this.#stored.delete(id);
    }
    this.#old.clear();
    this.#made = new Set();
    this.#host = undefined;
  }

  /** A runner attaches a new host before each cell: entries made since then are of this run. */
  #newRun(at: CellRef | undefined): void {
    if (at !== undefined) this.#numbers.set(at.id, at.number);
    if (host() === this.#host) return;
    this.#host = host();
    this.#made = new Set();
  }

  #freeId(draft: Draft, at: CellRef | undefined): string {
    const symbol = symbolOf(draft);
    if (symbol !== undefined) {
      this.refuseSecond({ called: symbol, change: "symbol" }, draft.id, at);
      return draft.id;
    }
    if (draft.kind === "text") return draft.id; // one text cell, one entry
    let id = draft.id;
    for (let n = 2; this.#taken(id, at); n++) id = `${draft.id} (${n})`;
    return id;
  }

  #taken(id: string, at: CellRef | undefined): boolean {
    const there = this.#stored.get(id);
    return there !== undefined && (this.#made.has(id) || there.cell?.id !== at?.id);
  }

  /** Throws when another cell has an entry of this id, or the running cell has made it already. */
  refuseSecond({ called, change }: Unique, id: string, at: CellRef | undefined = host().cell): void {
    this.#newRun(at);
    const there = this.#stored.get(id);
    if (there === undefined || at === undefined) return;
    if (there.cell?.id !== at.id) {
      const first =
        there.cell === undefined ? "before the first cell" : `in cell ${this.#number(there.cell)}`;
      throw new Error(
        `${called} is defined ${first} and again in cell ${at.number}; give one of them another ${change}`,
      );
    }
    if (this.#made.has(id)) {
      throw new Error(`${called} is defined twice in cell ${at.number}; give one of them another ${change}`);
    }
  }

  #number(cell: CellRef | undefined): number {
    return cell === undefined ? 0 : (this.#numbers.get(cell.id) ?? cell.number);
  }

  #entry(id: string): Entry {
    const stored = this.#stored.get(id);
    if (stored === undefined) throw new Error(`there is no entry "${id}"`);
    const { draft, version, cell } = stored;
    const outOfDate = this.#outOfDate(id) || bandUses(draft).some((use) => this.#changed(use));
    return Object.freeze({ ...draft, version, cell: this.#number(cell), outOfDate });
  }

  /** Whether storing this draft can change what is out of date among the entries stored before. */
  #disturbs(draft: Draft, version: number): boolean {
    const there = this.#stored.get(draft.id);
    if (there === undefined) return this.#missing.has(draft.id);
    return there.version !== version || there.draft.uses.join() !== draft.uses.join();
  }

  #outOfDate(id: string): boolean {
    // In the order of making nearly everything stands on what is settled already, however long the chain.
    if (this.#old.size === 0) {
      this.#missing.clear();
      for (const each of this.#stored.keys()) this.#settled(each);
    }
    return this.#settled(id);
  }

  /** Whether something an entry uses has another version now, is gone, or is itself out of date. */
  #settled(id: string): boolean {
    const answer = this.#old.get(id);
    if (answer !== undefined) return answer;
    this.#old.set(id, true); // what stands on itself never settles
    const old = (this.#stored.get(id)?.draft.uses ?? []).map((use) => this.#changed(use)).includes(true);
    this.#old.set(id, old);
    return old;
  }

  #changed(use: string): boolean {
    const { id, version } = readUse(use);
    const there = this.#stored.get(id);
    if (there === undefined) this.#missing.add(id);
    return there?.version !== version || this.#settled(id);
  }
}

/** The entry and version of a use "id@version". Throws on a text of another form. */
export function readUse(use: string): { readonly id: string; readonly version: number } {
  const match = /^(.+)@(\d+)$/s.exec(use);
  if (match?.[1] === undefined) throw new Error(`"${use}" is not an entry and its version, such as "L@1"`);
  return { id: match[1], version: Number(match[2]) };
}
