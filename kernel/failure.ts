// Why a cell failed, in the engineer's own lines.
import { inspect } from "node:util";
import type { CellDiagnostic } from "./check/index.ts";
import { excerpt, type Position } from "./position.ts";
import type { SyntaxRefusal } from "./rewrite/index.ts";
import type { Frame, Scripts } from "./scripts.ts";

/** A failed cell. Line and column (from 1) and the excerpt are absent where nothing tells them. */
export interface CellFailure {
  /** "refused" before it ran (not TypeScript, or the types do not fit), "thrown" while it ran, "interrupted" from
   *  outside. */
  readonly kind: "refused" | "thrown" | "interrupted";
  readonly name: string;
  readonly message: string;
  readonly cell: number;
  readonly line?: number;
  readonly column?: number;
  /** The lines around the place, with a caret. */
  readonly excerpt: string;
  readonly traceback: readonly string[];
}

interface ErrorShape {
  readonly name: string;
  readonly message: string;
  readonly stack: string;
  readonly cause?: unknown;
  readonly errors?: readonly unknown[];
}

/** An error by its shape: values from a cell have built-ins of their own. */
function errorShape(thrown: unknown): ErrorShape | undefined {
  if (typeof thrown !== "object" || thrown === null || !("message" in thrown)) return undefined;
  const { message, name, stack, cause, errors } = thrown as Record<string, unknown>;
  if (typeof message !== "string") return undefined;
  return {
    message,
    name: typeof name === "string" && name !== "" ? name : "Error",
    stack: typeof stack === "string" ? stack : "",
    ...(cause !== undefined ? { cause } : {}),
    ...(Array.isArray(errors) ? { errors } : {}),
  };
}

function frameLine({ caller, cell, file, line, column }: Frame): string {
  const where = cell === undefined ? file : `cell ${cell}`;
  const place = `${where}, line ${line}, column ${column}`;
  return caller === undefined ? `    at ${place}` : `    at ${caller} (${place})`;
}

const DEEPEST_CAUSE = 5;

function tracebackOf(thrown: unknown, scripts: Scripts, depth = 0): string[] {
  const error = errorShape(thrown);
  if (!error) return [`thrown: ${inspect(thrown)}`];
  const lines = [`${error.name}: ${error.message}`, ...scripts.frames(error.stack).map(frameLine)];
  if (depth >= DEEPEST_CAUSE) return lines;
  for (const one of error.errors ?? []) lines.push(...indented(tracebackOf(one, scripts, depth + 1)));
  if (error.cause !== undefined) {
    const [first = "", ...rest] = tracebackOf(error.cause, scripts, depth + 1);
    lines.push(`caused by ${first}`, ...rest);
  }
  return lines;
}

const indented = (lines: readonly string[]): string[] => lines.map((line) => `  ${line}`);

const atPlace = (
  source: string,
  at: Position | undefined,
  length = 1,
): Partial<Position> & { excerpt: string } =>
  at ? { line: at.line, column: at.column, excerpt: excerpt(source, at, length) } : { excerpt: "" };

/** A failure from what a cell threw. `at` is used where nothing carries a stack. */
export function thrownFailure(
  thrown: unknown,
  where: {
    readonly cell: number;
    readonly source: string;
    readonly script: string;
    readonly scripts: Scripts;
    readonly at?: Position | undefined;
    /** The stack at the `throw`, for a value that carries none. */
    readonly stack?: string | undefined;
  },
): CellFailure {
  const { cell, source, script, scripts, at, stack = "" } = where;
  const error = errorShape(thrown);
  const frames = scripts.frames(error && error.stack !== "" ? error.stack : stack);
  const own = frames.find((frame) => frame.script === script);
  const place = own ?? (frames.length === 0 && at ? scripts.place(script, at) : undefined);
  return Object.freeze({
    kind: "thrown",
    name: error?.name ?? "thrown",
    message: error?.message ?? inspect(thrown),
    cell,
    ...atPlace(source, place),
    traceback: Object.freeze([...tracebackOf(thrown, scripts), ...(error ? [] : frames.map(frameLine))]),
  });
}

/** A failure from text that is not TypeScript, or cannot run in a cell. */
export function syntaxFailure(refusal: SyntaxRefusal, cell: number, source: string): CellFailure {
  const { message, at } = refusal;
  return Object.freeze({
    kind: "refused",
    name: "SyntaxError",
    message,
    cell,
    ...atPlace(source, at),
    traceback: Object.freeze([
      `SyntaxError: ${message}`,
      `    at cell ${cell}, line ${at.line}, column ${at.column}`,
    ]),
  });
}

/** A failure from what the checker found in a cell; the first finding leads, the others stand in the traceback. */
export function checkFailure(
  found: readonly [CellDiagnostic, ...CellDiagnostic[]],
  cell: number,
  source: string,
): CellFailure {
  const [first] = found;
  const own = first.file === undefined;
  const lines = found.map(({ message, line, column, file }) => {
    const where = file ?? `cell ${cell}`;
    return `${where}, line ${line}, column ${column}: ${message}`;
  });
  return Object.freeze({
    kind: "refused",
    name: first.kind === "syntax" ? "SyntaxError" : "TypeError",
    message: own ? first.message : `${first.file}, line ${first.line}: ${first.message}`,
    cell,
    ...atPlace(source, own ? first : undefined, first.length),
    traceback: Object.freeze(lines),
  });
}

/** A failure of a cell that was cut off from outside. */
export function interruptedFailure(cell: number): CellFailure {
  const message = "the cell was interrupted; the names it had set by then keep their values";
  return Object.freeze({
    kind: "interrupted",
    name: "Interrupted",
    message,
    cell,
    excerpt: "",
    traceback: Object.freeze([`Interrupted: ${message}`]),
  });
}
