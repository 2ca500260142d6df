// The figure of a spread: a panel per result, a bar per cause.

import type { RangeBar, RangesFigure } from "../drawing/index.ts";
import { printValue } from "../quantity/index.ts";
import type { SpreadRow } from "./spread.ts";
import type { SpreadResult } from "./spread-results.ts";
import type { Hand } from "./types.ts";

/** Bars from the result at one end of each cause's range to that at the other; `rows` are those that move it. */
export function spreadFigure(
  hand: Hand,
  results: readonly SpreadResult[],
  rows: readonly SpreadRow[],
): RangesFigure {
  const moves = (one: SpreadResult): boolean => rows.some(({ result }) => result === one.name);
  const spoken = results.map(({ name, value }) => {
    const own = rows.filter(({ result }) => result === name);
    if (own.length === 0) return `${name} as chosen ${printValue(value)}, hardly moved`;
    const moved = own.map(
      ({ cause, least, greatest }) => `${printValue(least)} to ${printValue(greatest)} by ${cause}`,
    );
    return `${name} as chosen ${printValue(value)}: ${moved.join(", ")}`;
  });
  return {
    kind: "ranges",
    title: `How results under ${hand.name} move`,
    description: `${spoken.join("; ")}.`,
    panels: results.filter(moves).map(({ name, description, value }) => ({
      heading: description === "" ? name : `${name}, ${description}`,
      chosen: value.si,
      chosenText: `${printValue(value)} as chosen`,
      bars: rows.filter(({ result }) => result === name).map(barOf),
    })),
  };
}

function barOf({ kind, cause, range, least, greatest }: SpreadRow): RangeBar {
  const [low, high] = least.si <= greatest.si ? [least, greatest] : [greatest, least];
  return {
    kind,
    label: range === "" ? cause : `${cause}, ${range}`,
    least: least.si,
    greatest: greatest.si,
    texts: [printValue(low), printValue(high)],
  };
}
