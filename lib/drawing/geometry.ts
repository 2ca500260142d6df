// Plane geometry of the page: units of the viewBox, x to the right, y down.

export type Pt = readonly [number, number];
export type Segment = readonly [Pt, Pt];

/** Left, top, right, bottom. */
export interface Box {
  readonly left: number;
  readonly top: number;
  readonly right: number;
  readonly bottom: number;
}

export const plus = (a: Pt, b: Pt): Pt => [a[0] + b[0], a[1] + b[1]];
export const minus = (a: Pt, b: Pt): Pt => [a[0] - b[0], a[1] - b[1]];
export const times = (a: Pt, k: number): Pt => [a[0] * k, a[1] * k];
export const along = (a: Pt, direction: Pt, distance: number): Pt => plus(a, times(direction, distance));
export const between = (a: Pt, b: Pt, t: number): Pt => [a[0] + (b[0] - a[0]) * t, a[1] + (b[1] - a[1]) * t];
export const distance = (a: Pt, b: Pt): number => Math.hypot(a[0] - b[0], a[1] - b[1]);
export const dot = (a: Pt, b: Pt): number => a[0] * b[0] + a[1] * b[1];
export const turned = (a: Pt, angle: number): Pt => [
  a[0] * Math.cos(angle) - a[1] * Math.sin(angle),
  a[0] * Math.sin(angle) + a[1] * Math.cos(angle),
];

/** Unit vector of `a`, or `otherwise` where `a` has no length. */
export function unit(a: Pt, otherwise: Pt = [0, -1]): Pt {
  const length = Math.hypot(a[0], a[1]);
  return length < 1e-9 ? otherwise : [a[0] / length, a[1] / length];
}

export function boxOf(points: readonly Pt[], pad = 0): Box {
  const xs = points.map((p) => p[0]);
  const ys = points.map((p) => p[1]);
  return {
    left: Math.min(...xs) - pad,
    top: Math.min(...ys) - pad,
    right: Math.max(...xs) + pad,
    bottom: Math.max(...ys) + pad,
  };
}

export function union(boxes: readonly Box[]): Box {
  return {
    left: Math.min(...boxes.map((b) => b.left)),
    top: Math.min(...boxes.map((b) => b.top)),
    right: Math.max(...boxes.map((b) => b.right)),
    bottom: Math.max(...boxes.map((b) => b.bottom)),
  };
}

/** Area two boxes share. */
export function overlap(a: Box, b: Box): number {
  const width = Math.min(a.right, b.right) - Math.max(a.left, b.left);
  const height = Math.min(a.bottom, b.bottom) - Math.max(a.top, b.top);
  return width > 0 && height > 0 ? width * height : 0;
}

/** Whether the box round a segment meets a box, if only along an edge. */
export const touches = ([a, b]: Segment, box: Box): boolean =>
  Math.max(a[0], b[0]) >= box.left &&
  Math.min(a[0], b[0]) <= box.right &&
  Math.max(a[1], b[1]) >= box.top &&
  Math.min(a[1], b[1]) <= box.bottom;

/** Length of a segment inside a box, by clipping its parameter against the four sides; a touching point counts 0. */
export function lengthInside(segment: Segment, box: Box): number {
  if (!touches(segment, box)) return 0;
  const [[x, y], [toX, toY]] = segment;
  const [dx, dy] = [toX - x, toY - y];
  let enters = 0;
  let leaves = 1;
  // Labels ask this thousands of times for a figure: nothing is made here that would have to be cleared away.
  for (let side = 0; side < 4; side++) {
    const p = side === 0 ? -dx : side === 1 ? dx : side === 2 ? -dy : dy;
    const q =
      side === 0 ? x - box.left : side === 1 ? box.right - x : side === 2 ? y - box.top : box.bottom - y;
    if (p === 0) {
      if (q < 0) return 0;
    } else if (p < 0) enters = Math.max(enters, q / p);
    else leaves = Math.min(leaves, q / p);
  }
  return leaves > enters ? (leaves - enters) * Math.hypot(dx, dy) : 0;
}
