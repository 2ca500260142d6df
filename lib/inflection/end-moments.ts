// End moments of a span under any load, its ends restrained against turning.
//
// With M(x) = M0(x) + M_A (1 - x/L) + M_B x/L and constant EI, virtual work gives the end slopes
//   EI θ_A = -∫ M (1 - x/L) dx        (θ clockwise at A, so that a sagging moment turns it)
//   EI θ_B = -∫ M x/L dx
// A fixed, B hinged: ∫ M0 (1 - x/L) dx + m_A L/3 = 0, hence the propped moment m_A = -(3/L) ∫ M0 (1 - x/L) dx.
// A held by a rotational spring k: M_A = -k θ with EI θ = ∫ M0 (1 - x/L) dx + M_A L/3 + M_B L/6, which gives
//   M_A = r_A (m_A - M_B/2),   r_A = k / (k + 3EI/L),   and likewise   M_B = r_B (m_B - M_A/2).
// The fixity r is 0 for an end free to turn and 1 for a fixed one.

import { add, integralOver, type Piecewise, piecewise, product } from "../results/index.ts";
import { InflectionError } from "./faults.ts";
import { type Span, simpleMoments } from "./span.ts";

/** End fixities of a span: 0 free to turn, 1 fixed. */
export interface Fixities {
  readonly left: number;
  readonly right: number;
}

export interface EndMoments {
  readonly left: number;
  readonly right: number;
}

/** Fixed-end moments of a span under any load, N·m, hogging negative; gives wL²/12 for a uniform load.
 *  Source: integration of M/EI with zero end slopes. */
export function fixedEndMoments(span: Span): EndMoments {
  return endMoments(span, { left: 1, right: 1 });
}

/** End moments of a span whose ends are restrained by given fixities, N·m, hogging negative. Throws when a fixity is not in 0..1. */
export function endMoments(span: Span, fixities: Fixities): EndMoments {
  return restrained(proppedMoments(span), fixities);
}

/** Moments along a span whose ends are restrained by given fixities, N·m. */
export function momentsBetween(span: Span, fixities: Fixities): Piecewise {
  const { left, right } = endMoments(span, fixities);
  return add(simpleMoments(span), piecewise([0, span.length], [[left, (right - left) / span.length]]));
}

/** Moments statics tells at the ends of a span, N·m, hogging negative: beside an overhang or under a couple. At least one. */
export interface KnownEnds {
  readonly left?: number;
  readonly right?: number;
}

/** End moments of a span with the moment known at an end and the other, unless known too, restrained by a fixity, N·m, hogging
 *  negative:
 *    M_A = r_A (m_A - M_B/2). */
export function endMomentsBeside(span: Span, { left, right }: KnownEnds, fixity: number): EndMoments {
  checkFixity(left === undefined ? "the left end" : "the right end", fixity);
  const m = proppedMoments(span);
  const other = (propped: number, known = 0): number => fixity * (propped - known / 2) + 0;
  return Object.freeze({ left: left ?? other(m.left, right), right: right ?? other(m.right, left) });
}

/** End moments of a span restrained by fixities, N·m, hogging negative, with those told by statics as they are. */
export function endMomentsGiven(
  span: Span,
  told: { readonly start: number | undefined; readonly end: number | undefined },
  fixities: Fixities,
): EndMoments {
  const { start, end } = told;
  if (start === undefined && end === undefined) return endMoments(span, fixities);
  const known = {
    ...(start === undefined ? {} : { left: start }),
    ...(end === undefined ? {} : { right: end }),
  };
  return endMomentsBeside(span, known, start === undefined ? fixities.left : fixities.right);
}

/** Fixity of an end held by a rotational stiffness k, from its ratio to that of the span: k L / EI. r = k / (k + 3EI/L).
 *  A column framing in gives 3 (far end pinned) or 4 (fixed) times (EI of column / h) / (EI / L). */
export function endFixity(restraint: number): number {
  if (!(restraint >= 0)) throw new InflectionError({ kind: "restraint", value: restraint });
  return restraint === Number.POSITIVE_INFINITY ? 1 : restraint / (restraint + 3);
}

/** m_A and m_B: the moment at one fixed end with the other free to turn. */
function proppedMoments(span: Span): EndMoments {
  const L = span.length;
  const M0 = simpleMoments(span);
  const nearLeft = piecewise([0, L], [[1, -1 / L]]);
  const nearRight = piecewise([0, L], [[0, 1 / L]]);
  return {
    left: (-3 / L) * integralOver(product(M0, nearLeft)),
    right: (-3 / L) * integralOver(product(M0, nearRight)),
  };
}

function restrained(m: EndMoments, { left: rA, right: rB }: Fixities): EndMoments {
  checkFixity("the left end", rA);
  checkFixity("the right end", rB);
  const both = 1 - (rA * rB) / 4;
  return Object.freeze({
    left: (rA * (m.left - (rB * m.right) / 2)) / both + 0,
    right: (rB * (m.right - (rA * m.left) / 2)) / both + 0,
  });
}

/** Throws when a fixity is not in 0..1. */
export function checkFixity(end: string, value: number): void {
  if (!(value >= 0 && value <= 1)) throw new InflectionError({ kind: "fixity", end, value });
}
