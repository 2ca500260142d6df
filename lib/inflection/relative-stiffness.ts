// Hinges by the relative stiffness of the members that meet: which formula a frame asks for, the end moments it gives, and
// where each moment then changes sign.

import { inGlobalAxes, type Load, type Structure } from "../structure/index.ts";
import { momentDistribution } from "./distribution.ts";
import { hingesFromEndMoments } from "./hinged-spans.ts";
import { jointRotations } from "./joint-rotations.ts";
import { asBending, type EndMomentArray, type Net, type NetMember, netOf } from "./net.ts";
import { NetError } from "./net-faults.ts";
import { bayOf, type PortalBay, portalEnds } from "./portal-bay.ts";
import { twoSpanHinge } from "./two-spans.ts";

/** End moments of all members by the formula that fits the structure, and how it is called. */
export interface StiffnessMoments {
  readonly net: Net;
  readonly ends: EndMomentArray;
  readonly formula: "two spans" | "moment distribution" | "symmetric portal" | "portal" | "joint turns";
  /** The formula and the stiffness ratios in it, as they matter to one member. */
  words(member: string): string;
}

const cycles = 4;

/** End moments under gravity of beams, of single-bay portals and of building frames by ratios of EI/L alone. Continuous beams:
 *  the three-moment equation of two spans, else moment distribution; portals: the share of its fixed-end moment a beam keeps at
 *  the knees; other frames: joint turns, guessed and once corrected. Sections give EI; ratios will do. Throws, in words, on loads
 *  that push a frame sideways, inclined members, hinges and members without section. */
export function momentsByStiffness(structure: Structure, loads: readonly Load[]): StiffnessMoments {
  const net = netOf(structure, loads);
  checkGravity(structure, net, loads);
  if (net.members.every((member) => !member.column)) return ofBeam(net);
  const bay = bayOf(net);
  return bay === undefined ? ofFrame(net) : ofPortal(net, bay);
}

/** The point of zero moment nearest to one end of a member. Throws when the moment of the member does not change sign. */
export function hingeByStiffness(found: StiffnessMoments, member: string, from: "start" | "end"): number {
  const i = found.net.members.findIndex(({ name }) => name === member);
  const own = found.net.members[i];
  if (own === undefined) throw new Error(`member "${member}" is not in the net`);
  const places = placesIn(found, own, i);
  const place = from === "start" ? places[0] : places[places.length - 1];
  if (place === undefined) throw new NetError({ kind: "no sign change", member, words: found.words(member) });
  return from === "start" ? place : own.length - place;
}

function placesIn({ net, ends }: StiffnessMoments, member: NetMember, i: number): readonly number[] {
  const bending = asBending(net, ends)[i];
  return hingesFromEndMoments(member.span, { left: bending?.start ?? 0, right: bending?.end ?? 0 });
}

/** Throws on what would move a frame of columns sideways and on couples at joints, which these formulas leave out. */
export function checkGravity(structure: Structure, net: Net, loads: readonly Load[]): void {
  const columns = new Set(net.members.filter(({ column }) => column).map(({ name }) => name));
  if (columns.size === 0) return;
  for (const given of loads) {
    const load = inGlobalAxes(structure, given);
    const sideways = load.kind === "distributed" ? load.direction[0] !== 0 : load.fx !== 0;
    const where = load.kind === "joint" ? `joint ${load.joint}` : load.member;
    if (sideways) throw new NetError({ kind: "sideways", where });
    if (load.kind === "joint" && load.couple !== 0) throw new NetError({ kind: "couple", where });
    if (load.kind === "member point" && load.couple !== 0 && columns.has(load.member))
      throw new NetError({ kind: "couple", where });
  }
}

function ofBeam(net: Net): StiffnessMoments {
  const two = twoSpansOf(net);
  if (two !== undefined)
    return {
      net,
      ends: momentDistribution(net, 1),
      formula: "two spans",
      words: (name) => twoSpanWords(two, name),
    };
  const ends = momentDistribution(net, cycles);
  const spans = net.members.filter(({ overhang }) => !overhang);
  const k = ratioList(spans.map((member) => member.k));
  const ratios = `EI/L of ${spans.map(({ name }) => name).join(", ")} as ${k}`;
  const words = `moment distribution, ${cycles} cycles (H. Cross 1932, from memory), ${ratios}${overhangWords(net)}`;
  return { net, ends, formula: "moment distribution", words: () => words };
}

/** That the moments of overhangs are statics. */
function overhangWords({ members }: Net): string {
  const names = members.filter(({ overhang }) => overhang).map(({ name }) => name);
  if (names.length === 0) return "";
  const plural = names.length > 1;
  return `; overhang${plural ? "s" : ""} ${names.join(", ")}: no stiffness, the moment${plural ? "s" : ""} known by statics`;
}

type TwoSpanNet = readonly [NetMember, NetMember];

/** Two spans free to turn at their outer ends, each under a uniform load or none. */
function twoSpansOf({ members, joints }: Net): TwoSpanNet | undefined {
  const [a, b, ...more] = members;
  if (a === undefined || b === undefined || more.length > 0) return undefined;
  if (!(a.freeStart && !a.freeEnd && b.freeEnd && !b.freeStart && a.end === b.start)) return undefined;
  if (a.overhang || b.overhang || joints.some(({ couple }) => couple !== 0)) return undefined;
  if (joints[a.end]?.held === true || [a, b].every((member) => uniformLoad(member) === 0)) return undefined;
  return [a, b].every((member) => uniformLoad(member) !== undefined) ? [a, b] : undefined;
}

function uniformLoad({ span }: NetMember): number | undefined {
  const [piece, ...others] = span.across.pieces;
  const plain = others.length === 0 && span.points.length === 0 && (piece?.length ?? 0) <= 1;
  return plain ? (piece?.[0] ?? 0) : undefined;
}

function twoSpanWords(two: TwoSpanNet, name: string): string {
  const [own, other] = two[0].name === name ? two : [two[1], two[0]];
  const [w, v] = [uniformLoad(own) ?? 0, uniformLoad(other) ?? 0];
  const s = other.length / own.length;
  const i = (own.k * own.length) / (other.k * other.length);
  if (w === 0)
    return `three-moment equation (B. P. E. Clapeyron 1857, from memory), I of ${own.name} / I of ${other.name} = ${short(i)}`;
  const t = v / w;
  const part = t >= 0 ? ` = ${twoSpanHinge({ spans: s, loads: t, rigidity: i }).toFixed(3)}` : "";
  return (
    `(1 + t s³ i)/(1 + s i)/4${part} with s = ${short(s)}, t = ${short(t)}, i = ${short(i)} ` +
    `(span and load of ${other.name} to those of ${own.name}, I of ${own.name} to that of ${other.name}; three-moment equation, from memory)`
  );
}

function ofPortal(net: Net, bay: PortalBay): StiffnessMoments {
  const { ends, knees } = portalEnds(net, bay);
  const hung = net.members.some(({ overhang }) => overhang);
  const less = hung ? `, FEM less the moment of the overhang at each knee${overhangWords(net)}` : "";
  const [left, right] = bay.sides;
  const ks = [left, right].map(({ k }) => bay.k / k);
  if (bay.symmetric) {
    const m = left.base === "fixed" ? 4 : 3;
    const share = m / (m + 2 * (ks[0] ?? 0));
    const words = `k = (I of beam/L)/(I of column/h) = ${short(ks[0] ?? 0)}: M = FEM m/(m + 2k) = ${short(share)} FEM at the knees, m = ${m} for ${left.base} bases (A. Kleinlogel, from memory)${less}`;
    return { net, ends, formula: "symmetric portal", words: () => words };
  }
  const kept = knees.map((M, i) => M / ((i === 0 ? bay.fixedEnds.left : bay.fixedEnds.right) || 1));
  const words =
    `k = (I of beam/L)/(I of column/h) = ${short(ks[0] ?? 0)} left and ${short(ks[1] ?? 0)} right: two turning knees held against sway, ` +
    `then the holding force let go and shared by column stiffness; the knees keep ${short(kept[0] ?? 0)} and ${short(kept[1] ?? 0)} of the fixed-end moments${less}`;
  return { net, ends, formula: "portal", words: () => words };
}

function ofFrame(net: Net): StiffnessMoments {
  return {
    net,
    ends: jointRotations(net, 1),
    formula: "joint turns",
    words: (name) => jointWords(net, name),
  };
}

/** k of a member beside the sum of k of the columns, or beams, that meet it at its ends. */
function jointWords(net: Net, name: string): string {
  const own = net.members.find((member) => member.name === name);
  if (own === undefined) return "joint turns";
  if (own.overhang) return `${name} is an overhang: its moment is known by statics`;
  const across = own.column ? "beams" : "columns";
  const at = [own.start, own.end].flatMap((j) => {
    const joint = net.joints[j];
    const others = joint?.ends.filter((end) => net.members[end.member]?.column === !own.column) ?? [];
    const sum = others.reduce((total, end) => total + (net.members[end.member]?.k ?? 0), 0);
    if (joint === undefined || joint.held || sum === 0) return [];
    return [`${short(own.k / sum)} at ${joint.name}`];
  });
  const ratio = at.length === 0 ? "" : `, I/L of ${name} to that of the ${across} = ${at.join(" and ")}`;
  return `turns of the joints by slope-deflection, guessed and once corrected, no sway${ratio}${overhangWords(net)}`;
}

const short = (x: number): string => String(Number(x.toPrecision(3)));

/** Numbers as ratios to the least of them: "1 : 1.25 : 1". */
function ratioList(values: readonly number[]): string {
  const least = Math.min(...values);
  return values.map((value) => short(value / least)).join(" : ");
}
