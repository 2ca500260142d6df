// A net that is one bay of one storey: two columns and the beam on them, loaded on the beam and on overhangs at the knees only.

import type { EndMomentArray, Net, NetMember } from "./net.ts";
import { type PortalSide, portalMoments } from "./portal-gravity.ts";
import { isLoaded } from "./span.ts";

export interface PortalBay {
  /** Indices of the members. */
  readonly beam: number;
  readonly columns: readonly [left: number, right: number];
  /** EI/L of the beam. */
  readonly k: number;
  readonly sides: readonly [left: PortalSide, right: PortalSide];
  /** What the knees are turned by: fixed-end moments of the beam, left and right, hogging negative, less those of overhangs. */
  readonly fixedEnds: { readonly left: number; readonly right: number };
  /** End moments of the overhangs rooted at the knees, counter-clockwise on them. */
  readonly beside: { readonly left: number; readonly right: number };
  /** Equal columns and bases, and a load alike from both ends. */
  readonly symmetric: boolean;
}

/** The bay, when the net is one whose knees pass all moment on and whose columns bear no load across them. */
export function bayOf(net: Net): PortalBay | undefined {
  const { members, joints } = net;
  const own = members.flatMap(({ overhang }, i) => (overhang ? [] : [i]));
  if (own.length !== 3 || joints.length !== 4 + members.length - own.length) return undefined;
  const beam = own.find((i) => members[i]?.column === false) ?? -1;
  const columns = own.filter((i) => members[i]?.column === true);
  const level = members[beam];
  if (level === undefined || columns.length !== 2 || level.freeStart || level.freeEnd) return undefined;
  const [leftJoint, rightJoint] = level.sense === 1 ? [level.start, level.end] : [level.end, level.start];
  const at = (joint: number): number | undefined =>
    columns.find((i) => members[i]?.start === joint || members[i]?.end === joint);
  const [left, right] = [at(leftJoint), at(rightJoint)];
  if (left === undefined || right === undefined || left === right) return undefined;
  const [a, b] = [sideOf(net, left, leftJoint), sideOf(net, right, rightJoint)];
  if (a === undefined || b === undefined) return undefined;
  const [m1, m2] = level.sense === 1 ? level.fixed : [level.fixed[1], level.fixed[0]];
  const beside = { left: hungOn(net, leftJoint), right: hungOn(net, rightJoint) };
  const fixedEnds = { left: 0 - m1 - beside.left, right: m2 + beside.right };
  const like = (x: number, y: number): boolean =>
    Math.abs(x - y) <= 1e-9 * Math.max(Math.abs(x), Math.abs(y));
  const symmetric =
    like(a.k, b.k) && like(a.height, b.height) && a.base === b.base && like(fixedEnds.left, fixedEnds.right);
  return { beam, columns: [left, right], k: level.k, sides: [a, b], fixedEnds, beside, symmetric };
}

function hungOn({ members, joints }: Net, joint: number): number {
  return (joints[joint]?.ends ?? []).reduce((sum, { member, end }) => {
    const found = members[member];
    return found?.overhang === true ? sum + found.fixed[end] : sum;
  }, 0);
}

/** A column below the beam, held at its foot. */
function sideOf({ members, joints }: Net, column: number, knee: number): PortalSide | undefined {
  const member = members[column];
  if (member === undefined || isLoaded(member.span)) return undefined;
  const kneeIsEnd = member.end === knee;
  const foot = joints[kneeIsEnd ? member.start : member.end];
  const under = kneeIsEnd === (member.sense === 1);
  if (foot === undefined || !foot.carried || !under || joints[knee]?.held === true) return undefined;
  const [kneeFree, footFree] = kneeIsEnd
    ? [member.freeEnd, member.freeStart]
    : [member.freeStart, member.freeEnd];
  if (kneeFree || foot.held === footFree) return undefined;
  return { k: member.k, height: member.length, base: foot.held ? "fixed" : "pinned" };
}

/** End moments of the bay's members on the net, and the moments at the heads of the columns, tension on the inside positive. */
export function portalEnds(
  net: Net,
  { beam, columns, k, sides, fixedEnds, beside }: PortalBay,
): { readonly ends: EndMomentArray; readonly knees: readonly [number, number] } {
  const moments = portalMoments(k, sides, fixedEnds);
  const { left, right } = moments;
  const ends = Float64Array.from(net.members.flatMap(({ overhang, fixed }) => (overhang ? fixed : [0, 0])));
  const put = (i: number, inside: 1 | -1, upper: number, lower: number): void => {
    const member = net.members[i];
    if (member === undefined) return;
    const first = member.sense === 1 ? lower : upper; // the lower or left end of a member that goes up or right
    const second = member.sense === 1 ? upper : lower;
    ends[2 * i] = -inside * first + 0;
    ends[2 * i + 1] = inside * second + 0;
  };
  const onFibre = (i: number, side: 1 | -1): 1 | -1 =>
    side * (net.members[i] as NetMember).sense === 1 ? 1 : -1;
  put(beam, onFibre(beam, 1), right.knee, left.knee);
  const leftEnd = 2 * beam + (net.members[beam]?.sense === 1 ? 0 : 1);
  const rightEnd = 4 * beam + 1 - leftEnd;
  ends[leftEnd] = (ends[leftEnd] ?? 0) - beside.left;
  ends[rightEnd] = (ends[rightEnd] ?? 0) - beside.right;
  put(columns[0], onFibre(columns[0], 1), left.knee, left.base);
  put(columns[1], onFibre(columns[1], -1), right.knee, right.base);
  return { ends, knees: [left.knee, right.knee] };
}
