// The methods the study judges, by family: the trade's rules and the placements by relative stiffness.

import {
  coefficientMoments,
  coefficientSags,
  endMomentsFromHinges,
  exteriorRestraint,
  hingedBeams,
  jointRotations,
  kneeShare,
  momentDistribution,
  type Net,
  type PortalSide,
  portalMoments,
  twoSpanHinge,
  usualPlaces,
  withShortening,
} from "../inflection/index.ts";
import type { StudyCase } from "./study-cases.ts";
import { type Ends, handEnds } from "./study-ends.ts";

export interface Method {
  readonly name: string;
  readonly ends: (of: StudyCase, net: Net) => Ends;
}

const byNet = (name: string, moments: (net: Net) => Float64Array): Method => ({
  name,
  ends: (of, net) => handEnds(of, net, moments(net)),
});

const cycles = (n: number): Method =>
  byNet(n === 1 ? "joint balance, no carry-over" : `${n} cycles`, (net) => momentDistribution(net, n));

/** Beams from their support moments; outer ends free to turn. */
function continuous(net: Net, supports: readonly number[]): Ends {
  return {
    start: [0, ...supports],
    end: [...supports, 0],
    length: net.members.map((b) => b.length),
  };
}

/** A hinge in the long span, which is the second, at a part of it from the inner support. */
const inLongSpan = (name: string, part: (of: StudyCase, net: Net) => number): Method => ({
  name,
  ends: (of, net) => {
    const long = net.members[1];
    if (long === undefined) throw new Error("a beam of two spans is wanted");
    return continuous(net, [endMomentsFromHinges(long.span, part(of, net) * long.length, long.length).left]);
  },
});

export const twoSpanMethods: readonly Method[] = [
  ...[0.15, 0.2, 0.25].map((part) => inLongSpan(`${part} L`, () => part)),
  inLongSpan("hinge by relative stiffness", ({ w }, net) => {
    const [short, long] = net.members;
    if (short === undefined || long === undefined) throw new Error("a beam of two spans is wanted");
    const rigidity = (long.k * long.length) / (short.k * short.length);
    return twoSpanHinge({ spans: short.length / long.length, loads: (w[0] ?? 0) / (w[1] ?? 1), rigidity });
  }),
];

/** Hinges at a part from both inner supports: in the middle span, or one in each end span. */
const aboutSupports = (part: number, where: "middle" | "ends"): Method => ({
  name: where === "middle" ? `both in middle span ${part}` : `one in each end span ${part}`,
  ends: (_, net) => {
    const [a, b, c] = net.members;
    if (a === undefined || b === undefined || c === undefined)
      throw new Error("a beam of three spans is wanted");
    if (where === "middle") {
      const { left, right } = endMomentsFromHinges(b.span, part * b.length, (1 - part) * b.length);
      return continuous(net, [left, right]);
    }
    const first = endMomentsFromHinges(a.span, 0, (1 - part) * a.length).right;
    return continuous(net, [first, endMomentsFromHinges(c.span, part * c.length, c.length).left]);
  },
});

const meanTenth: Method = {
  name: "(wL2)mean/10",
  ends: ({ w }, net) => {
    const wL2 = net.members.map((b, i) => (w[i] ?? 0) * b.length ** 2);
    return continuous(net, [-((wL2[0] ?? 0) + (wL2[1] ?? 0)) / 20, -((wL2[1] ?? 0) + (wL2[2] ?? 0)) / 20]);
  },
};

export const threeSpanMethods: readonly Method[] = [
  aboutSupports(0.15, "middle"),
  aboutSupports(0.2, "middle"),
  aboutSupports(0.25, "middle"),
  aboutSupports(0.2, "ends"),
  aboutSupports(0.25, "ends"),
  meanTenth,
  cycles(1),
  cycles(2),
  cycles(3),
];

/** A portal from its knee and base moments, tension on the inside positive. */
function portalEnds(net: Net, knees: readonly number[], bases: readonly number[]): Ends {
  const [left = 0, right = 0] = knees;
  const [a = 0, d = 0] = bases;
  return { start: [a, left, right], end: [left, right, d], length: net.members.map((m) => m.length) };
}

function sidesOf({ structure }: StudyCase, net: Net): readonly [PortalSide, PortalSide] {
  const side = (i: number): PortalSide => ({
    k: net.members[i]?.k ?? 0,
    height: net.members[i]?.length ?? 0,
    base: structure.supports[i === 0 ? 0 : 1]?.holds.rotation === true ? "fixed" : "pinned",
  });
  return [side(0), side(2)];
}

const kneesOnly = (name: string, knee: (wL2: number, side: PortalSide, k: number) => number): Method => ({
  name,
  ends: (of, net) => {
    const sides = sidesOf(of, net);
    const beam = net.members[1];
    const wL2 = (of.w[1] ?? 0) * (beam?.length ?? 0) ** 2;
    const knees = sides.map((side) => knee(wL2, side, beam?.k ?? 0));
    return portalEnds(
      net,
      knees,
      knees.map((M, i) => (sides[i]?.base === "fixed" ? -M / 2 : 0)),
    );
  },
});

export const portalMethods: readonly Method[] = [
  kneesOnly("hinges 0.1 L", (wL2) => -0.045 * wL2),
  kneesOnly("hinges 0.15 L", (wL2) => (-0.15 * 0.85 * wL2) / 2),
  kneesOnly(
    "knee share by relative stiffness",
    (wL2, side, k) => (-wL2 / 12) * kneeShare(k / side.k, side.base),
  ),
  cycles(2),
  { ...cycles(60), name: "no-sway exact" },
  {
    name: "no-sway and one sway correction",
    ends: (of, net) => {
      const sides = sidesOf(of, net);
      const FEM = (-(of.w[1] ?? 0) * (net.members[1]?.length ?? 0) ** 2) / 12;
      const { left, right } = portalMoments(net.members[1]?.k ?? 0, sides, { left: FEM, right: FEM });
      return portalEnds(net, [left.knee, right.knee], [left.base, right.base]);
    },
  },
];

const hinged = (name: string, outer: number, inner: number, alike = false): Method =>
  byNet(name, (net) => hingedBeams(net, { outer, inner, alike }));

export const frameMethods: readonly Method[] = [
  hinged("0.1 L both ends", 0.1, 0.1),
  hinged("0.1 L exterior, 0.2 L interior ends, each end as if alike", 0.1, 0.2, true),
  hinged("0.1 L exterior, 0.211 L interior, each end as if alike", 0.1, usualPlaces["fixed ends"].part, true),
  hinged("0.1 L exterior, 0.211 L interior", 0.1, usualPlaces["fixed ends"].part),
  {
    name: "coefficients 1/16, 1/9 or 1/10, 1/11; 1/14, 1/16",
    ends: (of, net) => {
      const sags = new Map(coefficientSags(net).map((s) => [s.member, s.moment]));
      const sag = net.members.map((m) => sags.get(m.name) ?? 0);
      return { ...handEnds(of, net, coefficientMoments(net)), sag };
    },
  },
  byNet("exterior restraint", exteriorRestraint),
  cycles(2),
  cycles(3),
  byNet("joint rotation, 0 passes", (net) => jointRotations(net, 0)),
  byNet("joint rotation, 1 pass", (net) => jointRotations(net, 1)),
  byNet("joint rotation, 1 pass, with column shortening", (net) => jointRotations(withShortening(net), 1)),
];
