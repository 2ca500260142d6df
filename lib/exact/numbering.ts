// Which displacement has which number, and in which axes each node moves.

import type { Skeleton, Structure, Support } from "../structure/index.ts";
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

/** Numbers the displacements of all nodes: held where a support holds them, rotation only where something takes a moment. */
export function numbering(structure: Structure, cut: Skeleton): Numbering {
  const count = cut.nodes.length;
  const supports = new Map(structure.supports.map((s) => [s.joint, s]));
  const turns = turning(cut, supports);
  const kinds = cut.nodes.map((node, i) => {
    const support = node.kind === "joint" ? supports.get(node.name) : undefined;
    const { x = false, y = false, rotation = false } = support?.holds ?? {};
    return [
      x ? "held" : "free",
      y ? "held" : "free",
      rotation ? "held" : turns[i] ? "free" : "none",
    ] as const;
  });
  const places = new Int32Array(3 * count);
  const order = ordering(cut);
  let next = 0;
  for (const kind of ["free", "held"] as const)
    for (const i of order) for (let k = 0; k < 3; k++) if (kinds[i]?.[k] === kind) places[3 * i + k] = next++;
  const total = next;
  const free = kinds.flat().filter((kind) => kind === "free").length;
  kinds.forEach((three, i) => {
    three.forEach((kind, k) => {
      if (kind === "none") places[3 * i + k] = total;
    });
  });
  return {
    places,
    axes: axesOf(cut, supports),
    free,
    total,
    node: new Map(structure.joints.map((j, i) => [j.name, i])),
  };
}

function turning({ nodes, segments }: Skeleton, supports: ReadonlyMap<string, Support>): readonly boolean[] {
  const turns = nodes.map(
    (node) => node.kind === "joint" && supports.get(node.name)?.springs?.rotation !== undefined,
  );
  for (const s of segments) {
    if (!s.releasedStart) turns[s.from] = true;
    if (!s.releasedEnd) turns[s.to] = true;
  }
  return turns;
}

function axesOf({ nodes }: Skeleton, supports: ReadonlyMap<string, Support>): Float64Array {
  const axes = new Float64Array(2 * nodes.length);
  nodes.forEach((node, i) => {
    const angle = (node.kind === "joint" ? supports.get(node.name)?.angle : undefined) ?? 0;
    axes[2 * i] = Math.cos(angle);
    axes[2 * i + 1] = Math.sin(angle);
  });
  return axes;
}
