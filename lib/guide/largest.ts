// The largest force of a kind in a frame: what others are small against.

import { extremes } from "../results/index.ts";
import type { MemberForces } from "../results/types.ts";

/** The largest moment, or the largest of all axial forces and shears, in magnitude. N or N·m. */
export function largestOf(members: readonly MemberForces[], kind: "M" | "force"): number {
  const functions = members.flatMap(({ N, V, M }) => (kind === "M" ? [M] : [N, V]));
  return Math.max(0, ...functions.map((f) => Math.abs(extremes(f).governing.value)));
}
