// Sums of load cases: which cases, their loads together, and the sum of what was kept of each.

import type { Imposed, Load } from "../structure/types.ts";
import type { CasePart, InCase } from "./asked.ts";
import { AccuracyError } from "./faults.ts";

type Loads = readonly (Load | Imposed)[];

/** A sum of load cases; `key` is the same for the same sum. */
export interface Combination {
  readonly key: string;
  readonly parts: readonly CasePart[];
  readonly loads: Loads;
}

/** The sum of load cases a question is about; `what` names the question. Throws on a case that is not there, on a factor that is
 *  no number, and on a sum of none. */
export function combinationOf(cases: readonly Loads[], asked: InCase, what: string): Combination {
  const factors = new Map<number, number>();
  for (const part of asked.loadCases ?? [asked.loadCase ?? 0]) {
    const { loadCase, factor } = typeof part === "number" ? { loadCase: part, factor: 1 } : part;
    if (!Number.isInteger(loadCase) || loadCase < 0 || loadCase >= cases.length)
      throw new AccuracyError({ kind: "no such case", value: what, loadCase, count: cases.length });
    if (!Number.isFinite(factor))
      throw new AccuracyError({ kind: "bad factor", value: what, loadCase, factor });
    factors.set(loadCase, (factors.get(loadCase) ?? 0) + factor);
  }
  if (factors.size === 0) throw new AccuracyError({ kind: "no cases", value: what, count: cases.length });
  const parts = [...factors]
    .map(([loadCase, factor]): CasePart => ({ loadCase, factor }))
    .sort((a, b) => a.loadCase - b.loadCase);
  const loads = parts.flatMap(({ loadCase, factor }) =>
    (cases[loadCase] ?? []).map((load) => (factor === 1 ? load : times(load, factor))),
  );
  return { key: parts.map((p) => `${p.loadCase}*${p.factor}`).join("+"), parts, loads };
}

/** A load times a factor. */
function times(load: Load | Imposed, factor: number): Load | Imposed {
  switch (load.kind) {
    case "distributed":
      return { ...load, q1: load.q1 * factor, q2: load.q2 * factor };
    case "temperature":
      return { ...load, uniform: load.uniform * factor, difference: load.difference * factor };
    case "settlement":
      return { ...load, x: load.x * factor, y: load.y * factor, rotation: load.rotation * factor };
    default:
      return { ...load, fx: load.fx * factor, fy: load.fy * factor, couple: load.couple * factor };
  }
}

/** Adds the parts of a combination up: `states` holds `size` numbers per load case from `begin` on. Answers where the sum stands:
 *  in `states` itself for a case alone, otherwise at the beginning of `room`. */
export function summed(
  { parts }: Combination,
  states: Float64Array,
  begin: number,
  size: number,
  room: Float64Array,
): readonly [in_: Float64Array, from: number] {
  const [first] = parts;
  if (parts.length === 1 && first?.factor === 1) return [states, begin + first.loadCase * size];
  room.fill(0, 0, size);
  for (const { loadCase, factor } of parts) {
    const from = begin + loadCase * size;
    for (let i = 0; i < size; i++) room[i] = (room[i] as number) + factor * (states[from + i] as number); // both hold `size` numbers
  }
  return [room, 0];
}
