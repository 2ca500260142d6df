// A quantity as the record keeps it: SI, dimension, unit and printed text.

import { printValue, printWritten, type Quantity, shownUnit } from "../quantity/index.ts";
import type { ShownValue } from "./record.ts";

/** A result as shown, with the sheet's figures. */
export function shownValue(quantity: Quantity): ShownValue {
  return shown(quantity, printValue(quantity));
}

/** A value as the engineer wrote it, no figure dropped. */
export function shownAsWritten(quantity: Quantity): ShownValue {
  return shown(quantity, printWritten(quantity));
}

/** A value taken over into the sheet: one with a few figures as written, a computed one with the sheet's figures. */
export function shownGiven(quantity: Quantity): ShownValue {
  const size = Math.abs(quantity.si / shownUnit(quantity).factor);
  const few = size === 0 || Math.abs(Number(size.toPrecision(6)) - size) <= 1e-12 * size;
  return few ? shownAsWritten(quantity) : shownValue(quantity);
}

function shown(quantity: Quantity, text: string): ShownValue {
  const { si, dimension } = quantity;
  return Object.freeze({ si, dimension, unit: shownUnit(quantity).unit, text });
}
