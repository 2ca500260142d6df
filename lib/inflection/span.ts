// One span under loads across it, as a simple beam.
//
// q, P towards the reference fibre (down on a beam drawn left to right), couples C counter-clockwise;
// moments positive with tension on the reference fibre, so that hogging is negative. N, N/m, N·m, m; x from the left end.

import {
  constant,
  domain,
  integral,
  integralOver,
  type MemberPoint,
  type Piecewise,
  piecewise,
  product,
  scale,
  stepAt,
  sum,
} from "../results/index.ts";
import { InflectionError } from "./faults.ts";

/** A span and what acts across it; what `memberLoads` gives for a member is one. */
export interface Span {
  readonly length: number;
  readonly across: Piecewise;
  readonly points: readonly Pick<MemberPoint, "x" | "across" | "couple">[];
}

/** Moments of the simply supported span, N·m. */
export function simpleMoments(span: Span): Piecewise {
  const { across: q, points } = checked(span);
  const L = span.length;
  const fromRight = piecewise([0, L], [[L, -1]]);
  const about = integralOver(product(q, fromRight));
  const moment = points.reduce((total, p) => total + p.across * (L - p.x) + p.couple, about); // about the right end
  const R = moment / L;
  const jumps = points.flatMap((p) => (p.across === 0 ? [] : [stepAt(0, L, p.x, p.across)]));
  const V = sum(constant(0, L, R), scale(integral(q), -1), ...jumps.map((step) => scale(step, -1)));
  const turns = points.flatMap((p) => (p.couple === 0 ? [] : [stepAt(0, L, p.x, -p.couple)]));
  return sum(integral(V), ...turns);
}

/** Whether anything acts across the span. */
export function isLoaded({ across, points }: Span): boolean {
  return (
    across.pieces.some((piece) => piece.some((c) => c !== 0)) ||
    points.some((p) => p.across !== 0 || p.couple !== 0)
  );
}

function checked(span: Span): Span {
  const [a, b] = domain(span.across);
  if (!(span.length > 0) || !Number.isFinite(span.length))
    throw new InflectionError({ kind: "length", value: span.length });
  if (a !== 0 || Math.abs(b - span.length) > 1e-9 * span.length)
    throw new Error(`the load of the span is given on [${a}, ${b}]; [0, ${span.length}] is wanted`);
  for (const p of span.points)
    if (!(p.x >= 0 && p.x <= span.length && Number.isFinite(p.across) && Number.isFinite(p.couple)))
      throw new Error(
        `a point load of the span (${p.across} N, ${p.couple} N·m at ${p.x} m) is not finite or not on [0, ${span.length}]`,
      );
  return span;
}
