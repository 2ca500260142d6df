// Which frames are tried: values of the unknowns, drawn by the printed law.
//
// The law: with a chance of `endShare` a frame takes every unknown at one end or the other of its range, both ends equally likely and each
// unknown by itself (a corner of the ranges); otherwise it takes every unknown anywhere within its range, by the unknown's own law.
//
// The corners are in it for the engineer whose unknowns happen to lie at the ends. An interval that leaves out at most a tenth of all frames
// leaves out at most 0.1 / endShare of the corners, here a seventh: should all true values lie at ends of their ranges, it still holds in 6 of 7
// cases. Drawn inside the ranges alone it would hold in less than half of them.

import { uniformFloat64 } from "pure-rand/distribution/uniformFloat64";
import { xoroshiro128plus } from "pure-rand/generator/xoroshiro128plus";
import { atCorner, freeOf, type Unknown, valueAtPart } from "./unknowns.ts";

/** Share of the frames that take every unknown at an end. */
export const endShare = 0.7;
/** Up to so many unknowns all corners are solved. */
export const allCornersUpTo = 10;

export interface Draws {
  /** Frames to be solved, `unknowns.length` values each; all corners, or those that were drawn, come first. */
  readonly values: Float64Array;
  readonly rows: number;
  readonly corners: number;
  /** The corners among the samples, a bit per unknown that has a range, 1 at its most. */
  readonly drawn: readonly bigint[];
  readonly allCorners: boolean;
  /** The row of each sample: corners that are drawn again are solved once. */
  readonly rowOf: Int32Array;
  /** Samples that are corners. */
  readonly atEnds: number;
}

/** Draws samples by the law, the same for the same seed. They are spread evenly: corners are used up before one comes again, opposite
 *  ones together, and inside the ranges each unknown takes one value in every one of as many equal parts as there are samples. */
export function drawsOf(unknowns: readonly Unknown[], samples: number, seed: number): Draws {
  const generator = xoroshiro128plus(seed);
  const random = (): number => uniformFloat64(generator);
  const free = freeOf(unknowns);
  const atEnds = free.length === 0 ? samples : Math.round(endShare * samples);
  const drawn = cornersDrawn(free.length, atEnds, random);
  const allCorners = free.length <= allCornersUpTo;
  const corners = allCorners ? Array.from({ length: 2 ** free.length }, (_, i) => BigInt(i)) : drawn;
  const rows = corners.length + samples - atEnds;
  const values = new Float64Array(rows * unknowns.length);
  corners.forEach((corner, row) => {
    values.set(atCorner(unknowns, free, corner), row * unknowns.length);
  });
  drawInside(unknowns, values.subarray(corners.length * unknowns.length), random);
  const rowOf = Int32Array.from({ length: samples }, (_, s) => {
    if (s >= atEnds) return corners.length + s - atEnds;
    return allCorners ? Number(drawn[s]) : s;
  });
  return { values, rows, corners: corners.length, drawn, allCorners, rowOf, atEnds };
}

type Random = () => number;

/** So many corners of so many unknowns: a bit per unknown, 1 at its most. */
function cornersDrawn(free: number, count: number, random: Random): readonly bigint[] {
  const full = (1n << BigInt(free)) - 1n;
  const drawn: bigint[] = [];
  while (drawn.length < count)
    for (const corner of cycle(free, random)) drawn.push(corner, ...(full === 0n ? [] : [full ^ corner]));
  return drawn.slice(0, count);
}

/** Every pair of opposite corners once, by one of the two, in any order; of many unknowns a single one. */
function cycle(free: number, random: Random): readonly bigint[] {
  if (free === 0) return [0n];
  if (free > allCornersUpTo) {
    let corner = 0n;
    for (let k = 0; k < free; k++) corner = (corner << 1n) | (random() < 0.5 ? 1n : 0n);
    return [corner];
  }
  const pairs = Array.from({ length: 2 ** (free - 1) }, (_, i) => BigInt(i));
  shuffle(pairs, random);
  const full = (1n << BigInt(free)) - 1n;
  return pairs.map((corner) => (random() < 0.5 ? corner : full ^ corner));
}

function drawInside(unknowns: readonly Unknown[], into: Float64Array, random: Random): void {
  const count = into.length / Math.max(unknowns.length, 1);
  const parts = Array.from({ length: count }, (_, i) => i);
  unknowns.forEach((unknown, k) => {
    shuffle(parts, random);
    parts.forEach((part, row) => {
      into[row * unknowns.length + k] = valueAtPart(unknown, (part + random()) / count);
    });
  });
}

function shuffle<T>(list: T[], random: Random): void {
  for (let i = list.length - 1; i > 0; i--) {
    const j = Math.floor(random() * (i + 1));
    [list[i], list[j]] = [list[j] as T, list[i] as T]; // both are within the length
  }
}
