// The main dimensions of a structure: between the different x and the different y of its joints and hinges.

import type { DimensionLine } from "../drawing/index.ts";
import { axisOf, memberNamed, pointOn } from "../structure/index.ts";
import type { Structure } from "../structure/types.ts";
import { lengthText } from "./words.ts";

/** Places of more hinges than this stand in their table only: a frame's own dimensions would be lost among them. */
export const mostHinges = 4;

/** One chain of dimensions along x below the figure and one along y beside it. */
export function dimensionLines(structure: Structure): readonly DimensionLine[] {
  const hinges = structure.hinges.length > mostHinges ? [] : structure.hinges;
  const points = [
    ...structure.joints.map(({ x, y }) => [x, y] as const),
    ...hinges.map(({ member, at }) =>
      pointOn(axisOf(structure, memberNamed(structure, member, "hinge")), at),
    ),
  ];
  return [...chain(points, "x"), ...chain(points, "y")];
}

function chain(points: readonly (readonly [number, number])[], along: "x" | "y"): readonly DimensionLine[] {
  const k = along === "x" ? 0 : 1;
  const size = Math.max(...points.map((point) => Math.abs(point[k])), 1);
  const stops = [...points]
    .sort((a, b) => a[k] - b[k])
    .filter((point, i, all) => i === 0 || point[k] - (all[i - 1]?.[k] ?? 0) > 1e-9 * size);
  return stops.slice(1).map((to, i) => {
    const from = stops[i] ?? to;
    return { along, from, to, text: lengthText(to[k] - from[k]) };
  });
}
