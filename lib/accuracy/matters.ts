// Which stiffness of a member its forces can depend on at all.

import type { Member, Structure } from "../structure/types.ts";

/** True when neither end of a member takes a moment. */
export function isBar({ releases }: Member): boolean {
  return releases.start.moment && releases.end.moment;
}

/** Whether I, and whether A, of a group of members is worth varying when nobody says so: not the I of bars, and not the A of straight
 *  beams, whose axial forces statics gives but for a beam held lengthwise at both ends. */
export function matters(
  { family, members }: Structure,
  group: readonly number[],
): Readonly<Record<"I" | "A", boolean>> {
  const bends = group.some((i) => {
    const member = members[i];
    return member !== undefined && !isBar(member);
  });
  return { I: bends, A: family !== "beam" };
}
