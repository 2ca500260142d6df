// The floors of a building frame: beams that go on level with each other, and the supports that hold them against sway.

import { axisOf, calledBy, resists, support } from "../structure/index.ts";
import type { Structure, Support } from "../structure/types.ts";

/** Joints joined by beams, left to right, and the joint a holding support goes to: the rightmost that has no support. */
export interface Floor {
  readonly joints: readonly string[];
  readonly at: string;
  /** Whether a support of the frame holds it against sway already. */
  readonly held: boolean;
}

/** All floors above the bases, from the lowest up. Throws where the two-hinge method makes no sense: members that lean, joints
 *  that stand on no column and no support, or on two columns. */
export function floorsOf(frame: Structure): readonly Floor[] {
  const at = new Map(frame.joints.map((joint) => [joint.name, joint]));
  const bases = new Set(frame.supports.filter(({ holds }) => holds.y).map(({ joint }) => joint));
  const root = new Map(frame.joints.map(({ name }) => [name, name]));
  const find = (name: string): string => {
    const up = root.get(name) ?? name;
    return up === name ? name : find(up);
  };
  const below = new Map<string, number>();
  for (const member of frame.members) {
    const axis = axisOf(frame, member);
    const called = calledBy(axis);
    if (called === "member" || (called === "column" && Math.abs(axis.c) > 1e-9))
      throw new Error(
        `gravity: member ${member.name} leans; the method is for beams on upright columns, place the hinges of this frame by sheet.hinges`,
      );
    if (called === "beam") root.set(find(member.start), find(member.end));
    else {
      const head = axis.s > 0 ? member.end : member.start;
      below.set(head, (below.get(head) ?? 0) + 1);
    }
  }
  for (const { name } of frame.joints) {
    const columns = below.get(name) ?? 0;
    if (columns === 0 && !bases.has(name))
      throw new Error(
        `gravity: joint ${name} stands on no column and no support, so two hinges in every beam leave it free to drop; ` +
          "place the hinges of this frame by sheet.hinges",
      );
    if (columns > 0 && bases.has(name))
      throw new Error(
        `gravity: joint ${name} stands on a column and is held up by a support as well; the method shares no load between them, place the hinges of this frame by sheet.hinges`,
      );
  }
  const floors = new Map<string, string[]>();
  for (const { name } of frame.joints) {
    const own = floors.get(find(name));
    if (own === undefined) floors.set(find(name), [name]);
    else own.push(name);
  }
  const x = (name: string): number => at.get(name)?.x ?? 0;
  const y = (name: string): number => at.get(name)?.y ?? 0;
  return [...floors.values()]
    .filter((joints) => joints.some((name) => (below.get(name) ?? 0) > 0))
    .map((joints) =>
      floorOf(
        frame,
        [...joints].sort((a, b) => x(a) - x(b)),
      ),
    )
    .sort((a, b) => y(a.at) - y(b.at) || x(a.at) - x(b.at));
}

function floorOf({ supports }: Structure, joints: readonly string[]): Floor {
  const own = supports.filter(({ joint }) => joints.includes(joint));
  const free = joints.filter((joint) => !own.some((one) => one.joint === joint));
  const at = free[free.length - 1] ?? joints[joints.length - 1] ?? "";
  return { joints, at, held: own.some((one) => resists(one, "x") || (one.angle ?? 0) !== 0) };
}

/** A support against sway at each floor, beside those of the frame. */
export function holdingSupports(floors: readonly Floor[]): readonly Support[] {
  return floors.filter(({ held }) => !held).map(({ at }) => support(at, { x: true }));
}
