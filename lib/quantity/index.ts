// Numbers with units: read, convert, print; dimensions in the types.

export {
  type Dimension,
  dimensionNames,
  dimensionOf,
  type Exponents,
  exponentsOf,
  isNamedDimension,
  type NamedDimension,
  sameDimension,
  sameExponents,
  type UnnamedDimension,
} from "./dimension.ts";
export { type DisplayUnits, displayUnits, showIn, shownIn, unitFor } from "./display-units.ts";
export { named, withDimension } from "./errors.ts";
export { type Footing, footing } from "./footing.ts";
export type { AnyMeasure, DimensionOf, FeetAndInches, Measure, PlainNumber } from "./measure.ts";
export { nearest } from "./nearest.ts";
export {
  type Printable,
  type PrintOptions,
  printNumber,
  printUnit,
  printValue,
  printWritten,
  shownUnit,
} from "./print.ts";
export {
  type Product,
  type Products,
  productDimension,
  type Quotient,
  type Quotients,
  quotientDimension,
} from "./products.ts";
export {
  type Display,
  displayedAs,
  isQuantity,
  multipleOf,
  type Quantity,
  quantity,
  type UnitIn,
} from "./quantity.ts";
export { readMeasure } from "./read.ts";
export { isUnit, lookUpUnit, plainSpelling, someUnits, type Unit } from "./unit-table.ts";
export type {
  AnyUnit,
  DimensionOfUnit,
  ForceUnit,
  LengthUnit,
  LineLoadUnit,
  MomentUnit,
  RigidityUnit,
  RotationalStiffnessUnit,
  StressUnit,
  TemperatureUnit,
  UnitsOf,
  VolumeLoadUnit,
} from "./units.ts";
