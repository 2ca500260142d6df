// Every number a record shows, one after another, under names that hold from one run to the next.

import type { Draft } from "./draft.ts";
import type { Entry, ResultBand, ShownValue, TableEntry } from "./record.ts";

/** One shown number: the entry it stands in, and a name that is unique in its record. */
export interface NamedValue {
  readonly id: string;
  /** The entry's id; for a cell of a table with its row and column. */
  readonly name: string;
  readonly value: ShownValue;
}

const isHeadedTwice = ({ columns }: TableEntry, column: number): boolean =>
  columns.indexOf(columns[column] ?? "") !== columns.lastIndexOf(columns[column] ?? "");

/** The name of a cell; a heading that is there twice says its column too. */
export function cellName(entry: TableEntry, row: number, column: number): string {
  const { id, columns } = entry;
  const heading = columns[column];
  const which = isHeadedTwice(entry, column) ? `${heading}, column ${column + 1}` : heading;
  return `${id}, row ${row + 1}, ${which ?? `column ${column + 1}`}`;
}

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

/** One band: the entry it stands in, and the name of the value it is of. */
export interface NamedBand {
  readonly id: string;
  readonly name: string;
  readonly band: ResultBand;
}

/** The bands an entry shows: its own value's, or those of the cells of a table. */
export function bandsOf(entry: Entry): readonly NamedBand[] {
  const { id } = entry;
  if (entry.kind === "table")
    return entry.rows.flatMap((row, i) =>
      row.flatMap((cell, j) =>
        typeof cell === "string" || cell.band === undefined
          ? []
          : { id, name: cellName(entry, i, j), band: cell.band },
      ),
    );
  return entry.kind === "result" && entry.band !== undefined ? [{ id, name: id, band: entry.band }] : [];
}

/** The numbers of a band, by name. */
export function bandValues({ name, id, band }: NamedBand): readonly NamedValue[] {
  const { low, high, least, greatest, bias } = band;
  return Object.entries({ low, high, least, greatest, bias }).map(([which, value]) => ({
    id,
    name: `${name}, ${which} of its band`,
    value,
  }));
}

/** What a reader knows a cell of a table by: the words its row begins with, its column, and the table's caption. */
export function cellNames(entry: TableEntry): ReadonlyMap<string, string> {
  const short = entry.caption.replace(/[:(].*$/s, "").trim();
  const names = entry.rows.flatMap((row, i) => {
    const numbers = row.findIndex((cell) => typeof cell !== "string");
    const first = row.slice(0, numbers === -1 ? 1 : numbers).join(", ");
    return row.flatMap((cell, j) => {
      if (typeof cell === "string") return [];
      // under a heading that is there twice the words just before the number tell which it is
      const beside = row.slice(1, j).findLast((one) => typeof one === "string");
      const label = isHeadedTwice(entry, j) && beside !== undefined ? `${String(row[0])}, ${beside}` : first;
      return [[cellName(entry, i, j), `${label}: ${entry.columns[j] ?? ""} (${short})`] as const];
    });
  });
  return new Map(names);
}

/** Every use an entry names, those in the cells of a table and those of bands included, each once. */
export function allUses(entry: Entry): readonly string[] {
  return [...new Set([...valueUses(entry), ...bandUses(entry)])];
}

/** What an entry's values stand on, those in the cells of a table included, each once. */
export function valueUses(entry: Entry): readonly string[] {
  const cells =
    entry.kind === "table"
      ? entry.rows.flatMap((row) => row.flatMap((cell) => (typeof cell === "string" ? [] : cell.uses)))
      : [];
  return [...new Set([...entry.uses, ...cells])];
}

/** The entries an entry's bands stand on, each once. */
export function bandUses(entry: Entry | Draft): readonly string[] {
  if (entry.kind === "result") return entry.band?.uses ?? [];
  if (entry.kind !== "table") return [];
  const cells = entry.rows
    .flat()
    .flatMap((cell) => (typeof cell === "string" ? [] : (cell.band?.uses ?? [])));
  return [...new Set(cells)];
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
