// The figure of a spread: a panel per result, a bar per cause.

import type { RangeBar, RangesFigure } from "../drawing/index.ts";
import { printValue } from "../quantity/index.ts";
import type { SpreadRow } from "./spread.ts";
import type { SpreadResult } from "./spread-results.ts";
import type { Hand } from "./types.ts";

/** Bars from the result at one end of each cause's range to that at the other. */
export function spreadFigure(
  hand: Hand,
  results: readonly SpreadResult[],
  rows: readonly SpreadRow[],
): RangesFigure {
  const spoken = results.map(({ name, value }) => {
    const own = rows.filter(({ result }) => result === name);
    const moves = own.map(
      ({ cause, least, greatest }) => `${printValue(least)} to ${printValue(greatest)} by ${cause}`,
    );
    return `${name} as chosen ${printValue(value)}: ${moves.join(", ")}`;
  });
  return {
    kind: "ranges",
    title: `How results under ${hand.name} move`,
    description: `${spoken.join("; ")}.`,
    panels: results.map(({ name, description, value }) => ({
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
