// A structure cut into bodies, in two ways: at its hinges into rigid parts, and at its joints into members and joints.

import type { Action, ForceName, FreeBody, Piece, Point } from "../results/index.ts";
import {
  deepFreeze,
  type Load,
  type Segment,
  type Skeleton,
  type Structure,
  skeleton,
} from "../structure/index.ts";
import { type Connection, connections } from "./connections.ts";
import { cutForce, hingeForce, pinForce, reactionForce } from "./force-names.ts";
import {
  forcePush,
  loadPushes,
  memberEnds,
  nothing,
  type Push,
  pushesOnSegment,
  type Stands,
} from "./pushes.ts";

export interface Body {
  readonly pieces: readonly Piece[];
  readonly joints: readonly string[];
  readonly pushes: readonly Push[];
}

/** Everything the cutting needs to know of a structure under its loads. */
export interface Cutting {
  readonly structure: Structure;
  readonly loads: readonly Load[];
  readonly skeleton: Skeleton;
  readonly connections: readonly Connection[];
}

export function cutting(structure: Structure, loads: readonly Load[]): Cutting {
  return { structure, loads, skeleton: skeleton(structure), connections: connections(structure) };
}

/** Rigid parts between hinges, in the order of the members they begin with. */
export function partsBetweenHinges(cut: Cutting): readonly Body[] {
  const { segments } = cut.skeleton;
  const group = segments.map((_, i) => i);
  const find = (i: number): number => {
    const up = group[i] ?? i;
    return up === i ? i : find(up);
  };
  for (const joint of cut.structure.joints) {
    const [first, ...others] = segments.flatMap((s, i) => (joinedAt(cut, s, joint.name) ? [i] : []));
    for (const other of others)
      group[Math.max(find(first ?? other), find(other))] = Math.min(find(first ?? other), find(other));
  }
  return [...new Set(segments.map((_, i) => find(i)))].map((root) => {
    const own = segments.filter((_, i) => find(i) === root);
    const joints = cut.structure.joints
      .filter((j) => own.some((s) => joinedAt(cut, s, j.name)))
      .map((j) => j.name);
    const pushes = [
      ...joints.flatMap((joint) => [...pushesAtJoint(cut, joint), ...pinsOnJoint(cut, joint)]),
      ...own.flatMap((s) => [
        ...hingesOn(cut, s),
        ...pinsOnSegment(cut, s),
        ...pushesOnSegment(cut.structure, cut.loads, s),
      ]),
    ];
    return bodyOf(own, joints, pushes);
  });
}

/** Members (between joints and hinges) and joints, in walking order; only those at which something is cut. */
export function membersAndJoints(cut: Cutting): readonly Body[] {
  const seen = new Set<string>();
  const jointBody = (joint: string): readonly Body[] => {
    if (seen.has(joint) || !isCutFree(cut, joint)) return [];
    seen.add(joint);
    const own = cut.connections.filter((c) => c.joint === joint && c.joined);
    const cuts = own.flatMap((c) => cutForces(cut, c, "joint"));
    return [bodyOf([], [joint], [...pushesAtJoint(cut, joint), ...pinsOnJoint(cut, joint), ...cuts])];
  };
  return cut.skeleton.segments.flatMap((s) => {
    const ends = endsOf(cut, s);
    const kept = ends.filter((c) => c.joined && !isCutFree(cut, c.joint)).map((c) => c.joint);
    const cuts = ends
      .filter((c) => c.joined && isCutFree(cut, c.joint))
      .flatMap((c) => cutForces(cut, c, "member"));
    const pushes = [
      ...kept.flatMap((joint) => pushesAtJoint(cut, joint)),
      ...cuts,
      ...hingesOn(cut, s),
      ...pinsOnSegment(cut, s),
      ...pushesOnSegment(cut.structure, cut.loads, s),
    ];
    const before = ends.filter((c) => c.end === "start").flatMap((c) => jointBody(c.joint));
    const after = ends.filter((c) => c.end === "end").flatMap((c) => jointBody(c.joint));
    return [...before, ...(cuts.length === 0 ? [] : [bodyOf([s], kept, pushes)]), ...after];
  });
}

/** A joint is cut free where two or more member ends meet. */
export function isCutFree(cut: Cutting, joint: string): boolean {
  return cut.connections.filter((c) => c.joint === joint).length > 1;
}

/** The named forces that act on bodies, each once, in order of appearance. */
export function forceNames(bodies: readonly Body[]): readonly ForceName[] {
  const names = new Map<string, ForceName>();
  for (const { pushes } of bodies)
    for (const { force } of pushes)
      if (force !== undefined && !names.has(force.name)) names.set(force.name, force);
  return [...names.values()];
}

/** A body as handed out, with every value that is known. */
export function freeBody(name: string, body: Body, found: (force: string) => number | undefined): FreeBody {
  const actions = body.pushes.map(({ action }): Action => {
    const value = "force" in action.source ? found(action.source.force) : action.value;
    return value === undefined ? action : { ...action, value };
  });
  return deepFreeze({ name, pieces: body.pieces, joints: body.joints, actions });
}

function bodyOf(segments: readonly Segment[], joints: readonly string[], pushes: readonly Push[]): Body {
  return { pieces: segments.map(({ member, begin, end }) => ({ member, begin, end })), joints, pushes };
}

/** The member ends among the two ends of a segment (a hinge is none). */
function endsOf({ skeleton: { nodes }, connections: all }: Cutting, s: Segment): readonly Connection[] {
  return all.filter((c) => {
    const node = nodes[c.end === "start" ? s.from : s.to];
    return c.member === s.member && node?.kind === "joint" && node.name === c.joint;
  });
}

function joinedAt(cut: Cutting, s: Segment, joint: string): boolean {
  return endsOf(cut, s).some((c) => c.joint === joint && c.joined);
}

function jointPoint({ structure }: Cutting, joint: string): Point {
  const found = structure.joints.find((j) => j.name === joint);
  return { name: joint, x: found?.x ?? Number.NaN, y: found?.y ?? Number.NaN };
}

/** Reactions and loads at a joint. */
function pushesAtJoint(cut: Cutting, joint: string): readonly Push[] {
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

function hingesOn({ structure, skeleton: { nodes } }: Cutting, s: Segment): readonly Push[] {
  return [["from", -1] as const, ["to", 1] as const].flatMap(([end, sense]) => {
    const node = nodes[s[end]];
    if (node?.kind !== "hinge") return [];
    const at = { name: node.name, x: node.x, y: node.y };
    const place = { joints: memberEnds(structure, s.member).joints, hinges: [node.name] };
    return pair([hingeForce(node.name, "x"), hingeForce(node.name, "y")], at, sense, place);
  });
}

function pinsOnSegment(cut: Cutting, s: Segment): readonly Push[] {
  return endsOf(cut, s).flatMap((c) => (c.joined ? [] : pinForces(cut, c, 1)));
}

function pinsOnJoint(cut: Cutting, joint: string): readonly Push[] {
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
function cutForces(
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
