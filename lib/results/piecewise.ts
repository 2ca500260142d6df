// Piecewise polynomials: making, evaluating, adding. x and the values may carry any unit; breaks rise strictly.

import type { Piecewise } from "./types.ts";

/** Which limit is meant where a function jumps. */
export type Side = "left" | "right";

/** A function from its breaks and, per piece, the coefficients of powers of (x - left break).
 *  Throws when breaks do not rise, when counts do not fit, or when a number is not finite. */
export function piecewise(breaks: readonly number[], pieces: readonly (readonly number[])[]): Piecewise {
  if (breaks.length < 2 || pieces.length !== breaks.length - 1)
    throw new Error(
      `a piecewise function of ${pieces.length} pieces needs ${pieces.length + 1} breaks, at least 2; it has ${breaks.length}`,
    );
  breaks.forEach((x, i) => {
    if (!Number.isFinite(x))
      throw new Error(`break ${i + 1} of a piecewise function is ${x}; a finite number is wanted`);
    if (i > 0 && !(x > (breaks[i - 1] ?? x)))
      throw new Error(`breaks of a piecewise function must rise: ${breaks[i - 1]} is followed by ${x}`);
  });
  pieces.forEach((piece, i) => {
    const bad = piece.find((c) => !Number.isFinite(c));
    if (bad !== undefined)
      throw new Error(
        `piece ${i + 1} of a piecewise function has the coefficient ${bad}; a finite number is wanted`,
      );
  });
  return Object.freeze({
    breaks: Object.freeze([...breaks]),
    pieces: Object.freeze(pieces.map((piece) => Object.freeze(trimmed(piece)))),
  });
}

/** The same value from a to b. */
export function constant(a: number, b: number, value: number): Piecewise {
  return piecewise([a, b], [[value]]);
}

/** Zero before `at`, `height` after it, on [a, b]; everywhere `height` when `at` is a, everywhere zero when it is b. */
export function stepAt(a: number, b: number, at: number, height: number): Piecewise {
  if (at <= a) return constant(a, b, height);
  return at >= b ? constant(a, b, 0) : piecewise([a, at, b], [[0], [height]]);
}

/** Linear from q1 at x1 to q2 at x2, zero outside, on [a, b]; x1 < x2 within it. */
export function ramp(a: number, b: number, x1: number, x2: number, q1: number, q2: number): Piecewise {
  const breaks = [a];
  const pieces: number[][] = [];
  if (x1 > a) {
    breaks.push(x1);
    pieces.push([0]);
  }
  breaks.push(x2);
  pieces.push([q1, (q2 - q1) / (x2 - x1)]);
  if (x2 < b) {
    breaks.push(b);
    pieces.push([0]);
  }
  return piecewise(breaks, pieces);
}

/** Value at x; where the function jumps, the limit from the right unless "left" is asked for.
 *  Throws outside the function's interval (rounding of 1e-9 of its length is let pass). */
export function valueAt(f: Piecewise, x: number, side: Side = "right"): number {
  const [a, b] = domain(f);
  if (!(x >= a - 1e-9 * (b - a) && x <= b + 1e-9 * (b - a)))
    throw new Error(`the function is known from ${a} to ${b}, not at ${x}`);
  const i = pieceAt(f, x, side);
  return horner(f.pieces[i] ?? [], x - (f.breaks[i] ?? 0));
}

/** The interval on which the function is known. */
export function domain(f: Piecewise): readonly [number, number] {
  return [f.breaks[0] ?? Number.NaN, f.breaks[f.breaks.length - 1] ?? Number.NaN];
}

/** Index of the piece that holds x; a break belongs to the piece on the side asked for. */
export function pieceAt(f: Piecewise, x: number, side: Side = "right"): number {
  const last = f.pieces.length - 1;
  for (let i = 0; i < last; i++) {
    const right = f.breaks[i + 1] ?? Number.POSITIVE_INFINITY;
    if (x < right || (x === right && side === "left")) return i;
  }
  return last;
}

/** f + g on their common interval. */
export function add(f: Piecewise, g: Piecewise): Piecewise {
  const [a, b] = domain(f);
  const [c, d] = domain(g);
  const tolerance = 1e-9 * (b - a);
  if (Math.abs(a - c) > tolerance || Math.abs(b - d) > tolerance)
    throw new Error(
      `functions on [${a}, ${b}] and [${c}, ${d}] cannot be added; give both the same interval`,
    );
  const breaks = mergedBreaks(f.breaks, g.breaks, tolerance);
  return piecewise(
    breaks,
    breaks.slice(0, -1).map((x, i) => {
      const middle = (x + (breaks[i + 1] ?? x)) / 2;
      const [p, q] = [shifted(f, middle, x), shifted(g, middle, x)];
      return Array.from({ length: Math.max(p.length, q.length) }, (_, k) => (p[k] ?? 0) + (q[k] ?? 0));
    }),
  );
}

/** Sum of all functions, which must share one interval; at least one. */
export function sum(first: Piecewise, ...others: readonly Piecewise[]): Piecewise {
  return others.reduce(add, first);
}

/** factor · f. */
export function scale(f: Piecewise, factor: number): Piecewise {
  return piecewise(
    f.breaks,
    f.pieces.map((piece) => piece.map((c) => c * factor)),
  );
}

/** f on the part [a, b] of its interval. */
export function restrict(f: Piecewise, a: number, b: number): Piecewise {
  const [first, last] = domain(f);
  const tolerance = 1e-9 * (last - first);
  if (!(b > a && a >= first - tolerance && b <= last + tolerance))
    throw new Error(`the function is known from ${first} to ${last}; it cannot be cut to [${a}, ${b}]`);
  const breaks = [a, ...f.breaks.filter((x) => x > a + tolerance && x < b - tolerance), b];
  return piecewise(
    breaks,
    breaks.slice(0, -1).map((x, i) => shifted(f, (x + (breaks[i + 1] ?? x)) / 2, x)),
  );
}

/** Polynomial at t by Horner's rule. */
export function horner(coefficients: readonly number[], t: number): number {
  let value = 0;
  for (let k = coefficients.length - 1; k >= 0; k--) value = value * t + (coefficients[k] ?? 0);
  return value;
}

/** The piece of f around `inside`, written in powers of (x - origin): Taylor shift. */
function shifted(f: Piecewise, inside: number, origin: number): number[] {
  const i = pieceAt(f, inside);
  const piece = [...(f.pieces[i] ?? [])];
  const by = origin - (f.breaks[i] ?? 0);
  if (by === 0) return piece;
  for (let done = 0; done < piece.length; done++)
    for (let k = piece.length - 2; k >= done; k--) piece[k] = (piece[k] ?? 0) + by * (piece[k + 1] ?? 0);
  return piece;
}

function mergedBreaks(one: readonly number[], other: readonly number[], tolerance: number): number[] {
  const merged: number[] = [];
  for (const x of [...one, ...other].sort((a, b) => a - b))
    if (merged.length === 0 || x - (merged[merged.length - 1] ?? x) > tolerance) merged.push(x);
  return merged;
}

function trimmed(piece: readonly number[]): number[] {
  let length = piece.length;
  while (length > 1 && piece[length - 1] === 0) length -= 1;
  return length === 0 ? [0] : piece.slice(0, length).map((c) => c + 0);
}
