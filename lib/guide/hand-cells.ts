// Cells of tables that show hand results, each with its band.

import { type Quantity, quantity } from "../quantity/index.ts";
import { shownValue, type TableCell } from "../sheet/index.ts";
import type { BandBook } from "./band-book.ts";
import { largestOf } from "./largest.ts";
import { originOf } from "./origin.ts";

/** One cell: a value, printed with the sheet's figures or as `text` says; nothing where there is no value. */
export interface CellOf {
  readonly value: Quantity | undefined;
  readonly text?: string | undefined;
}

/** A hand result that is nought beside the largest of its kind, but for the last binary digits, as nought. */
function withoutRounding(value: Quantity): Quantity {
  const known = originOf(value);
  if (known === undefined || value.si === 0) return value;
  const kind = value.dimension === "moment" ? "M" : "force";
  const largest = largestOf(known.origin.hand.members, kind) * Math.abs(known.factor);
  return Math.abs(value.si) <= 1e-9 * largest ? quantity(0, value.dimension, value) : value;
}

/** Values as cells of a table, those that are hand results with their bands; empty where there is none. */
export function handCells(bands: BandBook, cells: readonly CellOf[]): readonly TableCell[] {
  const found = bands.of(cells.flatMap(({ value }) => value ?? []));
  let next = 0;
  return cells.map(({ value, text }): TableCell => {
    if (value === undefined) return "";
    const shown = shownValue(withoutRounding(value));
    const band = found[next++];
    return {
      value: text === undefined ? shown : { ...shown, text },
      uses: value.from,
      ...(band === undefined ? {} : { band }),
    };
  });
}
