// A formula as plain data, and written out again.

import type { FunctionName } from "./symbol.ts";

export type Operator = "+" | "-" | "*" | "/" | "^";
export type Relation = "<=" | ">=" | "<" | ">";

export type Expression =
  | { readonly kind: "number"; readonly value: number }
  | { readonly kind: "symbol"; readonly name: string }
  | { readonly kind: "negative"; readonly of: Expression }
  | { readonly kind: "group"; readonly of: Expression }
  | {
      readonly kind: "operation";
      readonly operator: Operator;
      readonly left: Expression;
      readonly right: Expression;
    }
  | { readonly kind: "call"; readonly name: FunctionName; readonly of: readonly Expression[] };

/** symbol = expression */
export interface Definition {
  readonly symbol: string;
  readonly expression: Expression;
}

/** left <= right */
export interface Comparison {
  readonly relation: Relation;
  readonly left: Expression;
  readonly right: Expression;
}

/** An expression as one would type it: w*L^2/8. */
export function written(expression: Expression): string {
  switch (expression.kind) {
    case "number":
      return String(expression.value);
    case "symbol":
      return expression.name;
    case "negative":
      return `-${written(expression.of)}`;
    case "group":
      return `(${written(expression.of)})`;
    case "call":
      return `${expression.name}(${expression.of.map(written).join(", ")})`;
    case "operation": {
      const { operator, left, right } = expression;
      const gap = operator === "+" || operator === "-" ? " " : "";
      return `${written(left)}${gap}${operator}${gap}${written(right)}`;
    }
  }
}

/** The symbols an expression names, each once, in order; pi is a number and not among them. */
export function symbolsIn(expression: Expression): readonly string[] {
  return [...new Set(named(expression))];
}

function named(expression: Expression): readonly string[] {
  switch (expression.kind) {
    case "number":
      return [];
    case "symbol":
      return expression.name === "pi" ? [] : [expression.name];
    case "negative":
    case "group":
      return named(expression.of);
    case "call":
      return expression.of.flatMap(named);
    case "operation":
      return [...named(expression.left), ...named(expression.right)];
  }
}
