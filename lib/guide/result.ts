// The verb `result` on a sheet: a hand result takes its band along, and is known again by its symbol.

import type { Dimension, Quantity } from "../quantity/index.ts";
import type { Ledger } from "../sheet/index.ts";
import type { BandBook } from "./band-book.ts";
import { asResultOf, originOf } from "./origin.ts";
import type { SheetState } from "./sheet-state.ts";

/** What a sheet knows of its hands. */
export interface HandBook {
  readonly state: SheetState;
  readonly bands: BandBook;
}

/** Records a result; one that comes from a hand with its band. */
export function recordResult<D extends Dimension>(
  ledger: Ledger,
  { state, bands }: HandBook,
  symbol: string,
  value: Quantity<D>,
  description: string | undefined,
  options: Parameters<Ledger["result"]>[3] = {},
): Quantity<D> {
  const known = originOf(value);
  if (known === undefined) {
    state.results.delete(symbol);
    return ledger.result(symbol, value, description, options);
  }
  const [band] = bands.of([value]);
  const kept = ledger.result(symbol, value, description, {
    ...options,
    ...(band === undefined ? {} : { band }),
  });
  state.results.set(symbol, value);
  // recorded again under another symbol it is the same result; a multiple of it is known by the value it was made from
  return known.factor === 1 ? asResultOf(kept, known.origin) : kept;
}
