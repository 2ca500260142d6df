// Edits shared by cells and local modules: imports and dynamic imports become calls of the runner.
import MagicString from "magic-string";
import type { ImportDeclaration, Program } from "oxc-parser";
import { type Position, positionAt } from "../position.ts";
import { importedNames, parse, walk } from "../syntax.ts";
import { RUNNER } from "./names.ts";
import { locator, type Stripped, SyntaxRefusal } from "./strip.ts";

export interface Draft {
  readonly program: Program;
  readonly text: MagicString;
  /** The stripped text, with one line break in front: offset 0 is where hoisted statements go. */
  readonly source: string;
  readonly stripped: Stripped;
  /** Where a place of the stripped text stood in the cell. */
  readonly origin: (offset: number) => Position | undefined;
}

export interface Rewritten {
  readonly code: string;
  /** Where a place of the code stood in the original text; line and column from 1. */
  readonly locate: (place: Position) => Position | undefined;
}

const quoted = (text: string): string => JSON.stringify(text);

/** Begin editing stripped text. */
export function draft(stripped: Stripped): Draft {
  const source = `\n${stripped.code}`;
  const tree = parse(source, "js");
  const origin = (offset: number): Position | undefined => {
    const { line, column } = positionAt(source, offset);
    return stripped.locate({ line: line - 1, column });
  };
  return { program: tree.program, text: new MagicString(source), source, stripped, origin };
}

/** Refuse a construct at its place in the original text. */
export function refuse({ origin }: Draft, original: string, offset: number, message: string): never {
  const at = origin(offset) ?? { line: 1, column: 1 };
  const lines = original.split("\n").slice(0, at.line - 1);
  const start = lines.reduce((sum, line) => sum + line.length + 1, 0) + at.column - 1;
  throw new SyntaxRefusal(original, [{ message, start, end: start + 1 }]);
}

const awaitedModule = (specifier: string): string => `(await ${RUNNER}.load(${quoted(specifier)}))`;

function importText(node: ImportDeclaration): string {
  const specifier = node.source.value;
  const names = importedNames(node);
  if (names.length === 0) return `${awaitedModule(specifier)};`;
  const parts: string[] = [];
  const single = names.filter(({ imported }) => imported !== "*");
  for (const { local } of names.filter(({ imported }) => imported === "*"))
    parts.push(`${local} = ${RUNNER}.whole(${awaitedModule(specifier)})`);
  if (single.length > 0) {
    const pattern = single.map(({ imported, local }) => `${quoted(imported)}: ${local}`).join(", ");
    const wanted = single.map(({ imported }) => quoted(imported)).join(", ");
    parts.push(
      `{ ${pattern} } = ${RUNNER}.names(${awaitedModule(specifier)}, [${wanted}], ${quoted(specifier)})`,
    );
  }
  return `let ${parts.join(", ")};`;
}

/** Put a statement in front of the rest. */
export function hoist({ text }: Draft, node: { readonly start: number; readonly end: number }): void {
  text.appendLeft(node.end, "\n");
  text.move(node.start, node.end, 0);
}

/** Turn an import declaration into an awaited lookup in front of the rest. */
export function rewriteImport(edit: Draft, node: ImportDeclaration): void {
  edit.text.overwrite(node.start, node.end, importText(node));
  hoist(edit, node);
}

/** Turn `export … from` into an awaited lookup; `use` wraps it in what is done with the module. */
export function rewriteFrom(
  edit: Draft,
  node: { readonly start: number; readonly end: number; readonly source: { readonly value: string } },
  use: (module: string) => string,
): void {
  edit.text.overwrite(node.start, node.end, `${use(awaitedModule(node.source.value))};`);
  hoist(edit, node);
}

/** Turn `import(…)` into a lookup and let `throw` pass through the runner, wherever they stand; refuse `import.meta`. */
export function rewriteExpressions(edit: Draft, original: string): void {
  walk(edit.program, (node) => {
    if (node.type === "ImportExpression") {
      edit.text.overwrite(node.start, node.source.start, `${RUNNER}.load(`);
      edit.text.overwrite(node.source.end, node.end, ")");
    }
    if (node.type === "ThrowStatement") {
      edit.text.appendLeft(node.argument.start, `${RUNNER}.thrown((`);
      edit.text.appendRight(node.argument.end, "))");
    }
    if (node.type === "MetaProperty" && node.meta.name === "import") {
      refuse(
        edit,
        original,
        node.start,
        "import.meta is not available here; write paths relative to the notebook",
      );
    }
    return true;
  });
}

/** The edited text with `"use strict"` in front and its way back to the original. */
export function finish({ text, stripped }: Draft, prefix = '"use strict";', suffix = ""): Rewritten {
  text.prepend(prefix);
  text.append(suffix);
  const inner = locator(text.generateDecodedMap({ hires: "boundary" }));
  const locate = (place: Position): Position | undefined => {
    const between = inner(place);
    return between && stripped.locate({ line: between.line - 1, column: between.column });
  };
  return { code: text.toString(), locate };
}
