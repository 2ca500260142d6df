// Givens set from outside: the host's measures by symbol, and which of them have been used.

import { type Dimension, type Quantity, readMeasure } from "../quantity/index.ts";
import { host } from "./host.ts";

export interface Overridden {
  readonly symbol: string;
  readonly written: string;
  readonly set: string;
}

export class Overrides {
  readonly #used = new Map<string, Overridden>();

  /** The quantity to use for a symbol: the one set from outside, of the same dimension, or the one written.
   *  Throws when the one set has another dimension or cannot be read. */
  apply<D extends Dimension>(symbol: string, written: Quantity<D>, printed: string): Quantity<D> {
    const text = host().overrides.get(symbol);
    if (text === undefined) {
      this.#used.delete(symbol);
      return written;
    }
    const set = readMeasure(text, written.dimension, `${symbol}, set from outside`) as Quantity<D>;
    this.#used.set(symbol, Object.freeze({ symbol, written: printed, set: text }));
    return set;
  }

  used(): readonly Overridden[] {
    return [...this.#used.values()];
  }

  unused(): readonly string[] {
    return [...host().overrides.keys()].filter((symbol) => !this.#used.has(symbol));
  }

  /** Throws when a symbol that is worked out is to be set from outside, naming what it stands on. */
  refuse(symbol: string, basis: () => readonly string[]): void {
    if (!host().overrides.has(symbol)) return;
    const standsOn = basis();
    const words =
      standsOn.length === 0
        ? "it stands on no given"
        : `it stands on ${standsOn.join(", ")}; set one of those`;
    throw new Error(`${symbol} is calculated, not given: ${words}`);
  }
}
