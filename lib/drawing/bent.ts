// The curves of a shape drawn qualitatively. Each bend of a member curves one way by an amount of its own; the amounts are
// chosen near one another so that members meet at their corners without a kink and pass through their supports.
//
//   d(x)  deflection towards the left of the walk, in the unit of length;  d' = rotation, counter-clockwise;  d'' = curvature,
//   positive for sagging. Along a bend from b of length l the curvature is a 6 t (1 - t) / L with t = (x - b)/l, so that
//   d' grows by a l/L over it and its resultant lies at its middle.

import { axisOf, type Member, type Structure } from "../structure/index.ts";
import { leastSquares, type Row } from "./least-squares.ts";
import type { Bend, ShapeFigure } from "./spec.ts";

/** Displacement of a member at x metres from its start, in any unit: along it, and across it towards the left of the walk. */
export interface Curve {
  readonly along: (x: number) => number;
  readonly across: (x: number) => number;
}

/** Share of the mean member length that the greatest displacement of a joint is drawn as. */
const MOVE = 0.16;
const LEAST_BEND = 0.3;
const MUST = 60;
const HARDLY = 0.02;

interface Unknowns {
  count: number;
  readonly rows: Row[];
}

const fresh = (unknowns: Unknowns, value = 0, weight = HARDLY): number => {
  const i = unknowns.count++;
  unknowns.rows.push({ terms: [[i, 1]], value, weight });
  return i;
};

interface Bent {
  readonly member: Member;
  readonly length: number;
  readonly bends: readonly {
    readonly begin: number;
    readonly end: number;
    readonly sign: number;
    readonly amount: number;
  }[];
  readonly kinks: readonly { readonly at: number; readonly amount: number }[];
  readonly slope: number;
  /** Deflections of its ends: known parts, and unknown ones by index. */
  readonly ends: readonly [End, End];
  /** Displacements of its ends along it. */
  readonly drift: readonly [number, number];
}

interface End {
  readonly known: number;
  readonly unknown?: readonly [index: number, share: number];
}

const signOf = (sense: Bend["sense"]): number => (sense === "sagging" ? 1 : sense === "hogging" ? -1 : 0);

/** Joints that a single member leaves hanging free. */
function isTip(structure: Structure, joint: string): boolean {
  const meeting = structure.members.filter((m) => m.start === joint || m.end === joint);
  return meeting.length === 1 && !structure.supports.some((s) => s.joint === joint);
}

/** The deflection of every member the shape names; members it leaves out stay straight between their joints. */
export function bentCurves({ structure, members, moves = [] }: ShapeFigure): ReadonlyMap<string, Curve> {
  const unknowns: Unknowns = { count: 0, rows: [] };
  const rotation = new Map<string, number>();
  const tips = new Map<string, number>();
  for (const { name } of structure.joints) {
    const support = structure.supports.find((s) => s.joint === name);
    rotation.set(name, fresh(unknowns, 0, support?.holds.rotation ? MUST : HARDLY));
    if (isTip(structure, name)) tips.set(name, fresh(unknowns));
  }
  const lengths = structure.members.map((m) => axisOf(structure, m).length);
  const unit = (MOVE * lengths.reduce((a, b) => a + b, 0)) / Math.max(1, lengths.length);
  const bent = structure.members.map((member): Bent => {
    const { length, c, s } = axisOf(structure, member);
    const end = (joint: string): End => {
      const move = moves.find((m) => m.joint === joint);
      const known = move === undefined ? 0 : (-s * move.x + c * move.y) * unit;
      const tip = tips.get(joint);
      return tip === undefined ? { known } : { known, unknown: [tip, length] };
    };
    const drift = (joint: string): number => {
      const move = moves.find((m) => m.joint === joint);
      return move === undefined ? 0 : (c * move.x + s * move.y) * unit;
    };
    const bends = (members.find((m) => m.member === member.name)?.bends ?? []).map((bend) => ({
      begin: bend.begin * length,
      end: bend.end * length,
      sign: signOf(bend.sense),
      amount: fresh(unknowns, 1, 1),
    }));
    const kinks = structure.hinges
      .filter((h) => h.member === member.name)
      .map((h) => ({ at: h.at, amount: fresh(unknowns) }));
    const joined = (joint: string, released: boolean): number =>
      released ? fresh(unknowns) : (rotation.get(joint) ?? 0);
    const slope = joined(member.start, member.releases.start.moment);
    const last = joined(member.end, member.releases.end.moment);
    const one: Bent = {
      member,
      length,
      bends,
      kinks,
      slope,
      ends: [end(member.start), end(member.end)],
      drift: [drift(member.start), drift(member.end)],
    };
    unknowns.rows.push(...compatible(one, last));
    return one;
  });
  const x = solved(unknowns, bent);
  return new Map(bent.map((one) => [one.member.name, curveOf(one, x)]));
}

/** The two equations of a member: the rotation and the deflection of its end follow from those of its start. */
function compatible({ length: L, bends, kinks, slope, ends }: Bent, last: number): readonly Row[] {
  const turn = bends.map(({ begin, end, sign, amount }) => [amount, (sign * (end - begin)) / L] as const);
  const lift = bends.map(
    ({ begin, end, sign, amount }) =>
      [amount, (sign * (end - begin) * (L - (begin + end) / 2)) / (L * L)] as const,
  );
  const side = (end: End, sign: number) =>
    end.unknown === undefined ? [] : [[end.unknown[0], (sign * end.unknown[1]) / L] as const];
  return [
    {
      terms: [[slope, 1], ...turn, ...kinks.map((k) => [k.amount, 1] as const), [last, -1]],
      value: 0,
      weight: MUST,
    },
    {
      terms: [
        [slope, 1],
        ...lift,
        ...kinks.map((k) => [k.amount, (L - k.at) / L] as const),
        ...side(ends[0], 1),
        ...side(ends[1], -1),
      ],
      value: (ends[1].known - ends[0].known) / L,
      weight: MUST,
    },
  ];
}

/** Amounts that fit, solved again where a bend would all but vanish or turn over. */
function solved(unknowns: Unknowns, bent: readonly Bent[]): Float64Array {
  let x = leastSquares(unknowns.count, unknowns.rows);
  for (let round = 0; round < 4; round++) {
    const flat = bent.flatMap(({ bends }) =>
      bends.filter(({ amount }) => (x[amount] ?? 0) < LEAST_BEND * 0.9),
    );
    if (flat.length === 0) break;
    for (const { amount } of flat)
      unknowns.rows.push({ terms: [[amount, 1]], value: LEAST_BEND, weight: 12 });
    x = leastSquares(unknowns.count, unknowns.rows);
  }
  return x;
}

function curveOf({ length: L, bends, kinks, slope, ends, drift }: Bent, x: Float64Array): Curve {
  const of = (end: End): number =>
    end.known + (end.unknown === undefined ? 0 : (x[end.unknown[0]] ?? 0) * end.unknown[1]);
  const raw = (s: number): number => {
    let d = (x[slope] ?? 0) * s;
    for (const { begin, end, sign, amount } of bends) {
      const l = end - begin;
      const a = (sign * Math.max(x[amount] ?? 0, LEAST_BEND * 0.5)) / L;
      if (s <= begin) continue;
      const t = Math.min(1, (s - begin) / l);
      d += a * l * l * (t ** 3 - t ** 4 / 2) + (s > end ? a * l * (s - end) : 0);
    }
    for (const { at, amount } of kinks) if (s > at) d += (x[amount] ?? 0) * (s - at);
    return d;
  };
  // Whatever the corners could not be made to fit is taken up here, so that members always meet.
  const [d0, dL] = [of(ends[0]), of(ends[1])];
  const miss = dL - d0 - raw(L);
  return {
    along: (s) => drift[0] + ((drift[1] - drift[0]) * s) / L,
    across: (s) => d0 + raw(s) + (miss * s) / L,
  };
}
