// From metres (y up) to the page (y down).

import { type Box, type Pt, union } from "./geometry.ts";
import { type PlacedLabel, placeLabels } from "./labels.ts";
import { blocksOf, type Scene } from "./scene.ts";

/** Width of every figure in viewBox units: small enough that text of 14 is read on a telephone. */
export const PAGE_WIDTH = 480;
const PAD = 8;

export interface Scale {
  /** Page units per metre. */
  readonly k: number;
  /** Page width of what is spanned; its left edge is at 0. */
  readonly width: number;
  readonly page: (x: number, y: number) => Pt;
}

export interface Laid {
  readonly scene: Scene;
  readonly placed: readonly PlacedLabel[];
  readonly box: Box;
}

const finite = (value: number, what: string): number => {
  if (!Number.isFinite(value)) throw new Error(`figure: ${what} is ${value}; a finite number is wanted`);
  return value;
};

function scaleFor(points: readonly Pt[], width: number, height: number): Scale {
  const xs = points.map((p) => finite(p[0], "an x coordinate"));
  const ys = points.map((p) => finite(p[1], "a y coordinate"));
  const [left, top] = [Math.min(...xs), Math.max(...ys)];
  const [w, h] = [Math.max(...xs) - left, top - Math.min(...ys)];
  const k = Math.min(w > 0 ? width / w : Infinity, h > 0 ? height / h : Infinity);
  const used = Number.isFinite(k) ? k : 1;
  return { k: used, width: w * used, page: (x, y) => [(x - left) * used, (top - y) * used] };
}

function lay(scene: Scene): Laid {
  const placed = placeLabels(scene.labels, blocksOf(scene));
  const box = union([...scene.shapes.map((s) => s.box), ...placed.map((p) => p.box)]);
  return { scene, placed, box };
}

/** A scene scaled so that it fits the page width with its labels and loads. `points` in m span what is drawn;
 *  `height` limits the skeleton's height on the page. */
export function fitted(points: readonly Pt[], build: (scale: Scale) => Scene, height: number): Laid {
  if (points.length === 0) throw new Error("figure: nothing to draw; at least one joint or member is wanted");
  let width = PAGE_WIDTH - 90;
  let laid = lay(build(scaleFor(points, width, height)));
  for (let round = 0; round < 4; round++) {
    const excess = laid.box.right - laid.box.left - (PAGE_WIDTH - 2 * PAD);
    if (excess <= 0 || width <= 120) break;
    width = Math.max(120, width - excess);
    laid = lay(build(scaleFor(points, width, height)));
  }
  return laid;
}
