// What a structure may hold that the equilibrium equations of this room do not know: refused, never left out of the sums.

import type { Structure } from "../structure/index.ts";
import { StaticsError } from "./faults.ts";

/** Throws on supports at an angle or on springs, and on member ends released for shear or axial force. */
export function checkWithinReach({ supports, members }: Structure): void {
  for (const { joint, angle = 0, springs = {} } of supports) {
    if (angle !== 0)
      throw new StaticsError({ kind: "out of reach", what: `the support at ${joint} stands at an angle` });
    if (Object.values(springs).some((k) => k !== 0))
      throw new StaticsError({ kind: "out of reach", what: `the support at ${joint} rests on a spring` });
  }
  for (const { name, releases } of members)
    for (const [end, release] of Object.entries(releases))
      if (release.shear === true || release.axial === true)
        throw new StaticsError({
          kind: "out of reach",
          what: `the ${end} of member ${name} is released for ${release.shear === true ? "shear" : "axial force"}`,
        });
}
