// The cells of a table as it was before, found again in the table as it is now: rows by the words they begin with, columns by
// their headings, whatever rows were put in or taken out between them.

import type { TableCell, TableEntry } from "./record.ts";
import { cellName } from "./values.ts";

/** Each text with its count so far, so that the second "M" is another than the first. */
function numbered(texts: readonly string[]): readonly string[] {
  const seen = new Map<string, number>();
  return texts.map((text) => {
    const count = (seen.get(text) ?? 0) + 1;
    seen.set(text, count);
    return `${text}\n${count}`;
  });
}

const rowWords = (row: readonly TableCell[]): string =>
  row.map((cell) => (typeof cell === "string" ? cell : "#")).join("\n");

/** For each row now the row it was. Rows whose words are others are the same ones in their order, if there are as many. */
function rowsBefore(before: TableEntry, after: TableEntry): ReadonlyMap<number, number> {
  const [was, is] = [before, after].map(({ rows }) => numbered(rows.map(rowWords)));
  const found = new Map((was ?? []).map((key, i) => [key, i]));
  const pairs = (is ?? []).map((key, i) => [i, found.get(key)] as const);
  const kept = new Set(pairs.map(([, old]) => old));
  const gone = before.rows.flatMap((_, i) => (kept.has(i) ? [] : [i]));
  const come = pairs.filter(([, old]) => old === undefined);
  const renamed = come.length === gone.length ? gone : [];
  return new Map(
    pairs.flatMap(([i, old]) => {
      const earlier = old ?? renamed[come.findIndex(([one]) => one === i)];
      return earlier === undefined ? [] : [[i, earlier] as const];
    }),
  );
}

/** Names of the cells of a table now, each with the name the cell had before; those that are new are left out. */
export function earlierCells(before: TableEntry, after: TableEntry): ReadonlyMap<string, string> {
  const rows = rowsBefore(before, after);
  const columns = new Map(numbered(before.columns).map((key, j) => [key, j]));
  const now = numbered(after.columns);
  return new Map(
    [...rows].flatMap(([i, row]) =>
      now.flatMap((key, j) => {
        const column = columns.get(key);
        return column === undefined ? [] : [[cellName(after, i, j), cellName(before, row, column)] as const];
      }),
    ),
  );
}
