// Points of inflection of an isolated span, and the range in which they can lie.

import { crossings, magnitude, type Piecewise, valueAt } from "../results/index.ts";
import {
  checkFixity,
  endMomentsBeside,
  type Fixities,
  type KnownEnds,
  momentsBetween,
} from "./end-moments.ts";
import { InflectionError } from "./faults.ts";
import { momentsWithEnds } from "./hinged-spans.ts";
import { isLoaded, type Span } from "./span.ts";

export type End = "left" | "right";

/** Distances from one end, m, between which the point of inflection near that end lies. */
export interface Range {
  readonly least: number;
  readonly most: number;
}

/** Places inside the span where the moment changes sign, m from the left end, ascending. */
export function inflectionPoints(span: Span, fixities: Fixities): readonly number[] {
  return crossings(momentsBetween(span, fixities));
}

/** Range of the point of inflection near one end, as the fixity of that end goes from 0 to 1 and that of the far end stays as given.
 *  The moment at x changes with the near fixity in one sense as far as x = L / (1 + r_far/2), at least 2L/3 away,
 *  so the first point of inflection moves in one sense and its extremes are those at 0 and at 1. */
export function inflectionRange(span: Span, near: End, farFixity: number): Range {
  checkFixity("the far end", farFixity);
  if (!isLoaded(span)) throw new InflectionError({ kind: "unloaded" });
  const fixed = firstFrom(span, near, 1, farFixity);
  if (fixed === undefined) throw new InflectionError({ kind: "no inflection", end: `the ${near} end` });
  const free = firstFrom(span, near, 0, farFixity) ?? fixed;
  return Object.freeze({ least: Math.min(free, fixed), most: Math.max(free, fixed) });
}

/** Range of the point of inflection near one end of the isolated span, as both fixities go from 0 to 1.
 *  At fixed x the moment is monotonic in the far fixity, so 0 and 1 there give the extremes. */
export function isolatedRange(span: Span, near: End): Range {
  const [free, fixed] = [inflectionRange(span, near, 0), inflectionRange(span, near, 1)];
  return Object.freeze({ least: Math.min(free.least, fixed.least), most: Math.max(free.most, fixed.most) });
}

/** Places inside the span where the moment changes sign, with moments known at one end or both, m from the left end. */
export function inflectionPointsBeside(span: Span, known: KnownEnds, fixity: number): readonly number[] {
  return crossings(momentsWithEnds(span, endMomentsBeside(span, known, fixity)));
}

/** Range of the point of inflection near one end, with moments known at one end or both, as the fixity of the other goes from `least`
 *  to 1: at fixed x the moment is monotonic in it, so these give the extremes. Throws where a fixed end gives no point there. */
export function rangeBeside(span: Span, near: End, known: KnownEnds, least: 0 | 1): Range {
  const place = (fixity: number): number | undefined => {
    const M = momentsWithEnds(span, endMomentsBeside(span, known, fixity));
    return firstOf(M, span.length, near, known[near] !== undefined || fixity > 0);
  };
  const fixed = place(1);
  if (fixed === undefined) throw new InflectionError({ kind: "no inflection", end: `the ${near} end` });
  const free = place(least) ?? fixed;
  return Object.freeze({ least: Math.min(free, fixed), most: Math.max(free, fixed) });
}

function firstFrom(span: Span, near: End, nearFixity: number, farFixity: number): number | undefined {
  const fixities =
    near === "left" ? { left: nearFixity, right: farFixity } : { left: farFixity, right: nearFixity };
  return firstOf(momentsBetween(span, fixities), span.length, near, nearFixity > 0);
}

/** Distance from the near end to the first change of sign; zero where an end free to turn is sagging beside it;
 *  none where an end that bears a moment is not hogging. */
function firstOf(M: Piecewise, L: number, near: End, bears: boolean): number | undefined {
  const left = near === "left";
  const places = crossings(M);
  const first = left ? places[0] : places[places.length - 1];
  const distance = first === undefined ? undefined : left ? first : L - first;
  const small = 1e-9 * magnitude(M);
  if (bears) return valueAt(M, left ? 0 : L, left ? "right" : "left") < -small ? distance : undefined;
  const beside = (distance ?? L) / 2;
  return valueAt(M, left ? beside : L - beside) > small ? 0 : distance;
}
