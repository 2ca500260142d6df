// How each member end meets its joint when the structure is cut into bodies.
//
// A joint goes with the member ends that are rigid there. Where all ends are released it goes with the first of them,
// so that no joint is a body of its own; the other ends meet it by a pin with two forces.

import type { Member, Structure } from "../structure/index.ts";

export interface Connection {
  readonly member: string;
  readonly joint: string;
  readonly end: "start" | "end";
  /** Whether the end goes with the joint, or meets it by a pin. */
  readonly joined: boolean;
  /** Whether the end takes moment. */
  readonly moment: boolean;
}

/** All member ends, member by member, start before end. */
export function connections(structure: Structure): readonly Connection[] {
  const ends = structure.members.flatMap((m) => [endOf(m, "start"), endOf(m, "end")]);
  return ends.map((end) => {
    const here = ends.filter((other) => other.joint === end.joint);
    const owner = here.find((other) => other.moment) ?? here[0];
    return { ...end, joined: end.moment || end === owner };
  });
}

function endOf(member: Member, end: "start" | "end"): Omit<Connection, "joined"> {
  return { member: member.name, joint: member[end], end, moment: !member.releases[end].moment };
}
