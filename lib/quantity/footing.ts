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
 *  values look equal, the column adds up, and the total is off by at most half a last unit for each part. Where the values
 *  add up to nought the total is printed so, and those nearest to the next figure are printed with that, as few as it takes.
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
  const exact = numbers.map((number) => Number((number * scale).toPrecision(14)));
  const rounded = exact.map((number) => Math.round(number) + 0);
  const parts = isNought(numbers) ? closed(exact, rounded) : rounded;
  const print = (lastUnits: number): string => attach(printFixed(lastUnits / scale, places), unit);
  return Object.freeze({
    parts: Object.freeze(parts.map(print)),
    total: print(parts.reduce((total, part) => total + part, 0)),
    decimals: places,
  });
}

/** Whether values cancel but for the last binary digits. */
function isNought(numbers: readonly number[]): boolean {
  const sum = numbers.reduce((total, number) => total + number, 0);
  return Math.abs(sum) <= 1e-9 * Math.max(...numbers.map(Math.abs));
}

/** Whole numbers moved by one, where that costs least, until they add up to nought; equal values together where that can be. */
function closed(exact: readonly number[], rounded: readonly number[]): readonly number[] {
  const parts = [...rounded];
  const over = (): number => parts.reduce((total, part) => total + part, 0);
  const step = -Math.sign(over());
  const cost = (i: number): number => Math.abs((parts[i] ?? 0) + step - (exact[i] ?? 0));
  const alike = (i: number): readonly number[] =>
    parts.flatMap((part, k) =>
      part === parts[i] && Math.abs((exact[k] ?? 0) - (exact[i] ?? 0)) < 1e-6 ? [k] : [],
    );
  const order = parts.map((_, i) => i).sort((a, b) => cost(a) - cost(b));
  for (const together of [true, false])
    for (const i of order) {
      const group = together ? alike(i) : [i];
      if (parts[i] !== rounded[i] || group.length > Math.abs(over())) continue;
      for (const k of group) parts[k] = (parts[k] ?? 0) + step;
    }
  return parts;
}
