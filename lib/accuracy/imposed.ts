// Deformations imposed from outside make forces in proportion to the stiffness itself, which ratios do not give.

import type { Imposed, Load, Structure } from "../structure/types.ts";
import { AccuracyError } from "./faults.ts";

/** E of a section that is a ratio only (see `withSections`). */
export const ratioOnly = 1;

/** Throws when a settlement or a temperature meets a member whose section is a ratio only. */
export function refuseImposed({ members }: Structure, cases: readonly (readonly (Load | Imposed)[])[]): void {
  const imposed = cases.flat().find((load) => load.kind === "settlement" || load.kind === "temperature");
  const bare = members.filter((m) => m.section?.E === ratioOnly).map((m) => m.name);
  if (imposed !== undefined && bare.length > 0)
    throw new AccuracyError({ kind: "sizes wanted", because: imposed.label, members: bare });
}
