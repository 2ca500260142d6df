// Types out of TypeScript, positions kept: everything `oxc-transform` is used for.
//
// Behaviours leaned on (held by tests/kernel/rewrite.test.ts and semantics-table.ts):
//   - a name imported without `type` is kept although the cell never uses it (`onlyRemoveTypeImports`), in cells;
//     in local modules unused names are dropped, as the compiler does;
//   - enums become `var A = (function…)(A || {})`, namespaces `let N; (function…)(N || (N = {}))`;
//   - decorators are the older kind (`experimentalDecorators`) and call `babelHelpers.decorate`, `decorateParam`;
//   - an optional or typed class field without a value stays as a field.
import { TraceMap, traceSegment } from "@jridgewell/trace-mapping";
import { transformSync } from "oxc-transform";
import type { Position } from "../position.ts";
import { positionAt } from "../position.ts";
import type { SyntaxFault, Tree } from "../syntax.ts";

export interface Stripped {
  readonly code: string;
  /** Where a place of the stripped text stood before; line and column from 1. */
  readonly locate: (place: Position) => Position | undefined;
}

/** Thrown for text that is not TypeScript. `faults` are in the order they stand. */
export class SyntaxRefusal extends Error {
  readonly faults: readonly SyntaxFault[];
  readonly at: Position;
  constructor(source: string, faults: readonly SyntaxFault[]) {
    super(faults[0]?.message ?? "this is not TypeScript");
    this.name = "SyntaxError";
    this.faults = faults;
    this.at = positionAt(source, faults[0]?.start ?? 0);
  }
}

/** A lookup from generated to original places, for a version 3 source map with one source. */
export function locator(map: unknown): (place: Position) => Position | undefined {
  let trace: TraceMap | undefined;
  return ({ line, column }) => {
    if (line < 1) return undefined; // what the rewriting put in front
    trace ??= new TraceMap(map as ConstructorParameters<typeof TraceMap>[0]);
    const segment = traceSegment(trace, line - 1, column - 1);
    if (!segment || segment.length === 1) return undefined;
    return { line: segment[2] + 1, column: segment[3] + 1 };
  };
}

/** Take the types out of a parsed cell or module. Throws `SyntaxRefusal` with the tree's faults. */
export function strip(tree: Tree, { keepImports }: { readonly keepImports: boolean }): Stripped {
  if (tree.faults.length > 0) throw new SyntaxRefusal(tree.source, tree.faults);
  const result = transformSync("cell.ts", tree.source, {
    lang: "ts",
    sourceType: "module",
    typescript: { onlyRemoveTypeImports: keepImports, allowNamespaces: true },
    decorator: { legacy: true },
    helpers: { mode: "External" as never }, // an ambient const enum, which isolatedModules cannot name
    sourcemap: true,
  });
  if (result.errors.length > 0) {
    const faults = result.errors.map(({ message }) => ({ message, start: 0, end: 0 }));
    throw new SyntaxRefusal(tree.source, faults);
  }
  return { code: result.code, locate: locator(result.map) };
}
