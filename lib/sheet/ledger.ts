// The ledger of one calculation: givens, assumptions, calculations, checks and results, each under a stable name,
// with what it stands on. One ledger is open at a time.

import type {
  AnyMeasure,
  AnyUnit,
  Dimension,
  DimensionOf,
  DimensionOfUnit,
  Quantity,
} from "../quantity/index.ts";
import type { Draft, Unique } from "./draft.ts";
import type { CellRef } from "./host.ts";
import type { AssumptionEntry, CalculationRecord, Entry, Failure, Head, ResultBand } from "./record.ts";

/** The outcome of a check; `utilisation` is 1 at the limit and absent where the limit is not positive. */
export interface CheckResult {
  readonly passed: boolean;
  readonly utilisation?: number;
}

/** The dimension a calculation's result has for the unit asked; "" asks for a pure number. */
export type DimensionAsked<U extends AnyUnit | ""> = U extends AnyUnit ? DimensionOfUnit<U> : "pure number";

export interface Ledger {
  readonly head: Head;
  /** Significant figures results are printed with. */
  readonly figures: number;
  /** A value taken from elsewhere; `from` says where: "drawing S-102 rev B". */
  given<const M extends AnyMeasure>(
    symbol: string,
    measure: M,
    description?: string,
    options?: { readonly from?: string },
  ): Quantity<DimensionOf<M>>;
  /** A value the engineer assumes, and why: assume("r_I", 2.5, "two similar roofs"). */
  assume<const M extends AnyMeasure>(symbol: string, measure: M, because: string): Quantity<DimensionOf<M>>;
  /** Something the engineer assumes, and why: assume("bases are pinned", { because: "single bolt pair" }). */
  assume(text: string, reason: { readonly because: string }): AssumptionEntry;
  /** A value worked out from symbols of this sheet: calc("M_0 = w*L^2/8", "kN m", "moment of the simple span").
   *  The unit is the result's, "" for a pure number. */
  calc<const U extends AnyUnit | "">(
    formula: string,
    unit: U,
    description?: string,
  ): Quantity<DimensionAsked<U>>;
  /** Two sides compared: check("delta <= L/360", "deflection"). */
  check(comparison: string, description?: string): CheckResult;
  /** A number taken from an analysis; it becomes a symbol, and a governing one stands on the cover. A hand result brings its
   *  band with it. */
  result<D extends Dimension>(
    symbol: string,
    value: Quantity<D>,
    description?: string,
    options?: { readonly governing?: boolean; readonly band?: ResultBand },
  ): Quantity<D>;
  note(text: string): Entry;
  conclude(text: string): Entry;
  /** A question to be settled by the engineer or the checker. */
  query(text: string, uses?: readonly string[]): Entry;
  /** What was left out of consideration, a sentence each; the cover names it before the usual ones. No line of the calculation:
   *  a cell run again replaces its own. */
  notConsidered(...sentences: readonly string[]): readonly string[];
  /** The text of a text cell. */
  text(cell: CellRef, markdown: string): Entry;
  /** Stores an entry another room made; adds its version and cell. Answers with the entry stored, whose id has a
   *  number added when the one asked for was taken; a `unique` one is refused then, as a symbol is. */
  put(draft: Draft, unique?: Unique): Entry;
  /** The value of a symbol; throws on an unknown one, naming the nearest. */
  lookup(symbol: string): Quantity;
  entry(id: string): Entry | undefined;
  /** All entries in the order of the cells. */
  entries(): readonly Entry[];
  /** Drops what earlier runs of a cell recorded and its last run did not. */
  endCell(cellId: string): void;
  /** A value the notebook wrote, or the one set from outside under this name; `written` is how the notebook says it. A value that may
   *  be set as a part of a span, "0.2 L", says that span. */
  setFromOutside<D extends Dimension>(
    name: string,
    value: Quantity<D>,
    written: string,
    span?: Quantity<D>,
  ): Quantity<D>;
  /** Symbols set from outside that no given or assumption has taken up. */
  unusedOverrides(): readonly string[];
  record(about: {
    readonly complete: boolean;
    readonly failure?: Failure;
    readonly notebook: { readonly name: string; readonly source: string };
    readonly versions: Readonly<Record<string, string>>;
  }): CalculationRecord;
}
