// Which displacement has which number, and in which axes each node moves.

import type { Skeleton, Structure } from "../structure/index.ts";
import { ordering } from "./ordering.ts";

export interface Numbering {
  /** x, y, rotation of each node: three per node. */
  readonly places: Int32Array;
  /** Cosine and sine of the axes of each node: two per node. */
  readonly axes: Float64Array;
  /** Displacements to be found; they come first. */
  readonly free: number;
  /** Free and held ones; one more, always zero, follows. */
  readonly total: number;
  /** Index of each joint's node. */
  readonly node: ReadonlyMap<string, number>;
}

const [free, held, none] = [0, 1, 2];

/** Numbers the displacements of all nodes: held where a support holds them, rotation only where something takes a moment. */
export function numbering(structure: Structure, cut: Skeleton): Numbering {
  const node = new Map(structure.joints.map((j, i) => [j.name, i]));
  const kinds = kindsOf(structure, cut, node);
  const places = new Int32Array(kinds.length);
  const order = ordering(cut);
  let next = 0;
  const number = (kind: number): number => {
    for (let p = 0; p < order.length; p++)
      for (let k = 3 * (order[p] ?? 0), end = k + 3; k < end; k++) if (kinds[k] === kind) places[k] = next++;
    return next;
  };
  const [count, total] = [number(free), number(held)];
  for (let k = 0; k < places.length; k++) if (kinds[k] === none) places[k] = total;
  return { places, axes: axesOf(structure, cut, node), free: count, total, node };
}

function kindsOf(
  { supports }: Structure,
  { nodes, segments }: Skeleton,
  node: ReadonlyMap<string, number>,
): Uint8Array {
  const kinds = new Uint8Array(3 * nodes.length);
  for (let i = 0; i < nodes.length; i++) kinds[3 * i + 2] = none;
  for (const { from, to, releasedStart, releasedEnd } of segments) {
    if (!releasedStart) kinds[3 * from + 2] = free;
    if (!releasedEnd) kinds[3 * to + 2] = free;
  }
  for (const { joint, holds, springs } of supports) {
    const i = 3 * (node.get(joint) ?? -1);
    if (holds.x) kinds[i] = held;
    if (holds.y) kinds[i + 1] = held;
    if (holds.rotation) kinds[i + 2] = held;
    else if (springs?.rotation !== undefined) kinds[i + 2] = free;
  }
  return kinds;
}

function axesOf(
  { supports }: Structure,
  { nodes }: Skeleton,
  node: ReadonlyMap<string, number>,
): Float64Array {
  const axes = new Float64Array(2 * nodes.length);
  for (let i = 0; i < nodes.length; i++) axes[2 * i] = 1;
  for (const { joint, angle = 0 } of supports) {
    const i = 2 * (node.get(joint) ?? -1);
    axes[i] = Math.cos(angle);
    axes[i + 1] = Math.sin(angle);
  }
  return axes;
}
