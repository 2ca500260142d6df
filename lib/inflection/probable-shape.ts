// The qualitative deflected shape: which stretches of each member sag and which hog, and where the points of inflection
// between them probably are. From the rule of the spans and the sense of the end moments; no stiffness enters, so sizes and
// places are guesses to start from, and what the rules cannot tell is said.
//
// Rules, common practice:
//   1 a loaded span hogs at an end that is held against turning and has one point of inflection near it
//   2 an end free to turn has no moment; a cantilever hogs from its tip to its root
//   3 at a joint, members without load hold against what the loaded ones bring; where two loaded spans hold one another
//     the others stay nearly straight
//   4 a member without load, turned at one end and held at the other, has one point of inflection, within the third of its
//     length at the held end; free at the other end it has none
//   5 pushed sideways, columns and beams held at both ends bend in double curvature, with a point of inflection near the middle

import { extremes, type MemberLoads, magnitude, memberLoads, valueAt } from "../results/index.ts";
import {
  axisOf,
  checkLoads,
  deepFreeze,
  inGlobalAxes,
  type Load,
  type Member,
  type Structure,
} from "../structure/index.ts";
import { endMoments, momentsBetween } from "./end-moments.ts";
import { type EndSense, endKey, holdOf, type Known, onJoint, spread } from "./end-senses.ts";
import { inflectionPoints } from "./inflection-points.ts";
import { isLoaded, simpleMoments } from "./span.ts";
import { swaySenses } from "./sway-senses.ts";

export interface ProbableShape {
  readonly members: readonly ProbableMember[];
  readonly label: "qualitative";
}

/** One member; places are parts of its length from its start. */
export interface ProbableMember {
  readonly member: string;
  /** From start to end; sagging puts the reference fibre in tension. */
  readonly pieces: readonly {
    readonly from: number;
    readonly to: number;
    readonly curvature: "sagging" | "hogging" | "straight";
  }[];
  readonly inflections: readonly { readonly at: number; readonly why: string }[];
  /** Why the shape of this member cannot be known by rule; pieces and inflections are then empty. */
  readonly unknown?: string;
}

/** The probable shape of a structure under loads of one sort, down on level members or sideways at joints. Members the rules
 *  do not reach are marked unknown, with the reason. Hinges and leaning loaded members are not treated. */
export function probableShape(structure: Structure, loads: readonly Load[]): ProbableShape {
  checkLoads(structure, loads);
  const global = loads.map((load) => inGlobalAxes(structure, load));
  const own = new Map(structure.members.map((m) => [m.name, memberLoads(structure, global, m.name)]));
  const known = sensesOf(structure, global, own);
  const members = structure.members.map((member) =>
    typeof known === "string"
      ? unknownMember(member, known)
      : shapeOf(structure, member, own.get(member.name), known),
  );
  return deepFreeze({ members, label: "qualitative" });
}

function unknownMember({ name }: Member, unknown: string): ProbableMember {
  return { member: name, pieces: [], inflections: [], unknown };
}

function sensesOf(
  structure: Structure,
  loads: readonly Load[],
  own: ReadonlyMap<string, MemberLoads>,
): Known | string {
  const sideways = loads.filter(pushesSideways);
  if (sideways.length === 0) return gravitySenses(structure, loads, own);
  if (loads.some((load) => load.kind !== "joint" || load.couple !== 0))
    return "loads push sideways and bend members at once: ask for each sort by itself";
  const pushes = sideways.map((load) => (load.kind === "joint" ? Math.sign(load.fx) : 0));
  if (new Set(pushes).size > 1) return "the pushes oppose one another";
  return swaySenses(structure, pushes[0] === -1 ? -1 : 1);
}

function pushesSideways(load: Load): boolean {
  return load.kind === "distributed" ? Math.abs(load.direction[0]) > 1e-12 : load.fx !== 0;
}

function gravitySenses(
  structure: Structure,
  loads: readonly Load[],
  own: ReadonlyMap<string, MemberLoads>,
): Known | string {
  if (loads.some((load) => load.kind === "joint" && load.couple !== 0))
    return "a couple acts at a joint: its sense alone does not tell how the members share it";
  const known: Known = new Map();
  const net = new Map<string, number[]>();
  for (const member of structure.members) {
    const span = own.get(member.name);
    if (span === undefined || !isLoaded(span)) continue;
    const sag = sagOf(structure, member, span);
    if (typeof sag === "string") return sag;
    for (const [joint, moment] of loadedEnds(structure, member, span, sag, known))
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

/** Sets the senses of a loaded member's ends; answers with the moments it brings to its joints. */
function loadedEnds(
  structure: Structure,
  member: Member,
  span: MemberLoads,
  sag: 1 | -1,
  known: Known,
): readonly (readonly [joint: string, moment: number])[] {
  const holds = { start: holdOf(structure, member, "start"), end: holdOf(structure, member, "end") };
  const tip = holds.start === "free" || holds.end === "free";
  const restrained = (end: "start" | "end"): boolean => holds[end] === "fixed" || holds[end] === "joined";
  const fixities = { left: restrained("start") ? 1 : 0, right: restrained("end") ? 1 : 0 };
  const moments = endMoments(span, fixities);
  const total = magnitude(simpleMoments(span)) * 4; // of the order of a cantilever's
  return (["start", "end"] as const).flatMap((end) => {
    const sense = (restrained(end) ? -sag : 0) as EndSense["sense"];
    const joint = member[end];
    const why = tip
      ? `a cantilever hogs from its tip to ${joint}`
      : sense === 0
        ? `${joint} is free to turn`
        : `the span is loaded and held against turning at ${joint}`;
    const fixity = sense === 0 ? 0 : fixityAt(structure, member, end);
    known.set(endKey(member.name, end), { sense, fixity, level: 0, why });
    if (holds[end] !== "joined") return [];
    const size = tip ? -sag * total : end === "start" ? moments.left : moments.right;
    return [[joint, onJoint(end) * size] as const];
  });
}

/** Fully held by a fixed support or by a span across the support; about half by columns or a span without load. */
function fixityAt(structure: Structure, member: Member, end: "start" | "end"): number {
  if (holdOf(structure, member, end) === "fixed") return 1;
  const { c } = axisOf(structure, member);
  const across = structure.members.some(
    (m) =>
      m !== member && [m.start, m.end].includes(member[end]) && Math.abs(axisOf(structure, m).c - c) < 1e-9,
  );
  return across ? 0.8 : 0.5;
}

function shapeOf(
  structure: Structure,
  member: Member,
  span: MemberLoads | undefined,
  known: Known,
): ProbableMember {
  const start = known.get(endKey(member.name, "start"));
  const end = known.get(endKey(member.name, "end"));
  if (structure.hinges.some((h) => h.member === member.name))
    return unknownMember(
      member,
      `${member.name} has a hinge: the point of inflection is there, the rest is statics`,
    );
  const loaded = span !== undefined && isLoaded(span);
  if (!loaded && [start?.sense ?? 0, end?.sense ?? 0].every((sense) => sense === 0)) {
    const doubt = [start, end].find((e) => e?.doubt === true);
    if (doubt !== undefined) return unknownMember(member, doubt.why);
  }
  if (start === undefined || end === undefined)
    return unknownMember(member, `no rule reaches ${member.name}`);
  if (loaded) return loadedShape(structure, member, span, start, end);
  return plainShape(member, start, end);
}

/** Without load the moment runs straight from one end to the other. */
function plainShape({ name, start: a, end: b }: Member, start: EndSense, end: EndSense): ProbableMember {
  const [s, e] = [start.sense, end.sense];
  const curvature = (sense: number): "sagging" | "hogging" | "straight" =>
    sense > 0 ? "sagging" : sense < 0 ? "hogging" : "straight";
  if (s * e >= 0)
    return { member: name, pieces: [{ from: 0, to: 1, curvature: curvature(s + e) }], inflections: [] };
  const ahead = start.level - end.level; // the lower level is the turned end
  const held = ahead < 0 ? end : start;
  const near = held.fixity === 1 ? 1 / 3 : 1 / 4;
  const at = ahead === 0 ? 1 / 2 : ahead < 0 ? 1 - near : near;
  const why =
    ahead === 0
      ? `${start.why}: near the middle`
      : `${held.why}: within the third of the length at ${ahead < 0 ? b : a}`;
  return {
    member: name,
    pieces: [
      { from: 0, to: at, curvature: curvature(s) },
      { from: at, to: 1, curvature: curvature(e) },
    ],
    inflections: [{ at, why }],
  };
}

function loadedShape(
  structure: Structure,
  member: Member,
  span: MemberLoads,
  start: EndSense,
  end: EndSense,
): ProbableMember {
  const sag = sagOf(structure, member, span);
  const curvature = (sense: number): "sagging" | "hogging" => (sense > 0 ? "sagging" : "hogging");
  const whole = typeof sag === "string" ? 1 : sag;
  if (["start", "end"].some((e) => holdOf(structure, member, e as "start" | "end") === "free"))
    return {
      member: member.name,
      pieces: [{ from: 0, to: 1, curvature: curvature(-whole) }],
      inflections: [],
    };
  const fixities = { left: start.fixity, right: end.fixity };
  const places = inflectionPoints(span, fixities).map((x) => x / span.length);
  const stops = [0, ...places, 1];
  const moments = momentsBetween(span, fixities);
  const inflections = places.map((at, i) => {
    const first = i === 0 && start.sense !== 0;
    const { why, fixity } = first ? start : end;
    const degree = fixity === 1 ? "fully" : fixity > 0.5 ? "nearly fully" : "about half";
    return { at, why: `${why}; placed for an end ${degree} fixed, isolated span` };
  });
  const pieces = stops.slice(0, -1).map((from, i) => {
    const to = stops[i + 1] ?? 1;
    return { from, to, curvature: curvature(valueAt(moments, ((from + to) / 2) * span.length)) };
  });
  return { member: member.name, pieces, inflections };
}
