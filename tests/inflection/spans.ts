// Spans and loads for the tests of points of inflection, written without units: L, w and P as given.

import type { Span } from "../../lib/inflection/index.ts";
import { constant, type Piecewise, piecewise, ramp } from "../../lib/results/index.ts";

type Point = Span["points"][number];

/** A span under a line load and point loads. */
export function span(length: number, across: Piecewise, points: readonly Point[] = []): Span {
  return { length, across, points };
}

export const bare = (L: number): Piecewise => constant(0, L, 0);
export const udl = (L: number, w: number): Span => span(L, constant(0, L, w));
/** Force P at parts c of the span. */
export const forces = (L: number, P: number, ...cs: readonly number[]): Span =>
  span(
    L,
    bare(L),
    cs.map((c) => ({ x: c * L, across: P, couple: 0 })),
  );
/** Linear from w1 to w2 between parts a and b of the span. */
export const trapezoid = (L: number, a: number, b: number, w1: number, w2: number): Span =>
  span(L, ramp(0, L, a * L, b * L, w1, w2));
/** Rising to w at mid-span and falling again. */
export const gable = (L: number, w: number): Span =>
  span(
    L,
    piecewise(
      [0, L / 2, L],
      [
        [0, (2 * w) / L],
        [w, (-2 * w) / L],
      ],
    ),
  );
/** Parabola with peak w. */
export const parabola = (L: number, w: number): Span =>
  span(L, piecewise([0, L], [[0, (4 * w) / L, (-4 * w) / L ** 2]]));
