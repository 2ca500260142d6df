// The one file that knows the mathjs parser. Nothing is ever evaluated by it: its tree is turned into an Expression,
// node by node from a list of those allowed, and anything else is refused in words.

import { create, type MathNode, parseDependencies } from "mathjs/number";
import { isUnit } from "../quantity/index.ts";
import type { Comparison, Definition, Expression, Operator, Relation } from "./expression.ts";
import { checkedSymbol, type FunctionName, functionNames, spellGreek } from "./symbol.ts";

/** The parts of a mathjs node this file reads. */
interface Node {
  readonly type: string;
  readonly name?: string;
  readonly value?: unknown;
  readonly op?: string;
  readonly implicit?: boolean;
  readonly args?: readonly Node[];
  readonly content?: Node;
  readonly object?: Node;
  readonly index?: unknown;
  readonly fn?: Node;
  toString(): string;
}

const allowed = `a formula may hold numbers, symbols, + - * / ^, parentheses, pi and ${functionNames.join(", ")}`;
const operators: readonly string[] = ["+", "-", "*", "/", "^"];
const relations: readonly string[] = ["<=", ">=", "<", ">"];

// What engineers type beside the plain signs.
const signs: Readonly<Record<string, string>> = {
  "×": "*",
  "·": "*",
  "−": "-",
  "≤": "<=",
  "≥": ">=",
  "²": "^2",
  "³": "^3",
  π: "pi",
};

let parser: ((text: string) => MathNode) | undefined;

/** Trees of the formulas read last: a notebook reads the same ones on every run. Nobody changes a tree. */
const trees = new Map<string, Node>();
const KEPT = 500;

/** A mathjs instance with the parser in it and nothing else; made when the first formula is read. */
function newParser(): (text: string) => MathNode {
  if (parseDependencies === undefined) throw new Error("mathjs came without its parser");
  return create(parseDependencies).parse as (text: string) => MathNode;
}

function parse(text: string): Node {
  if (typeof text !== "string" || text.trim() === "") throw new Error("the formula is empty");
  const known = trees.get(text);
  if (known) return known;
  parser ??= newParser();
  const plain = spellGreek(text.replace(/[×·−≤≥²³π]/g, (sign) => signs[sign] ?? sign));
  try {
    const tree = parser(plain) as unknown as Node;
    if (trees.size >= KEPT) trees.clear();
    trees.set(text, tree);
    return tree;
  } catch (error) {
    throw new Error(`"${text}" cannot be read as a formula: ${(error as Error).message}`);
  }
}

/** Reads "M_0 = w*L^2/8". Throws on anything that is not one symbol and one expression of the allowed kinds. */
export function parseDefinition(text: string): Definition {
  const node = parse(text);
  if (node.type !== "AssignmentNode" || node.object?.name === undefined || node.index) {
    throw new Error(`"${text}" is not a definition; write symbol = formula, such as "M_0 = w*L^2/8"`);
  }
  const symbol = checkedSymbol(node.object.name);
  return Object.freeze({ symbol, expression: expressionOf(node.value as Node, text) });
}

/** Reads "delta <= L/360". Throws on anything that is not two expressions and one of <= >= < >. */
export function parseComparison(text: string): Comparison {
  const node = parse(text);
  const [left, right] = node.args ?? [];
  if (node.type === "RelationalNode")
    throw new Error(`"${text}" compares more than two values; write a check for each`);
  if (
    node.type !== "OperatorNode" ||
    !relations.includes(node.op ?? "") ||
    left === undefined ||
    right === undefined
  ) {
    throw new Error(
      `"${text}" is not a check; write two sides with <=, >=, < or >, such as "delta <= L/360"`,
    );
  }
  return Object.freeze({
    relation: node.op as Relation,
    left: expressionOf(left, text),
    right: expressionOf(right, text),
  });
}

function expressionOf(node: Node, text: string): Expression {
  return Object.freeze(converted(node, text));
}

function converted(node: Node, text: string): Expression {
  switch (node.type) {
    case "ConstantNode":
      if (typeof node.value === "number") return { kind: "number", value: node.value };
      break;
    case "SymbolNode":
      if (node.name === "pi") return { kind: "symbol", name: "pi" };
      return { kind: "symbol", name: checkedSymbol(node.name ?? "") };
    case "ParenthesisNode":
      if (node.content !== undefined) return { kind: "group", of: expressionOf(node.content, text) };
      break;
    case "FunctionNode":
      return callOf(node, text);
    case "OperatorNode":
      return operationOf(node, text);
  }
  throw new Error(`"${text}": "${node}" cannot stand in a formula; ${allowed}`);
}

function callOf(node: Node, text: string): Expression {
  const name = node.fn?.name ?? "";
  const given = node.args ?? [];
  if (!(functionNames as readonly string[]).includes(name)) {
    throw new Error(
      `"${text}": "${name}" is not a function here; write ${name}*(…) for a product; ${allowed}`,
    );
  }
  const several = name === "min" || name === "max";
  if (several ? given.length < 2 : given.length !== 1) {
    throw new Error(
      `"${text}": ${name} takes ${several ? "two values or more" : "one value"}, not ${given.length}`,
    );
  }
  const of = Object.freeze(given.map((argument) => expressionOf(argument, text)));
  return { kind: "call", name: name as FunctionName, of };
}

function operationOf(node: Node, text: string): Expression {
  const [left, right] = node.args ?? [];
  if (node.implicit === true) throw new Error(missingSign(node, text));
  if (left !== undefined && right === undefined && node.op === "-") {
    return { kind: "negative", of: expressionOf(left, text) };
  }
  if (left === undefined || right === undefined || !operators.includes(node.op ?? "")) {
    throw new Error(`"${text}": "${node}" cannot stand in a formula; ${allowed}`);
  }
  return {
    kind: "operation",
    operator: node.op as Operator,
    left: expressionOf(left, text),
    right: expressionOf(right, text),
  };
}

function missingSign(node: Node, text: string): string {
  const [left, right] = node.args ?? [];
  const name = right?.name ?? "";
  if (left?.type === "ConstantNode" && isUnit(name)) {
    return `"${text}": "${left} ${name}" is a number with a unit; give it a symbol, sheet.given("a", "${left} ${name}"), and write that`;
  }
  return `"${text}": a sign is missing in "${node}"; write ${left}*${right} for a product`;
}
