// The band of every hand result, for the frame in hand, in one question.

import type { HandValue } from "./asked.ts";
import type { Band } from "./band.ts";
import type { NominalGroup } from "./nominal.ts";
import { type SampledQuestion, sampled } from "./sampled.ts";
import type { Unknown } from "./unknowns.ts";

export interface BandQuestion extends SampledQuestion {
  readonly values: readonly HandValue[];
}

export interface Bands {
  /** In the order of the values. */
  readonly bands: readonly Band[];
  readonly unknowns: readonly Unknown[];
  readonly nominal: readonly NominalGroup[];
  readonly samples: number;
  readonly seed: number;
  /** Samples that take every unknown at an end of its range. */
  readonly atEnds: number;
  /** Corners of the unknowns solved, and whether these are all there are. */
  readonly corners: number;
  readonly allCorners: boolean;
  /** What was varied, in one sentence, for the assumption on the sheet. */
  readonly words: string;
}

/** The band of every hand value. The interval comes from the samples, least and greatest from samples and corners.
 *  Throws on a value that is no result of the frame, on bad unknowns, and on a frame that can move freely. */
export function bands({ values, ...question }: BandQuestion): Bands {
  const found = sampled(question);
  const { unknowns, nominal, samples, seed, atEnds, allCorners, words } = found;
  return Object.freeze({
    ...found.answer(values),
    unknowns,
    nominal,
    samples,
    seed,
    atEnds,
    allCorners,
    words,
  });
}
