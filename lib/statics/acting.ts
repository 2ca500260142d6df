// What acts where a structure is cut: reactions, forces through hinges and pins, and N, V, M beside a joint.

import type { ForceName, Point } from "../results/index.ts";
import type { Segment } from "../structure/index.ts";
import type { Connection } from "./connections.ts";
import { type Cutting, endsOf, jointPoint } from "./cutting.ts";
import { cutForce, hingeForce, pinForce, reactionForce } from "./force-names.ts";
import { forcePush, loadPushes, memberEnds, nothing, type Push, type Stands } from "./pushes.ts";

/** Reactions and loads at a joint. */
export function pushesAtJoint(cut: Cutting, joint: string): readonly Push[] {
  const at = jointPoint(cut, joint);
  const place = { joints: [joint], hinges: [] };
  const holds = cut.structure.supports.find((s) => s.joint === joint)?.holds;
  return [
    ...(holds?.x ? [forcePush(reactionForce(joint, "x"), at, [1, 0], place)] : []),
    ...(holds?.y ? [forcePush(reactionForce(joint, "y"), at, [0, 1], place)] : []),
    ...(holds?.rotation ? [forcePush(reactionForce(joint, "M"), at, 1, place)] : []),
    ...cut.loads.flatMap((load, i) =>
      load.kind === "joint" && load.joint === joint
        ? loadPushes(i, at, [load.fx, load.fy], load.couple, place)
        : [],
    ),
  ];
}

/** Forces through the hinges at the ends of a segment. */
export function hingesOn({ structure, skeleton: { nodes } }: Cutting, s: Segment): readonly Push[] {
  return [["from", -1] as const, ["to", 1] as const].flatMap(([end, sense]) => {
    const node = nodes[s[end]];
    if (node?.kind !== "hinge") return [];
    const at = { name: node.name, x: node.x, y: node.y };
    const place = { joints: memberEnds(structure, s.member).joints, hinges: [node.name] };
    return pair([hingeForce(node.name, "x"), hingeForce(node.name, "y")], at, sense, place);
  });
}

/** Forces through the pins by which a segment meets joints it does not go with. */
export function pinsOnSegment(cut: Cutting, s: Segment): readonly Push[] {
  return endsOf(cut, s).flatMap((c) => (c.joined ? [] : pinForces(cut, c, 1)));
}

/** The same forces on the joint, opposite. */
export function pinsOnJoint(cut: Cutting, joint: string): readonly Push[] {
  return cut.connections.flatMap((c) => (c.joint === joint && !c.joined ? pinForces(cut, c, -1) : []));
}

function pinForces(cut: Cutting, { member, joint }: Connection, sense: 1 | -1): readonly Push[] {
  const names = [pinForce(member, joint, "x"), pinForce(member, joint, "y")] as const;
  return pair(names, jointPoint(cut, joint), sense, { joints: [joint], hinges: [] });
}

function pair(
  [x, y]: readonly [ForceName, ForceName],
  at: Point,
  sense: 1 | -1,
  place: Stands,
): readonly Push[] {
  return [forcePush(x, at, [sense, 0], place), forcePush(y, at, [0, sense], place)];
}

/** N, V and M at a cut beside a joint, as they act on the member or on the joint. */
export function cutForces(
  cut: Cutting,
  { member, joint, end, moment }: Connection,
  on: "member" | "joint",
): readonly Push[] {
  const segment = cut.skeleton.segments.find((s) => s.member === member);
  const [c, s] = [segment?.c ?? 1, segment?.s ?? 0];
  const sense = (end === "end") === (on === "member") ? 1 : -1;
  const at = jointPoint(cut, joint);
  const place = { joints: [joint], hinges: [] };
  const tilt = Math.abs(c * s) < 1e-12 ? nothing : memberEnds(cut.structure, member);
  return [
    forcePush(cutForce(member, joint, "N"), at, [sense * c + 0, sense * s + 0], place, tilt),
    forcePush(cutForce(member, joint, "V"), at, [sense * s + 0, -sense * c + 0], place, tilt),
    ...(moment ? [forcePush(cutForce(member, joint, "M"), at, sense, place)] : []),
  ];
}
