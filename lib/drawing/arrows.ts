// Arrows and turning arrows, with a choice of side where something is in the way.

import {
  along,
  boxOf,
  distance,
  lengthInside,
  type Pt,
  plus,
  type Segment,
  times,
  turned,
  unit,
} from "./geometry.ts";
import { line, type Pen, polygon, polyline, type Shape } from "./scene.ts";

const head = (tip: Pt, direction: Pt, pen: Pen, size = 8): Shape => {
  const back = along(tip, direction, -size);
  const side: Pt = times([-direction[1], direction[0]], size * 0.36);
  return polygon(
    [tip, plus(back, side), plus(back, times(side, -1))],
    { ...pen, width: 0.6, dash: "" },
    true,
  );
};

/** An arrow from `tail` to `tip`. */
export function arrow(tail: Pt, tip: Pt, pen: Pen, size = 8): readonly Shape[] {
  const direction = unit([tip[0] - tail[0], tip[1] - tail[1]]);
  const length = distance(tail, tip);
  const s = Math.min(size, length * 0.7);
  return [line(tail, along(tip, direction, -s * 0.8), pen), head(tip, direction, pen, s)];
}

/** Three quarters of a turn about a centre; `turn` +1 is counter-clockwise as the reader sees it. The gap faces `open`. */
export function turningArrow(centre: Pt, radius: number, turn: 1 | -1, open: Pt, pen: Pen): readonly Shape[] {
  const from = Math.atan2(open[1], open[0]) - turn * (Math.PI / 4);
  const sweep = -turn * 1.5 * Math.PI;
  const points = Array.from({ length: 19 }, (_, i) =>
    plus(centre, times([Math.cos(from + (sweep * i) / 18), Math.sin(from + (sweep * i) / 18)], radius)),
  );
  const tip = points.at(-1) ?? centre;
  const radial = unit([tip[0] - centre[0], tip[1] - centre[1]]);
  const tangent = turned(radial, -turn * (Math.PI / 2));
  return [polyline(points, pen), head(along(tip, tangent, 4), tangent, pen)];
}

/** Where a force arrow at a point is drawn: its tail and tip, and which of them is away from the point. */
export interface ArrowPlace {
  readonly tail: Pt;
  readonly tip: Pt;
  readonly far: Pt;
  readonly outward: Pt;
}

const cost = (place: ArrowPlace, taken: readonly Segment[]): number => {
  const outer = along(place.far, place.outward, 6);
  const inner = along(place.far, place.outward, 6 - distance(place.tail, place.tip) * 0.9);
  const box = boxOf([outer, inner], 3);
  return taken.reduce((sum, segment) => sum + lengthInside(segment, box), 0);
};

/** The clearest place for an arrow of given direction at a point: pushing on it, pulling from it, or farther out;
 *  never nearer to it than `nearest`. */
export function placeArrow(
  point: Pt,
  direction: Pt,
  length: number,
  taken: readonly Segment[],
  nearest: number,
): ArrowPlace {
  const back = times(direction, -1);
  // Arrows in line leave room for the text of the nearer one between them.
  const apart = length + (Math.abs(direction[0]) > 0.5 ? 70 : 24);
  const push = (gap: number): ArrowPlace => {
    const tip = along(point, back, gap);
    const tail = along(tip, back, length);
    return { tail, tip, far: tail, outward: back };
  };
  const pull = (gap: number): ArrowPlace => {
    const tail = along(point, direction, gap);
    const tip = along(tail, direction, length);
    return { tail, tip, far: tip, outward: direction };
  };
  const choices = [0, 1, 2]
    .map((n) => nearest + n * apart)
    .flatMap((gap, i) => [
      { place: push(gap), price: i * 12 },
      { place: pull(gap), price: i * 12 + 5 },
    ]);
  const priced = choices.map(({ place, price }) => ({ place, price: price + cost(place, taken) }));
  return priced.reduce((best, next) => (next.price < best.price ? next : best)).place;
}
