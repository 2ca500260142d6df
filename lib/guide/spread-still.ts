// What does not move a result to speak of.

import type { SpreadRow } from "./spread.ts";
import { and } from "./words.ts";

/** A move by less than this share of a result may not show in three figures, whatever its unit; a greater one always does. */
const still = 0.005;

/** Whether a result hardly moves throughout a range. */
export function isStill({ least, chosen, greatest }: SpreadRow): boolean {
  const values = [least.si, chosen.si, greatest.si];
  return Math.max(...values) - Math.min(...values) <= still * Math.max(...values.map(Math.abs));
}

/** "moved by less than 0.5 %: N_A by any; M_B by A of columns and A of beam"; "" where every cause moves every result. */
export function stillWords(rows: readonly SpreadRow[]): string {
  const results = [...new Set(rows.map(({ result }) => result))];
  const words = results
    .flatMap((result) => {
      const own = rows.filter((row) => row.result === result);
      const still = own.filter(isStill).map(({ cause }) => cause);
      if (still.length === 0) return [];
      return [`${result} by ${still.length === own.length ? "any" : and(still)}`];
    })
    .join("; ");
  return words === "" ? "" : `moved by less than ${100 * still} %: ${words}`;
}
