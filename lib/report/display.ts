// Figures shown in a notebook: SVG with words beside it, for front ends that show no pictures.

import type { FigureSpec } from "../drawing/index.ts";
import { drawFigureSpec } from "./figure.ts";

/** What a notebook front end chooses from: content by media type. */
export type MediaBundle = Readonly<Record<string, string>>;

const words = (spec: FigureSpec): string => `${spec.title}\n${spec.description}`;

/** One figure, or several under one another, as a media bundle. `prefix` starts the ids; give figures on one page
 *  different ones. */
export async function figureBundle(
  specs: FigureSpec | readonly FigureSpec[],
  prefix: string,
): Promise<MediaBundle> {
  const list = Array.isArray(specs) ? (specs as readonly FigureSpec[]) : [specs as FigureSpec];
  const drawn = await Promise.all(
    list.map((spec, i) => drawFigureSpec(spec, list.length === 1 ? prefix : `${prefix}-${i + 1}`)),
  );
  const plain = list.map(words).join("\n\n");
  const [only] = drawn;
  return drawn.length === 1 && only !== undefined
    ? { "image/svg+xml": only, "text/plain": plain }
    : { "text/html": drawn.map((svg) => `<div>${svg}</div>`).join("\n"), "text/plain": plain };
}

/** A value that a notebook shows as the figure: its display is drawn when asked for. */
export function figureDisplay(
  specs: FigureSpec | readonly FigureSpec[],
  prefix: string,
): { readonly [display: symbol]: () => Promise<MediaBundle> } {
  return Object.freeze({ [Symbol.for("Jupyter.display")]: () => figureBundle(specs, prefix) });
}
