// From displacements to the forces of every segment, and from those to what they take from their nodes.
// Entries of typed arrays within their length are numbers; `as number` says so to the compiler without a test at run time.

import type { LoadCase } from "./load-case.ts";
import type { Segments } from "./prepare.ts";
import type { Stiffness } from "./stiffness.ts";

/** n, m1, m2 of every segment from the displacements, with the fixed forces of the loads and free deformations. */
export function segmentForces(
  { count, length, c1, s1, c2, s2, places, member, ka, k11, k12, k22 }: Segments,
  stiffness: Stiffness,
  { fixed, thermal }: Pick<LoadCase, "fixed" | "thermal">,
  u: Float64Array,
  q: Float64Array,
): void {
  for (let e = 0; e < count; e++) {
    const L = length[e] as number;
    const p = 6 * e;
    const x1 = u[places[p] as number] as number;
    const y1 = u[places[p + 1] as number] as number;
    const x2 = u[places[p + 3] as number] as number;
    const y2 = u[places[p + 4] as number] as number;
    const u1 = x1 * (c1[e] as number) + y1 * (s1[e] as number);
    const u2 = x2 * (c2[e] as number) + y2 * (s2[e] as number);
    const v1 = y1 * (c1[e] as number) - x1 * (s1[e] as number);
    const v2 = y2 * (c2[e] as number) - x2 * (s2[e] as number);
    const psi = (v2 - v1) / L; // rotation of the chord
    let lengthening = u2 - u1;
    let r1 = (u[places[p + 2] as number] as number) - psi;
    let r2 = (u[places[p + 5] as number] as number) - psi;
    if (thermal !== undefined) {
      lengthening -= (thermal[2 * e] as number) * L;
      r1 += ((thermal[2 * e + 1] as number) * L) / 2;
      r2 -= ((thermal[2 * e + 1] as number) * L) / 2;
    }
    const EA = ((stiffness.EA[member[e] as number] as number) / L) * (ka[e] as number);
    const EI = (stiffness.EI[member[e] as number] as number) / L;
    q[3 * e] = EA * lengthening + (fixed[3 * e] as number);
    q[3 * e + 1] = EI * ((k11[e] as number) * r1 + (k12[e] as number) * r2) + (fixed[3 * e + 1] as number);
    q[3 * e + 2] = EI * ((k12[e] as number) * r1 + (k22[e] as number) * r2) + (fixed[3 * e + 2] as number);
  }
}

/** Subtracts from r what the segments take from their nodes. */
export function takeSegmentForces(
  { count, length, c1, s1, c2, s2, places }: Segments,
  q: Float64Array,
  r: Float64Array,
): void {
  for (let e = 0; e < count; e++) {
    const p = 6 * e;
    const n = q[3 * e] as number;
    const m1 = q[3 * e + 1] as number;
    const m2 = q[3 * e + 2] as number;
    const V = (m1 + m2) / (length[e] as number);
    const at = places;
    r[at[p] as number] = (r[at[p] as number] as number) + n * (c1[e] as number) + V * (s1[e] as number);
    r[at[p + 1] as number] =
      (r[at[p + 1] as number] as number) + n * (s1[e] as number) - V * (c1[e] as number);
    r[at[p + 2] as number] = (r[at[p + 2] as number] as number) - m1;
    r[at[p + 3] as number] =
      (r[at[p + 3] as number] as number) - n * (c2[e] as number) - V * (s2[e] as number);
    r[at[p + 4] as number] =
      (r[at[p + 4] as number] as number) - n * (s2[e] as number) + V * (c2[e] as number);
    r[at[p + 5] as number] = (r[at[p + 5] as number] as number) - m2;
  }
}
