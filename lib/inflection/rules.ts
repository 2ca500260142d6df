// The trade's rules for where the moment is zero and how large it is, offered as such: common practice, no derivation.
// They look at no stiffness; see the population study for how far off they are.

import { shareOverColumns } from "./balance-joints.ts";
import { type EndPlace, type LineBeam, lineBeams } from "./beam-lines.ts";
import type { EndMoments } from "./end-moments.ts";
import { endMomentsFromHinges } from "./hinged-spans.ts";
import type { EndMomentArray, Net, NetMember } from "./net.ts";
import { NetError } from "./net-faults.ts";

/** A usual place of a hinge, as a part of the span from the end. */
export interface UsualPlace {
  readonly part: number;
  readonly words: string;
}

/** The usual places. 0.211 = 1/2 - √3/6 and 1/4 are those of a uniform load between fixed ends and on a propped span; a tenth is the
 *  rounded middle between 0 and 0.211. */
export const usualPlaces: Readonly<Record<"tenth" | "fixed ends" | "propped", UsualPlace>> = Object.freeze({
  tenth: Object.freeze({ part: 0.1, words: "common practice: 0.1 L" }),
  "fixed ends": Object.freeze({
    part: 0.5 - Math.sqrt(3) / 6,
    words: "common practice: 0.211 L, as between fixed ends",
  }),
  propped: Object.freeze({
    part: 0.25,
    words: "common practice: 0.25 L, as on a propped span",
  }),
});

/** End moments on all members with two hinges in every beam, at parts of its span from an outer and from an inner end; what the
 *  beams leave at the joints is shared over the columns by EI/h, no sway. A beam end free to turn is its own hinge. With `alike`
 *  each end moment is that of a beam with the same hinge at both ends, as the rules are often worked: the moment is then not zero at
 *  the hinges of an end bay. Overhangs have the moments of statics. */
export function hingedBeams(
  net: Net,
  parts: { readonly outer: number; readonly inner: number; readonly alike?: boolean },
): EndMomentArray {
  const part = (place: EndPlace): number => (place === "outer" ? parts.outer : parts.inner);
  return fromBeams(net, (beam, { start, end }) => {
    const [a, b] = [part(start) * beam.length, part(end) * beam.length];
    const both = (first: number, second: number): EndMoments => betweenHinges(beam, first, second);
    if (parts.alike !== true) {
      const { left, right } = both(a, b);
      return [left, right];
    }
    return [both(a, a).left, both(b, b).right];
  });
}

/** End moments of a beam with hinges at distances from its ends, or with the moment known at an end instead of a hinge near it. */
function betweenHinges(beam: NetMember, fromStart: number, fromEnd: number): EndMoments {
  const { span, length: L, freeStart, freeEnd } = beam;
  const { left, right } = knownEnds(beam);
  const [first, second] = [freeStart ? 0 : fromStart, L - (freeEnd ? 0 : fromEnd)];
  return endMomentsFromHinges(span, first, second, [freeStart ? left : 0, freeEnd ? right : 0]);
}

/** What statics tells of the moments at free ends, as bending moments. */
function knownEnds({ fixed }: NetMember): EndMoments {
  return { left: 0 - fixed[0], right: fixed[1] };
}

/** Moment coefficients of a uniform load w on beams of several bays, hogging, as parts of wL²: 1/16 at outer ends that columns
 *  hold, 1/10 at first inner ends (1/9 with two bays), 1/11 further inside; and sagging 1/14 in end bays (1/11 where the outer end is
 *  free to turn), 1/16 between.
 *  Source: the approximate moments of concrete practice (ACI 318, simplified method), from memory. */
export const momentCoefficients: Readonly<
  Record<"outer" | "first of two" | "first" | "inner" | "end bay" | "free end bay" | "inner bay", number>
> = Object.freeze({
  outer: 1 / 16,
  "first of two": 1 / 9,
  first: 1 / 10,
  inner: 1 / 11,
  "end bay": 1 / 14,
  "free end bay": 1 / 11,
  "inner bay": 1 / 16,
});

/** End moments on all members by the coefficients; throws on a beam whose load is not uniform. */
export function coefficientMoments(net: Net): EndMomentArray {
  return fromBeams(net, (beam, { start, end, paired }) => {
    const wL2 = uniformLoad(beam) * beam.length ** 2;
    const part = (place: EndPlace): number =>
      momentCoefficients[place === "first" && paired ? "first of two" : place];
    const { left, right } = knownEnds(beam);
    return [beam.freeStart ? left : -part(start) * wL2, beam.freeEnd ? right : -part(end) * wL2];
  });
}

/** Sagging moment of each beam by the coefficients, N·m, by the beam's name. */
export function coefficientSags(net: Net): readonly { readonly member: string; readonly moment: number }[] {
  return lineBeams(net).flatMap(({ member, start, end }) => {
    const beam = net.members[member];
    if (beam === undefined) return [];
    const free = beam.freeStart || beam.freeEnd ? "free end bay" : "end bay";
    const bay = start === "outer" || end === "outer" ? free : "inner bay";
    return [{ member: beam.name, moment: momentCoefficients[bay] * uniformLoad(beam) * beam.length ** 2 }];
  });
}

function uniformLoad({ name, span }: NetMember): number {
  const [piece, ...others] = span.across.pieces;
  if (others.length > 0 || span.points.length > 0 || (piece?.length ?? 0) > 1)
    throw new NetError({ kind: "not uniform", member: name });
  return piece?.[0] ?? 0;
}

function fromBeams(
  net: Net,
  bending: (beam: NetMember, places: LineBeam) => readonly [left: number, right: number],
): EndMomentArray {
  const m = Float64Array.from(net.members.flatMap(({ overhang, fixed }) => (overhang ? fixed : [0, 0])));
  for (const places of lineBeams(net)) {
    const beam = net.members[places.member];
    if (beam === undefined) continue;
    const [left, right] = bending(beam, places);
    m[2 * places.member] = 0 - left;
    m[2 * places.member + 1] = right;
  }
  shareOverColumns(net, m);
  return m;
}
