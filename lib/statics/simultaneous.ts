// Equations that must be taken together: the smallest set with as many unknowns as equations.

import { eliminate } from "./elimination.ts";
import { coefficientIn, type Equation, type Found, termsOf, unknownsIn } from "./equations.ts";
import { StaticsError } from "./faults.ts";

export interface Answer {
  readonly equation: Equation;
  readonly unknown: string;
  readonly result: number;
}

/** Two or three equations where such a set exists, otherwise as many as it takes. */
export function simultaneous(
  equations: readonly Equation[],
  known: ReadonlyMap<string, Found>,
): readonly Answer[] {
  const open = equations.filter((e) => unknownsIn(e, known).length > 0);
  const set = smallSet(open, known, 2) ?? smallSet(open, known, 3) ?? wholeSet(open, known);
  return solved(set, known);
}

function smallSet(
  equations: readonly Equation[],
  known: ReadonlyMap<string, Found>,
  count: 2 | 3,
): readonly Equation[] | undefined {
  const few = equations.filter((e) => unknownsIn(e, known).length <= count);
  const extend = (chosen: readonly Equation[], from: number): readonly Equation[] | undefined => {
    const names = unknownsOf(chosen, known);
    if (names.length > count || rankOf(chosen, names) < chosen.length) return undefined;
    if (chosen.length === count) return names.length === count ? chosen : undefined;
    for (let i = from; i < few.length; i++) {
      const next = few[i];
      const found = next === undefined ? undefined : extend([...chosen, next], i + 1);
      if (found !== undefined) return found;
    }
    return undefined;
  };
  return extend([], 0);
}

/** Independent equations, in order, until there are as many as unknowns. Throws where there are too few. */
function wholeSet(equations: readonly Equation[], known: ReadonlyMap<string, Found>): readonly Equation[] {
  const names = unknownsOf(equations, known);
  const chosen: Equation[] = [];
  const basis: Float64Array[] = [];
  for (const equation of equations) {
    const row = Float64Array.from(names, (name) => coefficientIn(equation, name));
    if (grows(basis, row)) chosen.push(equation);
    if (chosen.length === names.length) return chosen;
  }
  throw new StaticsError({ kind: "too few equations", unknowns: names, equations: chosen.length });
}

/** Whether a row is independent of the orthonormal basis; if so it is added to it. */
export function grows(basis: Float64Array[], row: Float64Array): boolean {
  const before = Math.hypot(...row);
  if (before === 0) return false;
  const rest = row.map((v) => v / before);
  // twice, because one pass of Gram-Schmidt loses orthogonality to rounding
  for (let pass = 0; pass < 2; pass++)
    for (const unit of basis) {
      const along = rest.reduce((total, v, k) => total + v * (unit[k] ?? 0), 0);
      for (let k = 0; k < rest.length; k++) rest[k] = (rest[k] ?? 0) - along * (unit[k] ?? 0);
    }
  const left = Math.hypot(...rest);
  if (left < 1e-9) return false;
  basis.push(rest.map((v) => v / left));
  return true;
}

function solved(set: readonly Equation[], known: ReadonlyMap<string, Found>): readonly Answer[] {
  const names = unknownsOf(set, known);
  const matrix = set.map((e) => Float64Array.from(names, (name) => coefficientIn(e, name)));
  const right = Float64Array.from(
    set,
    (e) => -termsOf(e, known).reduce((sum, t) => sum + t.coefficient * t.value, 0),
  );
  const [x] = eliminate(matrix, names.length, [right]).solutions;
  const owner = matched(matrix, names.length);
  return set.map((equation, i) => {
    const k = owner[i] ?? 0;
    return { equation, unknown: names[k] ?? "", result: (x?.[k] ?? Number.NaN) + 0 };
  });
}

/** For each equation an unknown of its own that enters it (augmenting paths). */
function matched(matrix: readonly Float64Array[], columns: number): readonly number[] {
  const rowOf = new Array<number>(columns).fill(-1);
  const place = (row: number, tried: Set<number>): boolean => {
    for (let k = 0; k < columns; k++) {
      if ((matrix[row]?.[k] ?? 0) === 0 || tried.has(k)) continue;
      tried.add(k);
      const holder = rowOf[k] ?? -1;
      if (holder >= 0 && !place(holder, tried)) continue;
      rowOf[k] = row;
      return true;
    }
    return false;
  };
  matrix.forEach((_, row) => {
    place(row, new Set());
  });
  return matrix.map((_, row) => rowOf.indexOf(row));
}

function unknownsOf(equations: readonly Equation[], known: ReadonlyMap<string, Found>): readonly string[] {
  return [...new Set(equations.flatMap((e) => unknownsIn(e, known)))];
}

function rankOf(equations: readonly Equation[], names: readonly string[]): number {
  if (equations.length === 0) return 0;
  const matrix = equations.map((e) => Float64Array.from(names, (name) => coefficientIn(e, name)));
  return eliminate(matrix, names.length).rank;
}
