// Overhangs: members that hang on the rest of a structure by one end, whose moments are statics alone. They hold no joint
// against turning; what they bring to their root is a known force and couple.
//
// Global axes: x right, y up, couples counter-clockwise; with r the root and t the tip of a member, F and C what acts on the tip,
//   force on the root    F + (loads on the member)
//   couple on the root   C + (t - r) x F + (moments of those loads about r)

import { integralOver, type MemberLoads, memberLoads, piecewise, product } from "../results/index.ts";
import { axisOf, type Load, type Member, type Structure } from "../structure/index.ts";

/** A member without support beyond its root. Couples act on the member, counter-clockwise, N·m. */
export interface Overhang {
  readonly member: string;
  readonly root: "start" | "end";
  /** Of the root joint on the member, and of what hangs on its tip. */
  readonly couples: { readonly root: number; readonly tip: number };
  /** What it pushes its root joint by, N, down positive. */
  readonly down: number;
}

/** Known actions by joint: couples counter-clockwise in N·m, of the loads at the joint and of the overhangs rooted there; the
 *  overhangs themselves by name. */
export interface Overhangs {
  readonly members: ReadonlyMap<string, Overhang>;
  coupleOn(joint: string): number;
}

interface Action {
  readonly fx: number;
  readonly fy: number;
  readonly couple: number;
}

const nothing: Action = { fx: 0, fy: 0, couple: 0 };

/** All overhangs of a structure under loads, taken off from their tips inwards, however many members hang one on another. */
export function overhangsOf(structure: Structure, loads: readonly Load[]): Overhangs {
  const on = new Map<string, Action>();
  const act = (joint: string, more: Action): void => {
    on.set(joint, plus(on.get(joint) ?? nothing, more));
  };
  for (const load of loads) if (load.kind === "joint") act(load.joint, load);
  const members = new Map<string, Overhang>();
  let left: readonly Member[] = structure.members;
  for (;;) {
    const found = nextOf(structure, left);
    if (found === undefined) break;
    const { member, root } = found;
    const tip = on.get(member[opposite(root)]) ?? nothing;
    const brought = atRoot(structure, member, root, tip, memberLoads(structure, loads, member.name));
    members.set(
      member.name,
      Object.freeze({
        member: member.name,
        root,
        couples: Object.freeze({ root: 0 - brought.couple, tip: tip.couple }),
        down: 0 - brought.fy,
      }),
    );
    act(member[root], brought);
    left = left.filter((other) => other !== member);
  }
  return Object.freeze({ members, coupleOn: (joint: string): number => on.get(joint)?.couple ?? 0 });
}

const opposite = (end: "start" | "end"): "start" | "end" => (end === "start" ? "end" : "start");

const plus = (a: Action, b: Action): Action => ({
  fx: a.fx + b.fx,
  fy: a.fy + b.fy,
  couple: a.couple + b.couple,
});

/** A member that hangs by one end only, what hung on it taken off already. */
function nextOf(
  structure: Structure,
  left: readonly Member[],
): { readonly member: Member; readonly root: "start" | "end" } | undefined {
  const meeting = new Map<string, number>();
  for (const { start, end } of left)
    for (const joint of [start, end]) meeting.set(joint, (meeting.get(joint) ?? 0) + 1);
  for (const member of left)
    for (const root of ["start", "end"] as const) {
      const { moment, shear = false, axial = false } = member.releases[root];
      const tip = member[opposite(root)];
      const alone = meeting.get(tip) === 1 && !isSupported(structure, tip);
      if (alone && !moment && !shear && !axial) return { member, root };
    }
  return undefined;
}

function isSupported({ supports }: Structure, joint: string): boolean {
  const { holds, springs } = supports.find((s) => s.joint === joint) ?? {};
  return springs !== undefined || (holds !== undefined && (holds.x || holds.y || holds.rotation));
}

function atRoot(
  structure: Structure,
  member: Member,
  root: "start" | "end",
  tip: Action,
  own: MemberLoads,
): Action {
  const { c, s, length } = axisOf(structure, member);
  const reach = root === "start" ? length : -length; // from root to tip, along the member
  const { along, across, couple } = resultantAt(own, root === "start" ? 0 : length);
  return plus(tip, {
    fx: along * c + across * s,
    fy: along * s - across * c,
    couple: couple + reach * (c * tip.fy - s * tip.fx),
  });
}

/** Force along and across a member, and couple about a place on it, counter-clockwise. */
function resultantAt(
  { along, across, points, length }: MemberLoads,
  place: number,
): { readonly along: number; readonly across: number; readonly couple: number } {
  const arm = piecewise([0, length], [[place, -1]]);
  return {
    along: points.reduce((sum, p) => sum + p.along, integralOver(along)),
    across: points.reduce((sum, p) => sum + p.across, integralOver(across)),
    couple: points.reduce(
      (sum, p) => sum + p.across * (place - p.x) + p.couple,
      integralOver(product(across, arm)),
    ),
  };
}

/** The couple that acts on a member's end, N·m counter-clockwise, where statics alone tells it: at a joint that turns freely but
 *  for this member and overhangs. None where other members or a support share in it; the member must be no overhang. */
export function knownCouple(
  structure: Structure,
  { members, coupleOn }: Overhangs,
  member: Member,
  end: "start" | "end",
): number | undefined {
  const joint = member[end];
  if (members.has(member.name) || member.releases[end].moment) return undefined;
  if (structure.supports.some((s) => s.joint === joint && s.holds.rotation)) return undefined;
  const shared = structure.members.some(
    (m) =>
      m !== member &&
      !members.has(m.name) &&
      ((m.start === joint && !m.releases.start.moment) || (m.end === joint && !m.releases.end.moment)),
  );
  return shared ? undefined : coupleOn(joint);
}

/** What makes the moments that statics tells at a member's ends: the overhangs beyond them, and the loads on those and on the joints
 *  at these ends and beyond. */
export function beyondEnds(
  structure: Structure,
  loads: readonly Load[],
  member: Member,
): { readonly members: readonly string[]; readonly loads: readonly Load[] } {
  const overhangs = overhangsOf(structure, loads);
  const joints = new Set(
    (["start", "end"] as const)
      .filter((end) => knownCouple(structure, overhangs, member, end) !== undefined)
      .map((end) => member[end]),
  );
  const members = new Set<string>();
  for (const { member: name, root } of [...overhangs.members.values()].reverse()) {
    const own = structure.members.find((m) => m.name === name);
    if (own === undefined || !joints.has(own[root])) continue;
    members.add(name);
    joints.add(own[opposite(root)]);
  }
  const meant = loads.filter((load) =>
    load.kind === "joint" ? joints.has(load.joint) : members.has(load.member),
  );
  return { members: [...members], loads: meant };
}
