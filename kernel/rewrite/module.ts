// A local module (a .ts or .js file beside the notebook) as an asynchronous function of its runner: imports become
// awaited lookups, exports getters handed over before the module runs.
import type { Node, Program } from "oxc-parser";
import { parse, patternNames } from "../syntax.ts";
import { RUNNER } from "./names.ts";
import {
  type Draft,
  draft,
  finish,
  type Rewritten,
  rewriteExpressions,
  rewriteFrom,
  rewriteImport,
} from "./statements.ts";
import { strip } from "./strip.ts";

/** Local name by exported name. */
type Exports = Map<string, string>;

const DEFAULT = "__default";

const exportedName = (node: {
  readonly type: string;
  readonly name?: string;
  readonly value?: unknown;
}): string => (node.type === "Literal" ? String(node.value) : (node.name ?? ""));

function namesOf(node: Node): string[] {
  if (node.type === "VariableDeclaration") return node.declarations.flatMap(({ id }) => patternNames(id));
  if ((node.type === "FunctionDeclaration" || node.type === "ClassDeclaration") && node.id)
    return [node.id.name];
  return [];
}

function rewriteDefault(
  edit: Draft,
  node: Extract<Node, { type: "ExportDefaultDeclaration" }>,
  given: Exports,
): void {
  const { declaration } = node;
  const [name] = namesOf(declaration);
  given.set("default", name ?? DEFAULT);
  if (name !== undefined) edit.text.remove(node.start, declaration.start);
  else {
    edit.text.overwrite(node.start, declaration.start, `const ${DEFAULT} = `);
    edit.text.appendLeft(declaration.end, ";");
  }
}

function rewriteNamed(
  edit: Draft,
  node: Extract<Node, { type: "ExportNamedDeclaration" }>,
  given: Exports,
): void {
  if (node.declaration) {
    for (const name of namesOf(node.declaration)) given.set(name, name);
    edit.text.remove(node.start, node.declaration.start);
    return;
  }
  if (!node.source) {
    for (const { local, exported } of node.specifiers) given.set(exportedName(exported), exportedName(local));
    edit.text.remove(node.start, node.end);
    return;
  }
  const wanted = node.specifiers.map(({ local }) => JSON.stringify(exportedName(local)));
  const names = node.specifiers.map(
    ({ local, exported }) =>
      `${JSON.stringify(exportedName(exported))}: m[${JSON.stringify(exportedName(local))}]`,
  );
  const specifier = JSON.stringify(node.source.value);
  rewriteFrom(edit, { ...node, source: node.source }, (module) => {
    const picked = `${RUNNER}.names(${module}, [${wanted.join(", ")}], ${specifier})`;
    return `${RUNNER}.exports(((m) => ({ ${names.join(", ")} }))(${picked}))`;
  });
}

function rewriteTop(edit: Draft, program: Program, given: Exports): void {
  for (const node of program.body) {
    if (node.type === "ImportDeclaration") rewriteImport(edit, node);
    else if (node.type === "ExportDefaultDeclaration") rewriteDefault(edit, node, given);
    else if (node.type === "ExportNamedDeclaration") rewriteNamed(edit, node, given);
    else if (node.type === "ExportAllDeclaration") {
      const { exported } = node;
      rewriteFrom(edit, node, (module) =>
        exported
          ? `${RUNNER}.exports({ ${JSON.stringify(exportedName(exported))}: ${RUNNER}.whole(${module}) })`
          : `${RUNNER}.reexport(${module})`,
      );
    }
  }
}

/** Rewrite a local module as `(async function (runner) { … })`. Throws `SyntaxRefusal`. */
export function rewriteModule(source: string): Rewritten {
  const edit = draft(strip(parse(source), { keepImports: false }));
  const given: Exports = new Map();
  rewriteExpressions(edit, source);
  rewriteTop(edit, edit.program, given);
  const getters = [...given].map(([name, local]) => `get ${JSON.stringify(name)}() { return ${local}; }`);
  const start = `(async function (${RUNNER}) {"use strict";${RUNNER}.exports({ ${getters.join(", ")} });`;
  return finish(edit, start, "\n})");
}
