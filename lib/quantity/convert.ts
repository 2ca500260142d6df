// The one file that knows mathjs units. Its unit class is built on plain numbers alone: bundled that is 45 kB and
// a few milliseconds, against about a second for the whole of mathjs.
// mathjs has 4448.2216 N for a kip; here a kip is 1000 lbf, each exactly 4.4482216152605 N.

// @ts-expect-error: mathjs exports its factories without declaring them
import { createComplexClass, createFractionClass, createUnitClass } from "mathjs";

interface MathUnit {
  toNumeric(unit: string): number;
}
interface MathUnitClass {
  parse(expression: string): MathUnit;
}

const Unit = createUnitClass({
  config: { number: "number" },
  addScalar: (a: number, b: number) => a + b,
  subtractScalar: (a: number, b: number) => a - b,
  multiplyScalar: (a: number, b: number) => a * b,
  divideScalar: (a: number, b: number) => a / b,
  pow: Math.pow,
  abs: Math.abs,
  fix: Math.trunc,
  round: Math.round,
  equal: (a: number, b: number) => a === b,
  isNumeric: (value: unknown) => typeof value === "number",
  format: String,
  number: Number,
  Complex: createComplexClass({}),
  BigNumber: Number,
  Fraction: createFractionClass({}),
}) as unknown as MathUnitClass;

const known = new Map<string, number>();

/** How many SI units one `expression` is: factor("1000 lbf / ft", "N / m") is 14593.9. */
export function factor(expression: string, si: string): number {
  const key = `${expression} : ${si}`;
  let value = known.get(key);
  if (value === undefined) {
    value = Unit.parse(expression).toNumeric(si);
    known.set(key, value);
  }
  return value;
}
