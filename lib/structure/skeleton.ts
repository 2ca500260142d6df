// The discretisation every whole-structure method shares: members cut at their hinges (and where else is asked).

import { axisOf, pointOn } from "./geometry.ts";
import type { Member, Release, Structure } from "./types.ts";

/** A joint, a hinge inside a member, or a further cut, with its coordinates in m. */
export interface Node {
  readonly name: string;
  readonly kind: "joint" | "hinge" | "cut";
  readonly x: number;
  readonly y: number;
}

/** A stretch of a member between two nodes: `begin` and `end` in m from the member's start, (c, s) its direction;
 *  `releasedStart` and `releasedEnd` say whether that end transmits no moment to its node. See `releasesOf` for shear and axial force. */
export interface Segment {
  readonly member: string;
  readonly begin: number;
  readonly end: number;
  readonly length: number;
  readonly c: number;
  readonly s: number;
  /** Indices of nodes. */
  readonly from: number;
  readonly to: number;
  readonly releasedStart: boolean;
  readonly releasedEnd: boolean;
}

export interface Skeleton {
  readonly nodes: readonly Node[];
  readonly segments: readonly Segment[];
}

/** A place where a member is to be cut without being weakened. */
export interface Cut {
  readonly member: string;
  readonly at: number;
}

/** Nodes (joints first, in their order) and segments (member by member, start to end). At a hinge both segment ends are released. */
export function skeleton(structure: Structure, cuts: readonly Cut[] = []): Skeleton {
  const nodes: Node[] = structure.joints.map(({ name, x, y }) => ({ name, kind: "joint", x, y }));
  const segments: Segment[] = [];
  const place = new Map(nodes.map((node, i) => [node.name, i]));
  const stops = stopsByMember(structure, cuts);
  for (const member of structure.members) {
    const axis = axisOf(structure, member);
    let begin = 0;
    let from = place.get(member.start) ?? -1;
    let releasedStart = member.releases.start.moment;
    const close = (end: number, to: number, releasedEnd: boolean): void => {
      const { c, s } = axis;
      segments.push({
        member: member.name,
        begin,
        end,
        length: end - begin,
        c,
        s,
        from,
        to,
        releasedStart,
        releasedEnd,
      });
      [begin, from, releasedStart] = [end, to, releasedEnd];
    };
    for (const stop of inOrder(stops.get(member.name) ?? [], axis.length)) {
      const [x, y] = pointOn(axis, stop.at);
      nodes.push({ name: stop.name, kind: stop.hinge ? "hinge" : "cut", x, y });
      close(stop.at, nodes.length - 1, stop.hinge);
    }
    close(axis.length, place.get(member.end) ?? -1, member.releases.end.moment);
  }
  return { nodes, segments };
}

interface Stop {
  readonly at: number;
  readonly name: string;
  readonly hinge: boolean;
}

function stopsByMember(structure: Structure, cuts: readonly Cut[]): ReadonlyMap<string, readonly Stop[]> {
  const found = new Map<string, Stop[]>();
  const put = (member: string, stop: Stop): void => {
    const list = found.get(member);
    if (list === undefined) found.set(member, [stop]);
    else list.push(stop);
  };
  for (const { member, at, name } of structure.hinges) put(member, { at, name, hinge: true });
  for (const { member, at } of cuts)
    put(member, { at, name: `${member}@${Number(at.toPrecision(9))}`, hinge: false });
  return found;
}

/** Stops inside the member, rising; of those at one place the first, and hinges before cuts. */
function inOrder(stops: readonly Stop[], length: number): readonly Stop[] {
  const near = (a: number, b: number): boolean => Math.abs(a - b) <= 1e-9 * length;
  const kept: Stop[] = [];
  for (const stop of stops)
    if (stop.hinge || !(near(stop.at, 0) || near(stop.at, length) || kept.some((k) => near(k.at, stop.at))))
      kept.push(stop);
  return kept.sort((a, b) => a.at - b.at);
}

/** What both ends of a segment do not transmit to their nodes, given its member and whether it is the member's last:
 *  a hinge transmits no moment, a cut everything. */
export function releasesOf(
  member: Member,
  segment: Segment,
  isLast: boolean,
): { readonly start: Release; readonly end: Release } {
  return {
    start: segment.begin === 0 ? member.releases.start : { moment: segment.releasedStart },
    end: isLast ? member.releases.end : { moment: segment.releasedEnd },
  };
}
