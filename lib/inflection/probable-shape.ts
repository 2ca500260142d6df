// The qualitative deflected shape: which stretches of each member sag and which hog, and where the points of inflection
// between them probably are. From the rule of the spans and the sense of the end moments; no stiffness enters, so sizes and
// places are guesses to start from, and what the rules cannot tell is said.
//
// Rules, common practice:
//   1 a loaded span hogs at an end that is held against turning and has one point of inflection near it
//   2 an end free to turn has no moment; a cantilever hogs from its tip to its root, and the span beside it has at that end the
//     moment it brings, which is statics
//   3 at a joint, members without load hold against what the loaded ones bring; where two loaded spans hold one another
//     the others stay nearly straight
//   4 a member without load, turned at one end and held at the other, has one point of inflection, within the third of its
//     length at the held end; free at the other end it has none
//   5 pushed sideways, columns and beams held at both ends bend in double curvature, with a point of inflection near the middle

import { crossings, type MemberLoads, memberLoads, type Piecewise, valueAt } from "../results/index.ts";
import {
  checkLoads,
  deepFreeze,
  inGlobalAxes,
  type Load,
  type Member,
  type Structure,
} from "../structure/index.ts";
import { endMomentsGiven } from "./end-moments.ts";
import { type EndSense, endKey, type Known } from "./end-senses.ts";
import { gravitySenses } from "./gravity-senses.ts";
import { momentsWithEnds } from "./hinged-spans.ts";
import { isLoaded } from "./span.ts";
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
  const outweighed = [start, end].find((e) => loaded && e.doubt === true);
  if (outweighed !== undefined) return unknownMember(member, outweighed.why);
  if (loaded) return loadedShape(member, span, start, end);
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

function loadedShape(member: Member, span: MemberLoads, start: EndSense, end: EndSense): ProbableMember {
  const fixities = { left: start.fixity, right: end.fixity };
  const ends = endMomentsGiven(span, { start: start.moment, end: end.moment }, fixities);
  const moments = momentsWithEnds(span, ends);
  const places = crossings(moments).map((x) => x / span.length);
  const stops = [0, ...places, 1];
  const inflections = places.map((at, i) => {
    const first = i === 0 && start.sense !== 0;
    const { why, fixity, moment } = first ? start : end;
    const degree = fixity === 1 ? "fully" : fixity > 0.5 ? "nearly fully" : "about half";
    const placed = moment === undefined ? `an end ${degree} fixed` : "that moment, known by statics";
    return { at, why: `${why}; placed for ${placed}, isolated span` };
  });
  const pieces = stops.slice(0, -1).map((from, i) => {
    const to = stops[i + 1] ?? 1;
    return { from, to, curvature: curvatureOf(moments, ((from + to) / 2) * span.length) };
  });
  return { member: member.name, pieces, inflections };
}

const curvatureOf = (moments: Piecewise, x: number): "sagging" | "hogging" =>
  valueAt(moments, x) > 0 ? "sagging" : "hogging";
