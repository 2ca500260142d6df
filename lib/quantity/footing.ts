// A printed column must foot: the printed parts add up to the printed total.

import type { Dimension } from "./dimension.ts";
import { shownIn } from "./display-units.ts";
import { wrongSum } from "./errors.ts";
import { attach, decimals, printFixed, shownUnit } from "./print.ts";
import type { Quantity } from "./quantity.ts";

export interface Footing {
  readonly parts: readonly string[];
  readonly total: string;
  /** Decimals all of them are printed with. */
  readonly decimals: number;
}

/** Values printed with one number of decimals, each rounded to the nearest, and the total of what is printed: equal
 *  values look equal, the column adds up, and the total is off by at most half a last unit for each part.
 *  `figures` are those of the largest value. All values need one dimension and are shown in the unit of the first. */
export function footing<D extends Dimension>(values: readonly Quantity<D>[], figures?: number): Footing {
  const first = values[0];
  if (first === undefined) throw new Error("footing: there is no value to add up");
  for (const value of values)
    if (value.dimension !== first.dimension) throw new Error(wrongSum("add", first, value));
  const { unit, factor } = shownUnit(first);
  const numbers = values.map((value) => value.si / factor);
  const places = decimals(Math.max(...numbers.map(Math.abs)), figures ?? shownIn().figures);
  const scale = 10 ** places;
  // The last binary digits go first, so that 0.125 kN computed as 0.12499999999999999 rounds as it would on paper.
  const parts = numbers.map((number) => Math.round(Number((number * scale).toPrecision(14))));
  const print = (lastUnits: number): string => attach(printFixed(lastUnits / scale, places), unit);
  return Object.freeze({
    parts: Object.freeze(parts.map(print)),
    total: print(parts.reduce((total, part) => total + part, 0)),
    decimals: places,
  });
}
