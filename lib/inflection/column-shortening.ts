// What unequal shortening of columns does to the beams, before any joint turns. Needs EA as well as EI.
//   N    of a column: the simple-beam reactions and joint loads above it
//   u    of a joint: the sum of N h / EA of the columns below it, down
//   m    = 6 EI d / L² at both ends of a beam for the difference d of the sinking of its ends   (slope-deflection; 3 EI d / L² where
//          the other end is free to turn)

import type { Net, NetMember } from "./net.ts";
import { NetError } from "./net-faults.ts";

/** The net with the end moments of sinking joints added to the fixed-end moments: give it to any of the methods in place of the net.
 *  One step, as if the whole load came on at once. Throws on a joint that stands on nothing. */
export function withShortening(net: Net): Net {
  const sinking = columnSinking(net);
  const members = net.members.map((member): NetMember => {
    if (member.column) return member;
    const d = member.sense * ((sinking[member.end] ?? 0) - (sinking[member.start] ?? 0));
    return Object.freeze({ ...member, fixed: sunk(member, d / member.length) });
  });
  return Object.freeze({ ...net, members: Object.freeze(members) });
}

function sunk({ fixed, k, freeStart, freeEnd }: NetMember, slope: number): readonly [number, number] {
  const m = (freeStart || freeEnd ? 3 : 6) * k * slope;
  return [freeStart ? fixed[0] : fixed[0] + m, freeEnd ? fixed[1] : fixed[1] + m];
}

/** How far every joint sinks as its columns shorten, m where EA is in N (else a ratio), down positive; the tip of an overhang with
 *  its root. */
export function columnSinking(net: Net): readonly number[] {
  const columns = net.joints.map((): { readonly below: number[]; readonly above: number[] } => ({
    below: [],
    above: [],
  }));
  net.members.forEach((member, i) => {
    if (!member.column || member.overhang) return;
    const [low, high] = member.sense === 1 ? [member.start, member.end] : [member.end, member.start];
    columns[high]?.below.push(i);
    columns[low]?.above.push(i);
  });
  const own = net.joints.map((joint) => joint.down);
  for (const { start, end, down } of net.members) {
    own[start] = (own[start] ?? 0) + down[0];
    own[end] = (own[end] ?? 0) + down[1];
  }
  const force = (column: number): number => {
    const member = net.members[column];
    const high = (member?.sense === 1 ? member.end : member?.start) ?? -1;
    return (columns[high]?.above ?? []).reduce((sum, i) => sum + force(i), own[high] ?? 0);
  };
  const known: (number | undefined)[] = net.joints.map((joint) => (joint.carried ? 0 : undefined));
  const sinkingOf = (joint: number): number => {
    const found = known[joint];
    if (found !== undefined) return found;
    const root = rootBelow(net, joint);
    if (root !== undefined) return sinkingOf(root);
    const [column] = columns[joint]?.below ?? [];
    const member = net.members[column ?? -1];
    if (column === undefined || member === undefined)
      throw new NetError({ kind: "not carried", joint: net.joints[joint]?.name ?? "" });
    const low = member.sense === 1 ? member.start : member.end;
    const sinking = sinkingOf(low) + force(column) / member.stretch;
    known[joint] = sinking;
    return sinking;
  };
  return net.joints.map((_, j) => sinkingOf(j));
}

/** The joint an overhang hangs on, seen from its tip. */
function rootBelow({ members }: Net, joint: number): number | undefined {
  const own = members.find((m) => m.overhang && (m.freeStart ? m.start : m.end) === joint);
  return own === undefined ? undefined : own.freeStart ? own.end : own.start;
}
