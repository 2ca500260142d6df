// Beams that run on, one after another, at one level: which of their ends are outer, first inner, or further inside.

import type { Net } from "./net.ts";

/** A beam of a line, with its index in the net and what each end is: "outer" with no beam beyond it, "first" one beam in from an
 *  outer end (the inner end of an end bay), else "inner". */
export interface LineBeam {
  readonly member: number;
  readonly start: EndPlace;
  readonly end: EndPlace;
  /** The only beam of its line. */
  readonly alone: boolean;
  /** One of two. */
  readonly paired: boolean;
}

export type EndPlace = "outer" | "first" | "inner";

/** All beams of a net with the places of their ends; an overhang is no beam of the line. */
export function lineBeams(net: Net): readonly LineBeam[] {
  return net.members.flatMap((member, i): LineBeam[] => {
    if (member.column || member.overhang) return [];
    const [before, after] = [neighbour(net, i, 0), neighbour(net, i, 1)];
    const place = (here?: number, there?: number): EndPlace =>
      here === undefined ? "outer" : there === undefined ? "first" : "inner";
    const beyond = before ?? after;
    return [
      {
        member: i,
        start: place(before, after),
        end: place(after, before),
        alone: beyond === undefined,
        paired: beyond !== undefined && isEndBay(net, i) && isEndBay(net, beyond),
      },
    ];
  });
}

function isEndBay(net: Net, beam: number): boolean {
  return neighbour(net, beam, 0) === undefined || neighbour(net, beam, 1) === undefined;
}

/** The beam that goes on at one end of a beam, if any passes its moment on there. */
function neighbour({ joints, members }: Net, beam: number, end: 0 | 1): number | undefined {
  const member = members[beam];
  const joint = joints[(end === 0 ? member?.start : member?.end) ?? -1];
  const other = joint?.ends.find(({ member: i }) => {
    const found = members[i];
    return i !== beam && found?.column === false && !found.overhang;
  });
  return other?.member;
}
