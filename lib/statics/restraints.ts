// What the supports hold: single forces and couples. A spring holds as far as statics is concerned.

import { resists, type Structure, type Support } from "../structure/index.ts";

/** One reaction: a force along `direction`, or a couple where there is none. `component` is the axis of the support it
 *  acts along; "normal" and "tangent" stand for y and x of a support turned by an angle, whose `direction` is inclined. */
export interface Restraint {
  readonly joint: string;
  readonly component: "x" | "y" | "moment" | "normal" | "tangent";
  readonly direction?: readonly [number, number];
}

/** The reactions of a structure, support by support. A support that holds both ways has them along x and y whatever its angle. */
export function restraintsOf({ supports }: Pick<Structure, "supports">): readonly Restraint[] {
  return supports.flatMap((support) => [
    ...forcesOf(support),
    ...(resists(support, "rotation") ? [{ joint: support.joint, component: "moment" } as const] : []),
  ]);
}

function forcesOf(support: Support): readonly Restraint[] {
  const { joint, angle = 0 } = support;
  const [x, y] = [resists(support, "x"), resists(support, "y")];
  const [c, s] = [snapped(Math.cos(angle)), snapped(Math.sin(angle))];
  const across = { joint, component: "x", direction: [1, 0] } as const;
  const up = { joint, component: "y", direction: [0, 1] } as const;
  if (x && y) return [across, up];
  if (!x && !y) return [];
  const direction = x ? ([c, s] as const) : ([-s + 0, c] as const);
  if (Math.abs(direction[0]) === 1) return [across];
  if (Math.abs(direction[1]) === 1) return [up];
  return [{ joint, component: x ? "tangent" : "normal", direction }];
}

/** Rounding of a right angle away. */
function snapped(cosine: number): number {
  const near = Math.round(cosine);
  return Math.abs(cosine - near) < 1e-12 ? near : cosine;
}
