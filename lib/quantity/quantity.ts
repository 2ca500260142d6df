// A number with a unit: SI inside (N, m, rad), frozen, with the ledger entries it came from.

import { type Dimension, sameDimension, sameExponents } from "./dimension.ts";
import { withDimension, wrongConversion, wrongFactor, wrongSum } from "./errors.ts";
import type { Measure } from "./measure.ts";
import { printValue } from "./print.ts";
import { type Product, productDimension, type Quotient, quotientDimension } from "./products.ts";
import { readMeasure } from "./read.ts";
import { lookUpUnit } from "./unit-table.ts";
import type { AnyUnit, UnitsOf } from "./units.ts";

/** The units a value of a dimension can be shown in. */
export type UnitIn<D extends Dimension> = D extends keyof UnitsOf ? UnitsOf[D] : AnyUnit;

export interface Quantity<D extends Dimension = Dimension> {
  readonly dimension: D;
  /** The value in N, m and rad. */
  readonly si: number;
  /** The unit it was written in or asked for; "" for none. */
  readonly unit: string;
  /** Ledger entries it came from, each "id@version". */
  readonly from: readonly string[];
  /** The sum; both must have one dimension. */
  plus(other: Measure<D>): Quantity<D>;
  /** The difference; both must have one dimension. */
  minus(other: Measure<D>): Quantity<D>;
  /** The product with a number or another quantity. */
  times(factor: number): Quantity<D>;
  times<E extends Dimension>(factor: Quantity<E>): Quantity<Product<D, E>>;
  /** The quotient by a number or another quantity. */
  over(divisor: number): Quantity<D>;
  over<E extends Dimension>(divisor: Quantity<E>): Quantity<Quotient<D, E>>;
  negated(): Quantity<D>;
  /** The same value shown in another unit. */
  to(unit: UnitIn<D>): Quantity<D>;
  /** The bare number in a unit. */
  in(unit: UnitIn<D>): number;
  /** -1, 0 or 1: less than, equal to or greater than the other. */
  compare(other: Measure<D>): -1 | 0 | 1;
  toString(): string;
}

/** How a value shows itself in a notebook: MIME type -> content. */
export type Display = Readonly<Record<string, string>>;

// Beside the values and not in them: a quantity is plain data.
const displays = new WeakMap<object, () => Display>();

// What a value is a multiple of. A multiple of a hand result has its band, however it was turned round or shown.
const multiples = new WeakMap<object, { readonly of: Quantity; readonly factor: number }>();

/** The value another was made from by a factor alone (shown in another unit, turned round, multiplied by a number), and the
 *  factor; the value itself and 1 where it was not. */
export function multipleOf(value: Quantity): { readonly of: Quantity; readonly factor: number } {
  return multiples.get(value) ?? { of: value, factor: 1 };
}

function asMultiple<Q extends Quantity>(value: Q, of: Quantity, factor: number): Q {
  const first = multipleOf(of);
  multiples.set(value, { of: first.of, factor: factor * first.factor });
  return value;
}

class Value<D extends Dimension> implements Quantity<D> {
  readonly dimension: D;
  readonly si: number;
  readonly unit: string;
  readonly from: readonly string[];

  constructor(si: number, dimension: D, unit: string, from: readonly string[]) {
    this.si = si === 0 ? 0 : si;
    this.dimension = dimension;
    this.unit = unit;
    this.from = Object.freeze([...from]);
    Object.freeze(this);
  }

  plus(other: Measure<D>): Quantity<D> {
    const right = this.alike(other, "add");
    return this.with(this.si + right.si, right);
  }

  minus(other: Measure<D>): Quantity<D> {
    const right = this.alike(other, "subtract");
    return this.with(this.si - right.si, right);
  }

  times(factor: number): Quantity<D>;
  times<E extends Dimension>(factor: Quantity<E>): Quantity<Product<D, E>>;
  times(factor: number | Quantity): Quantity {
    if (!isFactor(factor)) throw new Error(wrongFactor(this, "multiplied", factor));
    if (typeof factor === "number")
      return asMultiple(quantity(this.si * factor, this.dimension, this), this, factor);
    const dimension = productDimension(this.dimension, factor.dimension);
    return quantity(this.si * factor.si, dimension, { from: joined(this, factor) });
  }

  over(divisor: number): Quantity<D>;
  over<E extends Dimension>(divisor: Quantity<E>): Quantity<Quotient<D, E>>;
  over(divisor: number | Quantity): Quantity {
    if (!isFactor(divisor)) throw new Error(wrongFactor(this, "divided", divisor));
    const si = typeof divisor === "number" ? divisor : divisor.si;
    if (si === 0) throw new Error(`${withDimension(this)} cannot be divided by ${divisor}`);
    if (typeof divisor === "number")
      return asMultiple(quantity(this.si / si, this.dimension, this), this, 1 / si);
    const dimension = quotientDimension(this.dimension, divisor.dimension);
    return quantity(this.si / si, dimension, { from: joined(this, divisor) });
  }

  negated(): Quantity<D> {
    return asMultiple(quantity(-this.si, this.dimension, this), this, -1);
  }

  to(unit: UnitIn<D>): Quantity<D> {
    this.checked(unit);
    return asMultiple(quantity(this.si, this.dimension, { unit, from: this.from }), this, 1);
  }

  in(unit: UnitIn<D>): number {
    return this.si / this.checked(unit);
  }

  compare(other: Measure<D>): -1 | 0 | 1 {
    const right = this.alike(other, "compare");
    return this.si < right.si ? -1 : this.si > right.si ? 1 : 0;
  }

  toString(): string {
    return printValue(this);
  }

  [Symbol.for("Jupyter.display")](): Display {
    return displays.get(this)?.() ?? Object.freeze({ "text/plain": this.toString() });
  }

  [Symbol.for("nodejs.util.inspect.custom")](): string {
    return this.toString();
  }

  private alike(other: Measure<D>, verb: string): Quantity {
    const right = isQuantity(other) ? other : readMeasure(other, undefined, "value");
    if (!sameDimension(this.dimension, right.dimension)) throw new Error(wrongSum(verb, this, right));
    return right;
  }

  private checked(unit: string): number {
    const found = lookUpUnit(unit);
    if (!sameExponents(this.dimension, found.dimension))
      throw new Error(wrongConversion(this, unit, found.dimension));
    return found.factor;
  }

  private with(si: number, other: Quantity): Quantity<D> {
    return quantity(si, this.dimension, { unit: this.unit, from: joined(this, other) });
  }
}

function isFactor(value: unknown): boolean {
  return typeof value === "number" ? Number.isFinite(value) : isQuantity(value);
}

function joined(one: Quantity, other: Quantity): readonly string[] {
  return [...new Set([...one.from, ...other.from])];
}

/** The same quantity, showing itself in a notebook as `display` says. */
export function displayedAs<D extends Dimension>(value: Quantity<D>, display: () => Display): Quantity<D> {
  const copy = quantity(value.si, value.dimension, value);
  displays.set(copy, display);
  return copy;
}

/** A quantity of `si` (in N, m, rad) of a dimension, shown in `unit`, standing on the entries `from`.
 *  Throws on a number that is not finite. */
export function quantity<D extends Dimension>(
  si: number,
  dimension: D,
  about: { readonly unit?: string; readonly from?: readonly string[] } = {},
): Quantity<D> {
  if (!Number.isFinite(si)) throw new Error(`${si} is not a finite value for a ${dimension}`);
  return new Value(si, dimension, about.unit ?? "", about.from ?? []);
}

/** Whether a value is a quantity, judged by its shape: cells run in a context of their own. */
export function isQuantity(value: unknown): value is Quantity {
  if (typeof value !== "object" || value === null) return false;
  const { dimension, si, unit, from } = value as Partial<Quantity>;
  return (
    typeof dimension === "string" && typeof si === "number" && typeof unit === "string" && Array.isArray(from)
  );
}
