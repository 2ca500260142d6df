// How what a verb answers shows itself in a notebook: a sketch beside its text alternative.

import { drawSketch, type SketchSpec } from "../drawing/index.ts";

/** MIME type -> content, as notebooks show it. */
export type Bundle = Readonly<Record<string, string>>;

const displaySymbol: unique symbol = Symbol.for("Jupyter.display") as never;

/** The data frozen, showing itself in a notebook by `bundle`, which is made only when asked for. */
export function shownAs<T extends object>(data: T, bundle: () => Bundle): T {
  return Object.freeze(Object.defineProperty({ ...data }, displaySymbol, { value: bundle }));
}

/** A sketch with its words for readers and front ends without pictures. */
export function sketchBundle(spec: SketchSpec, text: string): Bundle {
  return { "image/svg+xml": drawSketch(spec, "f"), "text/plain": text };
}
