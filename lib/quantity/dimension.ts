// Physical dimensions as the trade names them, each an exponent vector (force, length, temperature).
// One name per dimension, so that a written measure never fits two of them. Angles count as pure numbers.

import type { UnitsOf } from "./units.ts";

/** A dimension with a name: "length", "force per length", "moment", ... */
export type NamedDimension = keyof UnitsOf;

/** What arithmetic can lead to beside the named ones: "force^2", "length^5", "force length^3". */
export type UnnamedDimension =
  | `force^${number}`
  | `length^${number}`
  | `force${"" | `^${number}`} length${"" | `^${number}`}`
  | `${"" | `force${"" | `^${number}`} `}${"" | `length${"" | `^${number}`} `}temperature^${number}`;

export type Dimension = NamedDimension | UnnamedDimension;

/** Exponents of force, of length and of temperature. */
export type Exponents = readonly [force: number, length: number, temperature: number];

const named: Readonly<Record<NamedDimension, Exponents>> = {
  "pure number": [0, 0, 0],
  angle: [0, 0, 0],
  length: [0, 1, 0],
  area: [0, 2, 0],
  "section modulus": [0, 3, 0],
  "second moment of area": [0, 4, 0],
  force: [1, 0, 0],
  "force per length": [1, -1, 0],
  "force per area": [1, -2, 0],
  "force per volume": [1, -3, 0],
  moment: [1, 1, 0],
  "moment per angle": [1, 1, 0],
  "flexural rigidity": [1, 2, 0],
  "temperature change": [0, 0, 1],
  "per temperature": [0, 0, -1],
};

// Names that share their exponents with another one: arithmetic answers with the other.
const secondNames: readonly string[] = ["angle", "moment per angle"];

/** The names of all named dimensions. */
export const dimensionNames: readonly NamedDimension[] = Object.freeze(
  Object.keys(named) as NamedDimension[],
);

/** Whether a text is the name of a dimension in the table. */
export function isNamedDimension(text: string): text is NamedDimension {
  return Object.hasOwn(named, text);
}

/** Exponents (force, length, temperature) of a dimension. Throws on a text that is no dimension. */
export function exponentsOf(dimension: Dimension): Exponents {
  if (isNamedDimension(dimension)) return named[dimension];
  const match =
    /^(?:force(?:\^(-?[\d.]+))?)?(?:(?:^| )length(?:\^(-?[\d.]+))?)?(?:(?:^| )temperature\^(-?[\d.]+))?$/.exec(
      dimension,
    );
  if (match === null || match[0] === "") {
    throw new Error(`"${dimension}" is not a dimension; the named ones are ${dimensionNames.join(", ")}`);
  }
  const bases = ["force", "length", "temperature"] as const;
  const [force, length, temperature] = bases.map((base, i) => exponent(dimension, base, match[i + 1]));
  return [force ?? 0, length ?? 0, temperature ?? 0];
}

function exponent(dimension: string, base: string, written: string | undefined): number {
  return written !== undefined ? Number(written) : dimension.includes(base) ? 1 : 0;
}

/** The dimension with these exponents: its name where it has one, else a composed one such as "force^2 length". */
export function dimensionOf(exponents: Exponents): Dimension {
  const rounded = exponents.map((value) => Math.round(value * 1e9) / 1e9 + 0);
  for (const name of dimensionNames)
    if (named[name].every((value, i) => value === rounded[i]) && !secondNames.includes(name)) return name;
  const [force = 0, length = 0, temperature = 0] = rounded;
  const parts = [
    power("force", force, length === 0 && temperature === 0),
    power("length", length, force === 0 && temperature === 0),
    power("temperature", temperature, true),
  ];
  return parts.filter((part) => part !== "").join(" ") as UnnamedDimension;
}

function power(base: string, exponent: number, alone: boolean): string {
  if (exponent === 0) return "";
  return exponent === 1 && !alone ? base : `${base}^${exponent}`;
}

/** Whether two dimensions are the same, an angle counting as a pure number but a rotational stiffness not as a moment. */
export function sameDimension(one: Dimension, other: Dimension): boolean {
  return plain(one) === plain(other);
}

function plain(dimension: Dimension): Dimension {
  return dimension === "angle" ? "pure number" : dimension;
}

/** Whether two dimensions have the same exponents, whatever their names. */
export function sameExponents(one: Dimension, other: Dimension): boolean {
  const right = exponentsOf(other);
  return exponentsOf(one).every((value, i) => Math.abs(value - (right[i] ?? 0)) < 1e-9);
}
