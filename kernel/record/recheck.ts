// Every equation and formula of a record worked out again from the record alone.
import { type CalculationRecord, recheckEquations, recheckFormulas } from "../../lib/sheet/index.ts";

export interface Counted {
  /** How many were worked out again. */
  readonly count: number;
  readonly faults: readonly string[];
}

interface Answer {
  readonly count: number;
  readonly faults: readonly { readonly id: string; readonly words: string }[];
}

const inWords = ({ count, faults }: Answer): Counted => ({
  count,
  faults: faults.map(({ id, words }) => `${id}: ${words}`),
});

/** Re-adds every equation and recomputes every formula. */
export function recheck({ entries }: CalculationRecord): {
  readonly equations: Counted;
  readonly formulas: Counted;
} {
  return { equations: inWords(recheckEquations(entries)), formulas: inWords(recheckFormulas(entries)) };
}
