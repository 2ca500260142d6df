// Forces and couples on the page, drawn where there is room.

import { arrow, placeArrow, turningArrow } from "./arrows.ts";
import { along, between, boxOf, lengthInside, type Pt, type Segment, times, unit } from "./geometry.ts";
import { type Label, PENS, type Pen, type Scene, scene } from "./scene.ts";

/** One force at a page point, drawn where there is room; `force` in world axes. */
export function forceArrow(
  point: Pt,
  force: Pt,
  length: number,
  text: string,
  taken: readonly Segment[],
  pen: Pen = PENS.load,
  gap = 5,
): Scene {
  const direction = unit([force[0], -force[1]]);
  const place = placeArrow(point, direction, length, taken, gap);
  const middle = between(place.tail, place.tip, 0.5);
  const aside: Pt = [place.outward[1], place.outward[0]];
  const instead = [
    { at: middle, prefer: aside },
    { at: middle, prefer: times(aside, -1) },
  ];
  const label: Label = {
    text,
    at: place.far,
    prefer: place.outward,
    gap: 4,
    instead,
    accent: pen === PENS.sought,
  };
  return scene(arrow(place.tail, place.tip, pen), [label]);
}

/** One couple at a page point, its gap turned to where the members are fewest. */
export function coupleArrow(
  point: Pt,
  turn: 1 | -1,
  text: string,
  taken: readonly Segment[],
  pen: Pen = PENS.load,
  radius = 15,
): Scene {
  const sides: readonly Pt[] = [
    [0, -1],
    [1, 0],
    [-1, 0],
    [0, 1],
  ];
  const busy = (side: Pt): number => {
    const box = boxOf([along(point, side, radius - 4), along(point, side, radius + 10)], 5);
    return taken.reduce((sum, segment) => sum + lengthInside(segment, box), 0);
  };
  const clear = sides.reduce((best, side) => (busy(side) < busy(best) ? side : best));
  const label: Label = {
    text,
    at: along(point, clear, radius),
    prefer: clear,
    gap: 6,
    accent: pen === PENS.sought,
  };
  return scene(turningArrow(point, radius, turn, times(clear, -1), pen), [label]);
}
