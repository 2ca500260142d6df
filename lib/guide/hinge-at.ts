// A hinge put to another place of its member, also onto an end.

import { endsReleasedAt } from "../structure/index.ts";
import type { Hinge, Structure } from "../structure/types.ts";
import { endsOf } from "./hinge-ranges.ts";

/** The structure with one hinge at another place; at an end of its member the end is released in its stead, and where no other
 *  member takes a moment there its support no longer holds it. */
export function withHingeAt(structure: Structure, hinge: Hinge, at: number): Structure {
  const { start, end, length } = endsOf(structure, hinge.member);
  const side = at <= 1e-9 * length ? "start" : at >= (1 - 1e-9) * length ? "end" : undefined;
  if (side === undefined)
    return Object.freeze({
      ...structure,
      hinges: structure.hinges.map((one) => (one.name === hinge.name ? bare(hinge, at) : one)),
    });
  const released = Object.freeze({
    ...structure,
    hinges: structure.hinges.filter(({ name }) => name !== hinge.name),
    members: structure.members.map((member) =>
      member.name === hinge.member
        ? {
            ...member,
            releases: { ...member.releases, [side]: { ...member.releases[side], moment: true } },
          }
        : member,
    ),
  });
  const joint = side === "start" ? start : end;
  return endsReleasedAt(released, joint) ? turningFreely(released, joint) : released;
}

function turningFreely(structure: Structure, joint: string): Structure {
  return Object.freeze({
    ...structure,
    supports: structure.supports.map((support) =>
      support.joint === joint ? { ...support, holds: { ...support.holds, rotation: false } } : support,
    ),
  });
}

const bare = ({ name, member, from }: Hinge, at: number): Hinge => ({ name, member, at, from });
