// What acts on a body: an action, with what its place, its size and its direction stand on.

import type { Action, ForceName, Point } from "../results/index.ts";
import {
  axisOf,
  type DistributedLoad,
  type Load,
  type Place as LoadPlace,
  type MemberPointLoad,
  memberNamed,
  metresAlong,
  pointOn,
  type Segment,
  type Structure,
  snapToEnds,
} from "../structure/index.ts";
import { isWithin } from "./equilibrium-matrix.ts";
import type { Place, Stop } from "./place.ts";

export interface Push {
  readonly action: Action;
  /** Absent for a load. */
  readonly force?: ForceName;
  readonly place: Place;
  /** The stretch a spread load's resultant stands on, and the projection its intensity is per metre of. */
  readonly stretch?: Stretch;
  /** The member, or the support, a force's direction goes with. */
  readonly line?: { readonly member: string } | { readonly support: string };
  /** The parts of a spread load put together again on joined bodies. */
  readonly parts?: readonly Push[];
}

export interface Stretch {
  readonly member: string;
  readonly from: Stop;
  readonly to: Stop;
  readonly per?: "horizontal" | "vertical";
}

/** A force or couple known by name; `sense` is its direction, or its turn. */
export function forcePush(
  force: ForceName,
  at: Point,
  sense: Action["direction"] | 1 | -1,
  place: Place,
  line?: Push["line"],
): Push {
  const couple = typeof sense === "number";
  const source = { force: force.name };
  const action: Action = { at, direction: couple ? [0, 0] : sense, turn: couple ? sense : 0, source };
  return line === undefined ? { action, force, place } : { action, force, place, line };
}

/** Force components and couple of one load at a point; those that are zero are left out, senses are true. */
export function loadPushes(
  load: number,
  at: Point,
  force: readonly [number, number],
  couple: number,
  place: Place,
): Push[] {
  const put = (direction: readonly [number, number], turn: 0 | 1 | -1, value: number): Push => ({
    action: { at, direction, turn, source: { load }, value },
    place,
  });
  const [fx, fy] = force;
  return [
    ...(fx === 0 ? [] : [put([Math.sign(fx), 0], 0, Math.abs(fx))]),
    ...(fy === 0 ? [] : [put([0, Math.sign(fy)], 0, Math.abs(fy))]),
    ...(couple === 0 ? [] : [put([0, 0], couple > 0 ? 1 : -1, Math.abs(couple))]),
  ];
}

/** The loads between the ends of a segment, those spread along it by their resultants on this segment. `given` are the
 *  same loads before they were brought to global axes. */
export function pushesOnSegment(
  structure: Structure,
  loads: readonly Load[],
  given: readonly Load[],
  segment: Segment,
): readonly Push[] {
  return loads.flatMap((load, i) => {
    if (load.kind === "joint" || load.member !== segment.member) return [];
    if (load.kind === "member point") return pointPushes(structure, load, i, segment);
    const before = given[i];
    const per = before?.kind === "distributed" ? before.per : undefined;
    return spreadPushes(structure, load, i, segment, per);
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
  const place = { member: load.member, at: [{ stop: stopOf(load.at, `${i}`), weight: 1 }] };
  return loadPushes(i, at, [load.fx, load.fy], load.couple, place);
}

/** A trapezoid of load, cut by the segment; where it changes sign, the two triangles are taken apart. */
function spreadPushes(
  structure: Structure,
  load: DistributedLoad,
  i: number,
  segment: Segment,
  per: Stretch["per"],
): readonly Push[] {
  const axis = axisOf(structure, memberNamed(structure, load.member, "load"));
  const begin = snapToEnds(metresAlong(load.begin, axis.length), axis.length);
  const end = snapToEnds(metresAlong(load.end, axis.length), axis.length);
  const [a, b] = [Math.max(begin, segment.begin), Math.min(end, segment.end)];
  if (b - a <= 1e-9 * axis.length) return [];
  const q = (x: number): number => load.q1 + ((load.q2 - load.q1) * (x - begin)) / (end - begin);
  const [qa, qb] = [q(a), q(b)];
  const from = a > begin ? hingeStop(structure, segment, a) : stopOf(load.begin, `${i} begin`);
  const to = b < end ? hingeStop(structure, segment, b) : stopOf(load.end, `${i} end`);
  const stops = qa * qb < 0 ? [a, a + ((b - a) * qa) / (qa - qb), b] : [a, b];
  return stops.slice(0, -1).flatMap((left, k) => {
    const right = stops[k + 1] ?? left;
    const [q1, q2] = [k === 0 ? qa : 0, k === stops.length - 2 ? qb : 0];
    const resultant = ((q1 + q2) / 2) * (right - left);
    if (resultant === 0) return [];
    const x = left + ((right - left) * (q1 + 2 * q2)) / (3 * (q1 + q2));
    const weight = (x - a) / (b - a);
    const sense = Math.sign(resultant);
    const direction = [load.direction[0] * sense + 0, load.direction[1] * sense + 0] as const;
    const at = loadPoint(axis, x, i, load.member);
    const action: Action = { at, direction, turn: 0, source: { load: i }, value: Math.abs(resultant) };
    const places = [
      { stop: from, weight: 1 - weight },
      { stop: to, weight },
    ];
    const stretch = { member: load.member, from, to, ...(per === undefined ? {} : { per }) };
    return [{ action, place: { member: load.member, at: places }, stretch }];
  });
}

function stopOf(place: LoadPlace, load: string): Stop {
  return "fraction" in place ? { part: place.fraction } : { from: "start", metres: place.metres, load };
}

function hingeStop({ hinges }: Structure, { member, begin, end }: Segment, at: number): Stop {
  const found = hinges.find((h) => h.member === member && h.at === at);
  if (found === undefined)
    throw new Error(`no hinge at ${at} m of ${member}, which is cut from ${begin} to ${end} m`);
  return { hinge: found.name };
}

function loadPoint(axis: Parameters<typeof pointOn>[0], x: number, load: number, member: string): Point {
  const [px, py] = pointOn(axis, x);
  return { name: `load ${load + 1} on ${member}`, x: px, y: py };
}
