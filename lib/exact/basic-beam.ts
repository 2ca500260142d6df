// One segment between two nodes, seen in its own axes: x from start to end, v towards the left of that walk.
//
// EA, EI    axial and flexural rigidity          L         length
// e         lengthening                          r1, r2    end rotations from the chord, counter-clockwise
// n         axial force at the end               m1, m2    end moments on the segment, counter-clockwise
//   n = ka EA/L e + nF        (m1, m2) = EI/L K (r1, r2) + (m1F, m2F)
// A segment whose ends are supported like a simple beam has end rotations r1F / EI, r2F / EI and lengthening eF / EA
// under its loads. They are found from the influence of one force or couple at x; a load that varies linearly over a
// stretch acts on these cubics like three forces at the Gauss points (exact to degree 5).

import type { Release } from "../structure/index.ts";

/** What a segment's ends let through: the factor ka, the matrix K = [[k11, k12], [k12, k22]], and which end has no shear. */
export interface EndPattern {
  readonly ka: 0 | 1;
  readonly k11: number;
  readonly k12: number;
  readonly k22: number;
  readonly start: Release;
  readonly end: Release;
}

/** The pattern of two end releases (a segment released so far that it floats is refused when a structure is made). */
export function endPattern(start: Release, end: Release): EndPattern {
  const ka = start.axial === true || end.axial === true ? 0 : 1;
  const shearless = start.shear === true || end.shear === true;
  const [k11, k12, k22] = flexural(start.moment, end.moment, shearless);
  return { ka, k11, k12, k22, start, end };
}

/** Stiffness over EI/L: 4, 2 both ends rigid; 3 the far end pinned; 1, -1 bent by a constant moment; 0 when determinate. */
function flexural(startPinned: boolean, endPinned: boolean, shearless: boolean): [number, number, number] {
  if (shearless) return startPinned || endPinned ? [0, 0, 0] : [1, -1, 1];
  if (startPinned) return endPinned ? [0, 0, 0] : [0, 0, 3];
  return endPinned ? [3, 0, 0] : [4, 2, 4];
}

/** Sums over the loads of a segment: forces along P and across Q (towards the left), with their lever arms, couples C,
 *  and the deformations eF, r1F, r2F of the simple beam. */
export interface LoadSums {
  P: number;
  Px: number;
  Q: number;
  Qx: number;
  C: number;
  eF: number;
  r1F: number;
  r2F: number;
}

/** No load yet. */
export function noLoad(): LoadSums {
  return { P: 0, Px: 0, Q: 0, Qx: 0, C: 0, eF: 0, r1F: 0, r2F: 0 };
}

/** Adds a force (along, across) and a couple at x to the sums of a segment of length L. */
export function addForce(
  sums: LoadSums,
  L: number,
  x: number,
  along: number,
  across: number,
  couple: number,
): void {
  sums.P += along;
  sums.Px += along * x;
  sums.Q += across;
  sums.Qx += across * x;
  sums.C += couple;
  sums.eF += along * x; // ∫ N dx of a bar held at its start
  sums.r1F +=
    (across * x * (L - x) * (2 * L - x)) / (6 * L) + (couple * (2 * L * L - 6 * L * x + 3 * x * x)) / (6 * L);
  sums.r2F -= (across * x * (L * L - x * x)) / (6 * L) + (couple * (L * L - 3 * x * x)) / (6 * L);
}

/** Places and weights of three Gauss points on [0, 1]. */
const places = [0.5 - Math.sqrt(0.15), 0.5, 0.5 + Math.sqrt(0.15)] as const;
const weights = [5 / 18, 8 / 18, 5 / 18] as const;

/** Adds a line load q(x) = q1 at a, linear to q2 at b, whose direction has the components along and across. */
export function addLine(
  sums: LoadSums,
  L: number,
  a: number,
  b: number,
  q1: number,
  q2: number,
  along: number,
  across: number,
): void {
  for (let k = 0; k < 3; k++) {
    const place = places[k] ?? 0;
    const q = (q1 + (q2 - q1) * place) * (weights[k] ?? 0) * (b - a);
    addForce(sums, L, a + (b - a) * place, q * along, q * across, 0);
  }
}

/** n, m1, m2 under the loads while the nodes stay where they are. */
export function fixedForces(pattern: EndPattern, L: number, s: LoadSums): readonly [number, number, number] {
  const { ka, k11, k12, k22, start, end } = pattern;
  const n = ka === 1 ? -s.eF / L : start.axial === true ? -s.P : 0;
  const m1 = -(k11 * s.r1F + k12 * s.r2F) / L;
  const m2 = -(k12 * s.r1F + k22 * s.r2F) / L;
  if (start.shear !== true && end.shear !== true) return [n, m1, m2];
  const S = start.shear === true ? s.Q * L - s.Qx - s.C : -s.Qx - s.C; // m1 + m2 for no shear at that end
  if (start.moment) return [n, 0, S];
  return end.moment ? [n, S, 0] : [n, m1 + S / 2, m2 + S / 2];
}

/** Forces of the loads on the nodes: along at the start (all of it), across at the start and at the end. */
export function nodeForces(L: number, s: LoadSums): readonly [number, number, number] {
  const end = (s.Qx + s.C) / L;
  return [s.P, s.Q - end, end];
}
