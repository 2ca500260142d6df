// The stiffness matrix as a list of terms:  entry(place) += EA α + EI β,  so that assembling is one loop.
//
// With t = (-s1, c1, s2, -c2) / L the rotations from the chord are r1 = θ1 + t·u, r2 = θ2 + t·u, and with
// a = (-c1, -s1, c2, s2) the lengthening is e = a·u, where u = (x1, y1, x2, y2).
// Entries of typed arrays within their length are numbers; `as number` says so to the compiler without a test at run time.

import type { Envelope } from "./envelope.ts";
import type { Segments } from "./prepare.ts";

export interface Coefficients {
  /** Terms of segment e are begin[e] to begin[e + 1]. */
  readonly begin: Int32Array;
  /** Where in the envelope. */
  readonly place: Int32Array;
  readonly alpha: Float64Array;
  readonly beta: Float64Array;
}

/** The terms of all segments that fall on free displacements. */
export function coefficientsOf(segments: Segments, { n, shift }: Envelope): Coefficients {
  const { count, places } = segments;
  const begin = new Int32Array(count + 1);
  const place = new Int32Array(21 * count);
  const alpha = new Float64Array(21 * count);
  const beta = new Float64Array(21 * count);
  const vectors = { a: new Float64Array(6), r1: new Float64Array(6), r2: new Float64Array(6) };
  let next = 0;
  for (let e = 0; e < count; e++) {
    const { ka, k11, k12, k22 } = fill(vectors, segments, e);
    const { a, r1, r2 } = vectors;
    for (let i = 0; i < 6; i++) {
      const row = places[6 * e + i] as number;
      if (row >= n) continue;
      const [ai, p, q] = [a[i] as number, r1[i] as number, r2[i] as number];
      const [b1, b2] = [k11 * p + k12 * q, k12 * p + k22 * q];
      for (let k = 0; k <= i; k++) {
        const column = places[6 * e + k] as number;
        if (column >= n) continue;
        const x = ka * ai * (a[k] as number);
        const y = b1 * (r1[k] as number) + b2 * (r2[k] as number);
        if (x === 0 && y === 0) continue;
        place[next] = (shift[Math.max(row, column)] as number) + Math.min(row, column);
        alpha[next] = x;
        beta[next] = y;
        next += 1;
      }
    }
    begin[e + 1] = next;
  }
  return { begin, place, alpha, beta };
}

/** a, r1 and r2 over (x1, y1, θ1, x2, y2, θ2), and the factors of a segment over its length. */
function fill(
  { a, r1, r2 }: { readonly a: Float64Array; readonly r1: Float64Array; readonly r2: Float64Array },
  segments: Segments,
  e: number,
): { readonly ka: number; readonly k11: number; readonly k12: number; readonly k22: number } {
  const L = segments.length[e] as number;
  const [c1, s1] = [segments.c1[e] as number, segments.s1[e] as number];
  const [c2, s2] = [segments.c2[e] as number, segments.s2[e] as number];
  a[0] = -c1;
  a[1] = -s1;
  a[3] = c2;
  a[4] = s2;
  for (const r of [r1, r2]) {
    r[0] = -s1 / L;
    r[1] = c1 / L;
    r[3] = s2 / L;
    r[4] = -c2 / L;
  }
  r1[2] = 1;
  r2[5] = 1;
  return {
    ka: (segments.ka[e] as number) / L,
    k11: (segments.k11[e] as number) / L,
    k12: (segments.k12[e] as number) / L,
    k22: (segments.k22[e] as number) / L,
  };
}
