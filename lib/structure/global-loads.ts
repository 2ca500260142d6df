// Loads given in a member's own axes, or per metre of its projection, brought to global axes and per metre of member.

import { StructureError } from "./faults.ts";
import { type Axis, axisOf, memberNamed } from "./geometry.ts";
import type { DistributedLoad, Load, Structure } from "./types.ts";

/** The same load with a global direction and per metre of member; a load that is so already comes back unchanged.
 *  Throws when a load is per projection of a member that has none. */
export function inGlobalAxes<L extends Load>(structure: Structure, load: L): L {
  if (load.kind === "joint" || (load.axes === undefined && !hasProjection(load))) return load;
  const axis = axisOf(structure, memberNamed(structure, load.member, "load"));
  if (load.kind === "member point") {
    const [fx, fy] = turned(axis, [load.fx, load.fy]);
    const { axes: _, ...rest } = load;
    return Object.freeze({ ...rest, fx, fy }) as L;
  }
  const share = projection(load, axis);
  const direction = load.axes === "member" ? turned(axis, load.direction) : load.direction;
  const { axes: _, per: __, ...rest } = load;
  return Object.freeze({ ...rest, direction, q1: load.q1 * share, q2: load.q2 * share }) as L;
}

function hasProjection(load: Load): boolean {
  return load.kind === "distributed" && load.per !== undefined;
}

/** Metres of projection per metre of member. */
function projection({ per, member, label }: DistributedLoad, { c, s }: Axis): number {
  if (per === undefined) return 1;
  const share = Math.abs(per === "horizontal" ? c : s);
  if (share < 1e-9)
    throw new StructureError({ kind: "level load", what: `the load ${label} on ${member}`, member, per });
  return share;
}

/** A vector [along, left] of a member in global axes. */
function turned({ c, s }: Axis, [along, left]: readonly [number, number]): readonly [number, number] {
  return [along * c - left * s, along * s + left * c];
}
