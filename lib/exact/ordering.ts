// The order of nodes that keeps the matrix narrow. Three are tried, the one with the least work is taken:
// along x, along y, and from node to neighbour (reverse Cuthill-McKee; E. Cuthill & J. McKee, Reducing the bandwidth of
// sparse symmetric matrices, Proc. 24th ACM National Conf. (1969) 157-172).

import type { Skeleton } from "../structure/index.ts";

/** Node indices in the order their displacements are numbered. */
export function ordering({ nodes, segments }: Skeleton): Int32Array {
  const neighbours = neighboursOf(nodes.length, segments);
  const index = Array.from(nodes, (_, i) => i);
  const at = (i: number): { readonly x: number; readonly y: number } => nodes[i] ?? { x: 0, y: 0 };
  const tried = [
    [...index].sort((i, k) => at(i).y - at(k).y || at(i).x - at(k).x),
    [...index].sort((i, k) => at(i).x - at(k).x || at(i).y - at(k).y),
    reverseCuthillMcKee(neighbours),
  ];
  let best = tried[0] ?? index;
  let least = work(best, neighbours);
  for (const order of tried.slice(1)) {
    const w = work(order, neighbours);
    if (w < least) [best, least] = [order, w];
  }
  return Int32Array.from(best);
}

type Neighbours = readonly (readonly number[])[];

function neighboursOf(
  count: number,
  segments: readonly { readonly from: number; readonly to: number }[],
): Neighbours {
  const lists = Array.from({ length: count }, (): number[] => []);
  for (const { from, to } of segments) {
    lists[from]?.push(to);
    lists[to]?.push(from);
  }
  return lists;
}

/** Factoring costs about the sum of squared row lengths. */
function work(order: readonly number[], neighbours: Neighbours): number {
  const place = new Int32Array(order.length);
  order.forEach((node, p) => {
    place[node] = p;
  });
  return order.reduce((sum, node, p) => {
    const first = (neighbours[node] ?? []).reduce((least, other) => Math.min(least, place[other] ?? p), p);
    return sum + (p - first) ** 2;
  }, 0);
}

function reverseCuthillMcKee(neighbours: Neighbours): number[] {
  const degree = (i: number): number => (neighbours[i] ?? []).length;
  const start = remoteNode(neighbours, degree);
  return levelsFrom(start, neighbours, degree).order.reverse();
}

/** A node far from others: start anywhere, go to the least connected of the last level, until it gets no farther. */
function remoteNode(neighbours: Neighbours, degree: (i: number) => number): number {
  let node = 0;
  let { order, depth, lastLevel } = levelsFrom(node, neighbours, degree);
  for (;;) {
    const candidate = order.slice(lastLevel).reduce((a, b) => (degree(b) < degree(a) ? b : a));
    const next = levelsFrom(candidate, neighbours, degree);
    if (next.depth <= depth) return node;
    node = candidate;
    ({ order, depth, lastLevel } = next);
  }
}

/** Nodes level by level from a start, of each level the least connected first. */
function levelsFrom(
  start: number,
  neighbours: Neighbours,
  degree: (i: number) => number,
): { readonly order: number[]; readonly depth: number; readonly lastLevel: number } {
  const order = [start];
  const seen = new Uint8Array(neighbours.length);
  seen[start] = 1;
  let [depth, levelBegin, levelEnd, lastLevel] = [0, 0, 1, 0];
  while (levelBegin < levelEnd) {
    lastLevel = levelBegin;
    for (let i = levelBegin; i < levelEnd; i++) {
      const fresh = (neighbours[order[i] ?? 0] ?? []).filter((k) => seen[k] === 0);
      for (const k of fresh.sort((a, b) => degree(a) - degree(b)))
        if (seen[k] === 0) {
          seen[k] = 1;
          order.push(k);
        }
    }
    [levelBegin, levelEnd] = [levelEnd, order.length];
    depth += 1;
  }
  return { order, depth, lastLevel };
}
