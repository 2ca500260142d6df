// What acts on a body: an action, with the joints and hinges its place and its size stand on.

import type { Action, ForceName, Point } from "../results/index.ts";
import {
  axisOf,
  type DistributedLoad,
  type Load,
  type MemberPointLoad,
  memberNamed,
  metresAlong,
  pointOn,
  type Segment,
  type Structure,
  snapToEnds,
} from "../structure/index.ts";
import { isWithin } from "./equilibrium-matrix.ts";

export interface Stands {
  readonly joints: readonly string[];
  readonly hinges: readonly string[];
}

export interface Push {
  readonly action: Action;
  /** Absent for a load. */
  readonly force?: ForceName;
  /** What the point of action stands on. */
  readonly place: Stands;
  /** What the size (of a load's resultant) or the direction (of an inclined force) stands on. */
  readonly size: Stands;
}

export const nothing: Stands = Object.freeze({ joints: Object.freeze([]), hinges: Object.freeze([]) });

/** A force or couple known by name; `sense` is its direction, or its turn. */
export function forcePush(
  force: ForceName,
  at: Point,
  sense: Action["direction"] | 1 | -1,
  place: Stands,
  size: Stands = nothing,
): Push {
  const couple = typeof sense === "number";
  const source = { force: force.name };
  const action: Action = { at, direction: couple ? [0, 0] : sense, turn: couple ? sense : 0, source };
  return { action, force, place, size };
}

/** Force components and couple of one load at a point; those that are zero are left out, senses are true. */
export function loadPushes(
  load: number,
  at: Point,
  force: readonly [number, number],
  couple: number,
  place: Stands,
): Push[] {
  const put = (direction: readonly [number, number], turn: 0 | 1 | -1, value: number): Push => ({
    action: { at, direction, turn, source: { load }, value },
    place,
    size: nothing,
  });
  const [fx, fy] = force;
  return [
    ...(fx === 0 ? [] : [put([Math.sign(fx), 0], 0, Math.abs(fx))]),
    ...(fy === 0 ? [] : [put([0, Math.sign(fy)], 0, Math.abs(fy))]),
    ...(couple === 0 ? [] : [put([0, 0], couple > 0 ? 1 : -1, Math.abs(couple))]),
  ];
}

/** The loads between the ends of a segment, those spread along it by their resultants on this segment. */
export function pushesOnSegment(
  structure: Structure,
  loads: readonly Load[],
  segment: Segment,
): readonly Push[] {
  return loads.flatMap((load, i) => {
    if (load.kind === "joint" || load.member !== segment.member) return [];
    return load.kind === "distributed"
      ? spreadPushes(structure, load, i, segment)
      : pointPushes(structure, load, i, segment);
  });
}

function pointPushes(
  structure: Structure,
  load: MemberPointLoad,
  i: number,
  segment: Segment,
): readonly Push[] {
  const axis = axisOf(structure, memberNamed(structure, load.member, "load"));
  const x = snapToEnds(metresAlong(load.at, axis.length), axis.length);
  if (!isWithin(x, segment.begin, segment.end, axis.length)) return [];
  const at = loadPoint(axis, x, i, load.member);
  return loadPushes(i, at, [load.fx, load.fy], load.couple, memberEnds(structure, load.member));
}

/** A trapezoid of load, cut by the segment; where it changes sign, the two triangles are taken apart. */
function spreadPushes(
  structure: Structure,
  load: DistributedLoad,
  i: number,
  segment: Segment,
): readonly Push[] {
  const axis = axisOf(structure, memberNamed(structure, load.member, "load"));
  const begin = snapToEnds(metresAlong(load.begin, axis.length), axis.length);
  const end = snapToEnds(metresAlong(load.end, axis.length), axis.length);
  const [a, b] = [Math.max(begin, segment.begin), Math.min(end, segment.end)];
  if (b - a <= 1e-9 * axis.length) return [];
  const q = (x: number): number => load.q1 + ((load.q2 - load.q1) * (x - begin)) / (end - begin);
  const [qa, qb] = [q(a), q(b)];
  const middle = qa * qb < 0 ? [a + ((b - a) * qa) / (qa - qb)] : [];
  const ends = memberEnds(structure, load.member);
  const hinges = hingesBounding(structure, segment, begin, end);
  const place = { joints: ends.joints, hinges };
  const measured = "metres" in load.begin && "metres" in load.end && hinges.length === 0;
  const stops = [a, ...middle, b];
  return stops.slice(0, -1).flatMap((from, k) => {
    const to = stops[k + 1] ?? from;
    const [q1, q2] = [k === 0 ? qa : 0, k === stops.length - 2 ? qb : 0];
    const resultant = ((q1 + q2) / 2) * (to - from);
    if (resultant === 0) return [];
    const x = from + ((to - from) * (q1 + 2 * q2)) / (3 * (q1 + q2));
    const sense = Math.sign(resultant);
    const direction = [load.direction[0] * sense + 0, load.direction[1] * sense + 0] as const;
    const at = loadPoint(axis, x, i, load.member);
    const action: Action = { at, direction, turn: 0, source: { load: i }, value: Math.abs(resultant) };
    return [{ action, place, size: measured ? nothing : place }];
  });
}

function hingesBounding(
  structure: Structure,
  segment: Segment,
  begin: number,
  end: number,
): readonly string[] {
  return structure.hinges
    .filter((h) => h.member === segment.member)
    .filter((h) => (h.at === segment.begin && h.at > begin) || (h.at === segment.end && h.at < end))
    .map((h) => h.name);
}

/** What a place along a member stands on: both its joints. */
export function memberEnds(structure: Structure, member: string): Stands {
  const { start, end } = memberNamed(structure, member, "load");
  return { joints: [start, end], hinges: [] };
}

function loadPoint(axis: Parameters<typeof pointOn>[0], x: number, load: number, member: string): Point {
  const [px, py] = pointOn(axis, x);
  return { name: `load ${load + 1} on ${member}`, x: px, y: py };
}
