// Which hand result a value is: kept beside the values and not in them, so that a band can be found for it wherever it is shown.

import type { Wanted } from "../accuracy/index.ts";
import { multipleOf, type Quantity } from "../quantity/index.ts";
import type { Hand } from "./types.ts";

export interface Origin {
  readonly hand: Hand;
  readonly wanted: Wanted;
  /** The same question to another hand. */
  readonly ask: (hand: Hand) => Quantity;
}

const origins = new WeakMap<object, Origin>();

/** The same value, known as a result of a hand. */
export function asResultOf<Q extends Quantity>(value: Q, origin: Origin): Q {
  origins.set(value, origin);
  return value;
}

/** The hand result a value is, or is a multiple of by `factor`; none for values from elsewhere. */
export function originOf(
  value: Quantity,
): { readonly origin: Origin; readonly hand: Quantity; readonly factor: number } | undefined {
  const { of, factor } = multipleOf(value);
  const origin = origins.get(of);
  return origin === undefined ? undefined : { origin, hand: of, factor };
}

/** Whether two hands are one: what a verb answers with is a copy that shows itself. */
export function isSameHand(one: Hand, other: Hand): boolean {
  return one.solved === other.solved;
}
