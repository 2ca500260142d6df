// The order of nodes that keeps the matrix narrow. Three are tried, the one with the least work is taken:
// along x, along y, and from node to neighbour (reverse Cuthill-McKee; E. Cuthill & J. McKee, Reducing the bandwidth of
// sparse symmetric matrices, Proc. 24th ACM National Conf. (1969) 157-172).
// Entries of typed arrays within their length are numbers; `as number` says so to the compiler without a test at run time.

import type { Skeleton } from "../structure/index.ts";

/** Node indices in the order their displacements are numbered. */
export function ordering({ nodes, segments }: Skeleton): Int32Array {
  const graph = graphOf(nodes.length, segments);
  const x = new Float64Array(nodes.length);
  const y = new Float64Array(nodes.length);
  nodes.forEach((node, i) => {
    x[i] = node.x;
    y[i] = node.y;
  });
  let best = along(y, x);
  let least = work(best, graph);
  for (const order of [along(x, y), reverseCuthillMcKee(graph)]) {
    const w = work(order, graph);
    if (w < least) [best, least] = [order, w];
  }
  return best;
}

/** Neighbours of node i are list[begin[i]] to list[begin[i + 1] - 1]. */
interface Graph {
  readonly begin: Int32Array;
  readonly list: Int32Array;
}

function graphOf(count: number, segments: readonly { readonly from: number; readonly to: number }[]): Graph {
  const begin = new Int32Array(count + 1);
  for (const { from, to } of segments) {
    begin[from + 1] = (begin[from + 1] as number) + 1;
    begin[to + 1] = (begin[to + 1] as number) + 1;
  }
  for (let i = 0; i < count; i++) begin[i + 1] = (begin[i + 1] as number) + (begin[i] as number);
  const next = begin.slice();
  const list = new Int32Array(2 * segments.length);
  for (const { from, to } of segments) {
    list[next[from] as number] = to;
    list[next[to] as number] = from;
    next[from] = (next[from] as number) + 1;
    next[to] = (next[to] as number) + 1;
  }
  return { begin, list };
}

/** Sorted by one coordinate, then the other. */
function along(first: Float64Array, second: Float64Array): Int32Array {
  const order = new Int32Array(first.length);
  for (let i = 0; i < order.length; i++) order[i] = i;
  return order.sort(
    (i, k) => (first[i] as number) - (first[k] as number) || (second[i] as number) - (second[k] as number),
  );
}

/** Factoring costs about the sum of squared row lengths. */
function work(order: Int32Array, { begin, list }: Graph): number {
  const place = new Int32Array(order.length);
  for (let p = 0; p < order.length; p++) place[order[p] as number] = p;
  let sum = 0;
  for (let p = 0; p < order.length; p++) {
    const node = order[p] as number;
    let first = p;
    for (let k = begin[node] as number; k < (begin[node + 1] as number); k++)
      first = Math.min(first, place[list[k] as number] as number);
    sum += (p - first) ** 2;
  }
  return sum;
}

function degree({ begin }: Graph, i: number): number {
  return (begin[i + 1] as number) - (begin[i] as number);
}

function reverseCuthillMcKee(graph: Graph): Int32Array {
  return levelsFrom(remoteNode(graph), graph).order.reverse();
}

/** A node far from others: start anywhere, go to the least connected of the last level, until it gets no farther. */
function remoteNode(graph: Graph): number {
  let node = 0;
  let { order, depth, lastLevel } = levelsFrom(node, graph);
  for (;;) {
    const candidate = order
      .subarray(lastLevel)
      .reduce((a, b) => (degree(graph, b) < degree(graph, a) ? b : a));
    const next = levelsFrom(candidate, graph);
    if (next.depth <= depth) return node;
    node = candidate;
    ({ order, depth, lastLevel } = next);
  }
}

/** Nodes level by level from a start, the neighbours of each with the least connected first. */
function levelsFrom(
  start: number,
  graph: Graph,
): { readonly order: Int32Array; readonly depth: number; readonly lastLevel: number } {
  const { begin, list } = graph;
  const order = new Int32Array(begin.length - 1);
  const seen = new Uint8Array(order.length);
  order[0] = start;
  seen[start] = 1;
  let [depth, levelBegin, count, lastLevel] = [0, 0, 1, 0];
  while (levelBegin < count) {
    lastLevel = levelBegin;
    const levelEnd = count;
    for (let i = levelBegin; i < levelEnd; i++) {
      const node = order[i] as number;
      const fresh = count;
      for (let k = begin[node] as number; k < (begin[node + 1] as number); k++) {
        const other = list[k] as number;
        if (seen[other] === 1) continue;
        seen[other] = 1;
        let p = count++;
        for (; p > fresh && degree(graph, order[p - 1] as number) > degree(graph, other); p--)
          order[p] = order[p - 1] as number;
        order[p] = other;
      }
    }
    levelBegin = levelEnd;
    depth += 1;
  }
  return { order, depth, lastLevel };
}
