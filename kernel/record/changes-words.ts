// What changed between two records, as a table of text.
import {
  type CalculationRecord,
  type Changes,
  isUnchanged,
  type ValueChange,
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

/** The changes as text; standing lines are counted here and named in the JSON. */
export function changesText(before: CalculationRecord, after: CalculationRecord, changes: Changes): string {
  const name = ({ head, notebook }: CalculationRecord): string => head.revision ?? notebook.name;
  const title = `${after.head.title}: ${name(before)} -> ${name(after)}\n`;
  if (isUnchanged(changes)) return `${title}  nothing changed\n`;
  return [
    title,
    section(
      "head",
      changes.head.map(({ field, before: was, after: is }) => [field, was, "->", is]),
    ),
    section("givens and assumptions changed", groundRows(changes)),
    section(
      "checks changed",
      changes.checks.map((one) => [one.turned ? "TURNED" : "", cut(one.name), one.before, "->", one.after]),
    ),
    section(
      "raised",
      changes.raised.map((one) => [cut(one.name, 200)]),
    ),
    section(
      "settled",
      changes.settled.map((one) => [cut(one.name, 200)]),
    ),
    section(
      "results changed",
      changes.results.map(({ name: line, value, governing }) => [
        governing ? "governs" : "",
        cut(line),
        value.before,
        "->",
        value.after,
        percentText(value),
      ]),
    ),
    section(
      "bands changed",
      (changes.bands ?? []).map(({ name: line, before: was, after: is, governing }) => [
        governing ? "governs" : "",
        cut(line, 40),
        cut(was, 120),
        "->",
        cut(is, 120),
      ]),
    ),
    section(
      "words changed",
      changes.words.map((one) => [one.kind, cut(one.before), "->", cut(one.after)]),
    ),
    section(
      "added",
      changes.added.map((one) => [one.kind, cut(one.name)]),
    ),
    section(
      "removed",
      changes.removed.map((one) => [one.kind, cut(one.name)]),
    ),
  ].join("");
}
