// The syntax tree of a cell, and what its top level declares and imports. Offsets are UTF-16 units from 0.
import type { Directive, ImportDeclaration, Node, Program, Statement } from "oxc-parser";
import { parseSync, visitorKeys } from "oxc-parser";
import { kept } from "./kept.ts";

export interface SyntaxFault {
  readonly message: string;
  readonly start: number;
  readonly end: number;
}

export interface Tree {
  readonly source: string;
  readonly program: Program;
  readonly comments: readonly { readonly start: number; readonly end: number; readonly value: string }[];
  readonly faults: readonly SyntaxFault[];
}

/** One name an import brings in. `imported` is the exported name, "default", or "*" for the whole module. */
export interface ImportedName {
  readonly local: string;
  readonly imported: string;
  readonly typeOnly: boolean;
}

const MOST_KEPT = 300;
const ofTypeScript = kept(MOST_KEPT, (source) => parsed(source, "ts"));

/** Parse a cell or module; the tree is shared and must not be changed. Faults are what makes it unusable, in the order
 *  they stand. */
export const parse = (source: string, lang: "ts" | "js" = "ts"): Tree =>
  lang === "ts" ? ofTypeScript(source) : parsed(source, lang);

function parsed(source: string, lang: "ts" | "js"): Tree {
  const result = parseSync(lang === "ts" ? "cell.ts" : "cell.js", source, {
    lang,
    sourceType: "module",
    ...(lang === "ts" ? { astType: "ts" as const } : {}),
    showSemanticErrors: lang === "ts",
  });
  const faults = result.errors.map((error): SyntaxFault => {
    const label = error.labels.at(-1);
    return { message: error.message, start: label?.start ?? 0, end: label?.end ?? 0 };
  });
  return { source, program: result.program, comments: result.comments, faults };
}

/** The nodes directly below a node. */
export function children(node: Node): Node[] {
  const found: Node[] = [];
  for (const key of visitorKeys[node.type] ?? []) {
    const below = (node as unknown as Record<string, Node | (Node | null)[] | null | undefined>)[key];
    if (Array.isArray(below)) for (const child of below) child && found.push(child);
    else if (below) found.push(below);
  }
  return found;
}

/** Visit a node and all below it; `enter` answers false to leave out what lies below. */
export function walk(node: Node, enter: (node: Node) => boolean | undefined): void {
  if (enter(node) === false) return;
  for (const child of children(node)) walk(child, enter);
}

/** The innermost nodes that hold an offset, outermost first. */
export function pathTo(program: Program, offset: number): Node[] {
  const path: Node[] = [];
  walk(program, (node) => {
    if (node.type !== "Program" && (offset < node.start || offset >= node.end)) return false;
    path.push(node);
    return true;
  });
  return path;
}

/** Names a binding pattern introduces. */
export function patternNames(pattern: Node): string[] {
  switch (pattern.type) {
    case "Identifier":
      return [pattern.name];
    case "ObjectPattern":
      return pattern.properties.flatMap((p) => patternNames(p.type === "RestElement" ? p.argument : p.value));
    case "ArrayPattern":
      return pattern.elements.flatMap((element) => (element ? patternNames(element) : []));
    case "AssignmentPattern":
      return patternNames(pattern.left);
    case "RestElement":
      return patternNames(pattern.argument);
    case "TSParameterProperty":
      return patternNames(pattern.parameter);
    default:
      return [];
  }
}

/** The names an import declaration brings in. */
export function importedNames(node: ImportDeclaration): ImportedName[] {
  return node.specifiers.map((specifier): ImportedName => {
    const local = specifier.local.name;
    const typeOnly = node.importKind === "type";
    if (specifier.type === "ImportDefaultSpecifier") return { local, imported: "default", typeOnly };
    if (specifier.type === "ImportNamespaceSpecifier") return { local, imported: "*", typeOnly };
    const { imported, importKind } = specifier;
    const name = imported.type === "Literal" ? imported.value : imported.name;
    return { local, imported: name, typeOnly: typeOnly || importKind === "type" };
  });
}

const isFunctionLike = (node: Node): boolean =>
  node.type === "FunctionDeclaration" ||
  node.type === "FunctionExpression" ||
  node.type === "ArrowFunctionExpression" ||
  node.type === "ClassDeclaration" ||
  node.type === "ClassExpression" ||
  node.type === "TSModuleDeclaration";

/** Names of `var` declarations at function level: those of the top level and of blocks and loops in it. */
export function varNames(program: Program): Set<string> {
  const names = new Set<string>();
  walk(program, (node) => {
    if (isFunctionLike(node)) return false;
    if (node.type === "VariableDeclaration" && node.kind === "var" && !node.declare) {
      for (const { id } of node.declarations) for (const name of patternNames(id)) names.add(name);
    }
    return true;
  });
  return names;
}

/** The declaration an `export` stands before, or the statement itself. */
export function unexported(statement: Statement | Directive): Node {
  if (statement.type === "ExportNamedDeclaration" && statement.declaration) return statement.declaration;
  if (statement.type === "ExportDefaultDeclaration") return statement.declaration;
  return statement;
}

function declaredBy(node: Node): string[] {
  switch (node.type) {
    case "VariableDeclaration":
      return node.declarations.flatMap(({ id }) => patternNames(id));
    case "FunctionDeclaration":
    case "TSDeclareFunction":
    case "ClassDeclaration":
      return node.id ? [node.id.name] : [];
    case "TSEnumDeclaration":
    case "TSInterfaceDeclaration":
    case "TSTypeAliasDeclaration":
    case "TSImportEqualsDeclaration":
      return [node.id.name];
    case "TSModuleDeclaration":
      return node.id.type === "Identifier" && node.kind !== "global" ? [node.id.name] : [];
    default:
      return [];
  }
}

/** Names a cell declares at its top level, values and types alike, imports not counted. */
export function declaredNames(program: Program): Set<string> {
  const names = varNames(program);
  for (const statement of program.body) for (const name of declaredBy(unexported(statement))) names.add(name);
  return names;
}

/** A module named in a text: by import, by `export … from`, or by `import("…")` as a value or as a type. */
export interface Named {
  readonly specifier: string;
  readonly offset: number;
}

/** The modules a text names, in the order they stand. */
export function namedModules({ program }: Tree): Named[] {
  const found: Named[] = [];
  walk(program, (node) => {
    const source =
      node.type === "ImportDeclaration" ||
      node.type === "ExportAllDeclaration" ||
      node.type === "ExportNamedDeclaration" ||
      node.type === "ImportExpression" ||
      node.type === "TSImportType"
        ? node.source
        : undefined;
    if (source?.type === "Literal" && typeof source.value === "string")
      found.push({ specifier: source.value, offset: source.start });
    return true;
  });
  return found;
}

/** Whether a specifier names a file rather than a package. */
export const namesFile = (specifier: string): boolean => /^(?:\.{0,2}\/|\.{1,2}$|file:)/.test(specifier);

/** The package of a specifier: "a" of "a/b", "@a/b" of "@a/b/c". */
export const packageOf = (specifier: string): string =>
  specifier
    .split("/")
    .slice(0, specifier.startsWith("@") ? 2 : 1)
    .join("/");
