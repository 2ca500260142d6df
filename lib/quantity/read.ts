// Reading what was written: "14 m", "-3.5 kN/m", 14'-6 1/2", 0.5, "1/200".

import { type Dimension, type NamedDimension, sameDimension } from "./dimension.ts";
import { badMeasure, badNumber, notThatDimension } from "./errors.ts";
import type { Measure } from "./measure.ts";
import { isQuantity, type Quantity, quantity } from "./quantity.ts";
import { lookUpUnit } from "./unit-table.ts";

/** The quantity a measure stands for. `name` is the argument's name for messages; without a `dimension` any will do.
 *  Throws on another dimension, an unknown unit, an empty text, and on numbers that are not finite. */
export function readMeasure<D extends Dimension>(
  measure: Measure<D>,
  dimension: D,
  name: string,
): Quantity<D>;
export function readMeasure(measure: unknown, dimension: Dimension | undefined, name: string): Quantity;
export function readMeasure(measure: unknown, dimension: Dimension | undefined, name: string): Quantity {
  const read = isQuantity(measure) ? measure : readWritten(measure, dimension, name);
  if (!Number.isFinite(read.si)) throw new Error(badNumber(name, measure, dimension));
  if (dimension === undefined || read.dimension === dimension) return read;
  if (!sameDimension(read.dimension, dimension))
    throw new Error(notThatDimension(name, measure, read, dimension));
  return quantity(read.si, dimension, read);
}

function readWritten(measure: unknown, dimension: Dimension | undefined, name: string): Quantity {
  if (typeof measure === "number") {
    if (!Number.isFinite(measure)) throw new Error(badNumber(name, measure, dimension));
    return quantity(measure, "pure number");
  }
  if (typeof measure !== "string" || measure.trim() === "")
    throw new Error(badMeasure(name, measure, dimension));
  const text = measure.trim();
  const read = readFeetAndInches(text) ?? readRatio(text) ?? readNumberAndUnit(text, name);
  if (read === undefined) throw new Error(badMeasure(name, measure, dimension));
  return read;
}

function readFeetAndInches(text: string): Quantity<"length"> | undefined {
  const marks = text.replace(/[’′]/g, "'").replace(/[”″]/g, '"');
  const match = /^([-−])?(?:(\d+(?:\.\d+)?)')?[-\s]*(?:(\d+(?:\.\d+)?)?(?:[-\s]?\b(\d+)\/(\d+))?")?$/.exec(
    marks,
  );
  if (match === null || !/['"]$/.test(marks)) return undefined;
  const [, minus, feet, whole, over, under] = match;
  if (feet === undefined && whole === undefined && over === undefined) return undefined;
  const inches = Number(whole ?? 0) + (over === undefined ? 0 : Number(over) / Number(under));
  const metres = Number(feet ?? 0) * lookUpUnit("ft").factor + inches * lookUpUnit("in").factor;
  if (!Number.isFinite(metres)) return undefined;
  return quantity(minus === undefined ? metres : -metres, "length", {
    unit: feet === undefined ? "in" : "ft",
  });
}

function readRatio(text: string): Quantity<"pure number"> | undefined {
  const match = /^(\S+?)\s*\/\s*(\S+)$/.exec(text);
  const over = readNumber(match?.[1] ?? "");
  const under = readNumber(match?.[2] ?? "");
  if (over === undefined || under === undefined || under === 0) return undefined;
  return quantity(over / under, "pure number");
}

function readNumberAndUnit(text: string, name: string): Quantity | undefined {
  const match =
    /^([-+−]?(?:\d[\d\u202f\u2009\u00a0]*)?(?:\.\d+)?(?:[eE][-+]?\d+|×10[⁻⁰¹²³⁴⁵⁶⁷⁸⁹]+)?)\s*((?:1\/)?[\p{L}%°].*)?$/u.exec(
      text,
    );
  const number = readNumber(match?.[1] ?? "");
  if (number === undefined) return undefined;
  const unit = match?.[2];
  if (!Number.isFinite(number)) throw new Error(badNumber(name, text, undefined));
  if (unit === undefined) return quantity(number, "pure number");
  const { factor, dimension } = unitNamed(unit, text, name);
  if (!Number.isFinite(number * factor)) throw new Error(badNumber(name, text, dimension));
  return quantity(number * factor, dimension, { unit });
}

function unitNamed(unit: string, text: string, name: string): { dimension: NamedDimension; factor: number } {
  try {
    return lookUpUnit(unit);
  } catch (error) {
    throw new Error(`${name}: "${text}": ${(error as Error).message}`);
  }
}

const raised = "⁰¹²³⁴⁵⁶⁷⁸⁹";

/** A written number: −12 345.6, 1.5e3, 1.50×10⁻⁶; undefined when the text is none. */
export function readNumber(text: string): number | undefined {
  const plain = text
    .replace(/[\u202f\u2009\u00a0](?=\d{3}(?!\d))/g, "")
    .replace("−", "-")
    .replace(/×10([⁻⁰¹²³⁴⁵⁶⁷⁸⁹]+)$/, (_, power: string) => `e${lowered(power)}`);
  if (!/^[-+]?(?:\d+(?:\.\d*)?|\.\d+)(?:[eE][-+]?\d+)?$/.test(plain)) return undefined;
  return Number(plain);
}

function lowered(power: string): string {
  return [...power].map((figure) => (figure === "⁻" ? "-" : String(raised.indexOf(figure)))).join("");
}
