// Senses of the end moments under loads down on level members: of loaded spans, of overhangs, and of what they bend in turn.

import { extremes, type MemberLoads } from "../results/index.ts";
import { axisOf, type Load, type Member, type Structure } from "../structure/index.ts";
import { endMomentsGiven } from "./end-moments.ts";
import { type End, type EndSense, endKey, holdOf, type Known, onJoint, spread } from "./end-senses.ts";
import { knownCouple, type Overhang, type Overhangs, overhangsOf } from "./overhangs.ts";
import { isLoaded, simpleMoments } from "./span.ts";

/** Senses of all ends the rules reach, or the reason why they cannot be known. `own` are the loads of each member by its name. */
export function gravitySenses(
  structure: Structure,
  loads: readonly Load[],
  own: ReadonlyMap<string, MemberLoads>,
): Known | string {
  if (loads.some((load) => load.kind === "joint" && load.couple !== 0))
    return "a couple acts at a joint: its sense alone does not tell how the members share it";
  const known: Known = new Map();
  const net = new Map<string, number[]>();
  const overhangs = overhangsOf(structure, loads);
  for (const member of structure.members) {
    const overhang = overhangs.members.get(member.name);
    const span = own.get(member.name);
    if (overhang !== undefined) {
      overhungEnds(member, overhang, known);
      const moment = 0 - overhang.couples.root;
      const joint = member[overhang.root];
      if (moment !== 0 && holdOf(structure, member, overhang.root) === "joined")
        net.set(joint, [...(net.get(joint) ?? []), moment]);
      continue;
    }
    if (span === undefined || !isLoaded(span)) continue;
    const sag = sagOf(structure, member, span);
    if (typeof sag === "string") return sag;
    for (const [joint, moment] of loadedEnds(structure, member, span, sag, { known, overhangs, own }))
      net.set(joint, [...(net.get(joint) ?? []), moment]);
  }
  const unbalanced = new Map<string, number>();
  for (const [joint, moments] of net) {
    const sum = moments.reduce((a, b) => a + b, 0);
    const largest = Math.max(...moments.map(Math.abs));
    unbalanced.set(joint, Math.abs(sum) < 0.1 * largest ? 0 : sum);
  }
  spread(structure, known, unbalanced);
  return known;
}

/** +1 where the loads bend the simple span towards its reference fibre, -1 away from it. */
function sagOf(structure: Structure, member: Member, span: MemberLoads): 1 | -1 | string {
  const { s } = axisOf(structure, member);
  if (Math.abs(s) > 1e-9) return `${member.name} is loaded and not level: the rules are for level spans`;
  const { greatest, least } = extremes(simpleMoments(span));
  const [up, down] = [greatest.value, -least.value];
  if (Math.min(up, down) > 0.05 * Math.max(up, down))
    return `the loads on ${member.name} bend it both ways: the rules are for loads of one sense`;
  return up > down ? 1 : -1;
}

/** Sets the senses of an overhang's ends, which are known by statics. */
function overhungEnds(member: Member, { root, couples }: Overhang, known: Known): void {
  for (const end of ["start", "end"] as const) {
    const couple = end === root ? couples.root : couples.tip;
    const moment = 0 - onJoint(end) * couple;
    const why = `a cantilever hogs from its tip to ${member[root]}`;
    known.set(endKey(member.name, end), { sense: senseOf(moment), fixity: 1, level: 0, why, moment });
  }
}

const senseOf = (moment: number): EndSense["sense"] => (moment > 0 ? 1 : moment < 0 ? -1 : 0);

interface Bent {
  readonly known: Known;
  readonly overhangs: Overhangs;
  readonly own: ReadonlyMap<string, MemberLoads>;
}

/** Sets the senses of a loaded member's ends; answers with the moments it brings to its joints. */
function loadedEnds(
  structure: Structure,
  member: Member,
  span: MemberLoads,
  sag: 1 | -1,
  { known, overhangs, own }: Bent,
): readonly (readonly [joint: string, moment: number])[] {
  const holds = { start: holdOf(structure, member, "start"), end: holdOf(structure, member, "end") };
  /** The bending moment at an end beside overhangs alone. */
  const toldAt = (end: End): number | undefined => {
    const couple = holds[end] === "joined" ? knownCouple(structure, overhangs, member, end) : undefined;
    return couple === undefined ? undefined : 0 - onJoint(end) * couple;
  };
  const told = { start: toldAt("start"), end: toldAt("end") };
  const restrained = (end: End): boolean =>
    told[end] === undefined && (holds[end] === "fixed" || holds[end] === "joined");
  const fixities = { left: restrained("start") ? 1 : 0, right: restrained("end") ? 1 : 0 };
  const moments = endMomentsGiven(span, told, fixities);
  return (["start", "end"] as const).flatMap((end) => {
    const size = end === "start" ? moments.left : moments.right;
    const sense =
      told[end] !== undefined || !restrained(end)
        ? freeEnd(member[end], told[end])
        : heldEnd(structure, member, end, size, sag, own);
    known.set(endKey(member.name, end), sense);
    return holds[end] === "joined" ? [[member[end], onJoint(end) * size] as const] : [];
  });
}

/** An end that turns freely, but for the moment of what hangs there. */
function freeEnd(joint: string, moment: number | undefined): EndSense {
  const sense = senseOf(moment ?? 0);
  const why = sense === 0 ? `${joint} is free to turn` : `what hangs on ${joint} bends it there`;
  return { sense, fixity: 0, level: 0, why, ...(moment === undefined ? {} : { moment }) };
}

/** An end held against turning: it hogs, unless what hangs on the far end outweighs the span's own load; where other loaded spans
 *  meet it then, its sense is open. */
function heldEnd(
  structure: Structure,
  member: Member,
  end: End,
  size: number,
  sag: 1 | -1,
  own: Bent["own"],
): EndSense {
  const joint = member[end];
  const held = { fixity: fixityAt(structure, member, end), level: 0 };
  if (size * sag <= 0)
    return {
      ...held,
      sense: -sag as EndSense["sense"],
      why: `the span is loaded and held against turning at ${joint}`,
    };
  const rivals = structure.members.some((m) => {
    const loads = own.get(m.name);
    return m !== member && [m.start, m.end].includes(joint) && loads !== undefined && isLoaded(loads);
  });
  const why = `what hangs on ${member[end === "start" ? "end" : "start"]} outweighs the load of the span`;
  return rivals
    ? { ...held, sense: sag, why: `${why}: which way it bends at ${joint} cannot be known`, doubt: true }
    : { ...held, sense: sag, why };
}

/** Fully held by a fixed support or by a span across the support; about half by columns or a span without load. */
function fixityAt(structure: Structure, member: Member, end: End): number {
  if (holdOf(structure, member, end) === "fixed") return 1;
  const { c } = axisOf(structure, member);
  const across = structure.members.some(
    (m) =>
      m !== member && [m.start, m.end].includes(member[end]) && Math.abs(axisOf(structure, m).c - c) < 1e-9,
  );
  return across ? 0.8 : 0.5;
}
