// The size of a structure, by which lengths are judged.

import type { Structure } from "../structure/index.ts";

/** Diagonal of the rectangle round all joints, m. */
export function sizeOf({ joints }: Pick<Structure, "joints">): number {
  const [xs, ys] = [joints.map((j) => j.x), joints.map((j) => j.y)];
  return Math.hypot(Math.max(...xs) - Math.min(...xs), Math.max(...ys) - Math.min(...ys));
}
