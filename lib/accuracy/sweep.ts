// How results move as one unknown goes through its range, the others staying nominal.

import type { Imposed, Load, Structure } from "../structure/types.ts";
import type { WantedInCase } from "./asked.ts";
import { refuseImposed } from "./imposed.ts";
import { trialOf, tryOut } from "./trial.ts";
import { defaultUnknowns, freeOf, type Unknown, type Unknowns, valueAtPart } from "./unknowns.ts";
import { nominalValues } from "./varied.ts";

/** One unknown, the values it took, and per result (in the order asked for) its true value at each, N or N·m. */
export interface Sweep {
  readonly unknown: Unknown;
  readonly at: readonly number[];
  readonly truth: readonly (readonly number[])[];
}

/** The true values of results along each unknown that has a range, from its least to its most, in so many steps, the other unknowns at their
 *  nominal values (fixities in the middle of their ranges). */
export function sweeps(question: {
  readonly structure: Structure;
  readonly cases: readonly (readonly (Load | Imposed)[])[];
  readonly wanted: readonly WantedInCase[];
  readonly unknowns?: Unknowns;
  readonly steps?: number;
}): readonly Sweep[] {
  const { structure, cases, wanted, steps = 8 } = question;
  if (!Number.isInteger(steps) || steps < 1)
    throw new RangeError(`a sweep of ${steps} steps; a whole number from 1 is wanted`);
  refuseImposed(structure, cases);
  const trial = trialOf(structure, cases, wanted, question.unknowns ?? defaultUnknowns(structure));
  const out = new Float64Array(wanted.length);
  return Object.freeze(
    freeOf(trial.unknowns).map((k) => {
      const unknown = trial.unknowns[k] as Unknown; // k is one of their places
      const values = nominalValues(trial.unknowns);
      const at = Array.from({ length: steps + 1 }, (_, i) => valueAtPart(unknown, i / steps));
      const rows = at.map((value) => {
        values[k] = value;
        tryOut(trial, values, out);
        return [...out];
      });
      const truth = wanted.map((_, w) => Object.freeze(rows.map((row) => row[w] ?? Number.NaN)));
      return Object.freeze({ unknown, at: Object.freeze(at), truth: Object.freeze(truth) });
    }),
  );
}
