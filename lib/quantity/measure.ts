// What an engineer may write where a quantity is wanted: a quantity, or a literal such as "14 m", checked by the compiler.

import type { Dimension, NamedDimension } from "./dimension.ts";
import type { Quantity } from "./quantity.ts";
import type { UnitsOf } from "./units.ts";

/** Feet and inches: 14'-6", 14', 6", 14'-6 1/2". */
export type FeetAndInches =
  | `${number}'`
  | `${number}"`
  | `${number} ${number}/${number}"`
  | `${number}'-${number}"`
  | `${number}'-${number} ${number}/${number}"`;

/** A bare number, or a ratio such as "1/200". */
export type PlainNumber = number | `${number}` | `${number}/${number}`;

/** A quantity of the dimension, or a text such as "14 m". */
export type Measure<D extends Dimension> =
  | Quantity<D>
  | (D extends NamedDimension ? `${number} ${UnitsOf[D]}` : never)
  | (D extends "length" ? FeetAndInches : never)
  | (D extends "pure number" | "angle" ? PlainNumber : never);

/** A measure of any dimension. */
export type AnyMeasure = Quantity | `${number} ${UnitsOf[NamedDimension]}` | FeetAndInches | PlainNumber;

/** The dimension of a measure, read off its text. */
export type DimensionOf<M> =
  M extends Quantity<infer D>
    ? D
    : M extends PlainNumber
      ? "pure number"
      : M extends FeetAndInches
        ? "length"
        : { [D in NamedDimension]: M extends `${number} ${UnitsOf[D]}` ? D : never }[NamedDimension];
