// Distributed loads on the page: arrows under a line, all to one scale.

import { type DistributedLoad, type Load, metresAlong } from "../structure/index.ts";
import { arrow } from "./arrows.ts";
import { along, distance, dot, minus, type Pt, plus, times, unit } from "./geometry.ts";
import type { MemberLine } from "./members.ts";
import { repeats } from "./repeats.ts";
import { type Label, PENS, polyline, type Scene, type Shape, scene } from "./scene.ts";

const DEEPEST = 30;
const TEXT_ROOM = 24;

/** How deep distributed loads are drawn. */
export interface Depth {
  /** Largest ordinate, N/m, the one drawn deepest. */
  readonly greatest: number;
  /** Its depth on the page. */
  readonly deep: number;
}

/** The stretch of a distributed load, metres from the member's start, with its ordinates there. */
export interface Stretch {
  readonly load: DistributedLoad;
  readonly begin: number;
  readonly end: number;
  readonly q1: number;
  readonly q2: number;
}

/** A distributed load cut to a piece of its member; undefined where they do not meet. */
export function stretchOn(
  load: DistributedLoad,
  length: number,
  from = 0,
  to: number = length,
): Stretch | undefined {
  const a = metresAlong(load.begin, length);
  const b = metresAlong(load.end, length);
  const begin = Math.max(a, from);
  const end = Math.min(b, to);
  if (!(end - begin > 1e-9 * length)) return undefined;
  const q = (x: number): number => load.q1 + ((load.q2 - load.q1) * (x - a)) / (b - a);
  return { load, begin, end, q1: q(begin), q2: q(end) };
}

/** Depth of the loads of one figure; `storey` is the height there is for them with their texts. */
export function depthOf(loads: readonly Load[], storey: number = Number.POSITIVE_INFINITY): Depth {
  const ordinates = loads.map((l) =>
    l.kind === "distributed" ? Math.max(Math.abs(l.q1), Math.abs(l.q2)) : 0,
  );
  return { greatest: Math.max(0, ...ordinates), deep: Math.min(DEEPEST, Math.max(9, storey * 0.24)) };
}

const depthAt = (q: number, { greatest, deep }: Depth): number =>
  greatest > 0 ? (deep * Math.abs(q)) / greatest : 0;

interface Band {
  readonly shapes: readonly Shape[];
  /** Where its text belongs. */
  readonly peak: Pt;
  readonly out: Pt;
  /** Its first and last point, where the text may stand beside it. */
  readonly ends: readonly [Pt, Pt];
}

/** Arrows of a load that runs along its member, beside it. */
function axialBand(on: MemberLine, s: Stretch, offset: number): Band {
  const out = times(on.fibre, -1);
  const a = along(on.page(s.begin), out, offset + 4);
  const b = along(on.page(s.end), out, offset + 4);
  const sense = dot([s.load.direction[0], s.load.direction[1]], on.axis) * (s.q1 + s.q2) >= 0 ? 1 : -1;
  const count = Math.max(1, Math.round(repeats(distance(a, b), 34)));
  const step = times([b[0] - a[0], b[1] - a[1]], 1 / count);
  const shapes = Array.from({ length: count }, (_, i) => {
    const tail = along(a, step, i + 0.1);
    const tip = along(a, step, i + 0.9);
    return sense > 0 ? arrow(tail, tip, PENS.load, 6) : arrow(tip, tail, PENS.load, 6);
  }).flat();
  return { shapes, peak: along(a, step, count / 2), out, ends: [a, b] };
}

/** Arrows under a line, of a load across its member. */
function crossBand(on: MemberLine, s: Stretch, offset: number, scaled: Depth): Band {
  const direction: Pt = [s.load.direction[0], -s.load.direction[1]];
  const mean = s.q1 + s.q2 >= 0 ? 1 : -1;
  const out = times(direction, -mean);
  const depth = (q: number): number => depthAt(q, scaled);
  const count = Math.max(2, Math.round(repeats(distance(on.page(s.begin), on.page(s.end)), 20)));
  const shapes: Shape[] = [];
  const tops: Pt[] = [];
  for (let i = 0; i <= count; i++) {
    const t = i / count;
    const q = s.q1 + (s.q2 - s.q1) * t;
    const foot = along(on.page(s.begin + (s.end - s.begin) * t), out, offset);
    const top = along(foot, out, Math.max(depth(q), Math.abs(q) > 0 ? 5 : 0));
    tops.push(top);
    if (distance(foot, top) < 4) continue;
    shapes.push(...(q * mean >= 0 ? arrow(top, foot, PENS.load, 6) : arrow(foot, top, PENS.load, 6)));
  }
  const steepest = Math.abs(s.q2) > Math.abs(s.q1) ? 0.8 : Math.abs(s.q2) < Math.abs(s.q1) ? 0.2 : 0.5;
  const half = along([0, 0], out, -Math.max(depth(s.q1), depth(s.q2)) / 2);
  const [first, last] = [tops[0] ?? half, tops.at(-1) ?? half];
  return {
    shapes: [...shapes, polyline(tops, PENS.load)],
    peak: tops[Math.round(count * steepest)] ?? first,
    out,
    ends: [plus(first, half), plus(last, half)],
  };
}

/** One distributed load `offset` page units off its member. */
export function band(
  on: MemberLine,
  s: Stretch,
  offset: number,
  depth: Depth,
  text: string,
  rank?: number,
): Scene {
  const axial = Math.abs(dot([s.load.direction[0], s.load.direction[1]], on.axis)) > 0.999;
  const { shapes, peak, out, ends } = axial ? axialBand(on, s, offset) : crossBand(on, s, offset, depth);
  const [first, last] = ends;
  const beside = unit(minus(last, first));
  const instead = [
    { at: last, prefer: beside },
    { at: first, prefer: times(beside, -1) },
  ];
  const label: Label = { text, at: peak, prefer: out, gap: 4, instead, reluctance: 14 };
  return scene(shapes, [rank === undefined ? label : { ...label, rank }]);
}

/** How far off the member the next band on it has to stand, with room for the text between. */
export const bandHeight = (s: Stretch, depth: Depth): number =>
  depthAt(Math.max(Math.abs(s.q1), Math.abs(s.q2)), depth) + Math.min(TEXT_ROOM, depth.deep * 0.8 + 8);
