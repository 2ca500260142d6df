// Greatest and least values of a piecewise polynomial, and where they are.

import { derivative } from "./calculus.ts";
import { horner, pieceAt } from "./piecewise.ts";
import { zeros } from "./roots.ts";
import type { Piecewise } from "./types.ts";

export interface Extreme {
  readonly x: number;
  readonly value: number;
}

export interface Extremes {
  readonly greatest: Extreme;
  readonly least: Extreme;
  /** The one of the two that is larger in magnitude. */
  readonly governing: Extreme;
}

/** Exact extremes over the interval: ends, breaks (both limits) and roots of the derivative are tried.
 *  Of equal values the first is taken. */
export function extremes(f: Piecewise): Extremes {
  const tried = candidates(f);
  const size = Math.max(...tried.map((e) => Math.abs(e.value)));
  const beyond = 1e-12 * size;
  const first = tried[0] ?? { x: Number.NaN, value: Number.NaN };
  const greatest = tried.reduce((best, e) => (e.value > best.value + beyond ? e : best), first);
  const least = tried.reduce((best, e) => (e.value < best.value - beyond ? e : best), first);
  const governing = Math.abs(least.value) > Math.abs(greatest.value) + beyond ? least : greatest;
  return Object.freeze({ greatest, least, governing });
}

function candidates(f: Piecewise): readonly Extreme[] {
  const inside = zeros(derivative(f)).points.map((x) => {
    const i = pieceAt(f, x);
    return { x, value: horner(f.pieces[i] ?? [], x - (f.breaks[i] ?? 0)) };
  });
  const ends = f.pieces.flatMap((piece, i) => {
    const [left, right] = [f.breaks[i] ?? 0, f.breaks[i + 1] ?? 0];
    return [
      { x: left, value: horner(piece, 0) },
      { x: right, value: horner(piece, right - left) },
    ];
  });
  return [...ends, ...inside].sort((a, b) => a.x - b.x).map((e) => Object.freeze(e));
}
