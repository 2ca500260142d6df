// Dimension lines: along x in rows below the figure, along y in columns beside it, short ones nearest.

import { union } from "./geometry.ts";
import { placeLabels } from "./labels.ts";
import type { Scale } from "./scale.ts";
import { blocksOf, type Label, line, merge, PENS, type Scene, scene } from "./scene.ts";
import type { DimensionLine } from "./spec.ts";
import { textWidth } from "./text.ts";

const ROW = 24;
const FIRST = 26;
const SIZE = 13;

interface Span {
  readonly dimension: DimensionLine;
  readonly low: number;
  readonly high: number;
  /** Page coordinate across the line, where the measured places lie. */
  readonly feet: readonly [number, number];
}

function spanOf(dimension: DimensionLine, scale: Scale): Span {
  const a = scale.page(...dimension.from);
  const b = scale.page(...dimension.to);
  const [i, j] = dimension.along === "x" ? [0, 1] : [1, 0];
  const ends = [
    { s: a[i as 0 | 1], foot: a[j as 0 | 1] },
    { s: b[i as 0 | 1], foot: b[j as 0 | 1] },
  ].sort((p, q) => p.s - q.s);
  const [low, high] = ends;
  return { dimension, low: low?.s ?? 0, high: high?.s ?? 0, feet: [low?.foot ?? 0, high?.foot ?? 0] };
}

/** Spans sorted into rows so that those of a row do not overlap, nor their texts. */
function rows(spans: readonly Span[]): readonly (readonly Span[])[] {
  const taken: { readonly from: number; readonly to: number; readonly span: Span }[][] = [];
  for (const span of [...spans].sort((p, q) => p.high - p.low - (q.high - q.low))) {
    const half = textWidth(span.dimension.text, SIZE) / 2 + 3;
    const middle = (span.low + span.high) / 2;
    const across = span.dimension.along === "x" ? half : SIZE;
    const from = Math.min(span.low + 1, middle - across);
    const to = Math.max(span.high - 1, middle + across);
    const row = taken.find((r) => r.every((other) => to <= other.from || from >= other.to));
    if (row) row.push({ from, to, span });
    else taken.push([{ from, to, span }]);
  }
  return taken.map((row) => row.map((r) => r.span));
}

function below(span: Span, y: number): Scene {
  const { low, high, feet, dimension } = span;
  const extend = (x: number, foot: number) =>
    line([x, Math.min(foot + 30, y - 4)], [x, y + 4], PENS.dimension);
  const slash = (x: number) => line([x - 4, y + 4], [x + 4, y - 4], { ...PENS.dimension, width: 1.4 });
  const label: Label = {
    text: dimension.text,
    at: [(low + high) / 2, y],
    prefer: [0, -1],
    instead: [
      { at: [high + 4, y], prefer: [1, 0] },
      { at: [low - 4, y], prefer: [-1, 0] },
      { at: [(low + high) / 2, y], prefer: [0, 1] },
    ],
    gap: 2,
    size: SIZE,
    fixed: true,
  };
  return scene(
    [
      line([low - 5, y], [high + 5, y], PENS.dimension),
      extend(low, feet[0]),
      extend(high, feet[1]),
      slash(low),
      slash(high),
    ],
    [label],
  );
}

function beside(span: Span, x: number, inner: number, side: 1 | -1): Scene {
  const { low, high, dimension } = span;
  const extend = (y: number) => line([x + 4 * side, y], [inner + 14 * side, y], PENS.dimension);
  const slash = (y: number) => line([x - 4, y + 4], [x + 4, y - 4], { ...PENS.dimension, width: 1.4 });
  const label: Label = {
    text: dimension.text,
    at: [x, (low + high) / 2],
    prefer: [side, 0],
    gap: 4,
    size: SIZE,
    fixed: true,
  };
  return scene(
    [line([x, low - 5], [x, high + 5], PENS.dimension), extend(low), extend(high), slash(low), slash(high)],
    [label],
  );
}

/** A drawing with dimension lines around it, clear of its labels: rows below, columns on the emptier side. */
export function dimensioned(list: readonly DimensionLine[], scale: Scale, drawn: Scene): Scene {
  if (list.length === 0) return drawn;
  const texts = placeLabels(drawn.labels, blocksOf(drawn));
  const box = union([...drawn.shapes.map((s) => s.box), ...texts.map((t) => t.box)]);
  const spans = list.map((d) => spanOf(d, scale));
  const horizontal = rows(spans.filter((s) => s.dimension.along === "x"));
  const vertical = rows(spans.filter((s) => s.dimension.along === "y"));
  const widest = Math.max(0, ...vertical.flat().map((s) => textWidth(s.dimension.text, SIZE)));
  const side = box.right - scale.width < -box.left - 12 ? 1 : -1;
  const [outer, inner] = side > 0 ? [box.right, scale.width] : [box.left, 0];
  const column = (i: number): number => outer + side * (FIRST - 4 + i * (widest + 14));
  return merge(
    drawn,
    ...horizontal.flatMap((row, i) => row.map((s) => below(s, box.bottom + FIRST - 4 + i * ROW))),
    ...vertical.flatMap((row, i) => row.map((s) => beside(s, column(i), inner, side))),
  );
}
