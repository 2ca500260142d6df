// Whether a calculation run again gives what its record says: every value, every check, then everything else.
import {
  bandsOf,
  bandValues,
  type CalculationRecord,
  canonicalJson,
  type Entry,
  type NamedValue,
  readerName,
  valuesOf,
} from "../../lib/sheet/index.ts";

export interface Reproduction {
  /** Values and verdicts compared. */
  readonly count: number;
  /** Each that is not reproduced, in words. */
  readonly values: readonly string[];
  /** What else is not as the record says: lines, their words, what they stand on. */
  readonly parts: readonly string[];
}

/** Values agree to this share of their size: what another machine's last binary digit can do. */
const SAME = 1e-12;

/** The record of a file compared with that of its notebook run again. */
export function reproduction(said: CalculationRecord, again: CalculationRecord): Reproduction {
  const now = new Map(again.entries.map((entry) => [entry.id, entry]));
  const known = new Set(said.entries.map(({ id }) => id));
  const compared = said.entries.map((entry) => compareEntry(entry, now.get(entry.id)));
  const extra = again.entries.filter(({ id }) => !known.has(id));
  return {
    count: compared.reduce((sum, one) => sum + one.count, 0),
    values: compared.flatMap((one) => one.values),
    parts: [
      ...compared.flatMap((one) => one.parts),
      ...extra.map((entry) => `${place(entry)}: the run gives this line, the file does not have it`),
      ...frameDifferences(said, again),
    ],
  };
}

const shownIn = (entry: Entry): readonly NamedValue[] => [
  ...valuesOf(entry),
  ...bandsOf(entry).flatMap(bandValues),
];

const place = (entry: Entry): string => {
  const name = readerName(entry).replace(/\s+/g, " ");
  return `${entry.kind} "${name.length > 80 ? `${name.slice(0, 79)}…` : name}"`;
};

function compareEntry(said: Entry, again: Entry | undefined): Reproduction {
  const own = shownIn(said);
  const count = own.length + (said.kind === "check" ? 1 : 0);
  if (again === undefined || again.kind !== said.kind)
    return { count, values: own.map(({ name }) => `${name}: not given by the run`), parts: missing(said) };
  const found = new Map(shownIn(again).map(({ name, value }) => [name, value]));
  const values = own.flatMap(({ name, value }) => {
    const other = found.get(name);
    if (other === undefined) return [`${name}: not given by the run`];
    const near = Math.abs(other.si - value.si) <= SAME * Math.max(Math.abs(other.si), Math.abs(value.si));
    if (near && other.text === value.text && other.dimension === value.dimension) return [];
    return [`${name}: the file says ${value.text} (${value.si}), the run gives ${other.text} (${other.si})`];
  });
  const verdict =
    said.kind === "check" && again.kind === "check" && said.passed !== again.passed
      ? [`${said.formula}: the file says it ${holds(said.passed)}, by the run it ${holds(again.passed)}`]
      : [];
  const same = canonicalJson(withoutNumbers(said)) === canonicalJson(withoutNumbers(again));
  const parts = same ? [] : [`${place(said)}: its words, references or figure are not those of the run`];
  return { count, values: [...values, ...verdict], parts };
}

const holds = (passed: boolean): string => (passed ? "holds" : "does not hold");
const missing = (entry: Entry): readonly string[] => [`${place(entry)}: the run does not give this line`];

/** Everything an entry says beside the values it shows, which are compared one by one; plain numbers rounded to what
 *  must agree. */
function withoutNumbers(value: unknown): unknown {
  if (typeof value === "number") return Math.abs(value) < 1e-9 ? 0 : Number(value.toPrecision(11));
  if (Array.isArray(value)) return value.map(withoutNumbers);
  if (typeof value !== "object" || value === null) return value;
  if ("si" in value && "dimension" in value && "text" in value) return "a value";
  return Object.fromEntries(Object.entries(value).map(([key, member]) => [key, withoutNumbers(member)]));
}

// Set when a revision is issued, not by the notebook.
const BY_ISSUE = ["revision", "date", "checkedBy", "checkedOn", "approvedBy", "approvedOn"] as const;

function frameDifferences(said: CalculationRecord, again: CalculationRecord): string[] {
  const wrong: string[] = [];
  const headOf = ({ head }: CalculationRecord): object =>
    Object.fromEntries(
      Object.entries(head).filter(([field]) => !(BY_ISSUE as readonly string[]).includes(field)),
    );
  if (canonicalJson(headOf(said)) !== canonicalJson(headOf(again)))
    wrong.push("the head: title, job, basis, units or status are not those of the run");
  if (canonicalJson(said.overrides) !== canonicalJson(again.overrides))
    wrong.push("the values set from outside are not those of the run");
  if (canonicalJson(said.notConsidered ?? []) !== canonicalJson(again.notConsidered ?? []))
    wrong.push("what was not considered is not what the run says");
  if (said.complete !== again.complete) wrong.push("the file is marked incomplete, the run reached its end");
  return wrong;
}
