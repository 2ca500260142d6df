// Loads on the page: distributed ones as arrows under a line, forces and couples as arrows, each kind to one scale.

import type { DistributedLoad, Load, Structure } from "../structure/types.ts";
import { arrow, placeArrow, turningArrow } from "./arrows.ts";
import {
  along,
  between,
  boxOf,
  distance,
  dot,
  lengthInside,
  minus,
  type Pt,
  plus,
  type Segment,
  times,
  unit,
} from "./geometry.ts";
import { jointOf, type MemberLine, memberLine, metresOf } from "./members.ts";
import type { Scale } from "./scale.ts";
import {
  blocksOf,
  type Label,
  merge,
  PENS,
  type Pen,
  polyline,
  type Scene,
  type Shape,
  scene,
} from "./scene.ts";

const DEEPEST = 30;
const LONGEST = 46;
const SHORTEST = 20;

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
  const a = metresOf(load.begin, length);
  const b = metresOf(load.end, length);
  const begin = Math.max(a, from);
  const end = Math.min(b, to);
  if (!(end - begin > 1e-9 * length)) return undefined;
  const q = (x: number): number => load.q1 + ((load.q2 - load.q1) * (x - a)) / (b - a);
  return { load, begin, end, q1: q(begin), q2: q(end) };
}

/** Largest ordinate among distributed loads, N/m, the one drawn deepest. */
export const deepest = (loads: readonly Load[]): number =>
  Math.max(0, ...loads.map((l) => (l.kind === "distributed" ? Math.max(Math.abs(l.q1), Math.abs(l.q2)) : 0)));

/** Largest force among point and joint loads, N, the one drawn longest. */
export const largest = (loads: readonly Load[]): number =>
  Math.max(0, ...loads.map((l) => (l.kind === "distributed" ? 0 : Math.hypot(l.fx, l.fy))));

/** Length of a force arrow drawn to scale, with a least length that can still be seen. */
export const arrowLength = (force: number, greatest: number): number =>
  Math.max(SHORTEST, greatest > 0 ? (LONGEST * force) / greatest : LONGEST);

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
  const count = Math.max(1, Math.round(distance(a, b) / 34));
  const step = times([b[0] - a[0], b[1] - a[1]], 1 / count);
  const shapes = Array.from({ length: count }, (_, i) => {
    const tail = along(a, step, i + 0.1);
    const tip = along(a, step, i + 0.9);
    return sense > 0 ? arrow(tail, tip, PENS.load, 6) : arrow(tip, tail, PENS.load, 6);
  }).flat();
  return { shapes, peak: along(a, step, count / 2), out, ends: [a, b] };
}

/** Arrows under a line, of a load across its member. */
function crossBand(on: MemberLine, s: Stretch, offset: number, greatest: number): Band {
  const direction: Pt = [s.load.direction[0], -s.load.direction[1]];
  const mean = s.q1 + s.q2 >= 0 ? 1 : -1;
  const out = times(direction, -mean);
  const depth = (q: number): number => (greatest > 0 ? (DEEPEST * Math.abs(q)) / greatest : 0);
  const count = Math.max(2, Math.round(distance(on.page(s.begin), on.page(s.end)) / 20));
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
export function band(on: MemberLine, s: Stretch, offset: number, greatest: number, text: string): Scene {
  const axial = Math.abs(dot([s.load.direction[0], s.load.direction[1]], on.axis)) > 0.999;
  const { shapes, peak, out, ends } = axial ? axialBand(on, s, offset) : crossBand(on, s, offset, greatest);
  const [first, last] = ends;
  const beside = unit(minus(last, first));
  const instead = [
    { at: last, prefer: beside },
    { at: first, prefer: times(beside, -1) },
  ];
  return scene(shapes, [{ text, at: peak, prefer: out, gap: 4, instead }]);
}

/** How far off the member the next band on it has to stand, with room for the text between. */
export const bandHeight = (s: Stretch, greatest: number): number =>
  (greatest > 0 ? (DEEPEST * Math.max(Math.abs(s.q1), Math.abs(s.q2))) / greatest : 0) + 24;

/** One force at a page point, drawn where there is room; `force` in world axes. */
export function forceArrow(
  point: Pt,
  force: Pt,
  length: number,
  text: string,
  taken: readonly Segment[],
  pen: Pen = PENS.load,
): Scene {
  const direction = unit([force[0], -force[1]]);
  const place = placeArrow(point, direction, length, taken);
  const middle = between(place.tail, place.tip, 0.5);
  const aside: Pt = [place.outward[1], place.outward[0]];
  const instead = [
    { at: middle, prefer: aside },
    { at: middle, prefer: times(aside, -1) },
  ];
  const label: Label = {
    text,
    at: place.far,
    prefer: place.outward,
    gap: 4,
    instead,
    accent: pen === PENS.sought,
  };
  return scene(arrow(place.tail, place.tip, pen), [label]);
}

/** One couple at a page point, its gap turned to where the members are fewest. */
export function coupleArrow(
  point: Pt,
  turn: 1 | -1,
  text: string,
  taken: readonly Segment[],
  pen: Pen = PENS.load,
  radius = 15,
): Scene {
  const sides: readonly Pt[] = [
    [0, -1],
    [1, 0],
    [-1, 0],
    [0, 1],
  ];
  const busy = (side: Pt): number => {
    const box = boxOf([along(point, side, radius - 4), along(point, side, radius + 10)], 5);
    return taken.reduce((sum, segment) => sum + lengthInside(segment, box), 0);
  };
  const clear = sides.reduce((best, side) => (busy(side) < busy(best) ? side : best));
  const label: Label = {
    text,
    at: along(point, clear, radius),
    prefer: clear,
    gap: 6,
    accent: pen === PENS.sought,
  };
  return scene(turningArrow(point, radius, turn, times(clear, -1), pen), [label]);
}

/** Loads of a structure; `taken` are the lines already drawn. */
export function loads(
  structure: Structure,
  list: readonly Load[],
  texts: readonly string[],
  scale: Scale,
  drawn: Scene,
): Scene {
  const [q, P] = [deepest(list), largest(list)];
  const offsets = new Map<string, number>();
  let scenes: Scene = scene([]);
  const taken = (): Segment[] => [...blocksOf(drawn), ...blocksOf(scenes)];
  const add = (part: Scene): void => {
    scenes = merge(scenes, part);
  };
  const inOrder = list.map((load, i) => ({ load, text: texts[i] ?? load.label }));
  for (const { load, text } of inOrder) {
    if (load.kind !== "distributed") continue;
    const on = memberLine(structure, load.member, scale);
    const s = stretchOn(load, on.length);
    if (!s) continue;
    const side = `${load.member} ${load.direction.map((d) => d.toFixed(3)).join(" ")} ${s.q1 + s.q2 >= 0}`;
    const offset = offsets.get(side) ?? 5;
    add(band(on, s, offset, q, text));
    offsets.set(side, offset + bandHeight(s, q));
  }
  for (const { load, text } of inOrder) {
    if (load.kind === "distributed") continue;
    const point = pointOf(structure, load, scale);
    const force = Math.hypot(load.fx, load.fy);
    if (force > 0) add(forceArrow(point, [load.fx, load.fy], arrowLength(force, P), text, taken()));
    if (load.couple !== 0) add(coupleArrow(point, load.couple > 0 ? 1 : -1, force > 0 ? "" : text, taken()));
  }
  return scenes;
}

function pointOf(structure: Structure, load: Exclude<Load, DistributedLoad>, scale: Scale): Pt {
  if (load.kind === "joint") {
    const joint = jointOf(structure, load.joint);
    return scale.page(joint.x, joint.y);
  }
  const on = memberLine(structure, load.member, scale);
  return on.page(metresOf(load.at, on.length));
}
