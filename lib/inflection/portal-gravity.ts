// Portals under gravity: how much of its fixed-end moment a beam keeps at the knees.
//   k = (EI of beam / L) / (EI of column / h)     m = 3 pinned bases, 4 fixed bases
//   M_knee = FEM m / (m + 2k)        A. Kleinlogel, Rigid Frame Formulas, from memory (wL²/(4(2k + 3)) and wL²/(6(k + 2)))
//   M = 0 where x(1 - x) = m / (m + 2k) / 6 under a uniform load, x from the knee as a part of L

import { checkRatio } from "./net-faults.ts";

export type PortalBase = "pinned" | "fixed";

const columnFactor = { pinned: 3, fixed: 4 } as const;

/** Knee moment of a symmetric portal under a symmetric load over its fixed-end moment; exact but for axial deformation. */
export function kneeShare(k: number, base: PortalBase): number {
  checkRatio("(EI of beam / L) / (EI of column / h)", k);
  const m = columnFactor[base];
  return m / (m + 2 * k);
}

/** Distance of the points of inflection from the knees under a uniform load, as a part of the span. */
export function kneeHinge(k: number, base: PortalBase): number {
  return (1 - Math.sqrt(1 - (4 * kneeShare(k, base)) / 6)) / 2;
}

/** One side of a portal: k = EI/L of its column, the column's height in m, what holds its base. */
export interface PortalSide {
  readonly k: number;
  readonly height: number;
  readonly base: PortalBase;
}

/** Moments, N·m, tension on the inside positive: knees and bases, left and right; and the force that would hold the frame
 *  against sway, to the right. */
export interface PortalMoments {
  readonly left: { readonly knee: number; readonly base: number };
  readonly right: { readonly knee: number; readonly base: number };
  readonly holding: number;
}

/** A portal with a level beam of k = EI/L and fixed-end moments (N·m, hogging negative), its columns of any height and stiffness.
 *  First held against sway, which is exact:
 *    (c1 + 4k) θ1 + 2k θ2 = -F1     2k θ1 + (c2 + 4k) θ2 = -F2     c = 3 or 4 times k of the column
 *  then the holding force is let go and shared by the stiffness of the columns (`swayShares`), which is not. */
export function portalMoments(
  k: number,
  sides: readonly [left: PortalSide, right: PortalSide],
  fixedEnds: { readonly left: number; readonly right: number },
): PortalMoments {
  checkRatio("k of the beam", k);
  for (const side of sides) {
    checkRatio("k of a column", side.k);
    checkRatio("height of a column", side.height);
  }
  const [c1, c2] = [columnFactor[sides[0].base] * sides[0].k, columnFactor[sides[1].base] * sides[1].k];
  const [F1, F2] = [0 - fixedEnds.left, fixedEnds.right]; // counter-clockwise on the beam
  const determinant = (c1 + 4 * k) * (c2 + 4 * k) - 4 * k * k;
  const turn1 = (2 * k * F2 - (c2 + 4 * k) * F1) / determinant;
  const turn2 = (2 * k * F1 - (c1 + 4 * k) * F2) / determinant;
  // inside tension: a counter-clockwise moment on the head of the left column, a clockwise one on that of the right column
  const held = [columnMoments(sides[0], c1 * turn1), columnMoments(sides[1], -c2 * turn2)] as const;
  const thrust = held.map(({ knee, base }, i) => (base - knee) / (sides[i]?.height ?? 1));
  const holding = (thrust[1] ?? 0) - (thrust[0] ?? 0);
  const sway = swayShares(k, sides, -holding);
  return Object.freeze({
    left: Object.freeze({ knee: held[0].knee + sway[0].knee, base: held[0].base - sway[0].base }),
    right: Object.freeze({ knee: held[1].knee - sway[1].knee, base: held[1].base + sway[1].base }),
    holding,
  });
}

function columnMoments({ base }: PortalSide, knee: number): { readonly knee: number; readonly base: number } {
  return { knee, base: base === "fixed" ? -knee / 2 : 0 };
}

type HeadAndBase = { readonly knee: number; readonly base: number };

/** Moments at heads and bases of two columns that share a force H to the right at beam level: each takes shear by a k/h²,
 *    c = 6 k_beam / k_column    fixed: a = (1 + c)/(4 + c), M = 0 at y h above the base, y = (1 + 2/c)/(2 + 2/c)
 *                               pinned: a = c/(12 + 4c), y = 0
 *  from slope-deflection with equal turns of both knees; exact for equal columns. A second time c is the mean of that and of
 *  c / (2 - t), the beam's restraint when the other knee's moment is t times this one's (our own mean).
 *  H > 0 gives positive values: tension on the inside at the left head and the right base. */
export function swayShares(
  k: number,
  sides: readonly [PortalSide, PortalSide],
  H: number,
): readonly [HeadAndBase, HeadAndBase] {
  const c = [(6 * k) / sides[0].k, (6 * k) / sides[1].k] as const;
  const [left, right] = shared(sides, c, H);
  if (left.knee === 0 || right.knee === 0) return [left, right];
  const t = right.knee / left.knee;
  const again = (c: number, t: number): number => (t < 2 ? (c + c / (2 - t)) / 2 : c);
  return shared(sides, [again(c[0], t), again(c[1], 1 / t)], H);
}

function shared(
  sides: readonly [PortalSide, PortalSide],
  c: readonly [number, number],
  H: number,
): readonly [HeadAndBase, HeadAndBase] {
  const stiff = ({ base, k, height }: PortalSide, c: number): number =>
    ((base === "fixed" ? (1 + c) / (4 + c) : c / (12 + 4 * c)) * k) / height ** 2;
  const all = [stiff(sides[0], c[0]), stiff(sides[1], c[1])] as const;
  const share = (i: 0 | 1): HeadAndBase => {
    const { height, base } = sides[i];
    const y = base === "fixed" ? (1 + 2 / c[i]) / (2 + 2 / c[i]) : 0;
    const V = (H * all[i]) / (all[0] + all[1]);
    return { knee: V * (1 - y) * height, base: V * y * height };
  };
  return [share(0), share(1)];
}
