// What is said when a measure or an operation is wrong. Each message names what was written and what would be right.

import { type Dimension, isNamedDimension } from "./dimension.ts";
import { type Printable, printWritten } from "./print.ts";

const examples: Readonly<Record<string, string>> = {
  "pure number": '0.5 or "1/200"',
  angle: '"0.5 deg" or "5 mrad"',
  length: '"14 m"',
  area: '"53.8 cm^2"',
  "section modulus": '"557 cm^3"',
  "second moment of area": '"8360 cm^4"',
  force: '"18 kN"',
  "force per length": '"5.2 kN/m"',
  "force per area": '"0.8 kN/m^2"',
  "force per volume": '"25 kN/m^3"',
  moment: '"120 kN m"',
  "moment per angle": '"8000 kN m/rad"',
  "flexural rigidity": '"17500 kN m^2"',
  "temperature change": '"25 K"',
  "per temperature": '"12e-6 1/K"',
};

function wanted(dimension: Dimension | undefined): string {
  if (dimension === undefined) return 'a number and a unit are wanted, e.g. "14 m" or "5.2 kN/m"';
  const example = isNamedDimension(dimension) ? `, e.g. ${examples[dimension]}` : "";
  return `${named(dimension)} is wanted${example}`;
}

/** "a length", "an area". */
export function named(dimension: Dimension): string {
  return `${/^[aeiou]/.test(dimension) ? "an" : "a"} ${dimension}`;
}

function shown(value: unknown): string {
  if (typeof value === "string") return `"${value}"`;
  if (typeof value === "function") return "a function";
  if (Array.isArray(value)) return `[${value.join(", ")}]`;
  return typeof value === "object" && value !== null ? "an object" : String(value);
}

export function notThatDimension(
  name: string,
  measure: unknown,
  read: Printable,
  dimension: Dimension,
): string {
  const text = typeof measure === "object" ? printWritten(read) : shown(measure);
  return `${name}: ${text} is ${named(read.dimension)}; ${wanted(dimension)}`;
}

export function badNumber(name: string, measure: unknown, dimension: Dimension | undefined): string {
  const text = shown(measure);
  return `${name}: ${text} is not a finite number; ${wanted(dimension)}`;
}

export function badMeasure(name: string, measure: unknown, dimension: Dimension | undefined): string {
  if (typeof measure === "string" && measure.trim() === "") return `${name} is empty; ${wanted(dimension)}`;
  if (measure === undefined || measure === null) return `${name} is missing; ${wanted(dimension)}`;
  const comma = typeof measure === "string" && /\d,\d/.test(measure);
  const hint = comma ? "; decimals take a point, thousands no mark" : "";
  return `${name}: ${shown(measure)} cannot be read${hint}; ${wanted(dimension)}`;
}

export function wrongSum(verb: string, one: Printable, other: Printable): string {
  const between = verb === "subtract" ? "from" : "and";
  const [first, second] = verb === "subtract" ? [other, one] : [one, other];
  return `cannot ${verb} ${withDimension(first)} ${between} ${withDimension(second)}`;
}

export function wrongFactor(value: Printable, verb: string, factor: unknown): string {
  return `${withDimension(value)} cannot be ${verb} by ${shown(factor)}; a finite number or a quantity is wanted`;
}

export function wrongConversion(value: Printable, unit: string, dimension: Dimension): string {
  return `${withDimension(value)} cannot be given in ${unit}, which is ${named(dimension)}`;
}

/** "6 m (length)". */
export function withDimension(value: Printable): string {
  return `${printWritten(value, { figures: 1 })} (${value.dimension})`;
}
