// What each assumption moves: the calculation run again with that assumption alone changed, everything else as it is.
import { type AnyUnit, lookUpUnit } from "../../lib/quantity/index.ts";
import {
  type AssumptionEntry,
  type CalculationRecord,
  type Entry,
  type Movement,
  type ShownValue,
  shareOf,
} from "../../lib/sheet/index.ts";
import { type Runner, runForRecord } from "./run-quietly.ts";

/** What an assumption is changed by. */
const SHARE = 0.1;
const CHANGE = "+10 %";
/** A result that moves less than this share of itself has not moved. */
const STILL = 1e-9;

type Valued = AssumptionEntry & { readonly value: ShownValue };

const isValued = (entry: Entry): entry is Valued => entry.kind === "assumption" && entry.value !== undefined;

/** What an assumption is set by from outside: its symbol, or its id where it has none. */
const keyOf = (entry: Valued): string => entry.symbol ?? entry.id;

/** The set a hinge belongs to: "hinge h1 (G + S)" is of "G + S". */
const setOf = (entry: Valued): string | undefined => /^hinge .* \((.*)\)$/s.exec(entry.id)?.[1];

/** One run for each valued assumption; `progress` hears one line for each. A hinge whose load no longer balances when
 *  it moves alone is moved together with the others of its set, once for the set. */
export async function movements(
  file: string,
  base: CalculationRecord,
  runner: Runner,
  progress: (text: string) => void = () => undefined,
): Promise<readonly Movement[]> {
  const found: Movement[] = [];
  const given = new Map(base.overrides.map((one) => [one.symbol, one.set]));
  const valued = base.entries.filter(isValued);
  const together = new Set<string>();
  for (const entry of valued) {
    const set = setOf(entry);
    if (set !== undefined && together.has(set)) continue;
    const alone = await moved(file, base, [entry], CHANGE, given, runner);
    const others = set === undefined ? [] : valued.filter((one) => setOf(one) === set);
    const fails = alone.failed !== undefined && others.length > 1;
    const change = `${CHANGE}, together with the other hinges under ${set}`;
    const one = fails ? await moved(file, base, others, change, given, runner) : alone;
    if (fails && set !== undefined) together.add(set);
    progress(`  ${one.assumption} ${one.change}: ${outcome(one)}\n`);
    found.push(one);
  }
  return found;
}

function outcome({ failed, results }: Movement): string {
  return failed === undefined ? `${results.length} results move` : `no answer, ${failed}`;
}

async function moved(
  file: string,
  base: CalculationRecord,
  entries: readonly Valued[],
  change: string,
  set: ReadonlyMap<string, string>,
  runner: Runner,
): Promise<Movement> {
  const [first] = entries;
  if (first === undefined) throw new Error("sensitivity: no assumption to change");
  const about = { assumption: first.id, change };
  if (first.value.si === 0)
    return { ...about, set: first.value, results: [], failed: "it is nought, which no share changes" };
  const overrides = new Map([...set, ...entries.map((one) => [keyOf(one), changedText(one.value)] as const)]);
  const { record, said } = await runForRecord(file, overrides, runner);
  if (record === undefined) return { ...about, set: first.value, results: [], failed: firstReason(said) };
  const now = record.entries.find((entry) => entry.id === first.id);
  return {
    ...about,
    set: now !== undefined && isValued(now) ? now.value : first.value,
    results: movedResults(base, record),
  };
}

/** The value changed, as one writes it, every digit kept. */
function changedText({ si, unit }: ShownValue): string {
  const factor = unit === "" ? 1 : lookUpUnit(unit as AnyUnit).factor;
  return `${(si * (1 + SHARE)) / factor} ${unit}`.trim();
}

/** The line of the message that says what went wrong, behind the line that says where. */
function firstReason(said: string): string {
  const [where = "", what] = said.split("\n").filter((one) => one.trim() !== "");
  return (what ?? where).slice(0, 500);
}

type Moving = Extract<Entry, { readonly kind: "result" | "calc" }>;
const isMoving = (entry: Entry | undefined): entry is Moving =>
  entry?.kind === "result" || entry?.kind === "calc";

function movedResults(base: CalculationRecord, changed: CalculationRecord): Movement["results"] {
  const now = new Map(changed.entries.map((entry) => [entry.id, entry]));
  return base.entries.flatMap((entry) => {
    const other = now.get(entry.id);
    if (!isMoving(entry) || !isMoving(other)) return [];
    const [before, after] = [entry.value.si, other.value.si];
    if (Math.abs(after - before) <= STILL * Math.max(Math.abs(before), Math.abs(after))) return [];
    const share = shareOf(before, after);
    return { id: entry.id, value: other.value, ...(share === undefined ? {} : { share }) };
  });
}
