// The sense in which each member end is bent, from rules of thumb and the balance of joints; no stiffness enters.
//
// Senses follow the fibre: +1 tension on the reference fibre (sagging), -1 on the other (hogging), 0 none.

import type { Member, Structure } from "../structure/index.ts";

export type End = "start" | "end";
export type Sense = 1 | -1 | 0;

export interface EndSense {
  readonly sense: Sense;
  /** How far the end is held against turning, 0 to 1, for a first place of the point of inflection. */
  readonly fixity: number;
  /** How many joints away from a load. */
  readonly level: number;
  readonly why: string;
  /** The bending moment where statics tells it, N·m. */
  readonly moment?: number;
  /** True where the rules leave the sense open. */
  readonly doubt?: true;
}

/** How an end meets what is around it. */
export type Hold = "free" | "hinged" | "fixed" | "joined";

/** Free: nothing there. Hinged: held in place, free to turn. Fixed: held against turning by the support.
 *  Joined: held by the other members. */
export function holdOf(structure: Structure, member: Member, end: End): Hold {
  const joint = member[end];
  const support = structure.supports.find((s) => s.joint === joint);
  if (member.releases[end].moment) return "hinged";
  if (support?.holds.rotation) return "fixed";
  const others = structure.members.some(
    (m) =>
      m !== member &&
      ((m.start === joint && !m.releases.start.moment) || (m.end === joint && !m.releases.end.moment)),
  );
  if (others) return "joined";
  return support === undefined &&
    !structure.members.some((m) => m !== member && [m.start, m.end].includes(joint))
    ? "free"
    : "hinged";
}

/** Sign with which a moment at an end acts on its joint, counter-clockwise positive. */
export function onJoint(end: End): 1 | -1 {
  return end === "start" ? 1 : -1;
}

/** The ends known so far, by member and end. */
export type Known = Map<string, EndSense>;

export const endKey = (member: string, end: End): string => `${member} ${end}`;

/** Members joined rigidly at a joint, with the end they have there. */
export function joinedAt(structure: Structure, joint: string): readonly { member: Member; end: End }[] {
  return structure.members.flatMap((member) =>
    (["start", "end"] as const)
      .filter((end) => member[end] === joint && !member.releases[end].moment)
      .map((end) => ({ member, end })),
  );
}

/** Spreads the senses from joint to joint, level by level: at a joint the members not bent yet hold against the moment that
 *  comes in, and each is bent the other way at its far end. */
export function spread(structure: Structure, known: Known, first: ReadonlyMap<string, number>): void {
  let incoming = first;
  for (let level = 0; incoming.size > 0 && level <= structure.joints.length; level++) {
    const reached: { member: Member; end: End; sense: Sense }[] = [];
    for (const [joint, net] of incoming) reached.push(...held(structure, known, joint, net, level));
    const next = new Map<string, number>();
    for (const { member, end, sense } of reached) {
      const far = end === "start" ? "end" : "start";
      if (known.has(endKey(member.name, far))) continue;
      const hold = holdOf(structure, member, far);
      const opposite = (hold === "fixed" || hold === "joined" ? -sense + 0 : 0) as Sense;
      known.set(endKey(member.name, far), farSense(member, far, hold, opposite, level));
      if (hold === "joined" && opposite !== 0)
        next.set(member[far], (next.get(member[far]) ?? 0) + onJoint(far) * opposite);
    }
    incoming = next;
  }
}

function held(
  structure: Structure,
  known: Known,
  joint: string,
  net: number,
  level: number,
): readonly { member: Member; end: End; sense: Sense }[] {
  return joinedAt(structure, joint).flatMap(({ member, end }) => {
    if (known.has(endKey(member.name, end))) return [];
    const sense = (net === 0 ? 0 : -Math.sign(net) * onJoint(end) + 0) as Sense;
    const why =
      sense === 0
        ? `the members it meets at ${joint} hold one another: which way it bends cannot be known`
        : `at ${joint} it holds against what bends the joint`;
    const doubt = sense === 0 ? { doubt: true as const } : {};
    known.set(endKey(member.name, end), { sense, fixity: 0.5, level, why, ...doubt });
    return sense === 0 ? [] : [{ member, end, sense }];
  });
}

function farSense(member: Member, far: End, hold: Hold, sense: Sense, level: number): EndSense {
  const joint = member[far];
  const why =
    sense === 0
      ? `${joint} is free to turn`
      : `turned at its other end, it is bent the other way where ${joint} holds it`;
  return { sense, fixity: hold === "fixed" ? 1 : 0.5, level: level + 1, why };
}
