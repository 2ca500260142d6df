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

/** Values and their total printed with one number of decimals so that the printed parts add up to the printed total:
 *  each part is rounded down and the missing last units go to the parts with the largest remainders.
 *  `figures` are those of the largest value. All values need one dimension and are shown in the unit of the first. */
export function footing<D extends Dimension>(values: readonly Quantity<D>[], figures?: number): Footing {
  const first = values[0];
  if (first === undefined) throw new Error("footing: there is no value to add up");
  for (const value of values)
    if (value.dimension !== first.dimension) throw new Error(wrongSum("add", first, value));
  const { unit, factor } = shownUnit(first);
  const numbers = values.map((value) => value.si / factor);
  const largest = Math.max(...numbers.map(Math.abs), Math.abs(sum(numbers)));
  const places = decimals(largest, figures ?? shownIn().figures);
  const { parts, total } = largestRemainder(numbers, 10 ** places);
  return Object.freeze({
    parts: Object.freeze(parts.map((part) => attach(printFixed(part, places), unit))),
    total: attach(printFixed(total, places), unit),
    decimals: places,
  });
}

function sum(numbers: readonly number[]): number {
  return numbers.reduce((total, number) => total + number, 0);
}

function largestRemainder(numbers: readonly number[], scale: number): { parts: number[]; total: number } {
  const scaled = numbers.map((number) => Number((number * scale).toPrecision(14)));
  const total = Math.round(Number(sum(scaled).toPrecision(14)));
  const whole = scaled.map(Math.floor);
  const order = scaled
    .map((number, index) => ({ index, remainder: number - Math.floor(number) }))
    .sort((a, b) => b.remainder - a.remainder || a.index - b.index);
  for (let left = total - sum(whole), k = 0; left > 0; left--, k++) {
    const index = order[k % order.length]?.index ?? 0;
    whole[index] = (whole[index] ?? 0) + 1;
  }
  return { parts: whole.map((part) => part / scale), total: total / scale };
}
