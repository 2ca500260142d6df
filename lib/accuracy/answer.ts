// Answers from solved samples: results are read from what was kept of each frame. Only corners that a result is followed to are
// solved besides, when there are too many for all, and frames too large to be kept once more per question.

import type { HandValue, WantedInCase } from "./asked.ts";
import { type Band, bandOf } from "./band.ts";
import { climbed, looksFor, towards } from "./corners.ts";
import type { Draws } from "./draws.ts";
import { AccuracyError } from "./faults.ts";
import { type Group, groupsOf, largestForces, type PieceStore, readGroups } from "./groups.ts";
import { cornerStates, statesOf } from "./states.ts";
import { atCorner, freeOf } from "./unknowns.ts";
import { nominalValues, solveVaried, type Varied } from "./varied.ts";
import { scaleOf, wordsFor } from "./wanted.ts";

/** A frame solved at all samples and at nominal stiffnesses. */
export interface SolvedFrames {
  readonly varied: Varied;
  readonly draws: Draws;
  readonly states: ReturnType<typeof statesOf>;
  readonly cornerStates: ReturnType<typeof cornerStates>;
  /** States at nominal stiffnesses. */
  readonly nominal: Float64Array;
  readonly room: Float64Array;
  readonly pieces: PieceStore;
  readonly scales: Map<string, ReturnType<typeof largestForces>>;
}

/** Solves a frame at the values drawn. */
export function solvedOf(varied: Varied, draws: Draws): SolvedFrames {
  const { unknowns, size, prepared } = varied;
  const free = freeOf(unknowns);
  const nominal = new Float64Array(size * prepared.cases.length);
  solveVaried(varied, nominalValues(unknowns), nominal);
  return {
    varied,
    draws,
    states: statesOf(varied, draws.values, draws.rows),
    cornerStates: cornerStates(varied, (corner) => atCorner(unknowns, free, corner)),
    nominal,
    room: new Float64Array(size),
    pieces: new Map(),
    scales: new Map(),
  };
}

/** The bands of hand values, and how many corners were solved for them. Throws on a value that is no number or no result of the frame. */
export function answered(
  solved: SolvedFrames,
  values: readonly HandValue[],
): { readonly bands: readonly Band[]; readonly corners: number } {
  for (const { wanted, value } of values)
    if (!Number.isFinite(value))
      throw new AccuracyError({ kind: "bad value", what: wordsFor(wanted), value });
  const { varied, draws, states, room, pieces } = solved;
  const groups = groupsOf(varied, values, pieces);
  const found = new Float64Array(draws.rows * values.length);
  for (let row = 0; row < draws.rows; row++)
    readGroups(groups, varied.size, states.array, states.begin(row), room, found, row, draws.rows);
  const nominal = nominalTruths(solved, values, groups);
  const seen = new Set<bigint>();
  const bands = new Array<Band>(values.length);
  for (const { combination, readings, places } of groups) {
    const scales = scalesOf(solved, combination);
    places.forEach((k, i) => {
      const hand = values[k] as HandValue; // places are those of values
      const rows = found.subarray(k * draws.rows, (k + 1) * draws.rows);
      const [reading] = readings.slice(i, i + 1);
      const alone: Group = { combination, readings: reading === undefined ? [] : [reading], places: [0] };
      bands[k] = bandOf(
        hand,
        picked(rows, draws.rowOf),
        extremesOf(solved, alone, rows, seen),
        nominal[k] ?? Number.NaN,
        scales[scaleOf(hand.wanted)],
      );
    });
  }
  return {
    bands: Object.freeze(bands),
    corners: draws.allCorners ? draws.corners : new Set([...seen, ...draws.drawn]).size,
  };
}

/** The values of a list of rows. A plain loop: this runs for every result of every sample. */
function picked(rows: Float64Array, rowOf: ArrayLike<number>): Float64Array {
  const found = new Float64Array(rowOf.length);
  for (let i = 0; i < found.length; i++) found[i] = rows[rowOf[i] as number] as number; // rowOf holds rows
  return found;
}

/** Least and greatest of a result over all frames solved, and over the corners it is followed to where not all are among them. */
function extremesOf(
  { varied, draws, cornerStates: statesAt, room }: SolvedFrames,
  group: Group,
  rows: Float64Array,
  seen: Set<bigint>,
): readonly [least: number, greatest: number] {
  let [least, greatest] = [Number.POSITIVE_INFINITY, Number.NEGATIVE_INFINITY];
  for (const value of rows) {
    least = Math.min(least, value);
    greatest = Math.max(greatest, value);
  }
  if (draws.allCorners) return [least, greatest];
  const free = freeOf(varied.unknowns);
  const out = new Float64Array(1);
  const valueAt = (corner: bigint): number => {
    seen.add(corner);
    readGroups([group], varied.size, statesAt(corner), 0, room, out);
    return out[0] ?? Number.NaN;
  };
  const followed = { valueAt, unknowns: free.length, looks: looksFor(varied.size) };
  const top = towards(draws.values, varied.unknowns.length, free, rows, draws.rowOf);
  const bottom = ((1n << BigInt(free.length)) - 1n) ^ top;
  // from where the trend points to, and from the best corner drawn
  const starts = (trend: bigint, sense: 1 | -1): readonly bigint[] => [
    trend,
    draws.drawn[bestRow(rows, draws.corners, sense)] ?? trend,
  ];
  const lows = starts(bottom, -1).map((start) => climbed(followed, start, -1));
  const highs = starts(top, 1).map((start) => climbed(followed, start, 1));
  return [Math.min(least, ...lows), Math.max(greatest, ...highs)];
}

function bestRow(rows: Float64Array, corners: number, sense: 1 | -1): number {
  let best = 0;
  for (let row = 1; row < corners; row++) if (sense * ((rows[row] ?? 0) - (rows[best] ?? 0)) > 0) best = row;
  return best;
}

/** True values with nominal stiffnesses. */
export function nominalTruths(
  { varied, nominal, room, pieces }: SolvedFrames,
  wanted: readonly WantedInCase[],
  groups: readonly Group[] = groupsOf(varied, wanted, pieces),
): Float64Array {
  const out = new Float64Array(wanted.length);
  readGroups(groups, varied.size, nominal, 0, room, out);
  return out;
}

function scalesOf(
  { varied, nominal, room, pieces, scales }: SolvedFrames,
  combination: Group["combination"],
): ReturnType<typeof largestForces> {
  const found = scales.get(combination.key) ?? largestForces(varied, combination, nominal, room, pieces);
  scales.set(combination.key, found);
  return found;
}
