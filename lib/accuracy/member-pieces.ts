// N, V and M along a member as polynomials whose beginnings follow from the end forces of its segments, laid out so that a
// solved frame is read without making anything. With s from the beginning of a piece, t from that of its segment:
//   M(s) = M1 + V1 t + c + (V1 + v) s - w0 s²/2 - w1 s³/6
//   V(s) = V1 + v - w0 s - w1 s²/2
//   N(s) = N1 + n - p0 s - p1 s²/2
// where N1, V1, M1 are those at the segment's start and c, v, n what the loads before the piece have added.

import type { Prepared } from "../exact/index.ts";
import {
  derivative,
  type MemberLoads,
  memberLoads,
  type Piecewise,
  type Side,
  valueAt,
} from "../results/index.ts";
import type { Imposed, Load } from "../structure/types.ts";

export interface Piece {
  readonly segment: number;
  /** m from the member's start. */
  readonly begin: number;
  readonly length: number;
  /** Distance of its beginning from that of its segment. */
  readonly t: number;
  readonly c: number;
  readonly v: number;
  readonly n: number;
  readonly w0: number;
  readonly w1: number;
  readonly p0: number;
  readonly p1: number;
}

/** The pieces of one member under loads, start to end. */
export function memberPieces(
  prepared: Prepared,
  loads: readonly (Load | Imposed)[],
  member: string,
): readonly Piece[] {
  const forces = loads.filter((l): l is Load => !isImposed(l.kind));
  const own = memberLoads(prepared.structure, forces, member);
  return prepared.skeleton.segments.flatMap((segment, e) =>
    segment.member === member ? segmentPieces(own, e, segment.begin, segment.end) : [],
  );
}

function isImposed(kind: string): boolean {
  return kind === "temperature" || kind === "settlement";
}

function segmentPieces(own: MemberLoads, segment: number, begin: number, end: number): readonly Piece[] {
  const near = 1e-9 * own.length;
  const inside = [...own.across.breaks, ...own.along.breaks, ...own.points.map((p) => p.x)]
    .filter((x) => x > begin + near && x < end - near)
    .sort((a, b) => a - b);
  const stops = [begin, ...inside.filter((x, i) => x - (inside[i - 1] ?? begin) > near), end];
  const slope = { across: derivative(own.across), along: derivative(own.along) };
  let [c, v, n] = [0, 0, 0];
  return stops.slice(0, -1).map((x, i) => {
    const length = (stops[i + 1] ?? x) - x;
    // a load at a hinge belongs to the segment before it
    if (i > 0 || begin === 0)
      for (const point of own.points)
        if (Math.abs(point.x - x) <= near) {
          n -= point.along;
          v -= point.across;
          c -= point.couple;
        }
    const middle = x + length / 2;
    const value = (f: Piecewise, df: Piecewise): readonly [number, number] => {
      const rise = valueAt(df, middle);
      return [valueAt(f, middle) - (rise * length) / 2, rise];
    };
    const [w0, w1] = value(own.across, slope.across);
    const [p0, p1] = value(own.along, slope.along);
    const piece: Piece = { segment, begin: x, length, t: x - begin, c, v, n, w0, w1, p0, p1 };
    c += v * length - (w0 * length ** 2) / 2 - (w1 * length ** 3) / 6;
    v -= w0 * length + (w1 * length ** 2) / 2;
    n -= p0 * length + (p1 * length ** 2) / 2;
    return Object.freeze(piece);
  });
}

/** Value of a force at s from the beginning of a piece; `F` from `from` on as `endForces` gives it. */
export function valueIn(piece: Piece, force: "N" | "V" | "M", F: Float64Array, s: number, from = 0): number {
  const { v, w0, w1 } = piece;
  const at = from + 6 * piece.segment;
  if (force === "N") return (F[at] ?? 0) + piece.n - s * (piece.p0 + (s * piece.p1) / 2);
  const V1 = F[at + 1] ?? 0;
  if (force === "V") return V1 + v - s * (w0 + (s * w1) / 2);
  const start = (F[at + 2] ?? 0) + V1 * piece.t + piece.c;
  return start + s * (V1 + v - s * (w0 / 2 + (s * w1) / 6));
}

/** Greatest (sense 1) or least (sense -1) value of a force over pieces: ends and turning points, by their formulas. */
export function extremeIn(
  pieces: readonly Piece[],
  force: "N" | "V" | "M",
  F: Float64Array,
  sense: 1 | -1,
  from = 0,
): number {
  let best = Number.NEGATIVE_INFINITY;
  for (let i = 0; i < pieces.length; i++) {
    const piece = pieces[i] as Piece; // i is within the length
    best = Math.max(
      best,
      sense * valueIn(piece, force, F, 0, from),
      sense * valueIn(piece, force, F, piece.length, from),
    );
    // the derivative is a + b s + d s²
    const V = force === "M";
    const load = force === "N" ? piece.p0 : piece.w0;
    const rise = force === "N" ? piece.p1 : piece.w1;
    const a = V ? (F[from + 6 * piece.segment + 1] ?? 0) + piece.v : -load;
    const b = V ? -load : -rise;
    const d = V ? -rise / 2 : 0;
    const root = Math.sqrt(b * b - 4 * a * d); // not a number when there is none, and then no turning point either
    const q = -(b + (b < 0 ? -root : root)) / 2;
    const [s1, s2] = [a / q, q / d];
    if (s1 > 0 && s1 < piece.length) best = Math.max(best, sense * valueIn(piece, force, F, s1, from));
    if (s2 > 0 && s2 < piece.length) best = Math.max(best, sense * valueIn(piece, force, F, s2, from));
  }
  return sense * best;
}

/** Index of the piece that holds x; a place between two pieces belongs to the one on the side asked for. */
export function pieceHolding(pieces: readonly Piece[], x: number, side: Side): number {
  const last = pieces[pieces.length - 1];
  const near = 1e-9 * ((last?.begin ?? 0) + (last?.length ?? 0));
  for (let i = 0; i + 1 < pieces.length; i++) {
    const next = pieces[i + 1]?.begin ?? 0;
    if (x < next - near || (side === "left" && x <= next + near)) return i;
  }
  return pieces.length - 1;
}
