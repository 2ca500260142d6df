// A structure cut into bodies, in two ways: at its hinges into rigid parts, and at its joints into members and joints.

import type { Action, ForceName, FreeBody, Piece } from "../results/index.ts";
import { deepFreeze, type Segment } from "../structure/index.ts";
import { cutForces, hingesOn, meetingsOnJoint, meetingsOnSegment, pushesAtJoint } from "./acting.ts";
import { type Cutting, endsOf, isBar, isCutFree, joinedAt, standsAlone } from "./cutting.ts";
import { type Push, pushesOnSegment } from "./pushes.ts";

export interface Body {
  readonly pieces: readonly Piece[];
  readonly joints: readonly string[];
  readonly pushes: readonly Push[];
}

/** Rigid parts between hinges, in the order of the members they begin with, then the joints that stand alone. */
export function partsBetweenHinges(cut: Cutting): readonly Body[] {
  const alone = cut.structure.joints.filter((j) => standsAlone(cut, j.name));
  return [
    ...rigidParts(cut),
    ...alone.map(({ name }) =>
      bodyOf([], [name], [...pushesAtJoint(cut, name), ...meetingsOnJoint(cut, name)]),
    ),
  ];
}

function rigidParts(cut: Cutting): readonly Body[] {
  const segments = cut.skeleton.segments.filter((s) => !isBar(cut, s));
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
      ...joints.flatMap((joint) => [...pushesAtJoint(cut, joint), ...meetingsOnJoint(cut, joint)]),
      ...own.flatMap((s) => [
        ...hingesOn(cut, s),
        ...meetingsOnSegment(cut, s),
        ...pushesOnSegment(cut.structure, cut.loads, cut.given, s),
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
    return [bodyOf([], [joint], [...pushesAtJoint(cut, joint), ...meetingsOnJoint(cut, joint), ...cuts])];
  };
  return cut.skeleton.segments.flatMap((s) => {
    if (isBar(cut, s)) return [];
    const ends = endsOf(cut, s);
    const kept = ends.filter((c) => c.joined && !isCutFree(cut, c.joint)).map((c) => c.joint);
    const cuts = ends
      .filter((c) => c.joined && isCutFree(cut, c.joint))
      .flatMap((c) => cutForces(cut, c, "member"));
    const pushes = [
      ...kept.flatMap((joint) => pushesAtJoint(cut, joint)),
      ...cuts,
      ...hingesOn(cut, s),
      ...meetingsOnSegment(cut, s),
      ...pushesOnSegment(cut.structure, cut.loads, cut.given, s),
    ];
    const before = ends.filter((c) => c.end === "start").flatMap((c) => jointBody(c.joint));
    const after = ends.filter((c) => c.end === "end").flatMap((c) => jointBody(c.joint));
    return [...before, ...(cuts.length === 0 ? [] : [bodyOf([s], kept, pushes)]), ...after];
  });
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

/** Several bodies put together: the forces between them are inner ones, and bars between their joints belong to them. */
export function joinedBody(cut: Cutting, bodies: readonly Body[], outer: readonly Push[]): Body {
  const joints = bodies.flatMap((body) => body.joints);
  const bars = cut.skeleton.segments.filter(
    (s) => isBar(cut, s) && endsOf(cut, s).every((c) => joints.includes(c.joint)),
  );
  const pieces = bars.map(({ member, begin, end }) => ({ member, begin, end }));
  return { pieces: [...bodies.flatMap((body) => body.pieces), ...pieces], joints, pushes: outer };
}

function bodyOf(segments: readonly Segment[], joints: readonly string[], pushes: readonly Push[]): Body {
  return { pieces: segments.map(({ member, begin, end }) => ({ member, begin, end })), joints, pushes };
}
