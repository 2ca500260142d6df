// From end moments to hinges and back, for any load on a span.

import { add, crossings, type Piecewise, piecewise, valueAt } from "../results/index.ts";
import type { EndMoments } from "./end-moments.ts";
import { NetError } from "./net-faults.ts";
import { type Span, simpleMoments } from "./span.ts";

/** Moments along a span between given end moments, N·m. */
export function momentsWithEnds(span: Span, { left, right }: EndMoments): Piecewise {
  return add(simpleMoments(span), piecewise([0, span.length], [[left, (right - left) / span.length]]));
}

/** Places where the moment of a span with given end moments changes sign, m from the left end, ascending. */
export function hingesFromEndMoments(span: Span, ends: EndMoments): readonly number[] {
  return crossings(momentsWithEnds(span, ends));
}

/** End moments of a span whose moment is zero, or `moments` in N·m, at two different places, m from its left end; an end free to
 *  turn is a place:
 *    M0(x) + M_A (1 - x/L) + M_B x/L = 0 at both. */
export function endMomentsFromHinges(
  span: Span,
  first: number,
  second: number,
  moments: readonly [atFirst: number, atSecond: number] = [0, 0],
): EndMoments {
  const L = span.length;
  if (!(first >= 0 && second <= L && first < second))
    throw new NetError({ kind: "places", first, second, length: L });
  const M0 = simpleMoments(span);
  const [p, q] = [valueAt(M0, first) - moments[0], valueAt(M0, second) - moments[1]];
  const slope = (p - q) / (second - first); // of the closing line, which is -p and -q at the places
  const left = -p - slope * first;
  return Object.freeze({ left: left + 0, right: left + slope * L + 0 });
}
