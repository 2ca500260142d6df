// A formula as TeX, once with its symbols and once with the numbers in their places.

import type { Expression, Operator } from "./expression.ts";
import type { ShownValue } from "./record.ts";
import { symbolTex } from "./symbol.ts";
import { valueTex } from "./tex.ts";

/** How a symbol is set, and whether what stands there is a number with a unit or a sign. */
interface Setting {
  readonly symbol: (name: string) => string;
  /** True when the symbol must be bracketed as the base of a power. */
  readonly bracketed: (name: string) => boolean;
  /** Between two factors, and between a factor and a figure, which side by side would read as one number. */
  readonly times: string;
  readonly timesFigure: string;
}

const symbols: Setting = { symbol: symbolTex, bracketed: () => false, times: "\\,", timesFigure: " \\cdot " };

/** The expression in symbols: \frac{w\,L^{2}}{8}. */
export function symbolsTex(expression: Expression): string {
  return set(expression, symbols);
}

/** The expression with each symbol replaced by its shown value; powers of values with units are bracketed. */
export function numbersTex(expression: Expression, shown: (symbol: string) => ShownValue): string {
  const symbol = (name: string): string => {
    if (name === "pi") return symbolTex(name);
    const value = shown(name);
    return value.si < 0 ? `\\left(${valueTex(value)}\\right)` : valueTex(value);
  };
  const bracketed = (name: string): boolean =>
    name !== "pi" && shown(name).unit !== "" && shown(name).si >= 0;
  const times = " \\times ";
  return set(expression, { symbol, bracketed, times, timesFigure: times });
}

function set(expression: Expression, how: Setting): string {
  switch (expression.kind) {
    case "number":
      return numeral(expression.value);
    case "symbol":
      return how.symbol(expression.name);
    case "negative":
      return `-${set(expression.of, how)}`;
    case "group":
      return bracket(set(expression.of, how));
    case "call":
      return call(expression, how);
    case "operation":
      return operation(expression.operator, expression.left, expression.right, how);
  }
}

function numeral(value: number): string {
  const [mantissa = "", exponent] = String(value).split("e");
  return exponent === undefined ? mantissa : `${mantissa} \\times 10^{${Number(exponent)}}`;
}

function bracket(tex: string): string {
  return `\\left(${tex}\\right)`;
}

function call({ name, of }: Extract<Expression, { kind: "call" }>, how: Setting): string {
  const list = of.map((argument) => set(bare(argument), how)).join(",\\; ");
  if (name === "sqrt") return `\\sqrt{${list}}`;
  if (name === "abs") return `\\left|${list}\\right|`;
  const word = name.startsWith("a") ? `\\arc${name.slice(1)}` : `\\${name}`;
  return `${word}${bracket(list)}`;
}

/** An expression without the parentheses around all of it. */
function bare(expression: Expression): Expression {
  return expression.kind === "group" ? bare(expression.of) : expression;
}

function operation(operator: Operator, left: Expression, right: Expression, how: Setting): string {
  switch (operator) {
    case "+":
    case "-":
      return `${set(left, how)} ${operator} ${set(right, how)}`;
    case "*":
      return `${set(left, how)}${startsWithFigure(right) ? how.timesFigure : how.times}${set(right, how)}`;
    case "/":
      return `\\frac{${set(bare(left), how)}}{${set(bare(right), how)}}`;
    case "^":
      return `${base(left, how)}^{${set(bare(right), how)}}`;
  }
}

function startsWithFigure(expression: Expression): boolean {
  if (expression.kind === "number") return true;
  if (expression.kind !== "operation" || expression.operator === "/") return false;
  return startsWithFigure(expression.left);
}

function base(expression: Expression, how: Setting): string {
  const tex = set(expression, how);
  if (expression.kind === "call") return bracket(tex);
  return expression.kind === "symbol" && how.bracketed(expression.name) ? bracket(tex) : tex;
}
