// Random numbers of the population study: seeded, the same on every machine.

import { uniformFloat64 } from "pure-rand/distribution/uniformFloat64";
import { xoroshiro128plus } from "pure-rand/generator/xoroshiro128plus";

export interface Dice {
  /** Even between two numbers. */
  even(from: number, to: number): number;
  /** Even in the logarithm. */
  ratio(from: number, to: number): number;
  /** A whole number, both ends included. */
  whole(from: number, to: number): number;
  /** True in so many of a hundred cases. */
  percent(share: number): boolean;
}

export function diceOf(seed: number): Dice {
  const random = xoroshiro128plus(seed);
  const even = (from: number, to: number): number => from + (to - from) * uniformFloat64(random);
  return {
    even,
    ratio: (from, to) => from * (to / from) ** even(0, 1),
    whole: (from, to) => Math.min(to, Math.floor(even(from, to + 1))),
    percent: (share) => even(0, 100) < share,
  };
}
