// A frame as joints that turn and members of a stiffness k = EI/L: all that the restraint formulas look at.
// End moments here act on the members, counter-clockwise positive, two per member (start, end); `asBending` turns them into
// bending moments with the signs of results.

import { integralOver, memberLoads, piecewise, product } from "../results/index.ts";
import { axisOf, calledBy, type Load, type Structure } from "../structure/index.ts";
import { fixedEndMoments } from "./end-moments.ts";
import { NetError } from "./net-faults.ts";
import type { Span } from "./span.ts";

export interface NetMember {
  readonly name: string;
  /** Indices of joints. */
  readonly start: number;
  readonly end: number;
  readonly column: boolean;
  readonly length: number;
  /** EI/L, N·m or a ratio. */
  readonly k: number;
  /** EA/L, N/m, in the unit of k over that of lengths squared. */
  readonly stretch: number;
  /** 1 when it runs to the right (a beam) or up (a column), else -1. */
  readonly sense: 1 | -1;
  /** Forces down on its joints as a simple beam; none from columns. */
  readonly down: readonly [start: number, end: number];
  /** Whether that end passes no moment on: released, or alone at a support that lets it turn. */
  readonly freeStart: boolean;
  readonly freeEnd: boolean;
  /** The span and its loads. */
  readonly span: Span;
  /** End moments with every joint held against turning; free ends have none and raise the other end's. */
  readonly fixed: readonly [start: number, end: number];
}

/** A member seen from one of its ends. */
export interface NetEnd {
  readonly member: number;
  /** 0 start, 1 end. */
  readonly end: 0 | 1;
  /** The joint at the other end. */
  readonly far: number;
}

export interface NetJoint {
  readonly name: string;
  /** Held against turning by its support. */
  readonly held: boolean;
  /** Held against sinking by its support. */
  readonly carried: boolean;
  /** Force down at the joint itself, N. */
  readonly down: number;
  /** Members that pass moment on to it. */
  readonly ends: readonly NetEnd[];
}

export interface Net {
  readonly joints: readonly NetJoint[];
  readonly members: readonly NetMember[];
}

/** End moments on the members, counter-clockwise: two per member, in the order of the net. */
export type EndMomentArray = Float64Array;

/** The net of a frame of beams and columns under loads across its members (its joints are held against moving: sway is another
 *  load case). Throws on members without section, on inclined ones and on hinges. */
export function netOf(structure: Structure, loads: readonly Load[]): Net {
  if (structure.hinges.length > 0)
    throw new NetError({ kind: "hinged", hinges: structure.hinges.map((h) => h.name) });
  const index = new Map(structure.joints.map((j, i) => [j.name, i]));
  const held = new Set(structure.supports.filter((s) => s.holds.rotation).map((s) => s.joint));
  const passing = new Map<string, number>();
  const count = (joint: string, released: boolean): void => {
    if (!released) passing.set(joint, (passing.get(joint) ?? 0) + 1);
  };
  for (const m of structure.members) {
    count(m.start, m.releases.start.moment);
    count(m.end, m.releases.end.moment);
  }
  const loose = (joint: string, released: boolean): boolean =>
    released || (!held.has(joint) && (passing.get(joint) ?? 0) < 2);
  const members = structure.members.map((m): NetMember => {
    const axis = axisOf(structure, m);
    const called = calledBy(axis);
    if (called === "member") throw new NetError({ kind: "inclined", member: m.name });
    if (m.section === undefined) throw new NetError({ kind: "no stiffness", member: m.name });
    const span = memberLoads(structure, loads, m.name);
    const sense = (called === "column" ? axis.s : axis.c) > 0 ? 1 : -1;
    const ends = [loose(m.start, m.releases.start.moment), loose(m.end, m.releases.end.moment)] as const;
    return Object.freeze({
      name: m.name,
      start: index.get(m.start) ?? -1,
      end: index.get(m.end) ?? -1,
      column: called === "column",
      length: axis.length,
      k: (m.section.E * m.section.I) / axis.length,
      stretch: (m.section.E * m.section.A) / axis.length,
      sense,
      down: called === "column" ? ([0, 0] as const) : simpleReactions(span, sense),
      freeStart: ends[0],
      freeEnd: ends[1],
      span,
      fixed: fixedMoments(span, ends[0], ends[1]),
    });
  });
  const carried = new Set(structure.supports.filter((s) => s.holds.y).map((s) => s.joint));
  const joints = structure.joints.map(({ name }, j) =>
    Object.freeze({
      name,
      held: held.has(name),
      carried: carried.has(name),
      down: loads.reduce((sum, l) => (l.kind === "joint" && l.joint === name ? sum - l.fy : sum), 0),
      ends: Object.freeze(endsAt(members, j)),
    }),
  );
  return Object.freeze({ joints: Object.freeze(joints), members: Object.freeze(members) });
}

function endsAt(members: readonly NetMember[], joint: number): NetEnd[] {
  return members.flatMap((m, member): NetEnd[] => [
    ...(m.start === joint && !m.freeStart ? [{ member, end: 0 as const, far: m.end }] : []),
    ...(m.end === joint && !m.freeEnd ? [{ member, end: 1 as const, far: m.start }] : []),
  ]);
}

/** What a simple beam gives its joints, down positive; one drawn to the left has its loads turned round. */
function simpleReactions({ length: L, across, points }: Span, sense: 1 | -1): readonly [number, number] {
  const total = integralOver(across) + points.reduce((sum, p) => sum + p.across, 0);
  const arm = piecewise([0, L], [[L, -1]]);
  const about = points.reduce(
    (sum, p) => sum + p.across * (L - p.x) + p.couple,
    integralOver(product(across, arm)),
  );
  return [(sense * about) / L, sense * (total - about / L)];
}

/** A free end has no moment, and half of what it would have had goes to the other with the sign turned. */
function fixedMoments(span: Span, freeStart: boolean, freeEnd: boolean): readonly [number, number] {
  const { left, right } = fixedEndMoments(span);
  const [m1, m2] = [0 - left, right];
  if (freeStart && freeEnd) return [0, 0];
  if (freeStart) return [0, m2 - m1 / 2];
  return freeEnd ? [m1 - m2 / 2, 0] : [m1, m2];
}

/** Whether the far end of a member, seen from one end, is free to turn by itself. */
export function farIsFree(member: NetMember, end: 0 | 1): boolean {
  return end === 0 ? member.freeEnd : member.freeStart;
}

/** Stiffness of a member end against turning, the far end held or free to turn: 4k or 3k. */
export function endStiffness(member: NetMember, end: 0 | 1): number {
  return (farIsFree(member, end) ? 3 : 4) * member.k;
}

/** What is out of balance at a joint: the sum of the end moments that meet there. */
export function unbalanced({ ends }: NetJoint, m: EndMomentArray): number {
  return ends.reduce((sum, { member, end }) => sum + (m[2 * member + end] ?? 0), 0);
}

/** End moments with every joint held. */
export function heldMoments({ members }: Net): EndMomentArray {
  return Float64Array.from(members.flatMap((m) => m.fixed));
}

/** The members of a net by their end moments as bending moments, tension on the reference fibre positive. */
export interface MemberEnds {
  readonly member: string;
  readonly start: number;
  readonly end: number;
}

/** Bending moments at the ends of every member. */
export function asBending({ members }: Net, m: EndMomentArray): readonly MemberEnds[] {
  return Object.freeze(
    members.map(({ name }, i) =>
      Object.freeze({ member: name, start: 0 - (m[2 * i] ?? 0), end: (m[2 * i + 1] ?? 0) + 0 }),
    ),
  );
}
