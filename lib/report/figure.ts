// The one place where a figure of a record becomes SVG.

import { drawLineChart, drawSketch, type FigureSpec } from "../drawing/index.ts";

const KINDS: readonly FigureSpec["kind"][] = [
  "structure",
  "mechanism",
  "free body",
  "diagrams",
  "self-stress",
  "shape",
  "deflection",
  "ranges",
  "line chart",
];

const isFigureSpec = (spec: { readonly kind: string }): spec is FigureSpec =>
  (KINDS as readonly string[]).includes(spec.kind);

const draw = async (spec: FigureSpec, prefix: string): Promise<string> =>
  spec.kind === "line chart" ? drawLineChart(spec, prefix) : drawSketch(spec, prefix);

/** Drawings by prefix and content: a notebook is run again and again, and most of its figures stay. */
const drawn = new Map<string, string>();
const KEPT = 200;

/** A figure as one SVG element; every id in it starts with `prefix`. Throws on an unknown kind, naming those there are. */
export async function drawFigureSpec(spec: { readonly kind: string }, prefix: string): Promise<string> {
  if (!isFigureSpec(spec)) {
    throw new Error(`figure kind "${spec.kind}" is unknown; kinds are ${KINDS.join(", ")}`);
  }
  const key = `${prefix} ${JSON.stringify(spec)}`;
  const svg = drawn.get(key) ?? (await draw(spec, prefix));
  if (!drawn.has(key) && drawn.size >= KEPT) drawn.clear();
  drawn.set(key, svg);
  return svg;
}

/** Internal forces of a frame too large for one page are drawn on one per quantity; every other figure is one drawing. */
export async function drawFigureParts(
  spec: { readonly kind: string },
  prefix: string,
): Promise<readonly string[]> {
  const whole = await drawFigureSpec(spec, prefix);
  if (!isFigureSpec(spec) || spec.kind !== "diagrams" || spec.quantities.length < 2 || !isLarge(whole))
    return [whole];
  return spec.quantities.map((quantity) =>
    drawSketch(
      { ...spec, title: `${spec.title}: ${quantity}`, quantities: [quantity] },
      `${prefix}-${quantity}`,
    ),
  );
}

/** Height in px above which a drawing would be shrunk to fit a printed page. */
const TALL = 900;

const isLarge = (svg: string): boolean => Number(/ height="([\d.]+)"/.exec(svg)?.[1]) > TALL;
