// A cell as V8's REPL mode is to run it. Every name of the top level becomes a `let`: REPL mode lets `let` follow
// `let` in a later cell and keeps the old value when the new one throws. (That a constant stays constant is the
// checker's business.) Functions are set before anything else runs, `var` is declared in front, imports are awaited
// lookups, and the last statement, when it is an expression, is shown.
import type { Function as FunctionNode, Node, VariableDeclaration } from "oxc-parser";
import { kept } from "../kept.ts";
import { declaredNames, parse, varNames, walk } from "../syntax.ts";
import { RUNNER } from "./names.ts";
import {
  type Draft,
  draft,
  finish,
  hoist,
  type Rewritten,
  refuse,
  rewriteExpressions,
  rewriteFrom,
  rewriteImport,
} from "./statements.ts";
import { SyntaxRefusal, strip } from "./strip.ts";

function refuseUsing(edit: Draft, original: string, node: VariableDeclaration): void {
  if (node.kind !== "using" && node.kind !== "await using") return;
  refuse(
    edit,
    original,
    node.start,
    `"${node.kind}" is not available in this version of Node.js; write const and call dispose`,
  );
}

/** `var a = 1, b` as assignments to names declared in front. */
function rewriteVar({ text, source }: Draft, node: VariableDeclaration, place: "statement" | "head"): void {
  const [first] = node.declarations;
  if (!first) return;
  const assigned = node.declarations.filter(({ init }) => init);
  const loopTarget = place === "head" && node.declarations.length === 1 && !first.init;
  if (loopTarget) {
    text.remove(node.start, first.start);
    return;
  }
  if (assigned.length === 0) {
    if (place === "head") text.remove(node.start, node.end);
    else text.overwrite(node.start, node.end, ";");
    return;
  }
  const closed = source.slice(node.start, node.end).endsWith(";");
  text.overwrite(node.start, first.start, "(");
  let last = first.start;
  for (const [index, declarator] of node.declarations.entries()) {
    if (index > 0)
      text.overwrite(last, declarator.start, declarator.init && assigned[0] !== declarator ? ", " : "");
    if (!declarator.init) text.remove(declarator.start, declarator.end);
    last = declarator.end;
  }
  if (closed) text.overwrite(node.end - 1, node.end, ");");
  else text.appendLeft(node.end, ")");
}

function rewriteVars(edit: Draft): void {
  const head = new Set<Node>();
  walk(edit.program, (node) => {
    if (node.type === "FunctionDeclaration" || node.type === "FunctionExpression") return false;
    if (node.type === "ArrowFunctionExpression" || node.type.startsWith("Class")) return false;
    if (node.type === "ForStatement" && node.init) head.add(node.init);
    if (node.type === "ForInStatement" || node.type === "ForOfStatement") head.add(node.left);
    if (node.type === "VariableDeclaration" && node.kind === "var")
      rewriteVar(edit, node, head.has(node) ? "head" : "statement");
    return true;
  });
}

/** A function declaration as `let f = function …`, in front of the rest: its own name stays the cell's `f`. */
function rewriteFunction(edit: Draft, node: FunctionNode, start: number): void {
  if (!node.id) return;
  const keyword = `${node.async ? "async " : ""}function${node.generator ? "*" : ""}`;
  edit.text.overwrite(start, node.id.end, `let ${node.id.name} = ${keyword} `);
  edit.text.appendLeft(node.end, ";");
  hoist(edit, { start, end: node.end });
}

/** A declaration; `start` is where its statement begins, before any `export`. */
function rewriteDeclaration(edit: Draft, original: string, node: Node, start: number): void {
  const { text } = edit;
  if (node.type === "FunctionDeclaration") rewriteFunction(edit, node, start);
  else if (node.type === "ClassDeclaration" && node.id) {
    text.overwrite(start, node.start + "class".length, `let ${node.id.name} = class`);
    text.appendLeft(node.end, ";");
  } else if (node.type === "VariableDeclaration") {
    refuseUsing(edit, original, node);
    if (start < node.start) text.remove(start, node.start);
    if (node.kind === "const") text.overwrite(node.start, node.start + "const".length, "let");
  }
}

function rewriteDefault(
  edit: Draft,
  original: string,
  node: Extract<Node, { type: "ExportDefaultDeclaration" }>,
): void {
  const { declaration } = node;
  const named = "id" in declaration && declaration.id && declaration.type.endsWith("Declaration");
  if (named) {
    rewriteDeclaration(edit, original, declaration, node.start);
    return;
  }
  edit.text.overwrite(node.start, declaration.start, "(");
  edit.text.appendLeft(declaration.end, ");");
}

function rewriteTop(edit: Draft, original: string, node: Node): void {
  const keep = (module: string): string => module;
  if (node.type === "ImportDeclaration") rewriteImport(edit, node);
  else if (node.type === "ExportAllDeclaration") rewriteFrom(edit, node, keep);
  else if (node.type === "ExportDefaultDeclaration") rewriteDefault(edit, original, node);
  else if (node.type !== "ExportNamedDeclaration") rewriteDeclaration(edit, original, node, node.start);
  else if (node.source) rewriteFrom(edit, { ...node, source: node.source }, keep);
  else if (node.declaration) rewriteDeclaration(edit, original, node.declaration, node.start);
  else edit.text.remove(node.start, node.end);
}

const isChange = (node: Node): boolean =>
  node.type === "AssignmentExpression" ||
  node.type === "UpdateExpression" ||
  (node.type === "ParenthesizedExpression" && isChange(node.expression));

/** A last statement that is an expression is shown, with or without a semicolon; a bare assignment is not. */
function rewriteLast({ program, text }: Draft): void {
  const last = program.body.findLast((node) => node.type !== "EmptyStatement");
  if (last?.type !== "ExpressionStatement" || isChange(last.expression)) return;
  text.appendLeft(last.expression.start, `${RUNNER}.show((`);
  text.appendRight(last.expression.end, "))");
}

const MOST_KEPT = 300;

/** Rewrite one cell for V8's REPL mode. Throws `SyntaxRefusal` for text that is not TypeScript or cannot run here. */
export const rewriteCell: (source: string) => Rewritten = kept(MOST_KEPT, rewritten);

function rewritten(source: string): Rewritten {
  const tree = parse(source);
  const edit = draft(strip(tree, { keepImports: true }));
  const taken = [RUNNER, "babelHelpers"].find((name) => declaredNames(tree.program).has(name));
  if (taken !== undefined) {
    const message = `the name ${taken} is kept for hingebook; choose another`;
    throw new SyntaxRefusal(source, [{ message, start: source.indexOf(taken), end: source.length }]);
  }
  const vars = varNames(edit.program);
  rewriteExpressions(edit, source);
  for (const node of edit.program.body) rewriteTop(edit, source, node);
  rewriteVars(edit);
  rewriteLast(edit);
  const declared = vars.size > 0 ? `let ${[...vars].join(", ")};` : "";
  return finish(edit, `"use strict";${declared}`);
}
