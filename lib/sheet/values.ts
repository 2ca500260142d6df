// Every number a record shows, one after another, under names that hold from one run to the next.

import type { Entry, ShownValue, TableEntry } from "./record.ts";

/** One shown number: the entry it stands in, and a name that is unique in its record. */
export interface NamedValue {
  readonly id: string;
  /** The entry's id; for a cell of a table with its row and column. */
  readonly name: string;
  readonly value: ShownValue;
}

const cellName = ({ id, columns }: TableEntry, row: number, column: number): string =>
  `${id}, row ${row + 1}, ${columns[column] ?? `column ${column + 1}`}`;

/** The numbers an entry shows: its own value, or the cells of a table. */
export function valuesOf(entry: Entry): readonly NamedValue[] {
  const { id } = entry;
  if (entry.kind === "table")
    return entry.rows.flatMap((row, i) =>
      row.flatMap((cell, j) =>
        typeof cell === "string" ? [] : { id, name: cellName(entry, i, j), value: cell.value },
      ),
    );
  return "value" in entry && entry.value !== undefined ? [{ id, name: id, value: entry.value }] : [];
}

/** What a reader knows a cell of a table by: the words its row begins with, its column, and the table's caption. */
export function cellNames(entry: TableEntry): ReadonlyMap<string, string> {
  const short = entry.caption.replace(/[:(].*$/s, "").trim();
  const names = entry.rows.flatMap((row, i) => {
    const numbers = row.findIndex((cell) => typeof cell !== "string");
    const label = row.slice(0, numbers === -1 ? 1 : numbers).join(", ");
    return row.flatMap((cell, j) =>
      typeof cell === "string"
        ? []
        : [[cellName(entry, i, j), `${label}: ${entry.columns[j] ?? ""} (${short})`] as const],
    );
  });
  return new Map(names);
}

/** Every use an entry names, those in the cells of a table included, each once. */
export function allUses(entry: Entry): readonly string[] {
  const cells =
    entry.kind === "table"
      ? entry.rows.flatMap((row) => row.flatMap((cell) => (typeof cell === "string" ? [] : cell.uses)))
      : [];
  return [...new Set([...entry.uses, ...cells])];
}

/** What a reader knows an entry by: its symbol, or its words. */
export function readerName(entry: Entry): string {
  switch (entry.kind) {
    case "given":
    case "calc":
    case "result":
      return entry.symbol;
    case "assumption":
      return entry.symbol ?? entry.text;
    case "check":
      return entry.description === "" ? entry.formula : entry.description;
    case "step":
      return entry.body;
    case "finding":
      return entry.title;
    case "table":
    case "figure":
      return entry.caption;
    case "text":
      return `text of cell ${entry.cell}`;
    case "note":
    case "query":
    case "conclusion":
      return entry.text;
  }
}
