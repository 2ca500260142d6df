// One check: two sides of a formula compared.

import { printValue, type Quantity, quantity } from "../quantity/index.ts";
import { evaluated, type Inputs, inFormula, inputsOf, type Symbols } from "./calculate.ts";
import { alike } from "./evaluate.ts";
import { type Comparison, type Relation, written } from "./expression.ts";
import { numbersTex, symbolsTex } from "./formula-tex.ts";
import type { FormulaLines, ShownValue } from "./record.ts";
import { shownGiven, shownValue } from "./shown.ts";
import { valueTex } from "./tex.ts";

export interface Compared extends Inputs {
  readonly formula: string;
  readonly lines: FormulaLines;
  readonly passed: boolean;
  /** The side that must be less over the other, 1 at the limit; absent where that other is not positive. */
  readonly utilisation?: number;
}

const signs: Readonly<Record<Relation, string>> = { "<=": "\\le", ">=": "\\ge", "<": "<", ">": ">" };
const opposites: Readonly<Record<Relation, Relation>> = { "<=": ">", ">=": "<", "<": ">=", ">": "<=" };

// Sides nearer than this share of their size are equal: what rounding in the arithmetic can do, and no more.
const equalWithin = 1e-12;

/** Works both sides out and compares them. Throws when they have different dimensions. */
export function compare({ relation, left, right }: Comparison, symbols: Symbols): Compared {
  const formula = `${written(left)} ${relation} ${written(right)}`;
  const given = inputsOf(formula, [left, right], symbols);
  const [a, b] = [evaluated(formula, left, symbols), evaluated(formula, right, symbols)];
  const { dimension, unit } = inFormula(formula, () => alike(left, a, right, b, "compare"));
  const passed = holds(relation, a.si, b.si);
  const sign = signs[passed ? relation : opposites[relation]];
  const shown = (name: string): ShownValue => symbols(name).shown;
  const sides = [quantity(a.si, dimension, { unit }), quantity(b.si, dimension, { unit })] as const;
  const shownSides = apart(
    sides,
    [left, right].map((side) => side.kind === "symbol" && side.name !== "pi"),
  );
  const lines = Object.freeze({
    symbols: `${symbolsTex(left)} ${signs[relation]} ${symbolsTex(right)}`,
    numbers: `${numbersTex(left, shown)} ${signs[relation]} ${numbersTex(right, shown)}`,
    result: shownSides.map(valueTex).join(` ${sign} `),
  });
  return Object.freeze({ ...given, formula, lines, passed, ...utilisation(relation, a.si, b.si) });
}

function holds(relation: Relation, a: number, b: number): boolean {
  const equal = Math.abs(a - b) <= equalWithin * Math.max(Math.abs(a), Math.abs(b));
  if (equal) return relation === "<=" || relation === ">=";
  return relation === "<=" || relation === "<" ? a < b : a > b;
}

function utilisation(relation: Relation, a: number, b: number): { readonly utilisation?: number } {
  const [less, more] = relation === "<=" || relation === "<" ? [a, b] : [b, a];
  return more > 0 ? { utilisation: less / more } : {};
}

/** Both sides shown, a lone symbol as it was written, with as many figures as it takes to see which is greater. */
function apart(sides: readonly [Quantity, Quantity], asWritten: readonly boolean[]): readonly ShownValue[] {
  const shown = sides.map((side, index) => (asWritten[index] ? shownGiven(side) : shownValue(side)));
  if (shown[0]?.text !== shown[1]?.text || sides[0].si === sides[1].si) return shown;
  for (let figures = 4; figures <= 12; figures++) {
    const texts = sides.map((side) => printValue(side, { figures }));
    if (texts[0] !== texts[1])
      return shown.map((value, index) => ({ ...value, text: texts[index] ?? value.text }));
  }
  return shown;
}
