// Reactions in global axes from the forces found.

import type { Reaction } from "../results/index.ts";
import type { Structure } from "../structure/index.ts";
import type { Found } from "./equations.ts";
import { reactionForce } from "./force-names.ts";
import { restraintsOf } from "./restraints.ts";

interface Zero {
  readonly joint: string;
  readonly component: "x" | "y";
}

/** The reaction at each support; `zero` are components settled without an equation. The reaction of a support on a slope
 *  has both components from one step. */
export function reactionsOf(
  structure: Structure,
  known: ReadonlyMap<string, Found>,
  zero: readonly Zero[],
): readonly Reaction[] {
  const restraints = restraintsOf(structure);
  return structure.supports.map(({ joint }) => {
    const values: { x?: number; y?: number; moment?: number } = {};
    const steps: { x?: number; y?: number; moment?: number } = {};
    for (const z of zero) if (z.joint === joint) values[z.component] = 0;
    for (const restraint of restraints) {
      const found = known.get(reactionForce(joint, restraint.component).name);
      if (restraint.joint !== joint || found === undefined) continue;
      const { direction } = restraint;
      for (const [key, part] of [
        ["x", direction?.[0] ?? 0],
        ["y", direction?.[1] ?? 0],
        ["moment", direction === undefined ? 1 : 0],
      ] as const) {
        if (part === 0) continue;
        values[key] = found.value * part + 0;
        steps[key] = found.step;
      }
    }
    return { joint, ...values, steps };
  });
}
