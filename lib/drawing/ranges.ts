// How results move: one panel per result, one hatched bar per cause, from the least to the greatest it makes of the result,
// with a stroke at the value as chosen.

import { boxOf, type Pt, union } from "./geometry.ts";
import { hatch } from "./hatch.ts";
import { at as coordinate, INK, line, PENS, polyline, type Shape, scene, strokes } from "./scene.ts";
import type { RangeBar, RangePanel, RangesFigure } from "./spec.ts";
import type { Panel } from "./svg.ts";
import { textContent, textWidth } from "./text.ts";

const WIDTH = 460;
const ROW = 42;
const BAR = 11;
const SIZE = 12.5;
/** Below the label of a bar. */
const DROP = 22;
/** A result that moves less than this share of itself does not move. */
const STILL = 1e-6;

/** Panels of a figure of ranges. */
export const rangePanels = (spec: RangesFigure): readonly Panel[] =>
  spec.panels.map((panel) => ({ heading: panel.heading, laid: panelOf(panel) }));

function panelOf(panel: RangePanel): NonNullable<Panel["laid"]> {
  const all = [panel.chosen, ...panel.bars.flatMap(({ least, greatest }) => [least, greatest])];
  const bad = all.find((value) => !Number.isFinite(value));
  if (bad !== undefined)
    throw new Error(`ranges: ${panel.heading} has a value ${bad}; finite numbers are wanted`);
  const [low, high] = [Math.min(...all), Math.max(...all)];
  const moves = high - low > STILL * Math.max(Math.abs(low), Math.abs(high));
  const margin = Math.max(40, ...panel.bars.flatMap((bar) => bar.texts.map((t) => textWidth(t, SIZE) + 8)));
  const x = (value: number): number =>
    moves ? margin + ((value - low) / (high - low)) * (WIDTH - 2 * margin) : WIDTH / 2;
  const bottom = panel.bars.length * ROW;
  const chosen = x(panel.chosen);
  const shapes = [
    ...panel.bars.flatMap((bar, i) => barOf(bar, i * ROW, { x, chosen, size: moves ? high - low : 0 })),
    ...panel.bars.map((_, i) =>
      line([chosen, i * ROW + DROP - 4], [chosen, i * ROW + DROP + BAR + 4], {
        ...PENS.dimension,
        name: "chosen",
        width: 2,
      }),
    ),
    text(panel.chosenText, [chosen, bottom + 8], "middle"),
  ];
  const box = union([{ left: 0, top: 0, right: WIDTH, bottom: bottom + 18 }, ...shapes.map((s) => s.box)]);
  return { scene: scene(shapes), placed: [], box };
}

function barOf(
  { kind, label, least, greatest, texts }: RangeBar,
  top: number,
  {
    x,
    chosen,
    size,
  }: { readonly x: (value: number) => number; readonly chosen: number; readonly size: number },
): readonly Shape[] {
  const [upper, lower] = [top + DROP, top + DROP + BAR];
  const middle = (upper + lower) / 2;
  const [from, to] = [x(Math.min(least, greatest)), x(Math.max(least, greatest))];
  const name = text(label, [0, top + 10], "start");
  if (Math.abs(greatest - least) <= 2e-3 * size || size === 0) {
    const beyond = from > chosen;
    return [
      name,
      line([from, upper], [from, lower], PENS.curve),
      text(texts[0], [beyond ? from + 7 : from - 7, middle], beyond ? "start" : "end"),
    ];
  }
  const outline: readonly Pt[] = [
    [from, upper],
    [to, upper],
    [to, lower],
    [from, lower],
    [from, upper],
  ];
  const hatching = kind === "hinge" ? hatch(outline, Math.PI / 4, 5) : hatch(outline, Math.PI / 2, 4);
  const pen = kind === "hinge" ? PENS.curve : { ...PENS.curve, name: "unknown", colour: INK, width: 1.2 };
  return [
    name,
    ...(hatching.length > 0 ? [strokes(hatching, PENS.hatch)] : []),
    polyline(outline, pen),
    text(texts[0], [from - 6, middle], "end"),
    text(texts[1], [to + 6, middle], "start"),
  ];
}

/** A text put where it belongs: what is drawn here leaves it room. */
function text(words: string, [x, y]: Pt, anchor: "start" | "middle" | "end"): Shape {
  const width = textWidth(words, SIZE);
  const left = anchor === "middle" ? x - width / 2 : anchor === "start" ? x : x - width;
  return {
    svg:
      `<text x="${coordinate(x)}" y="${coordinate(y + SIZE * 0.34)}" font-size="${SIZE}" fill="${INK}" ` +
      `text-anchor="${anchor}">${textContent(words, SIZE)}</text>`,
    box: boxOf([
      [left, y - SIZE * 0.6],
      [left + width, y + SIZE * 0.6],
    ]),
    blocks: [],
  };
}
