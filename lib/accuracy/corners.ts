// The corners of the unknowns: every one at its least or its most. A corner is a number with a bit per unknown, 1 at its most.

import { type Trial, tryOut } from "./trial.ts";
import type { Unknown } from "./unknowns.ts";

/** Up to so many unknowns all corners are solved. */
export const allCornersUpTo = 10;
/** Of more, so many at most. */
const most = 4096;

export interface CornerResults {
  /** Per result. */
  readonly least: Float64Array;
  readonly greatest: Float64Array;
  readonly solved: number;
}

/** Least and greatest results over all corners; with more than ten unknowns over those found by going, for each result, from the
 *  corner its trend over the samples points to, by turning one unknown at a time, until no turn brings it further. `drawn` holds the
 *  unknowns sample by sample, `found` the results result by result. */
export function cornerResults(
  trial: Trial,
  wanted: number,
  drawn: Float64Array,
  found: Float64Array,
  samples: number,
): CornerResults {
  const count = trial.unknowns.length;
  const tried = cornerTrials(trial, wanted);
  if (count <= allCornersUpTo) for (let i = 0; i < 2 ** count; i++) tried.solve(BigInt(i));
  else {
    for (const corner of byTrend(drawn, found, count, samples)) tried.solve(corner);
    climb(tried, count);
  }
  return { least: tried.least, greatest: tried.greatest, solved: tried.seen.size };
}

/** Corners tried so far, and the best of them per result. */
interface CornerTrials {
  readonly seen: Set<bigint>;
  readonly least: Float64Array;
  readonly greatest: Float64Array;
  readonly at: bigint[];
  solve(corner: bigint): void;
}

function cornerTrials({ unknowns, ...trial }: Trial, wanted: number): CornerTrials {
  const seen = new Set<bigint>();
  const least = new Float64Array(wanted).fill(Number.POSITIVE_INFINITY);
  const greatest = new Float64Array(wanted).fill(Number.NEGATIVE_INFINITY);
  const at = new Array<bigint>(2 * wanted).fill(0n);
  const values = new Float64Array(unknowns.length);
  const out = new Float64Array(wanted);
  const solve = (corner: bigint): void => {
    if (seen.has(corner) || seen.size >= most) return;
    seen.add(corner);
    setCorner(unknowns, corner, values);
    tryOut({ unknowns, ...trial }, values, out);
    out.forEach((value, k) => {
      if (value < (least[k] ?? 0)) [least[k], at[2 * k]] = [value, corner];
      if (value > (greatest[k] ?? 0)) [greatest[k], at[2 * k + 1]] = [value, corner];
    });
  };
  return { seen, least, greatest, at, solve };
}

/** Tries the neighbours of every best corner until none is better. */
function climb({ at, solve }: CornerTrials, count: number): void {
  const climbed = new Set<bigint>();
  for (;;) {
    const next = [...new Set(at)].filter((corner) => !climbed.has(corner));
    if (next.length === 0) return;
    for (const corner of next) {
      climbed.add(corner);
      for (let k = 0; k < count; k++) solve(corner ^ (1n << BigInt(k)));
    }
  }
}

function byTrend(
  drawn: Float64Array,
  found: Float64Array,
  count: number,
  samples: number,
): ReadonlySet<bigint> {
  const corners = new Set<bigint>();
  const full = (1n << BigInt(count)) - 1n;
  for (let begin = 0; begin < found.length; begin += samples) {
    let corner = 0n;
    for (let k = 0; k < count; k++)
      if (covariance(drawn, k, count, found.subarray(begin, begin + samples)) > 0) corner |= 1n << BigInt(k);
    corners.add(corner).add(full ^ corner);
  }
  return corners;
}

function covariance(drawn: Float64Array, k: number, count: number, y: Float64Array): number {
  let [sum, x, z] = [0, 0, 0];
  for (let s = 0; s < y.length; s++) {
    const [a, b] = [drawn[s * count + k] ?? 0, y[s] ?? 0];
    x += a;
    z += b;
    sum += a * b;
  }
  return sum - (x * z) / y.length;
}

function setCorner(unknowns: readonly Unknown[], corner: bigint, values: Float64Array): void {
  unknowns.forEach(({ least, most: top }, k) => {
    values[k] = (corner >> BigInt(k)) & 1n ? top : least;
  });
}
