// One calculation: a formula, the symbols it names, and its three lines.

import {
  type AnyUnit,
  lookUpUnit,
  named,
  type Quantity,
  quantity,
  sameExponents,
} from "../quantity/index.ts";
import { type Amount, evaluate } from "./evaluate.ts";
import { type Definition, type Expression, symbolsIn, written } from "./expression.ts";
import { numbersTex, symbolsTex } from "./formula-tex.ts";
import type { FormulaLines, ShownValue } from "./record.ts";
import { shownValue } from "./shown.ts";
import { symbolTex } from "./symbol.ts";
import { valueTex } from "./tex.ts";

/** What a formula can ask of the sheet about a symbol. */
export interface SymbolEntry {
  readonly quantity: Quantity;
  readonly shown: ShownValue;
  /** The entry it is, "id@version". */
  readonly use: string;
}
export type Symbols = (symbol: string) => SymbolEntry;

export interface Inputs {
  readonly inputs: Readonly<Record<string, number>>;
  readonly uses: readonly string[];
}

export interface Calculated extends Inputs {
  readonly formula: string;
  readonly lines: FormulaLines;
  readonly result: Quantity;
}

/** Values and entries of exactly the symbols the expressions of a formula name. */
export function inputsOf(formula: string, expressions: readonly Expression[], symbols: Symbols): Inputs {
  const names = [...new Set(expressions.flatMap(symbolsIn))];
  const entries = inFormula(formula, () => names.map((name) => [name, symbols(name)] as const));
  return {
    inputs: Object.freeze(Object.fromEntries(entries.map(([name, { quantity: value }]) => [name, value.si]))),
    uses: Object.freeze(entries.map(([, { use }]) => use)),
  };
}

/** Works a definition out and shows the result in `unit` ("" for a pure number).
 *  Throws when the result has another dimension than the unit, naming both. */
export function calculate(
  { symbol, expression }: Definition,
  unit: AnyUnit | "",
  symbols: Symbols,
): Calculated {
  const formula = `${symbol} = ${written(expression)}`;
  if (symbolsIn(expression).includes(symbol)) {
    throw new Error(`${formula}: ${symbol} would stand on itself; give the result another symbol`);
  }
  const given = inputsOf(formula, [expression], symbols);
  const result = resultOf(formula, evaluated(formula, expression, symbols), unit, given.uses);
  const lines = Object.freeze({
    symbols: `${symbolTex(symbol)} = ${symbolsTex(expression)}`,
    numbers: `${symbolTex(symbol)} = ${numbersTex(expression, (name) => symbols(name).shown)}`,
    result: `${symbolTex(symbol)} = ${valueTex(shownValue(result))}`,
  });
  return Object.freeze({ ...given, formula, lines, result });
}

/** The value of one side of a formula; errors name the formula. */
export function evaluated(formula: string, expression: Expression, symbols: Symbols): Amount {
  return inFormula(formula, () => evaluate(expression, (name) => symbols(name).quantity));
}

/** Does something for a formula, so that an error names it. */
export function inFormula<T>(formula: string, work: () => T): T {
  try {
    return work();
  } catch (error) {
    throw new Error(`${formula}: ${(error as Error).message}`);
  }
}

function resultOf(formula: string, amount: Amount, unit: AnyUnit | "", from: readonly string[]): Quantity {
  const dimension = unit === "" ? "pure number" : lookUpUnit(unit).dimension;
  if (!sameExponents(amount.dimension, dimension)) {
    const asked = unit === "" ? "a pure number is asked for" : `"${unit}" is ${named(dimension)}`;
    throw new Error(`${formula}: the result is ${named(amount.dimension)}; ${asked}`);
  }
  return quantity(amount.si, dimension, { unit, from });
}
