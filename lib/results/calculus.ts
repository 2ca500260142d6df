// Integrals and derivatives of piecewise polynomials, and the places where they jump.

import { constant, domain, horner, piecewise, restrict } from "./piecewise.ts";
import type { Piecewise } from "./types.ts";

/** The continuous antiderivative that starts at `initial`. */
export function integral(f: Piecewise, initial = 0): Piecewise {
  let start = initial;
  const pieces = f.pieces.map((piece, i) => {
    const grown = [start, ...piece.map((c, k) => c / (k + 1))];
    start = horner(grown, (f.breaks[i + 1] ?? 0) - (f.breaks[i] ?? 0));
    return grown;
  });
  return piecewise(f.breaks, pieces);
}

/** The derivative piece by piece; jumps leave no trace (see `jumps`). */
export function derivative(f: Piecewise): Piecewise {
  return piecewise(
    f.breaks,
    f.pieces.map((piece) => (piece.length < 2 ? [0] : piece.slice(1).map((c, k) => c * (k + 1)))),
  );
}

/** The integral from a to b; over the whole interval when they are not given. */
export function integralOver(f: Piecewise, a?: number, b?: number): number {
  const [first, last] = domain(f);
  const [from, to] = [a ?? first, b ?? last];
  if (from === to) return 0;
  if (from > to) return -integralOver(f, to, from);
  const F = integral(restrict(f, from, to));
  const i = F.pieces.length - 1;
  return horner(F.pieces[i] ?? [], (F.breaks[i + 1] ?? 0) - (F.breaks[i] ?? 0));
}

/** f · g, piece by piece, on their common interval. */
export function product(f: Piecewise, g: Piecewise): Piecewise {
  const [a, b] = domain(f);
  const inner = [...f.breaks, ...g.breaks].sort((x, y) => x - y);
  const breaks = inner.filter((x, i) => i === 0 || x - (inner[i - 1] ?? x) > 1e-9 * (b - a));
  const pieces = breaks.slice(0, -1).map((x, i) => {
    const end = breaks[i + 1] ?? x;
    return multiplied(restrict(f, x, end).pieces[0] ?? [0], restrict(g, x, end).pieces[0] ?? [0]);
  });
  return breaks.length < 2 ? constant(a, b, 0) : piecewise(breaks, pieces);
}

/** A place where the limits from both sides differ. */
export interface Jump {
  readonly x: number;
  readonly left: number;
  readonly right: number;
}

/** The jumps of f, larger than 1e-9 of its greatest coefficient sum. */
export function jumps(f: Piecewise): readonly Jump[] {
  const tolerance = 1e-9 * magnitude(f);
  return f.breaks.slice(1, -1).flatMap((x, i) => {
    const left = horner(f.pieces[i] ?? [], x - (f.breaks[i] ?? 0));
    const right = f.pieces[i + 1]?.[0] ?? 0;
    return Math.abs(left - right) > tolerance ? [{ x, left, right }] : [];
  });
}

/** An upper bound of |f|: the largest sum of |coefficient · width^power| over the pieces. */
export function magnitude(f: Piecewise): number {
  return Math.max(
    ...f.pieces.map((piece, i) => {
      const h = (f.breaks[i + 1] ?? 0) - (f.breaks[i] ?? 0);
      return piece.reduce((total, c, k) => total + Math.abs(c) * h ** k, 0);
    }),
  );
}

function multiplied(p: readonly number[], q: readonly number[]): number[] {
  const out = new Array<number>(p.length + q.length - 1).fill(0);
  p.forEach((a, i) => {
    q.forEach((b, k) => {
      out[i + k] = (out[i + k] ?? 0) + a * b;
    });
  });
  return out;
}
