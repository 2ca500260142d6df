// What acts where a structure is cut: reactions, forces through hinges, pins and bars, and N, V, M beside a joint.

import type { Point } from "../results/index.ts";
import { axisOf, memberNamed, type Segment } from "../structure/index.ts";
import type { Connection } from "./connections.ts";
import { type Cutting, endsOf, jointPoint } from "./cutting.ts";
import { barForce, cutForce, hingeForce, pinForce, reactionForce } from "./force-names.ts";
import type { Place } from "./place.ts";
import { forcePush, loadPushes, type Push } from "./pushes.ts";
import { type Restraint, restraintsOf } from "./restraints.ts";

/** Reactions and loads at a joint. */
export function pushesAtJoint(cut: Cutting, joint: string): readonly Push[] {
  const at = jointPoint(cut, joint);
  const place = { joint };
  return [
    ...restraintsOf(cut.structure)
      .filter((restraint) => restraint.joint === joint)
      .map((restraint) => reactionPush(restraint, at, place)),
    ...cut.loads.flatMap((load, i) =>
      load.kind === "joint" && load.joint === joint
        ? loadPushes(i, at, [load.fx, load.fy], load.couple, place)
        : [],
    ),
  ];
}

function reactionPush({ joint, component, direction }: Restraint, at: Point, place: Place): Push {
  const inclined = component === "normal" || component === "tangent";
  return forcePush(
    reactionForce(joint, component),
    at,
    direction ?? 1,
    place,
    inclined ? { support: joint } : undefined,
  );
}

/** Forces through the hinges at the ends of a segment. */
export function hingesOn({ skeleton: { nodes } }: Cutting, s: Segment): readonly Push[] {
  return [["from", -1] as const, ["to", 1] as const].flatMap(([end, sense]) => {
    const node = nodes[s[end]];
    if (node?.kind !== "hinge") return [];
    const { name, x, y } = node;
    const place = { member: s.member, at: [{ stop: { hinge: name }, weight: 1 }] };
    return [
      forcePush(hingeForce(name, "x"), { name, x, y }, [sense, 0], place),
      forcePush(hingeForce(name, "y"), { name, x, y }, [0, sense], place),
    ];
  });
}

/** Forces by which a segment meets joints it does not go with. */
export function meetingsOnSegment(cut: Cutting, s: Segment): readonly Push[] {
  return endsOf(cut, s).flatMap((c) => (c.joined ? [] : meeting(cut, c, "member")));
}

/** The same forces on the joint, opposite. */
export function meetingsOnJoint(cut: Cutting, joint: string): readonly Push[] {
  return cut.connections.flatMap((c) => (c.joint === joint && !c.joined ? meeting(cut, c, "joint") : []));
}

function meeting(cut: Cutting, c: Connection, on: "member" | "joint"): readonly Push[] {
  if (c.bar || !c.shear || !c.axial || c.moment) return cutForces(cut, c, on);
  const { member, joint } = c;
  const sense = on === "member" ? 1 : -1;
  const at = jointPoint(cut, joint);
  return [
    forcePush(pinForce(member, joint, "x"), at, [sense, 0], { joint }),
    forcePush(pinForce(member, joint, "y"), at, [0, sense], { joint }),
  ];
}

/** N, V and M at a cut beside a joint, as far as the end transmits them, as they act on the member or on the joint. */
export function cutForces(cut: Cutting, c: Connection, on: "member" | "joint"): readonly Push[] {
  const { member, joint, end, bar } = c;
  const axis = axisOf(cut.structure, memberNamed(cut.structure, member, "cut"));
  const sense = (end === "end") === (on === "member") ? 1 : -1;
  const at = jointPoint(cut, joint);
  const put = (force: ReturnType<typeof cutForce>, x: number, y: number): Push =>
    forcePush(force, at, [sense * x + 0, sense * y + 0], { joint }, { member });
  if (bar) return [put(barForce(member), axis.c, axis.s)];
  return [
    ...(c.axial ? [put(cutForce(member, joint, "N"), axis.c, axis.s)] : []),
    ...(c.shear ? [put(cutForce(member, joint, "V"), axis.s, -axis.c)] : []),
    ...(c.moment ? [forcePush(cutForce(member, joint, "M"), at, sense, { joint })] : []),
  ];
}
