// Where a force is greatest and least strictly inside its member.

import type { ForceQuantity } from "../drawing/index.ts";
import { extremes } from "../results/index.ts";
import type { MemberForces } from "../results/types.ts";

/** Extremes strictly inside the member that say more than its ends do; none of axial forces. */
export function innerExtremes(
  forces: MemberForces,
  which: ForceQuantity,
): readonly { x: number; value: number }[] {
  if (which === "N") return [];
  const { length } = forces;
  const { greatest, least } = extremes(forces[which]);
  const size = Math.max(Math.abs(greatest.value), Math.abs(least.value), 1e-3);
  return [greatest, least].filter(
    ({ x, value }) => x > 1e-9 * length && x < (1 - 1e-9) * length && Math.abs(value) > 1e-9 * size,
  );
}
