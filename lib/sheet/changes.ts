// Two records of one calculation compared, line by line under their stable ids. What is the same is not listed.

import { bandChange } from "./band-changes.ts";
import type {
  Changes,
  CheckChange,
  GroundChange,
  LineNamed,
  ResultChange,
  ValueChange,
  WordChange,
} from "./change.ts";
import { earlierCells } from "./earlier-cells.ts";
import type {
  AssumptionEntry,
  CalculationRecord,
  CheckEntry,
  Entry,
  GivenEntry,
  Head,
  ShownValue,
} from "./record.ts";
import { standingOn, usersOf } from "./standing.ts";
import { cellNames, readerName, valuesOf } from "./values.ts";

/** Values nearer than this share of the largest of their dimension are the same: what another order of adding can do. */
const SAME = 1e-9;

type Differs = (before: ShownValue, after: ShownValue) => boolean;
type Pair<E extends Entry = Entry> = readonly [E, E];

/** Everything that differs from the earlier record to the later one. */
export function changesBetween(before: CalculationRecord, after: CalculationRecord): Changes {
  const old = new Map(before.entries.map((entry) => [entry.id, entry]));
  const now = new Set(after.entries.map(({ id }) => id));
  const pairs = after.entries.flatMap((entry): Pair[] => {
    const earlier = old.get(entry.id);
    return earlier?.kind === entry.kind ? [[earlier, entry]] : [];
  });
  const kept = new Set(pairs.map(([, { id }]) => id));
  const added = after.entries.filter(({ id }) => !kept.has(id));
  const removed = before.entries.filter(({ id, kind }) => !now.has(id) || (!kept.has(id) && kind !== "text"));
  const differs = differsIn([...before.entries, ...after.entries]);
  const bands = governingFirst(pairs.flatMap(([was, is]) => bandChange(was, is)));
  return Object.freeze({
    head: headChanges(before.head, after.head),
    grounds: groundChanges(pairs, after.entries, differs),
    results: governingFirst(pairs.flatMap((pair) => resultChanges(pair, differs))),
    ...(bands.length === 0 ? {} : { bands }),
    checks: pairs.flatMap(checkChange),
    raised: added.filter(isQuery).map(lineNamed),
    settled: removed.filter(isQuery).map(lineNamed),
    words: pairs.flatMap(wordChange),
    added: added.filter((entry) => !isQuery(entry)).map(lineNamed),
    removed: removed.filter((entry) => !isQuery(entry)).map(lineNamed),
  });
}

/** Whether two records differ in nothing that is listed. */
export function isUnchanged(changes: Changes): boolean {
  return Object.values(changes).every((list: readonly unknown[]) => list.length === 0);
}

const isQuery = (entry: Entry): boolean => entry.kind === "query";
const lineNamed = (entry: Entry): LineNamed => ({
  id: entry.id,
  name: readerName(entry),
  kind: entry.kind,
});

function differsIn(entries: readonly Entry[]): Differs {
  const largest = new Map<string, number>();
  for (const { value } of entries.flatMap(valuesOf))
    largest.set(value.dimension, Math.max(largest.get(value.dimension) ?? 0, Math.abs(value.si)));
  return (a, b) => a.dimension !== b.dimension || Math.abs(a.si - b.si) > SAME * sizeOf(a, b, largest);
}

/** The larger of two values; of values that are nought but for rounding, a thousandth of the largest there is. */
function sizeOf(a: ShownValue, b: ShownValue, largest: ReadonlyMap<string, number>): number {
  return Math.max(Math.abs(a.si), Math.abs(b.si), 1e-3 * (largest.get(a.dimension) ?? 0));
}

function valueChange(before: ShownValue, after: ShownValue): ValueChange {
  const percent = before.dimension === after.dimension ? shareOf(before.si, after.si) : undefined;
  return {
    before: before.text,
    after: after.text,
    ...(percent === undefined ? {} : { percent: percent * 100 }),
  };
}

/** The change over the value before, positive where it grew in its own sense; absent where it was nought. */
export function shareOf(before: number, after: number): number | undefined {
  return before === 0 ? undefined : (after - before) / before;
}

const FIELDS = [
  "title",
  "job",
  "preparedBy",
  "basis",
  "units",
  "status",
] as const satisfies readonly (keyof Head)[];

function headChanges(before: Head, after: Head): Changes["head"] {
  return FIELDS.filter((field) => before[field] !== after[field]).map((field) => ({
    field,
    before: before[field],
    after: after[field],
  }));
}

type Ground = GivenEntry | AssumptionEntry;
const isGround = (pair: Pair): pair is Pair<Ground> =>
  pair[1].kind === "given" || pair[1].kind === "assumption";

function groundChanges(
  pairs: readonly Pair[],
  entries: readonly Entry[],
  differs: Differs,
): readonly GroundChange[] {
  const users = usersOf(entries);
  return pairs.filter(isGround).flatMap(([before, after]) => {
    const value =
      before.value && after.value && differs(before.value, after.value)
        ? { value: valueChange(before.value, after.value) }
        : {};
    const source = textChange("source", whence(before), whence(after));
    const words = textChange("words", wordsOf(before), wordsOf(after));
    if (Object.keys({ ...value, ...source, ...words }).length === 0) return [];
    return {
      id: after.id,
      name: readerName(after),
      kind: after.kind,
      ...value,
      ...source,
      ...words,
      standing: standingOn(entries, after.id, users),
    };
  });
}

function textChange<K extends "source" | "words">(
  key: K,
  before: string,
  after: string,
): Partial<Record<K, { before: string; after: string }>> {
  return before === after
    ? {}
    : ({ [key]: { before, after } } as Record<K, { before: string; after: string }>);
}

const whence = (entry: Ground): string => (entry.kind === "given" ? (entry.source ?? "") : entry.because);

/** Words of a ground beside its value; an assumption's text that only repeats its value says nothing of its own. */
function wordsOf(entry: Ground): string {
  if (entry.kind === "given") return entry.description;
  return entry.value !== undefined ? "" : entry.text;
}

function resultChanges([before, after]: Pair, differs: Differs): readonly ResultChange[] {
  if (after.kind === "given" || after.kind === "assumption" || before.kind !== after.kind) return [];
  const earlier = new Map(valuesOf(before).map((one) => [one.name, one.value]));
  const cells = before.kind === "table" && after.kind === "table" ? earlierCells(before, after) : undefined;
  return valuesOf(after).flatMap(({ id, name, value }) => {
    const was = earlier.get(cells === undefined ? name : (cells.get(name) ?? ""));
    if (was === undefined || !differs(was, value)) return [];
    const words = (after.kind === "table" ? cellNames(after).get(name) : undefined) ?? readerName(after);
    return {
      id,
      name: words,
      kind: after.kind as ResultChange["kind"],
      value: valueChange(was, value),
      governing: after.kind === "result" && after.governing,
    };
  });
}

const governingFirst = <T extends { readonly governing: boolean }>(changes: readonly T[]): readonly T[] => [
  ...changes.filter(({ governing }) => governing),
  ...changes.filter(({ governing }) => !governing),
];

function checkChange([before, after]: Pair): readonly CheckChange[] {
  if (before.kind !== "check" || after.kind !== "check") return [];
  const turned = before.passed !== after.passed;
  const used = Math.abs((before.utilisation ?? 0) - (after.utilisation ?? 0)) > SAME;
  if (!turned && !used) return [];
  return [
    { id: after.id, name: readerName(after), before: verdictOf(before), after: verdictOf(after), turned },
  ];
}

function verdictOf({ passed, utilisation }: CheckEntry): string {
  const used = utilisation === undefined ? "" : `, utilisation ${utilisation.toPrecision(3)}`;
  return `${passed ? "holds" : "DOES NOT HOLD"}${used}`;
}

function wordChange([before, after]: Pair): readonly WordChange[] {
  const [was, is] = [sayings(before), sayings(after)];
  if (was === is) return [];
  return [{ id: after.id, name: readerName(after), kind: after.kind, before: was, after: is }];
}

/** What an entry says beside its values. */
function sayings(entry: Entry): string {
  switch (entry.kind) {
    case "calc":
      return entry.description === "" ? entry.formula : `${entry.formula} (${entry.description})`;
    case "check":
      return entry.closure === true ? "" : entry.formula;
    case "result":
      return `${entry.description}${entry.governing ? " (governs)" : ""}`;
    case "finding":
      return [entry.verdict, ...entry.lines].join("\n");
    case "note":
    case "conclusion":
      return entry.text;
    case "text":
      return entry.markdown;
    case "table":
      return [
        entry.columns.join(" | "),
        ...entry.rows.map((row) => row.map((cell) => (typeof cell === "string" ? cell : "#")).join(" | ")),
      ].join("\n");
    default:
      return "";
  }
}
