// A frame as joints that turn and members of a stiffness k = EI/L: all that the restraint formulas look at.
// End moments here act on the members, counter-clockwise positive, two per member (start, end); `asBending` turns them into
// bending moments with the signs of results.

import { integralOver, memberLoads, piecewise, product } from "../results/index.ts";
import { axisOf, calledBy, type Load, type Structure } from "../structure/index.ts";
import { fixedEndMoments } from "./end-moments.ts";
import { NetError } from "./net-faults.ts";
import { knownCouple, type Overhang, overhangsOf } from "./overhangs.ts";
import type { Span } from "./span.ts";

export interface NetMember {
  readonly name: string;
  /** Indices of joints. */
  readonly start: number;
  readonly end: number;
  readonly column: boolean;
  readonly length: number;
  /** EI/L, N·m or a ratio; none of an overhang, which holds no joint. */
  readonly k: number;
  /** EA/L, N/m, in the unit of k over that of lengths squared. */
  readonly stretch: number;
  /** 1 when it runs to the right (a beam) or up (a column), else -1. */
  readonly sense: 1 | -1;
  /** Forces down on its joints as a simple beam, or all at the root of an overhang; none from columns. */
  readonly down: readonly [start: number, end: number];
  /** Hangs on the rest by one end: its moments are known by statics. */
  readonly overhang: boolean;
  /** Whether statics alone tells the moment of that end, mostly none: released, at a support that lets it turn, with nothing else
   *  there or overhangs only, or at the tip of an overhang. */
  readonly freeStart: boolean;
  readonly freeEnd: boolean;
  /** The span and its loads. */
  readonly span: Span;
  /** End moments with every joint held against turning; free ends have the moment statics tells and raise the other end's. */
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
  /** Couple of the loads at the joint itself, N·m, counter-clockwise. */
  readonly couple: number;
  /** Members that share in what turns it, and the overhangs rooted there; none where only one end could. */
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
  const overhangs = overhangsOf(structure, loads);
  const members = structure.members.map((m): NetMember => {
    const axis = axisOf(structure, m);
    const called = calledBy(axis);
    if (called === "member") throw new NetError({ kind: "inclined", member: m.name });
    if (m.section === undefined) throw new NetError({ kind: "no stiffness", member: m.name });
    const span = memberLoads(structure, loads, m.name);
    const sense = (called === "column" ? axis.s : axis.c) > 0 ? 1 : -1;
    const own = {
      name: m.name,
      start: index.get(m.start) ?? -1,
      end: index.get(m.end) ?? -1,
      column: called === "column",
      length: axis.length,
      stretch: (m.section.E * m.section.A) / axis.length,
      sense,
      span,
    } as const;
    const overhang = overhangs.members.get(m.name);
    if (overhang !== undefined) return Object.freeze({ ...own, ...hanging(overhang) });
    const known = (["start", "end"] as const).map((end) =>
      m.releases[end].moment ? 0 : knownCouple(structure, overhangs, m, end),
    );
    return Object.freeze({
      ...own,
      overhang: false,
      k: (m.section.E * m.section.I) / axis.length,
      down: called === "column" ? ([0, 0] as const) : simpleReactions(span, sense),
      freeStart: known[0] !== undefined,
      freeEnd: known[1] !== undefined,
      fixed: fixedMoments(span, known[0], known[1]),
    });
  });
  const carried = new Set(structure.supports.filter((s) => s.holds.y).map((s) => s.joint));
  const joints = structure.joints.map(({ name }, j) =>
    Object.freeze({
      name,
      held: held.has(name),
      carried: carried.has(name),
      down: loads.reduce((sum, l) => (l.kind === "joint" && l.joint === name ? sum - l.fy : sum), 0),
      couple: loads.reduce((sum, l) => (l.kind === "joint" && l.joint === name ? sum + l.couple : sum), 0),
      ends: Object.freeze(endsAt(members, j)),
    }),
  );
  return Object.freeze({ joints: Object.freeze(joints), members: Object.freeze(members) });
}

function endsAt(members: readonly NetMember[], joint: number): NetEnd[] {
  const ends = members.flatMap((m, member): NetEnd[] => [
    ...(m.start === joint && !m.freeStart ? [{ member, end: 0 as const, far: m.end }] : []),
    ...(m.end === joint && !m.freeEnd ? [{ member, end: 1 as const, far: m.start }] : []),
  ]);
  return ends.every(({ member }) => members[member]?.overhang === true) ? [] : ends;
}

/** An overhang of the net: no stiffness, its end moments as known, what it weighs on its root. */
function hanging({
  root,
  couples,
  down,
}: Overhang): Pick<NetMember, "overhang" | "k" | "down" | "freeStart" | "freeEnd" | "fixed"> {
  const atStart = root === "start";
  return {
    overhang: true,
    k: 0,
    down: atStart ? [down, 0] : [0, down],
    freeStart: !atStart,
    freeEnd: atStart,
    fixed: atStart ? [couples.root, couples.tip] : [couples.tip, couples.root],
  };
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

/** A free end has the moment known, and half of what that differs by goes to the other end. */
function fixedMoments(
  span: Span,
  atStart: number | undefined,
  atEnd: number | undefined,
): readonly [number, number] {
  const { left, right } = fixedEndMoments(span);
  const [m1, m2] = [0 - left, right];
  if (atStart !== undefined && atEnd !== undefined) return [atStart, atEnd];
  if (atStart !== undefined) return [atStart, m2 + (atStart - m1) / 2];
  return atEnd === undefined ? [m1, m2] : [m1 + (atEnd - m2) / 2, atEnd];
}

/** Whether the far end of a member, seen from one end, is free to turn by itself. */
export function farIsFree(member: NetMember, end: 0 | 1): boolean {
  return end === 0 ? member.freeEnd : member.freeStart;
}

/** Stiffness of a member end against turning, the far end held or free to turn: 4k or 3k. */
export function endStiffness(member: NetMember, end: 0 | 1): number {
  return (farIsFree(member, end) ? 3 : 4) * member.k;
}

/** What is out of balance at a joint: the sum of the end moments that meet there, less the couple that acts on it. */
export function unbalanced({ ends, couple }: NetJoint, m: EndMomentArray): number {
  return ends.length === 0
    ? 0
    : ends.reduce((sum, { member, end }) => sum + (m[2 * member + end] ?? 0), -couple);
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
