// How well the joints balance.

import type { LoadCase } from "./load-case.ts";
import type { Prepared } from "./prepare.ts";
import { segmentForces, takeSegmentForces } from "./segment-forces.ts";
import type { SolvedCase } from "./solve.ts";
import type { Stiffness } from "./stiffness.ts";

/** Largest force (moment) left over at a free displacement, over the largest sum of magnitudes of forces (moments) that
 *  meet at one, before or after the joints have moved; forces and moments compared over the longest segment. */
export function residual(
  { segments, numbering }: Prepared,
  stiffness: Stiffness,
  { q, r }: SolvedCase,
  loadCase: LoadCase,
): number {
  const { places, free, total } = numbering;
  const largest = { force: 0, moment: 0 };
  const left = { force: 0, moment: 0 };
  const locked = new Float64Array(q.length);
  const before = loadCase.ground ?? new Float64Array(total + 1);
  segmentForces(segments, stiffness, loadCase, before, locked);
  const met = sumsOfMagnitudes(segments, [q, locked], loadCase.f);
  for (let i = 0; i < places.length; i++) {
    const place = places[i] ?? total;
    const kind = i % 3 === 2 ? "moment" : "force";
    if (place < total) largest[kind] = Math.max(largest[kind], met[place] ?? 0);
    if (place < free) left[kind] = Math.max(left[kind], Math.abs(r[place] ?? 0));
  }
  const longest = segments.length.reduce((a, b) => Math.max(a, b), 0);
  const moment = Math.max(largest.moment, largest.force * longest);
  const share = (part: number, whole: number): number => (whole > 0 ? part / whole : 0);
  return Math.max(share(left.force, moment / longest), share(left.moment, moment));
}

/** What meets at each displacement: loads and segment forces, each by its magnitude. */
function sumsOfMagnitudes(
  segments: Prepared["segments"],
  forces: readonly Float64Array[],
  f: Float64Array,
): Float64Array {
  const size = (column: Float64Array): Float64Array => column.map(Math.abs);
  const { c1, s1, c2, s2 } = segments;
  const bound = { ...segments, c1: size(c1), s1: size(s1), c2: size(c2), s2: size(s2) };
  const met = size(f);
  // One kind of force at a time, so that terms of opposite sign do not cancel.
  for (const q of forces)
    for (const kind of [0, 1, 2]) {
      const one = new Float64Array(f.length);
      takeSegmentForces(
        bound,
        q.map((value, i) => (i % 3 === kind ? Math.abs(value) : 0)),
        one,
      );
      one.forEach((value, i) => {
        met[i] = (met[i] ?? 0) + Math.abs(value);
      });
    }
  return met;
}
