// Where a piecewise polynomial is zero. Roots are isolated, not sampled: between two neighbouring roots of the derivative
// (found first, the same way) a polynomial is monotonic and has one root or none.

import { derivative, jumps, magnitude } from "./calculus.ts";
import { domain, horner, valueAt } from "./piecewise.ts";
import type { Piecewise } from "./types.ts";

const small = 1e-12;

/** Where f is zero: single points, and stretches on which it is zero throughout. Ascending. A jump across zero is no root (see `crossings`). */
export interface Zeros {
  readonly points: readonly number[];
  readonly stretches: readonly (readonly [number, number])[];
}

/** All zeros of f; a value below 1e-12 of the function's magnitude counts as zero. */
export function zeros(f: Piecewise): Zeros {
  const tolerance = small * magnitude(f);
  const [a, b] = domain(f);
  const stretches: [number, number][] = [];
  const found: number[] = [];
  f.pieces.forEach((piece, i) => {
    const [left, right] = [f.breaks[i] ?? 0, f.breaks[i + 1] ?? 0];
    if (isZero(piece, right - left, tolerance)) {
      const last = stretches[stretches.length - 1];
      if (last !== undefined && last[1] === left) last[1] = right;
      else stretches.push([left, right]);
    } else for (const t of polynomialRoots(piece, right - left, tolerance)) found.push(left + t);
  });
  const apart = 1e-9 * (b - a);
  const points = found
    .sort((x, y) => x - y)
    .filter((x, i) => i === 0 || x - (found[i - 1] ?? x) > apart)
    .filter((x) => !stretches.some(([from, to]) => x >= from - apart && x <= to + apart));
  return { points, stretches };
}

/** The isolated zeros of f, ascending. */
export function roots(f: Piecewise): readonly number[] {
  return zeros(f).points;
}

/** The places inside the interval where f changes sign, through zero or by a jump, ascending; touching zero does not count.
 *  A stretch of zero between opposite signs counts once, at its middle. */
export function crossings(f: Piecewise): readonly number[] {
  const [a, b] = domain(f);
  const { points, stretches } = zeros(f);
  const places = [...points, ...stretches.map(([x, y]) => (x + y) / 2), ...jumps(f).map((j) => j.x)];
  const inside = places.filter((x) => x > a && x < b).sort((x, y) => x - y);
  const marks = [a, ...inside, b];
  return inside.filter((x, i) => {
    const stretch = stretches.find(([from, to]) => x > from && x < to);
    const [before, after] = stretch ?? [x, x];
    const left = signBetween(f, Math.min(marks[i] ?? a, before), before);
    const right = signBetween(f, after, Math.max(marks[i + 2] ?? b, after));
    return left * right < 0;
  });
}

function signBetween(f: Piecewise, from: number, to: number): number {
  return Math.sign(valueAt(f, (from + to) / 2));
}

function isZero(piece: readonly number[], width: number, tolerance: number): boolean {
  return piece.reduce((total, c, k) => total + Math.abs(c) * width ** k, 0) <= tolerance;
}

/** Roots of a polynomial in [0, width], ascending; a value within the tolerance counts as zero (so touching roots are found). */
export function polynomialRoots(
  coefficients: readonly number[],
  width: number,
  tolerance = 0,
): readonly number[] {
  const unit = coefficients.map((c, k) => c * width ** k);
  return unitRoots(unit, tolerance).map((t) => t * width);
}

/** Roots in [0, 1]: split at the roots of the derivative, then halve each stretch that changes sign. */
function unitRoots(p: readonly number[], tolerance: number): number[] {
  const size = p.reduce((total, c) => total + Math.abs(c), 0);
  const zero = Math.max(tolerance, 1e-15 * size);
  const degree = effectiveDegree(p, 1e-15 * size);
  if (degree < 1) return [];
  const slope = p.slice(1, degree + 1).map((c, k) => c * (k + 1));
  const turns = unitRoots(slope, 0).filter((t) => t > 0 && t < 1);
  const stops = [0, ...turns, 1];
  const found: number[] = [];
  stops.forEach((t, i) => {
    const value = horner(p, t);
    if (Math.abs(value) <= zero) found.push(t);
    const next = stops[i + 1];
    if (next === undefined) return;
    const other = horner(p, next);
    if (Math.abs(value) > zero && Math.abs(other) > zero && value * other < 0)
      found.push(bisected(p, t, next));
  });
  return found.filter((t, i) => i === 0 || t - (found[i - 1] ?? 0) > 1e-12);
}

function effectiveDegree(p: readonly number[], negligible: number): number {
  let degree = p.length - 1;
  while (degree > 0 && Math.abs(p[degree] ?? 0) <= negligible) degree -= 1;
  return degree;
}

/** The root between two points of opposite sign, to the last bit: bisection cannot fail and 60 halvings are cheap. */
function bisected(p: readonly number[], from: number, to: number): number {
  let [low, high] = [from, to];
  const rising = horner(p, low) < 0;
  for (let i = 0; i < 60; i++) {
    const middle = (low + high) / 2;
    if (middle <= low || middle >= high) break;
    if (horner(p, middle) < 0 === rising) low = middle;
    else high = middle;
  }
  return (low + high) / 2;
}

/** Places inside the interval where f turns: its derivative changes sign. */
export function turningPoints(f: Piecewise): readonly number[] {
  return crossings(derivative(f));
}
