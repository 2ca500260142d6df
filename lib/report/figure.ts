// The one place where a figure of a record becomes SVG.

import { drawLineChart, drawSketch, type FigureSpec } from "../drawing/index.ts";

const KINDS: readonly FigureSpec["kind"][] = [
  "structure",
  "mechanism",
  "free body",
  "diagrams",
  "line chart",
];

const isFigureSpec = (spec: { readonly kind: string }): spec is FigureSpec =>
  (KINDS as readonly string[]).includes(spec.kind);

/** A figure as one SVG element; every id in it starts with `prefix`. Throws on an unknown kind, naming those there are. */
export async function drawFigureSpec(spec: { readonly kind: string }, prefix: string): Promise<string> {
  if (!isFigureSpec(spec)) {
    throw new Error(`figure kind "${spec.kind}" is unknown; kinds are ${KINDS.join(", ")}`);
  }
  return spec.kind === "line chart" ? drawLineChart(spec, prefix) : drawSketch(spec, prefix);
}
