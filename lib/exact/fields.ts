// N, V, M, rotation and displacements along a member as exact piecewise polynomials, from the forces of its segments.
// Between two places where something changes, with t from the left one:
//   p, w line loads along and towards the left, each linear in t
//   N' = -p   V' = w   M' = V   u' = N/EA + ε0   θ' = M/EI + κ0   v' = θ

import { type Piecewise, piecewise } from "../results/index.ts";

/** What a member's field is made from, SI; moments as in results. `p` and `w` are line loads [value, slope] by x. */
export interface SegmentState {
  readonly begin: number;
  readonly length: number;
  readonly EA: number;
  readonly EI: number;
  readonly epsilon: number;
  readonly kappa: number;
  /** N, V, M at the start; loads exactly there come after it. */
  readonly N: number;
  readonly V: number;
  readonly M: number;
  /** u, v, θ at the start of the segment itself. */
  readonly u: number;
  readonly v: number;
  readonly theta: number;
}

/** A line load on a member in its own axes: linear from [p1, w1] at `begin` to [p2, w2] at `end`. */
export interface OwnLine {
  readonly begin: number;
  readonly end: number;
  readonly p1: number;
  readonly p2: number;
  readonly w1: number;
  readonly w2: number;
}

/** A force (along, left) and a couple on a member. */
export interface OwnPoint {
  readonly x: number;
  readonly along: number;
  readonly left: number;
  readonly couple: number;
}

export interface Fields {
  readonly N: Piecewise;
  readonly V: Piecewise;
  readonly M: Piecewise;
  readonly along: Piecewise;
  readonly rotation: Piecewise;
  readonly deflection: Piecewise;
}

/** The fields of one member from its segments, start to end, and the loads between its ends. */
export function fieldsOf(
  segments: readonly SegmentState[],
  lines: readonly OwnLine[],
  points: readonly OwnPoint[],
): Fields {
  const breaks: number[] = [];
  const pieces: Record<keyof Fields, number[][]> = {
    N: [],
    V: [],
    M: [],
    along: [],
    rotation: [],
    deflection: [],
  };
  for (const segment of segments) appendSegment(segment, lines, points, breaks, pieces);
  const last = segments[segments.length - 1];
  breaks.push((last?.begin ?? 0) + (last?.length ?? 0));
  return {
    N: piecewise(breaks, pieces.N),
    V: piecewise(breaks, pieces.V),
    M: piecewise(breaks, pieces.M),
    along: piecewise(breaks, pieces.along),
    rotation: piecewise(breaks, pieces.rotation),
    deflection: piecewise(breaks, pieces.deflection),
  };
}

function appendSegment(
  segment: SegmentState,
  lines: readonly OwnLine[],
  points: readonly OwnPoint[],
  breaks: number[],
  pieces: Record<keyof Fields, number[][]>,
): void {
  const { begin, length, EA, EI, epsilon, kappa } = segment;
  let { N, V, M, u, v, theta } = segment;
  const stops = stopsOf(segment, lines, points);
  const near = 1e-9 * length;
  for (let i = 0; i + 1 < stops.length; i++) {
    const [x, next] = [stops[i] ?? 0, stops[i + 1] ?? 0];
    const h = next - x;
    for (const point of points)
      if ((x > begin || begin === 0) && Math.abs(point.x - x) <= near) {
        N -= point.along;
        V += point.left;
        M -= point.couple;
      }
    const [p0, p1, w0, w1] = loadOn(lines, x, next);
    const piece = {
      N: [N, -p0, -p1 / 2],
      V: [V, w0, w1 / 2],
      M: [M, V, w0 / 2, w1 / 6],
      along: [u, N / EA + epsilon, -p0 / (2 * EA), -p1 / (6 * EA)],
      rotation: [theta, M / EI + kappa, V / (2 * EI), w0 / (6 * EI), w1 / (24 * EI)],
      deflection: [v, theta, (M / EI + kappa) / 2, V / (6 * EI), w0 / (24 * EI), w1 / (120 * EI)],
    };
    breaks.push(x);
    for (const key of keys) pieces[key].push(piece[key]);
    N = horner(piece.N, h);
    V = horner(piece.V, h);
    M = horner(piece.M, h);
    u = horner(piece.along, h);
    theta = horner(piece.rotation, h);
    v = horner(piece.deflection, h);
  }
}

const keys = ["N", "V", "M", "along", "rotation", "deflection"] as const;

function horner(coefficients: readonly number[], t: number): number {
  let value = 0;
  for (let k = coefficients.length - 1; k >= 0; k--) value = value * t + (coefficients[k] ?? 0);
  return value;
}

/** The ends of a segment and the places inside where a load begins, ends or acts. */
function stopsOf(
  { begin, length }: SegmentState,
  lines: readonly OwnLine[],
  points: readonly OwnPoint[],
): readonly number[] {
  const end = begin + length;
  if (lines.length === 0 && points.length === 0) return [begin, end];
  const near = 1e-9 * length;
  const inside = [...lines.flatMap((l) => [l.begin, l.end]), ...points.map((p) => p.x)]
    .filter((x) => x > begin + near && x < end - near)
    .sort((a, b) => a - b);
  return [begin, ...inside.filter((x, i) => i === 0 || x - (inside[i - 1] ?? x) > near), end];
}

/** Line loads between two stops: value at the first and slope, along and towards the left. */
function loadOn(
  lines: readonly OwnLine[],
  x: number,
  next: number,
): readonly [number, number, number, number] {
  let [p0, p1, w0, w1] = [0, 0, 0, 0];
  const middle = (x + next) / 2;
  for (const { begin, end, ...l } of lines) {
    if (middle <= begin || middle >= end) continue;
    const [ps, ws] = [(l.p2 - l.p1) / (end - begin), (l.w2 - l.w1) / (end - begin)];
    p0 += l.p1 + ps * (x - begin);
    p1 += ps;
    w0 += l.w1 + ws * (x - begin);
    w1 += ws;
  }
  return [p0, p1, w0, w1];
}
