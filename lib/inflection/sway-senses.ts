// Senses of the end moments of a rectangular frame pushed sideways: columns in double curvature, beams likewise.

import { type Axis, axisOf, calledBy, type Member, type Structure } from "../structure/index.ts";
import { type End, endKey, holdOf, joinedAt, type Known, type Sense } from "./end-senses.ts";

/** Senses of all ends for a push to the right (`push` 1) or left (-1), or the reason why they cannot be known. */
export function swaySenses(structure: Structure, push: 1 | -1): Known | string {
  const axes = new Map(structure.members.map((m) => [m.name, axisOf(structure, m)]));
  for (const [name, { c, s }] of axes)
    if (Math.abs(c * s) > 1e-9)
      return `${name} leans: how a frame with leaning members bends under a push cannot be known by rule`;
  const raised = structure.supports.find(
    ({ joint, holds }) =>
      holds.x &&
      !structure.members.some((m) => isColumn(axes.get(m.name)) && [m.start, m.end].includes(joint)),
  );
  if (raised !== undefined) return `the support at ${raised.joint} holds the frame against the push`;
  const known: Known = new Map();
  for (const member of structure.members) {
    const axis = axes.get(member.name);
    if (axis === undefined) continue;
    for (const end of ["start", "end"] as const)
      known.set(endKey(member.name, end), senseAt(structure, member, axis, end, push));
  }
  return known;
}

function isColumn(axis: Axis | undefined): boolean {
  return axis !== undefined && calledBy(axis) === "column";
}

/** Pushed to the right a column drawn upwards hogs at its foot and sags at its head, a beam sags at its left end and hogs at its right. */
function senseAt(
  structure: Structure,
  member: Member,
  axis: Axis,
  end: End,
  push: 1 | -1,
): ReturnType<Known["get"]> & object {
  const column = isColumn(axis);
  const forward = column ? axis.s > 0 : axis.c > 0;
  const first = (end === "start") === forward; // the foot, or the left end
  const own = (column ? (first ? -1 : 1) : first ? 1 : -1) * push;
  const turned = forward ? own : -own; // the fibre changes sides with the walk
  const hold = holdOf(structure, member, end);
  const where = column ? (first ? "foot" : "head") : first ? "left end" : "right end";
  const joint = member[end];
  if (hold === "hinged" || hold === "free" || !holdsTurning(structure, member, joint))
    return { sense: 0, fixity: 0, level: 0, why: `${joint} is free to turn` };
  return {
    sense: turned as Sense,
    fixity: hold === "fixed" ? 1 : 0.5,
    level: 0,
    why: `pushed sideways, ${column ? "a column" : "a beam"} held at its ${where} ${joint} bends one way there and the other way at its other end`,
  };
}

/** A column turns freely at a joint where no beam and no support holds it, however many columns meet there. */
function holdsTurning(structure: Structure, member: Member, joint: string): boolean {
  if (structure.supports.some((s) => s.joint === joint && s.holds.rotation)) return true;
  return joinedAt(structure, joint).some((other) => other.member !== member);
}
