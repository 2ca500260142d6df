// Changes as a reader wants them: results one by one, the many numbers of a table or of the equations in one line.

import type { Changes, ResultChange, WordChange } from "./change.ts";
import type { Entry, ShownValue } from "./record.ts";
import { cellNames, readerName, valuesOf } from "./values.ts";

/** The changed numbers of one table, or of all equations. */
export interface ChangedGroup {
  /** Entry id of the table; absent for the equations. */
  readonly id?: string;
  readonly name: string;
  readonly changed: number;
  readonly of: number;
  /** "most +12 %, M of BC at B"; "each +9.5 %"; empty where no change can be said in percent. */
  readonly most: string;
}

/** The changes of single results, and the rest in groups: tables in their order, then equations. */
export function condensed(
  changes: Changes,
  after: readonly Entry[],
  percentText: (percent: number) => string,
): { readonly single: readonly ResultChange[]; readonly groups: readonly ChangedGroup[] } {
  const single = changes.results.filter(({ kind }) => kind === "result" || kind === "calc");
  const tables = after.flatMap((entry): readonly ChangedGroup[] => {
    const own = entry.kind === "table" ? changes.results.filter(({ id }) => id === entry.id) : [];
    if (own.length === 0 || entry.kind !== "table") return [];
    const shown = own.map((one) => ({ ...one, name: withoutCaption(one.name) }));
    const sizes = new Map(
      valuesOf(entry).map(({ name, value }) => [withoutCaption(cellNames(entry).get(name) ?? ""), value]),
    );
    const most = mostText(shown, sizes, percentText);
    return [
      {
        id: entry.id,
        name: shortCaption(entry.caption),
        changed: own.length,
        of: valuesOf(entry).length,
        most,
      },
    ];
  });
  const steps = after.filter(({ kind }) => kind === "step");
  const turned = changes.results.filter(({ kind }) => kind === "step");
  if (turned.length === 0) return { single, groups: tables };
  const sizes = new Map(
    steps.flatMap((entry) => valuesOf(entry).map(({ value }) => [readerName(entry), value])),
  );
  const most = mostText(turned, sizes, percentText);
  const equations = { name: "equations of free bodies", changed: turned.length, of: steps.length, most };
  return { single, groups: [...tables, equations] };
}

/** A caption as far as it names the table. */
export const shortCaption = (caption: string): string => caption.replace(/[:(].*$/s, "").trim();

const withoutCaption = (name: string): string => name.replace(/ \([^()]*\)$/, "");

/** Values below this share of the largest of their kind are passed over where the greatest change in percent is sought. */
const SMALL = 0.05;

function mostText(
  changed: readonly ResultChange[],
  sizes: ReadonlyMap<string, ShownValue>,
  percentText: (percent: number) => string,
): string {
  const largest = new Map<string, number>();
  for (const { dimension, si } of sizes.values())
    largest.set(dimension, Math.max(largest.get(dimension) ?? 0, Math.abs(si)));
  const told = changed.flatMap(({ name, value: { percent } }) => {
    const size = sizes.get(name);
    if (percent === undefined || size === undefined) return [];
    return Math.abs(size.si) < SMALL * (largest.get(size.dimension) ?? 0) ? [] : [{ name, percent }];
  });
  const [first] = told;
  if (first === undefined) return "";
  const text = percentText(first.percent);
  if (
    changed.length > 1 &&
    told.length === changed.length &&
    told.every((one) => percentText(one.percent) === text)
  )
    return `each ${text}`;
  const most = told.reduce((a, b) => (Math.abs(b.percent) > Math.abs(a.percent) ? b : a));
  return `${changed.length > 1 ? "most " : ""}${percentText(most.percent)}, ${most.name}`;
}

/** What stands around the place where two texts part. */
const AROUND = 24;

/** Where a line's words differ, with a little around it; a table by the row, and how many of its rows. Undefined where only
 *  spaces differ. */
export function wordDifference({
  kind,
  before,
  after,
}: WordChange): { readonly before: string; readonly after: string; readonly more: number } | undefined {
  const [was, is] = [before, after].map((text) => text.split("\n").map(plainly));
  const gone = (was ?? []).filter((line) => !is?.includes(line));
  const come = (is ?? []).filter((line) => !was?.includes(line));
  const [a = "", b = ""] = [gone[0], come[0]];
  if (gone.length + come.length === 0) return undefined;
  const more = Math.max(gone.length, come.length) - 1;
  if (kind === "table") return { ...partingCells(a, b), more };
  return { ...parting(a, b), more };
}

const plainly = (text: string): string => text.replace(/\s+/g, " ").trim();

/** Of two rows the cells in words that are not the same; the whole words of a row that has no counterpart. */
function partingCells(a: string, b: string): { readonly before: string; readonly after: string } {
  const [was, is] = [a, b].map((row) => row.split(" | ").filter((cell) => cell !== "#"));
  const only = (own: readonly string[] = [], other: readonly string[] = []): string =>
    own.filter((cell) => !other.includes(cell)).join(", ");
  if (a === "" || b === "") return { before: (was ?? []).join(", "), after: (is ?? []).join(", ") };
  return { before: only(was, is), after: only(is, was) };
}

function parting(a: string, b: string): { readonly before: string; readonly after: string } {
  const short = Math.min(a.length, b.length);
  let start = 0;
  while (start < short && a[start] === b[start]) start++;
  let end = 0;
  while (end < short - start && a[a.length - 1 - end] === b[b.length - 1 - end]) end++;
  const cut = (text: string): string => {
    const [from, to] = [Math.max(0, start - AROUND), Math.min(text.length, text.length - end + AROUND)];
    return `${from > 0 ? "…" : ""}${text.slice(from, to)}${to < text.length ? "…" : ""}`;
  };
  return { before: cut(a), after: cut(b) };
}

/** A band's sentence as two ranges: "−132 to −104 kN·m (−140 to −99.4)"; other words as they are. */
export function bandInShort(text: string): string {
  const found = /between (\S+) and (.+?) ?(?:\([^()]*\))?, least (\S+?), greatest ([^ ,]+)/.exec(text);
  if (found === null) return text;
  const [, low = "", high = "", least = "", greatest = ""] = found;
  return `${low} to ${high.trim()} (${least} to ${greatest})`;
}
