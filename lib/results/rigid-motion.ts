// A whole structure moving as one rigid body, in words.

import type { Skeleton } from "../structure/index.ts";
import type { Mechanism } from "./types.ts";

/** Displacements of a motion below this part of its largest, which is 1, are none. */
export const stillMotion = 1e-6;

/** "the whole structure slides sideways", "the whole structure turns about A"; nothing when its parts move against each other.
 *  `points` are the motions of the skeleton's nodes in their order, `turns` those of its segments. */
export function rigidMotionWords(
  { nodes, segments }: Skeleton,
  points: Mechanism["points"],
  turns: Mechanism["turns"],
): string | undefined {
  const size = Math.max(...segments.map((s) => s.length));
  const rotation = turns[0]?.rotation ?? 0;
  if (turns.some((t) => Math.abs(t.rotation - rotation) * size > stillMotion)) return undefined;
  const [first, at] = [points[0], nodes[0]];
  if (first === undefined || at === undefined) return undefined;
  const rigid = points.every((p, i) => {
    const [dx, dy] = [(nodes[i]?.x ?? 0) - at.x, (nodes[i]?.y ?? 0) - at.y];
    return Math.hypot(p.ux - first.ux + rotation * dy, p.uy - first.uy - rotation * dx) <= stillMotion;
  });
  if (!rigid) return undefined;
  if (Math.abs(rotation) * size <= stillMotion) {
    if (Math.abs(first.uy) <= stillMotion) return "the whole structure slides sideways";
    return Math.abs(first.ux) <= stillMotion
      ? "the whole structure moves up or down"
      : "the whole structure slides at a slope";
  }
  const [x, y] = [at.x - first.uy / rotation, at.y + first.ux / rotation];
  const centre = nodes.find((n) => Math.hypot(n.x - x, n.y - y) <= stillMotion * size);
  return `the whole structure turns about ${centre?.name ?? pointText(x, y)}`;
}

/** A point without a name: "the point x = 2 m, y = 3.5 m". */
function pointText(x: number, y: number): string {
  return `the point x = ${Number(x.toPrecision(4))} m, y = ${Number(y.toPrecision(4))} m`;
}
