// The band of one hand value, from the true values of many frames.

import type { HandValue } from "./asked.ts";
import { countAbove, countBelow, holding, ranked } from "./quantiles.ts";
import { bandWords } from "./words.ts";

/** How true values lie: 90 % of them between `low` and `high` (see `holding`), `middle` has as many above as below. */
export interface Spread {
  readonly low: number;
  readonly high: number;
  readonly least: number;
  readonly greatest: number;
  readonly middle: number;
}

export interface Band {
  readonly hand: HandValue;
  /** True over hand; or true less hand, N or N·m, where the hand value is near zero. */
  readonly measure: "ratio" | "difference";
  readonly spread: Spread;
  /** The true values themselves, N or N·m. */
  readonly truth: Spread;
  /** The true value with nominal stiffnesses, N or N·m. */
  readonly nominal: number;
  /** Share of the samples between `low` and `high`, both included: 0.9, or more where few unknowns leave steps. */
  readonly holds: number;
  /** Middle of true over hand, less 1; or middle of true less hand. Above zero in size: the hand value is too small. */
  readonly bias: number;
  readonly words: string;
}

/** Parts of the frame's largest force of the kind below which a hand value counts as near zero. */
const nearZero = 0.02;
/** Share of the samples the interval holds. */
const share = 0.9;

/** The band of a hand value from true values of samples (put in order here), least and greatest of all frames solved, the value at
 *  nominal stiffness; `scale` is the largest force of its kind in the frame. */
export function bandOf(
  hand: HandValue,
  samples: Float64Array,
  [least, greatest]: readonly [least: number, greatest: number],
  nominal: number,
  scale: number,
): Band {
  samples.sort();
  const [low, high] = holding(samples, share);
  const truth: Spread = Object.freeze({ low, high, least, greatest, middle: ranked(samples, 0.5) });
  const holds = 1 - (countBelow(samples, low) + countAbove(samples, high)) / samples.length;
  const measure = Math.abs(hand.value) > nearZero * scale ? "ratio" : "difference";
  const spread = measure === "ratio" ? scaled(truth, 1 / hand.value) : moved(truth, -hand.value);
  const bias = measure === "ratio" ? spread.middle - 1 : spread.middle;
  return Object.freeze({
    hand,
    measure,
    spread,
    truth,
    nominal,
    holds,
    bias,
    words: bandWords(measure, spread),
  });
}

function scaled(s: Spread, factor: number): Spread {
  const turn = factor < 0;
  return Object.freeze({
    low: (turn ? s.high : s.low) * factor,
    high: (turn ? s.low : s.high) * factor,
    least: (turn ? s.greatest : s.least) * factor,
    greatest: (turn ? s.least : s.greatest) * factor,
    middle: s.middle * factor,
  });
}

function moved(s: Spread, by: number): Spread {
  return Object.freeze({
    low: s.low + by,
    high: s.high + by,
    least: s.least + by,
    greatest: s.greatest + by,
    middle: s.middle + by,
  });
}
