// What changed between two records, as a table of text.
import {
  bandInShort,
  type CalculationRecord,
  type Changes,
  condensed,
  isUnchanged,
  type ValueChange,
  wordDifference,
} from "../../lib/sheet/index.ts";

type Rows = readonly (readonly string[])[];

/** Changes in percent with a sign: "+4.3 %". */
export function percentText({ percent }: ValueChange): string {
  if (percent === undefined) return "";
  const size = Math.abs(percent) >= 100 ? percent.toFixed(0) : percent.toFixed(1);
  return `${percent > 0 ? "+" : ""}${size.replace("-", "−")} %`;
}

/** Columns set under one another, two spaces between. */
function columns(rows: Rows): string {
  const widths = rows.reduce<number[]>(
    (most, row) => row.map((cell, i) => Math.max(most[i] ?? 0, cell.length)),
    [],
  );
  return rows
    .map((row) => `    ${row.map((cell, i) => cell.padEnd(widths[i] ?? 0)).join("  ")}`.trimEnd())
    .map((line) => `${line}\n`)
    .join("");
}

const cut = (text: string, most = 70): string => {
  const plain = text.replace(/\s+/g, " ").trim();
  return plain.length > most ? `${plain.slice(0, most - 1)}…` : plain;
};

const section = (title: string, rows: Rows): string =>
  rows.length === 0 ? "" : `  ${title}\n${columns(rows)}`;
const either = (text: string): string => (text === "" ? "nothing stated" : cut(text));

function groundRows({ grounds }: Changes): Rows {
  return grounds.flatMap(({ name, value, source, words, standing }) => {
    const on = `${standing.length} lines stand on it`;
    const rows: string[][] = [];
    if (value) rows.push([cut(name, 40), value.before, "->", value.after, percentText(value), on]);
    if (source) rows.push([cut(name, 40), either(source.before), "->", either(source.after), "", on]);
    if (words) rows.push([cut(name, 40), either(words.before), "->", either(words.after), "", on]);
    return rows;
  });
}

function resultRows({ single }: ReturnType<typeof condensed>): Rows {
  return single.map(({ name, value, governing }) => [
    governing ? "governs" : "",
    cut(name),
    value.before,
    "->",
    value.after,
    percentText(value),
  ]);
}

const groupRows = ({ groups }: ReturnType<typeof condensed>): Rows =>
  groups.map(({ name, changed, of, most }) => [
    cut(
      `${name}: ${changed} of ${of} ${of === 1 ? "value" : "values"}${most === "" ? "" : `, ${most}`}`,
      160,
    ),
  ]);

function bandRows({ bands = [] }: Changes): Rows {
  return bands.map(({ name, before, after, governing }) => [
    governing ? "governs" : "",
    cut(name.replace(/[:(].*$/s, "")),
    bandInShort(before),
    "->",
    bandInShort(after),
  ]);
}

const withoutNumbers = (text: string): string => text.replace(/[−+]?\d[\d.,\u202f]*/g, "#");

/** Queries that ask the same with other numbers are no news; those that are come first. */
function queryRows({ raised, settled }: Changes): {
  readonly [which in "raised" | "settled" | "same"]: Rows;
} {
  const [now, was] = [raised, settled].map((list) => new Set(list.map(({ name }) => withoutNumbers(name))));
  const same = raised.filter(({ name }) => was?.has(withoutNumbers(name)));
  const row = ({ name }: Changes["raised"][number]): readonly string[] => [cut(name, 160)];
  return {
    raised: raised.filter((one) => !same.includes(one)).map(row),
    settled: settled.filter(({ name }) => !now?.has(withoutNumbers(name))).map(row),
    same: same.map(row),
  };
}

function wordRows({ words }: Changes): Rows {
  return words.flatMap((one) => {
    const found = wordDifference(one);
    if (found === undefined) return [];
    const more = found.more === 0 ? "" : `and ${found.more} more`;
    const name = cut(one.kind === "table" ? one.name.replace(/[:(].*$/s, "") : one.name, 40);
    return [[one.kind, name, either(found.before), "->", either(found.after), more]];
  });
}

/** So many lines of a kind are named; the others are counted. */
const NAMED = 6;

function lineRows(list: Changes["added"]): Rows {
  const kinds = [...new Set(list.map(({ kind }) => kind))];
  return kinds.flatMap((kind) => {
    const own = list.filter((one) => one.kind === kind);
    const rows = own.slice(0, NAMED).map(({ name }) => [kind, cut(name)]);
    return own.length > NAMED ? [...rows, [kind, `and ${own.length - NAMED} more`]] : rows;
  });
}

/** The changes as text, what a reader needs first at the head. Numbers of tables and equations and the lines that stand on a
 *  changed one are counted here and named in the JSON. */
export function changesText(before: CalculationRecord, after: CalculationRecord, changes: Changes): string {
  const name = ({ head, notebook }: CalculationRecord): string => head.revision ?? notebook.name;
  const title = `${after.head.title}: ${name(before)} -> ${name(after)}\n`;
  if (isUnchanged(changes)) return `${title}  nothing changed\n`;
  const queries = queryRows(changes);
  const values = condensed(changes, after.entries, (percent) =>
    percentText({ before: "", after: "", percent }),
  );
  return [
    title,
    section(
      "head",
      changes.head.map(({ field, before: was, after: is }) => [field, was, "->", is]),
    ),
    section("givens and assumptions changed", groundRows(changes)),
    section("results changed", resultRows(values)),
    section("bands changed: where 90 % lie (least to greatest)", bandRows(changes)),
    section(
      "checks changed",
      changes.checks.map((one) => [one.turned ? "TURNED" : "", cut(one.name), one.before, "->", one.after]),
    ),
    section("queries raised", queries.raised),
    section("queries settled", queries.settled),
    section("queries still open, with other numbers", queries.same),
    section("numbers of tables and equations changed (each of them by --json)", groupRows(values)),
    section("words changed", wordRows(changes)),
    section("lines added", lineRows(changes.added)),
    section("lines removed", lineRows(changes.removed)),
  ].join("");
}
