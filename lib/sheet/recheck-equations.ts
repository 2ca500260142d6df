// Equations of equilibrium of a record added up again from the record alone. It imports nothing and shares no line with
// what solved them, so that it can run in a reader's browser as a second opinion. SI: N, N·m.

/** A known term of an equation: coefficient times value; `from` is the step the value was found by, "id@version". */
export interface RecheckedTerm {
  readonly coefficient: number;
  readonly value: number;
  readonly from?: string;
}

/** What is read of an entry; entries of other kinds pass through unread. */
export interface RecheckedLine {
  readonly kind: string;
  readonly id: string;
  readonly version?: number;
  readonly terms?: readonly RecheckedTerm[];
  readonly coefficient?: number;
  readonly value?: { readonly si: number };
  readonly closure?: boolean;
  readonly passed?: boolean;
}

/** An equation that does not add up as the record says. */
export interface EquationFault {
  readonly id: string;
  readonly words: string;
}

export interface EquationRecheck {
  /** Equations added up again. */
  readonly count: number;
  readonly faults: readonly EquationFault[];
}

/** An equation closes when its sum is below this share of its largest term. */
const CLOSES = 1e-9;
/** A sum below this, N or N·m, is nought whatever its terms. */
const NOUGHT = 1e-3;

/** Adds every step (terms + coefficient × result = 0) and every equation left over (terms = 0), and compares each term
 *  that an earlier step found with that step's result. */
export function recheckEquations(entries: readonly RecheckedLine[]): EquationRecheck {
  const results = new Map<string, number>();
  for (const { kind, id, version, value } of entries)
    if (kind === "step" && value !== undefined) results.set(`${id}@${version}`, value.si);
  const faults: EquationFault[] = [];
  let count = 0;
  for (const entry of entries) {
    if (entry.terms === undefined) continue;
    count++;
    for (const words of [...carriedFaults(entry.terms, results), ...sumFaults(entry)])
      faults.push({ id: entry.id, words });
  }
  return { count, faults };
}

function carriedFaults(terms: readonly RecheckedTerm[], results: ReadonlyMap<string, number>): string[] {
  return terms.flatMap(({ value, from }) => {
    if (from === undefined) return [];
    const found = results.get(from);
    if (found === undefined) return [`a term comes from "${from}", which is not in the record`];
    const near = Math.abs(found - value) <= CLOSES * Math.max(Math.abs(found), Math.abs(value));
    return near ? [] : [`a term is ${value} where "${from}" found ${found}`];
  });
}

function sumFaults({ kind, terms = [], coefficient, value, passed }: RecheckedLine): string[] {
  const parts = terms.map((term) => term.coefficient * term.value);
  if (kind === "step") parts.push((coefficient ?? Number.NaN) * (value?.si ?? Number.NaN));
  const sum = parts.reduce((a, b) => a + b, 0);
  const largest = parts.reduce((most, part) => Math.max(most, Math.abs(part)), 0);
  const closes = Math.abs(sum) <= CLOSES * largest + NOUGHT * CLOSES;
  if (kind === "step") return closes ? [] : [`the equation adds up to ${sum}, not to nought`];
  const small = closes || Math.abs(sum) <= NOUGHT;
  return small === passed
    ? []
    : [`the equation adds up to ${sum}; the record says it ${passed ? "closes" : "does not close"}`];
}
