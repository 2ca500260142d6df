// A structure checked and frozen: the one way by which every builder makes one.

import { StructureError } from "./faults.ts";
import { deepFreeze } from "./freeze.ts";
import { axisOf, jointNamed } from "./geometry.ts";
import { checkSection } from "./section.ts";
import { checkSpring, heldCount } from "./support.ts";
import type { Member, Structure, Support } from "./types.ts";

/** The same structure frozen. Throws on an unknown or repeated joint or member, a member without length,
 *  numbers that are not finite, sections that are not positive, ends released too far, no supports, and a structure
 *  in several pieces. */
export function assemble(structure: Structure): Structure {
  deepFreeze(structure);
  checkNames(structure);
  for (const joint of structure.joints)
    for (const axis of ["x", "y"] as const) checkFinite(joint[axis], `${axis} of joint ${joint.name}`);
  const pairs = new Map<string, string>();
  for (const member of structure.members) checkMember(structure, member, pairs);
  checkSupports(structure);
  checkOnePiece(structure);
  return structure;
}

function checkFinite(value: number, what: string): void {
  if (!Number.isFinite(value)) throw new StructureError({ kind: "not finite", what, value });
}

function checkNames(structure: Structure): void {
  const nouns = [
    ["joint", structure.joints],
    ["member", structure.members],
  ] as const;
  for (const [what, things] of nouns) {
    const seen = new Set<string>();
    for (const { name } of things) {
      if (!/^\p{L}[\p{L}\p{N}']*$/u.test(name)) throw new StructureError({ kind: "bad name", what, name });
      if (seen.has(name)) throw new StructureError({ kind: "name used twice", what, name });
      seen.add(name);
    }
  }
}

function checkMember(structure: Structure, member: Member, pairs: Map<string, string>): void {
  const { length } = axisOf(structure, member);
  const joints = [member.start, member.end] as const;
  if (length === 0) throw new StructureError({ kind: "zero length", member: member.name, joints });
  const pair = [...joints].sort().join(" ");
  const twin = pairs.get(pair);
  if (twin !== undefined)
    throw new StructureError({ kind: "same joints", members: [twin, member.name], joints });
  pairs.set(pair, member.name);
  checkReleases(member);
  if (member.section !== undefined) checkSection(member.section, member.name);
}

/** A member must be held by its ends: axially by one of them, and against lifting and turning by two conditions. */
function checkReleases({ name, releases: { start, end } }: Member): void {
  const loose = (motion: string): never => {
    throw new StructureError({ kind: "loose member", member: name, motion });
  };
  if (start.axial === true && end.axial === true) loose("slides along its axis");
  if (start.shear === true && end.shear === true) loose("moves sideways");
  if (start.moment && end.moment && (start.shear === true || end.shear === true)) loose("turns");
}

function checkSupports(structure: Structure): void {
  const seen = new Set<string>();
  for (const support of structure.supports) {
    jointNamed(structure, support.joint, "a support is at joint");
    if (seen.has(support.joint))
      throw new StructureError({ kind: "name used twice", what: "support at", name: support.joint });
    seen.add(support.joint);
    checkNumbers(support);
    if (support.holds.rotation && endsReleasedAt(structure, support.joint))
      throw new StructureError({ kind: "spinning support", joint: support.joint });
  }
  if (structure.supports.every((s) => heldCount(s) === 0)) throw new StructureError({ kind: "no supports" });
}

function checkNumbers({ joint, angle = 0, springs = {}, holds }: Support): void {
  checkFinite(angle, `angle of the support at ${joint}`);
  for (const axis of ["x", "y", "rotation"] as const) {
    const stiffness = springs[axis];
    if (stiffness === undefined) continue;
    const what = `${axis} spring of the support at ${joint}`;
    checkFinite(stiffness, what);
    checkSpring(stiffness, axis, what);
    if (holds[axis]) throw new StructureError({ kind: "held spring", joint, axis });
  }
}

/** Whether every member end at a joint is released, so that nothing there takes a moment. */
export function endsReleasedAt(structure: Pick<Structure, "members">, joint: string): boolean {
  return structure.members.every(
    (m) => (m.start !== joint || m.releases.start.moment) && (m.end !== joint || m.releases.end.moment),
  );
}

function checkOnePiece(structure: Structure): void {
  const next = new Map<string, string[]>(structure.joints.map((j) => [j.name, []]));
  for (const { start, end } of structure.members) {
    next.get(start)?.push(end);
    next.get(end)?.push(start);
  }
  const pieces: string[][] = [];
  const left = new Set(next.keys());
  for (const { name } of structure.joints) {
    if (!left.delete(name)) continue;
    const piece = [name];
    for (const here of piece)
      for (const other of next.get(here) ?? []) if (left.delete(other)) piece.push(other);
    pieces.push(piece);
  }
  if (pieces.length > 1) throw new StructureError({ kind: "pieces", pieces });
}
