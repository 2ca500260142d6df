// What loads do to one member, in its own axes: along it (towards its end) and across it (towards its reference fibre).

import {
  axisOf,
  inGlobalAxes,
  type Load,
  memberNamed,
  metresAlong,
  type Structure,
  snapToEnds,
} from "../structure/index.ts";
import { constant, ramp, sum } from "./piecewise.ts";
import type { Piecewise } from "./types.ts";

/** Concentrated load on a member: `along` and `across` in N, `couple` in N·m counter-clockwise, at x m from the start. */
export interface MemberPoint {
  readonly x: number;
  readonly along: number;
  readonly across: number;
  readonly couple: number;
  readonly load: number;
}

/** Loads of one member. `along` and `across` are line loads in N/m over [0, length]; `loads` are the indices of the loads meant. */
export interface MemberLoads {
  readonly member: string;
  readonly length: number;
  readonly along: Piecewise;
  readonly across: Piecewise;
  readonly points: readonly MemberPoint[];
  readonly loads: readonly number[];
}

/** The loads that act between the ends of a member (those on joints are not its own). */
export function memberLoads(structure: Structure, loads: readonly Load[], member: string): MemberLoads {
  const { length, c, s } = axisOf(structure, memberNamed(structure, member, "load"));
  const along = [constant(0, length, 0)];
  const across = [constant(0, length, 0)];
  const points: MemberPoint[] = [];
  const indices: number[] = [];
  loads.forEach((given, i) => {
    if (given.kind === "joint" || given.member !== member) return;
    const load = inGlobalAxes(structure, given);
    indices.push(i);
    if (load.kind === "member point") {
      const x = snapToEnds(metresAlong(load.at, length), length);
      points.push({
        x,
        along: load.fx * c + load.fy * s,
        across: load.fx * s - load.fy * c,
        couple: load.couple,
        load: i,
      });
      return;
    }
    const begin = snapToEnds(metresAlong(load.begin, length), length);
    const end = snapToEnds(metresAlong(load.end, length), length);
    const [dx, dy] = load.direction;
    const part = (cosine: number): Piecewise =>
      ramp(0, length, begin, end, load.q1 * cosine, load.q2 * cosine);
    along.push(part(dx * c + dy * s));
    across.push(part(dx * s - dy * c));
  });
  const zero = constant(0, length, 0);
  return {
    member,
    length,
    along: sum(zero, ...along),
    across: sum(zero, ...across),
    points: points.sort((a, b) => a.x - b.x),
    loads: indices,
  };
}
