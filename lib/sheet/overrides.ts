// Givens set from outside: the host's measures by symbol, and which of them have been used.

import { type Dimension, type Quantity, quantity, readMeasure } from "../quantity/index.ts";
import { host } from "./host.ts";

export interface Overridden {
  readonly symbol: string;
  readonly written: string;
  readonly set: string;
}

export class Overrides {
  readonly #used = new Map<string, Overridden>();

  /** The quantity to use for a symbol: the one set from outside, of the same dimension, or the one written. With a `span` it may be
   *  set as a part of that, "0.2 L". Throws when the one set has another dimension or cannot be read. */
  apply<D extends Dimension>(
    symbol: string,
    written: Quantity<D>,
    printed: string,
    span?: Quantity<D>,
  ): Quantity<D> {
    const text = host().overrides.get(symbol);
    if (text === undefined) {
      this.#used.delete(symbol);
      return written;
    }
    const set = readSet(symbol, text, written.dimension, span);
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

const partOfSpan = /^\s*([-+]?(?:\d+\.?\d*|\.\d+))\s+L\s*$/;

function readSet<D extends Dimension>(
  symbol: string,
  text: string,
  dimension: D,
  span: Quantity<D> | undefined,
): Quantity<D> {
  const part = partOfSpan.exec(text)?.[1];
  if (part === undefined) return readMeasure(text, dimension, `${symbol}, set from outside`) as Quantity<D>;
  if (span !== undefined) return quantity(Number(part) * span.si, dimension, { unit: span.unit });
  const instead =
    dimension === "pure number"
      ? `${symbol} is a pure number, write ${part}`
      : `${symbol} is a ${dimension}, write one with its unit`;
  throw new Error(
    `${symbol}, set from outside: "${text}" is a part of a span, and only places of hinges are set so; ${instead}`,
  );
}
