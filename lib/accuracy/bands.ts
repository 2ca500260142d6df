// The band of every hand result, for the frame in hand: what is not known is drawn many times, each frame solved exactly, and
// the spread of true against hand reported. It judges; it never supplies a hand number.

import { uniformFloat64 } from "pure-rand/distribution/uniformFloat64";
import { xoroshiro128plus } from "pure-rand/generator/xoroshiro128plus";
import type { Imposed, Load, Structure } from "../structure/types.ts";
import { type Band, bandOf } from "./band.ts";
import { allCornersUpTo, cornerResults } from "./corners.ts";
import { AccuracyError } from "./faults.ts";
import { type NominalGroup, nominalGroups } from "./nominal.ts";
import { nominalValues, type Trial, trialOf, tryOut } from "./trial.ts";
import { defaultUnknowns, type Unknown, type Unknowns, valueAtPart } from "./unknowns.ts";
import { type Scale, scaleOf, type Wanted, wordsFor } from "./wanted.ts";
import { unknownWords } from "./words.ts";

/** A hand result: which, of which load case (counted from 0), and its value in N or N·m. */
export interface HandValue {
  readonly wanted: Wanted;
  readonly value: number;
  readonly loadCase?: number;
}

export interface BandQuestion {
  /** The frame itself, without the hinges of the hand method; every member with its nominal section or ratios. */
  readonly structure: Structure;
  /** Load cases (or combinations of loads, factored). */
  readonly cases: readonly (readonly (Load | Imposed)[])[];
  readonly values: readonly HandValue[];
  /** Otherwise `defaultUnknowns`. */
  readonly unknowns?: Unknowns;
  readonly samples?: number;
  readonly seed?: number;
}

export interface Bands {
  /** In the order of the values. */
  readonly bands: readonly Band[];
  readonly unknowns: readonly Unknown[];
  readonly nominal: readonly NominalGroup[];
  readonly samples: number;
  readonly seed: number;
  /** Corners of the unknowns solved besides, and whether these are all there are. */
  readonly corners: number;
  readonly allCorners: boolean;
  /** What was varied, in one sentence, for the assumption on the sheet. */
  readonly words: string;
}

const fewest = 39; // 90 % between the order statistics of ranks 2 and 38

/** The band of every hand value. The interval comes from the samples, least and greatest from samples and corners.
 *  Throws on a value that is no result of the frame, on bad unknowns, and on a frame that can move freely. */
export function bands(question: BandQuestion): Bands {
  const { structure, cases, values, samples = 500, seed = 1 } = question;
  if (!Number.isInteger(samples) || samples < fewest)
    throw new AccuracyError({ kind: "too few", samples, least: fewest });
  for (const { wanted, value } of values)
    if (!Number.isFinite(value))
      throw new AccuracyError({ kind: "bad value", what: wordsFor(wanted), value });
  const trial = trialOf(structure, cases, values, question.unknowns ?? defaultUnknowns(structure));
  const { unknowns } = trial;
  const scales = nominalScales(trial, values);
  const drawn = draw(unknowns, samples, seed);
  const found = solveAll(trial, drawn, samples, values.length);
  const allCorners = unknowns.length <= allCornersUpTo;
  const corners = cornerResults(trial, values.length, drawn, found, samples);
  const each = values.map((hand, k) =>
    bandOf(
      hand,
      found.slice(k * samples, (k + 1) * samples),
      [corners.least[k] ?? Number.NaN, corners.greatest[k] ?? Number.NaN],
      scales[scaleOf(hand.wanted)],
    ),
  );
  return Object.freeze({
    bands: Object.freeze(each),
    unknowns,
    nominal: nominalGroups(structure),
    samples,
    seed,
    corners: corners.solved,
    allCorners,
    words: unknownWords(unknowns, samples, allCorners),
  });
}

/** Values of the unknowns, sample by sample, each by its own law. */
function draw(unknowns: readonly Unknown[], samples: number, seed: number): Float64Array {
  const random = xoroshiro128plus(seed);
  const drawn = new Float64Array(unknowns.length * samples);
  for (let i = 0; i < drawn.length; i++)
    drawn[i] = valueAtPart(unknowns[i % unknowns.length] as Unknown, uniformFloat64(random));
  return drawn;
}

/** Results, result by result, of all samples. */
function solveAll(trial: Trial, drawn: Float64Array, samples: number, wanted: number): Float64Array {
  const count = trial.unknowns.length;
  const found = new Float64Array(samples * wanted);
  const values = new Float64Array(count);
  for (let s = 0; s < samples; s++) {
    for (let k = 0; k < count; k++) values[k] = drawn[s * count + k] as number;
    tryOut(trial, values, found, s, samples);
  }
  return found;
}

/** The largest N, V and M at member ends with nominal stiffnesses, or by hand: what a value is small against. */
function nominalScales(trial: Trial, values: readonly HandValue[]): Readonly<Record<Scale, number>> {
  tryOut(trial, nominalValues(trial.unknowns), new Float64Array(values.length));
  const scales: Record<Scale, number> = { N: 0, V: 0, M: 0 };
  const grow = (scale: Scale, value: number): void => {
    scales[scale] = Math.max(scales[scale], Math.abs(value));
  };
  for (const ends of trial.ends)
    for (let i = 0; i < ends.length; i++) grow(kinds[i % 3] ?? "M", ends[i] ?? 0);
  for (const { wanted, value } of values) grow(scaleOf(wanted), value);
  return scales;
}

const kinds = ["N", "V", "M"] as const;
