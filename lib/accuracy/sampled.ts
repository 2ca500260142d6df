// The frames that might be: what is not known is drawn many times and each frame solved exactly once; any number of hand results
// can then be held against them. It judges; it never supplies a hand number.

import type { Imposed, Load, Structure } from "../structure/types.ts";
import { answered, nominalTruths, solvedOf } from "./answer.ts";
import type { HandValue, WantedInCase } from "./asked.ts";
import type { Band } from "./band.ts";
import { drawsOf } from "./draws.ts";
import { AccuracyError } from "./faults.ts";
import { refuseImposed } from "./imposed.ts";
import { type NominalGroup, nominalGroups } from "./nominal.ts";
import { defaultUnknowns, type Unknown, type Unknowns } from "./unknowns.ts";
import { variedOf } from "./varied.ts";
import { unknownWords } from "./words.ts";

export interface SampledQuestion {
  /** The frame itself, without the hinges of the hand method; every member with its nominal section or ratios. */
  readonly structure: Structure;
  /** Load cases (or combinations of loads, factored). */
  readonly cases: readonly (readonly (Load | Imposed)[])[];
  /** Otherwise `defaultUnknowns`. */
  readonly unknowns?: Unknowns;
  readonly samples?: number;
  readonly seed?: number;
}

/** Solved samples of a frame that answer for any result. The answer for a value depends on the frame, its load and the unknowns
 *  alone, not on what else was asked before. */
export interface Sampled {
  readonly unknowns: readonly Unknown[];
  readonly nominal: readonly NominalGroup[];
  readonly samples: number;
  readonly seed: number;
  /** Samples that take every unknown at an end of its range. */
  readonly atEnds: number;
  /** Whether all corners of the unknowns are among the frames solved; otherwise they are sought for each result. */
  readonly allCorners: boolean;
  /** What was varied and by which law, in one sentence, for the assumption on the sheet. */
  readonly words: string;
  /** The bands of hand values, in their order. */
  bandsOf(values: readonly HandValue[]): readonly Band[];
  /** The bands, and how many corners were solved for them. */
  answer(values: readonly HandValue[]): { readonly bands: readonly Band[]; readonly corners: number };
  /** The true values with nominal stiffnesses (fixities in the middle of their ranges), in the order asked, N or N·m. */
  nominalOf(wanted: readonly WantedInCase[]): readonly number[];
}

const fewest = 39; // 90 % between the order statistics of ranks 2 and 38

/** Draws samples of what is not known (see draws.ts for the law), solves each for all load cases and keeps what results are read
 *  from. Throws on bad unknowns, on a member without section, and on a frame that can move freely. */
export function sampled(question: SampledQuestion): Sampled {
  const { structure, cases, samples = 500, seed = 1 } = question;
  if (!Number.isInteger(samples) || samples < fewest)
    throw new AccuracyError({ kind: "too few", samples, least: fewest });
  refuseImposed(structure, cases);
  const varied = variedOf(structure, cases, question.unknowns ?? defaultUnknowns(structure));
  const { unknowns } = varied;
  const draws = drawsOf(unknowns, samples, seed);
  const solved = solvedOf(varied, draws);
  const answer: Sampled["answer"] = (values) => answered(solved, values);
  return Object.freeze({
    unknowns,
    nominal: nominalGroups(structure),
    samples,
    seed,
    atEnds: draws.atEnds,
    allCorners: draws.allCorners,
    words: unknownWords(unknowns, samples, draws.atEnds, draws.allCorners),
    answer,
    bandsOf: (values: readonly HandValue[]) => answer(values).bands,
    nominalOf: (wanted: readonly WantedInCase[]) => Object.freeze([...nominalTruths(solved, wanted)]),
  });
}
