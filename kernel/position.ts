// Places in a cell's text: offsets (UTF-16 units, from 0) and lines and columns (both from 1).

export interface Position {
  readonly line: number;
  readonly column: number;
}

/** Line and column of an offset. An offset past the end gives the end. */
export function positionAt(source: string, offset: number): Position {
  const before = source.slice(0, Math.max(0, Math.min(offset, source.length)));
  const lastBreak = before.lastIndexOf("\n");
  return { line: before.split("\n").length, column: before.length - lastBreak };
}

/** Offset of a line and column, the inverse of `positionAt`. */
export function offsetAt(source: string, { line, column }: Position): number {
  let start = 0;
  for (let n = 1; n < line; n++) {
    const next = source.indexOf("\n", start);
    if (next < 0) return source.length;
    start = next + 1;
  }
  return Math.min(start + column - 1, source.length);
}

const CONTEXT_BEFORE = 2;
const CONTEXT_AFTER = 1;

/** The lines around a place with a caret under it; `length` is how far the caret reaches on that line. */
export function excerpt(source: string, { line, column }: Position, length = 1): string {
  const lines = source.replace(/\r/g, "").split("\n");
  const first = Math.max(1, line - CONTEXT_BEFORE);
  const last = Math.min(lines.length, line + CONTEXT_AFTER);
  const width = String(last).length;
  const shown: string[] = [];
  for (let n = first; n <= last; n++) {
    const text = lines[n - 1] ?? "";
    shown.push(`${n === line ? ">" : " "} ${String(n).padStart(width)} | ${text}`.trimEnd());
    if (n === line) shown.push(`  ${" ".repeat(width)} | ${underline(text, column, length)}`);
  }
  return shown.join("\n");
}

function underline(text: string, column: number, length: number): string {
  const indent = text.slice(0, column - 1).replace(/[^\t]/g, " ");
  const reach = Math.max(1, Math.min(length, text.length - column + 1));
  return indent.padEnd(column - 1) + "^".repeat(reach);
}
