// What is known of the ends of a member by its supports and by statics alone.

import type { Load, Member, Structure } from "../structure/index.ts";
import { knownCouple, type Overhangs, overhangsOf } from "./overhangs.ts";

/** How an end is held: by a moment statics tells (N·m, hogging negative), beside an overhang or under a couple; free to turn (0) or
 *  fixed (1) by a support alone; or by other members, so that its fixity is not known. */
export type EndHold = { readonly moment: number } | { readonly fixity: 0 | 1 } | undefined;

/** Both ends of a member, and whether it is itself an overhang. */
export interface EndHolds {
  readonly start: EndHold;
  readonly end: EndHold;
  readonly overhang: boolean;
}

/** How the ends of a member are held under loads. */
export function endHolds(structure: Structure, loads: readonly Load[], member: Member): EndHolds {
  const overhangs = overhangsOf(structure, loads);
  return {
    start: holdAt(structure, overhangs, member, "start"),
    end: holdAt(structure, overhangs, member, "end"),
    overhang: overhangs.members.has(member.name),
  };
}

function holdAt(structure: Structure, overhangs: Overhangs, member: Member, end: "start" | "end"): EndHold {
  const joint = member[end];
  if (member.releases[end].moment) return { fixity: 0 };
  if (structure.supports.some((s) => s.joint === joint && s.holds.rotation)) return { fixity: 1 };
  const couple = knownCouple(structure, overhangs, member, end);
  if (couple !== undefined && couple !== 0) return { moment: end === "start" ? 0 - couple : couple };
  if (couple === 0) return { fixity: 0 };
  const others = structure.members.some((m) => m !== member && (m.start === joint || m.end === joint));
  return others ? undefined : { fixity: 0 };
}
