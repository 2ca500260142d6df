// Bands of two records compared.

import { bandText } from "./band-words.ts";
import type { BandChange } from "./change.ts";
import { earlierCells } from "./earlier-cells.ts";
import type { Entry, ResultBand } from "./record.ts";
import { bandsOf, type NamedBand, readerName } from "./values.ts";

/** Ratios nearer than this are the same. */
const SAME = 1e-9;
const FOUR = ["low", "high", "least", "greatest"] as const;
const NONE = "no band";

/** The bands of one entry that lie otherwise about their values, in one line at most. */
export function bandChange(before: Entry, after: Entry): readonly BandChange[] {
  const [was, is] = [bandsOf(before), bandsOf(after)];
  const old = new Map(was.map((one) => [one.name, one]));
  const cells = before.kind === "table" && after.kind === "table" ? earlierCells(before, after) : undefined;
  const earlier = (name: string): string => (cells === undefined ? name : (cells.get(name) ?? ""));
  const now = new Set(is.map(({ name }) => earlier(name)));
  const otherwise = is.filter(({ name, band }) => differs(old.get(earlier(name))?.band, band));
  const gone = was.filter(({ name }) => !now.has(name));
  if (otherwise.length + gone.length === 0) return [];
  const governing = after.kind === "result" && after.governing;
  const words = (list: readonly NamedBand[]): string => {
    if (after.kind === "result") return list[0] === undefined ? NONE : bandText(list[0].band);
    return list.length === 0 ? NONE : `${list.length} ${list.length === 1 ? "band" : "bands"}`;
  };
  const many = `${otherwise.length} of them otherwise`;
  return [
    {
      id: after.id,
      name: readerName(after),
      before: words(was),
      after: after.kind === "table" && is.length > 0 && was.length > 0 ? `${words(is)}, ${many}` : words(is),
      governing,
    },
  ];
}

function differs(before: ResultBand | undefined, after: ResultBand): boolean {
  if (before === undefined || before.measure !== after.measure) return true;
  const size = Math.max(
    ...FOUR.flatMap((key) => [Math.abs(before.against[key]), Math.abs(after.against[key])]),
  );
  return FOUR.some((key) => Math.abs(before.against[key] - after.against[key]) > SAME * size);
}
