// Formulas worked out with quantities. Every refusal names the operands in words.

import {
  type Dimension,
  dimensionOf,
  type Exponents,
  exponentsOf,
  named,
  productDimension,
  quotientDimension,
  sameExponents,
  withDimension,
} from "../quantity/index.ts";
import { type Expression, written } from "./expression.ts";

/** A value on its way through a formula: SI, with the unit it was written in where it still has one. */
export interface Amount {
  readonly si: number;
  readonly dimension: Dimension;
  readonly unit: string;
}

/** Finds the amount a symbol stands for; throws on an unknown one. */
export type Scope = (symbol: string) => Amount;

/** The value of an expression. Throws on unlike operands, division by zero, roots of negative values, powers that are
 *  no pure number, arguments outside a function's range, and results that are not finite. */
export function evaluate(expression: Expression, scope: Scope): Amount {
  const value = worth(expression, scope);
  if (!Number.isFinite(value.si))
    throw new Error(`${written(expression)} gives ${value.si}, which is no number`);
  return value;
}

function worth(expression: Expression, scope: Scope): Amount {
  switch (expression.kind) {
    case "number":
      return pure(expression.value);
    case "symbol":
      return expression.name === "pi" ? pure(Math.PI) : scope(expression.name);
    case "negative": {
      const value = evaluate(expression.of, scope);
      return { ...value, si: -value.si };
    }
    case "group":
      return evaluate(expression.of, scope);
    case "call":
      return call(expression, scope);
    case "operation":
      return operation(expression, scope);
  }
}

function pure(si: number): Amount {
  return { si, dimension: "pure number", unit: "" };
}

function operation(expression: Extract<Expression, { kind: "operation" }>, scope: Scope): Amount {
  const left = evaluate(expression.left, scope);
  const right = evaluate(expression.right, scope);
  switch (expression.operator) {
    case "+":
      return summed(expression.left, left, "add", expression.right, right, left.si + right.si);
    case "-":
      return summed(expression.left, left, "subtract", expression.right, right, left.si - right.si);
    case "*":
      return {
        si: left.si * right.si,
        dimension: productDimension(left.dimension, right.dimension),
        unit: "",
      };
    case "/":
      if (right.si === 0)
        throw new Error(
          `cannot divide ${worded(expression.left, left)} by ${worded(expression.right, right)}`,
        );
      return {
        si: left.si / right.si,
        dimension: quotientDimension(left.dimension, right.dimension),
        unit: "",
      };
    case "^":
      return power(expression.left, left, expression.right, right);
  }
}

function summed(a: Expression, left: Amount, verb: string, b: Expression, right: Amount, si: number): Amount {
  const common = alike(a, left, b, right, verb);
  return { ...common, si };
}

/** The operand whose dimension holds for both; a nought without a unit goes with any. Throws on unlike ones. */
export function alike(a: Expression, left: Amount, b: Expression, right: Amount, verb: string): Amount {
  if (sameExponents(left.dimension, right.dimension))
    return left.unit === "" && right.unit !== "" ? right : left;
  if (isNought(a, left)) return right;
  if (isNought(b, right)) return left;
  const [first, second] =
    verb === "subtract" ? [worded(b, right), worded(a, left)] : [worded(a, left), worded(b, right)];
  throw new Error(`cannot ${verb} ${first} ${verb === "subtract" ? "from" : "and"} ${second}`);
}

function isNought(expression: Expression, value: Amount): boolean {
  return expression.kind === "number" && value.si === 0;
}

function power(a: Expression, base: Amount, b: Expression, exponent: Amount): Amount {
  if (!sameExponents(exponent.dimension, "pure number")) {
    throw new Error(`an exponent must be a pure number, not ${worded(b, exponent)}`);
  }
  const n = exponent.si;
  if (base.si < 0 && !Number.isInteger(n))
    throw new Error(`${worded(a, base)} is negative: it has no power ${n}`);
  if (base.si === 0 && n < 0) throw new Error(`${worded(a, base)} is zero: it has no power ${n}`);
  return { si: base.si ** n, dimension: raisedDimension(a, base, n), unit: "" };
}

function raisedDimension(a: Expression, base: Amount, n: number): Dimension {
  const raised = exponentsOf(base.dimension).map((value) => value * n) as unknown as Exponents;
  if (!raised.every(isHalf)) {
    throw new Error(
      `${worded(a, base)} has no power ${Number(n.toPrecision(6))}: ${named(base.dimension)} has whole powers and roots of its powers only; divide by a given of the same dimension first`,
    );
  }
  return dimensionOf(raised);
}

function isHalf(value: number): boolean {
  return Math.abs(2 * value - Math.round(2 * value)) < 1e-9;
}

function call(expression: Extract<Expression, { kind: "call" }>, scope: Scope): Amount {
  const values = expression.of.map((argument) => evaluate(argument, scope));
  const [argument, value] = [expression.of[0], values[0]];
  if (argument === undefined || value === undefined)
    throw new Error(`${expression.name} has no value to work on`);
  switch (expression.name) {
    case "abs":
      return { ...value, si: Math.abs(value.si) };
    case "sqrt":
      if (value.si < 0) throw new Error(`${worded(argument, value)} is negative: it has no square root`);
      return { si: Math.sqrt(value.si), dimension: raisedDimension(argument, value, 0.5), unit: "" };
    case "min":
    case "max":
      return extreme(expression.name, expression.of, values);
    case "sin":
    case "cos":
    case "tan":
      return pure(Math[expression.name](plain(expression.name, argument, value)));
    case "asin":
    case "acos":
    case "atan":
      return inverse(expression.name, argument, value);
  }
}

function extreme(name: "min" | "max", expressions: readonly Expression[], values: readonly Amount[]): Amount {
  return values.reduce((best, value, index) => {
    const [a, b] = [expressions[index - 1], expressions[index]];
    if (a === undefined || b === undefined) return value;
    const common = alike(a, best, b, value, "compare");
    return { ...common, si: Math[name](best.si, value.si) };
  });
}

function inverse(name: "asin" | "acos" | "atan", argument: Expression, value: Amount): Amount {
  const x = plain(name, argument, value);
  if (name !== "atan" && Math.abs(x) > 1) {
    throw new Error(
      `${name} of ${worded(argument, value)} does not exist; the value must lie between -1 and 1`,
    );
  }
  return { si: Math[name](x), dimension: "angle", unit: "" };
}

function plain(name: string, argument: Expression, value: Amount): number {
  if (sameExponents(value.dimension, "pure number")) return value.si;
  throw new Error(`${name} takes a pure number or an angle, not ${worded(argument, value)}`);
}

/** An operand in words: "L = 14 m (length)". */
export function worded(expression: Expression, value: Amount): string {
  const text = withDimension(value);
  return expression.kind === "number" ? text : `${written(expression)} = ${text}`;
}
