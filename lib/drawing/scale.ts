// From metres (y up) to the page (y down).

import { type Box, type Pt, union } from "./geometry.ts";
import { type PlacedLabel, placeWithin } from "./labels.ts";
import { blocksOf, type Scene } from "./scene.ts";

/** Greatest width of a figure in viewBox units: small enough that text of 14 is read on a telephone. */
export const PAGE_WIDTH = 480;
/** Greatest width of one body cut free, which stands beside its equations. */
export const BODY_WIDTH = 350;
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
  const placed = placeWithin(scene.labels, blocksOf(scene));
  const box = union([...scene.shapes.map((s) => s.box), ...placed.map((p) => p.box)]);
  return { scene, placed, box };
}

/** Scenes of one skeleton at one scale, so that they fit the page width with their labels and loads and stand exactly
 *  under one another. `points` in m span what is drawn; `height` limits the skeleton's height on the page, `page` the
 *  width of everything. */
export function fittedTogether(
  points: readonly Pt[],
  builds: readonly ((scale: Scale) => Scene)[],
  height: number,
  page: number = PAGE_WIDTH,
): readonly Laid[] {
  if (points.length === 0) throw new Error("figure: nothing to draw; at least one joint or member is wanted");
  const across = (laid: readonly Laid[]): Box => union(laid.map(({ box }) => box));
  const at = (width: number): readonly Laid[] =>
    builds.map((build) => lay(build(scaleFor(points, width, height))));
  let width = page - 90;
  let laid = at(width);
  for (let round = 0; round < 4; round++) {
    const { left, right } = across(laid);
    const excess = right - left - (page - 2 * PAD);
    if (excess <= 0 || width <= 120) break;
    // A skeleton that its height limits is narrower than the width it was given.
    width = Math.max(120, Math.min(width, scaleFor(points, width, height).width || width) - excess);
    laid = at(width);
  }
  const { left, right } = across(laid);
  return laid.map((one) => ({ ...one, box: { ...one.box, left, right } }));
}

/** One scene scaled so that it fits. */
export function fitted(
  points: readonly Pt[],
  build: (scale: Scale) => Scene,
  height: number,
  page: number = PAGE_WIDTH,
): Laid {
  const [laid] = fittedTogether(points, [build], height, page);
  if (laid === undefined) throw new Error("figure: nothing was laid out");
  return laid;
}
