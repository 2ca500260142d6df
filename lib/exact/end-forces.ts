// N, V and M at the ends of every segment of a solved load case, for those who want no more and want it often.
// Entries of typed arrays within their length are numbers; `as number` says so to the compiler without a test at run time.

import type { Prepared } from "./prepare.ts";
import type { Solved } from "./solve.ts";

/** N, V, M at the start and N, V, M at the end: six per segment, in the order of `prepared.skeleton.segments` (one segment
 *  per member, more where it has hinges). N, N·m, signs as in results; loads exactly at an end are not in them.
 *  `into` is overwritten and returned. */
export function endForces(
  prepared: Prepared,
  solved: Solved,
  loadCase = 0,
  into: Float64Array = new Float64Array(6 * prepared.segments.count),
): Float64Array {
  const loads = prepared.loadCases[loadCase];
  const q = solved.cases[loadCase]?.q;
  if (loads === undefined || q === undefined)
    throw new Error(
      `there is no load case ${loadCase}; ${prepared.loadCases.length} were prepared, counted from 0`,
    );
  const { beside } = loads;
  const { count, length } = prepared.segments;
  for (let e = 0; e < count; e++) {
    const n = q[3 * e] as number;
    const m1 = q[3 * e + 1] as number;
    const m2 = q[3 * e + 2] as number;
    const V = (m1 + m2) / (length[e] as number);
    into[6 * e] = n + (beside[3 * e] as number);
    into[6 * e + 1] = V + (beside[3 * e + 1] as number);
    into[6 * e + 2] = -m1;
    into[6 * e + 3] = n;
    into[6 * e + 4] = V + (beside[3 * e + 2] as number);
    into[6 * e + 5] = m2;
  }
  return into;
}
