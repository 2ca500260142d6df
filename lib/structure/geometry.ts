// Where joints and members lie. Local axes of a member: x from start to end, y to the left of that walk.

import { StructureError } from "./faults.ts";
import type { Joint, Member, Structure } from "./types.ts";

/** A member's line: its ends, length in m, and the direction (c, s) of its local x axis. */
export interface Axis {
  readonly start: Joint;
  readonly end: Joint;
  readonly length: number;
  readonly c: number;
  readonly s: number;
}

const indices = new WeakMap<readonly object[], ReadonlyMap<string, unknown>>();

/** Things by their name; of two with one name the first. Kept for frozen lists, so that large models stay quick. */
export function byName<T extends { readonly name: string }>(things: readonly T[]): ReadonlyMap<string, T> {
  const kept = indices.get(things) as ReadonlyMap<string, T> | undefined;
  if (kept !== undefined) return kept;
  const index = new Map<string, T>();
  for (const thing of things) if (!index.has(thing.name)) index.set(thing.name, thing);
  if (Object.isFrozen(things)) indices.set(things, index);
  return index;
}

/** The joint of that name. `what` begins the message when there is none: `member "AB" ends at joint`. */
export function jointNamed(structure: Pick<Structure, "joints">, name: string, what: string): Joint {
  const joint = byName(structure.joints).get(name);
  if (joint === undefined)
    throw new StructureError({
      kind: "unknown joint",
      what,
      joint: name,
      known: structure.joints.map((j) => j.name),
    });
  return joint;
}

/** The member of that name. `what` begins the message when there is none: "uniform load". */
export function memberNamed(structure: Pick<Structure, "members">, name: string, what: string): Member {
  const member = byName(structure.members).get(name);
  if (member === undefined)
    throw new StructureError({
      kind: "unknown member",
      what,
      member: name,
      known: structure.members.map((m) => m.name),
    });
  return member;
}

/** The line of a member; m. */
export function axisOf(structure: Pick<Structure, "joints">, member: Member): Axis {
  const start = jointNamed(structure, member.start, `member "${member.name}" starts at joint`);
  const end = jointNamed(structure, member.end, `member "${member.name}" ends at joint`);
  const [dx, dy] = [end.x - start.x, end.y - start.y];
  const length = Math.sqrt(dx * dx + dy * dy); // several times faster than hypot, and asked for often
  return { start, end, length, c: dx / length, s: dy / length };
}

/** The point `x` metres along a line, as [x, y]; the ends are hit exactly. */
export function pointOn(axis: Axis, x: number): readonly [number, number] {
  if (x === axis.length) return [axis.end.x, axis.end.y];
  return [axis.start.x + axis.c * x, axis.start.y + axis.s * x];
}

/** How the trade calls a member by its lie: steeper than 60 degrees a column, flatter than 30 a beam, else a member. */
export function calledBy(axis: Axis): "beam" | "column" | "member" {
  if (Math.abs(axis.s) <= 0.5) return "beam";
  return Math.abs(axis.c) <= 0.5 ? "column" : "member";
}
