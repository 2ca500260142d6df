// From end moments to hinges: where each moment is zero, and for members where it is zero too seldom an end that is cut, its
// moment put on as a pair of couples.

import {
  asBending,
  type EndMomentArray,
  hingesFromEndMoments,
  lineBeams,
  type Net,
  type NetMember,
} from "../inflection/index.ts";
import type { Parts } from "./gravity-moments.ts";

/** A hinge, m from the member's start, and why it is there. */
export interface CutHinge {
  readonly member: string;
  readonly at: number;
  readonly why: "outer" | "inner" | "moments" | "anywhere";
}

/** A member end cut free, and the moment on it as known, N·m, counter-clockwise on the member. */
export interface CutEnd {
  readonly member: string;
  readonly end: "start" | "end";
  readonly joint: string;
  readonly moment: number;
}

export interface Cuts {
  readonly hinges: readonly CutHinge[];
  readonly ends: readonly CutEnd[];
}

/** Two conditions for every beam, less one for each end that turns freely, and one for every column that has no such end, none for
 *  an overhang:
 *  with the floors held against sway that is as many as statics needs. */
export function cutsOf(net: Net, m: EndMomentArray, parts: Parts | undefined): Cuts {
  const scale = Math.max(1e-3, ...m.map(Math.abs));
  const bending = asBending(net, m);
  const lines = new Map(lineBeams(net).map((line) => [line.member, line]));
  const cuts = net.members.map((member, i): Cuts => {
    const line = lines.get(i);
    if (member.overhang) return { hinges: [], ends: [] };
    const free = Number(member.freeStart) + Number(member.freeEnd);
    const needed = Math.max(0, (member.column ? 1 : 2) - free);
    if (needed === 0) return { hinges: [], ends: [] };
    if (line !== undefined && parts !== undefined) return { hinges: byParts(member, line, parts), ends: [] };
    const ends = { left: bending[i]?.start ?? 0, right: bending[i]?.end ?? 0 };
    const places = hingesFromEndMoments(member.span, ends).filter(
      (x) => x > 1e-6 * member.length && x < (1 - 1e-6) * member.length,
    );
    if (places.length < needed && isStill(member, [m[2 * i] ?? 0, m[2 * i + 1] ?? 0], scale))
      return { hinges: anywhere(member), ends: [] };
    return byMoments(net, member, needed, places, [m[2 * i] ?? 0, m[2 * i + 1] ?? 0], scale);
  });
  return { hinges: cuts.flatMap(({ hinges }) => hinges), ends: cuts.flatMap(({ ends }) => ends) };
}

function byParts(
  { name, length, freeStart, freeEnd }: NetMember,
  line: { readonly start: string; readonly end: string },
  parts: Parts,
): readonly CutHinge[] {
  const why = (place: string): "outer" | "inner" => (place === "outer" ? "outer" : "inner");
  const [a, b] = [why(line.start), why(line.end)];
  return [
    ...(freeStart ? [] : [{ member: name, at: parts[a] * length, why: a }]),
    ...(freeEnd ? [] : [{ member: name, at: length - parts[b] * length, why: b }]),
  ];
}

/** Nothing bends the member at all: any place will do. */
function isStill({ span }: NetMember, ends: readonly number[], scale: number): boolean {
  const unloaded =
    span.points.length === 0 && span.across.pieces.every((piece) => piece.every((c) => c === 0));
  return unloaded && ends.every((moment) => Math.abs(moment) <= 1e-9 * scale);
}

function anywhere({ name, length, column, freeStart, freeEnd }: NetMember): readonly CutHinge[] {
  const places = column ? [0.5] : [...(freeStart ? [] : [0.1]), ...(freeEnd ? [] : [0.9])];
  return places.map((part) => ({ member: name, at: part * length, why: "anywhere" }));
}

/** The places nearest to the ends that do not turn freely, then cut ends for what is missing: those farthest from the places. */
function byMoments(
  net: Net,
  member: NetMember,
  needed: number,
  places: readonly number[],
  ends: readonly [number, number],
  scale: number,
): Cuts {
  const { name, freeStart, freeEnd } = member;
  const [first, last] = [places[0], places[places.length - 1]];
  const chosen = needed >= 2 ? [first, last] : freeStart ? [last] : [first];
  const taken = [...new Set(chosen.filter((x) => x !== undefined))].slice(0, needed);
  const order = cutOrder(net, member, taken[0]);
  const free = { start: freeStart, end: freeEnd };
  const cut = order.filter((end) => !free[end]).slice(0, needed - taken.length);
  return {
    hinges: taken.map((at) => ({ member: name, at, why: "moments" })),
    ends: cut.map((end) => {
      const moment = end === "start" ? ends[0] : ends[1];
      const joint = net.joints[end === "start" ? member.start : member.end]?.name ?? "";
      return { member: name, end, joint, moment: Math.abs(moment) <= 1e-9 * scale ? 0 : moment };
    }),
  };
}

/** Which end to cut first: of a column the foot, of a beam the end farther from its hinge; never one at a support that holds turning
 *  where the other will do. */
function cutOrder(
  net: Net,
  member: NetMember,
  hinge: number | undefined,
): readonly ["start" | "end", "start" | "end"] {
  const held = (joint: number): boolean => net.joints[joint]?.held === true;
  if (held(member.start) !== held(member.end))
    return held(member.start) ? ["end", "start"] : ["start", "end"];
  const fromStart = hinge === undefined ? !member.column || member.sense === 1 : hinge >= member.length / 2;
  return fromStart ? ["start", "end"] : ["end", "start"];
}
