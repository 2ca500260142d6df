// How what a verb answers shows itself in a notebook: a sketch beside its text alternative.

import { drawSketch, type SketchSpec } from "../drawing/index.ts";

/** MIME type -> content, as notebooks show it. */
export type Bundle = Readonly<Record<string, string>>;

const displaySymbol: unique symbol = Symbol.for("Jupyter.display") as never;

/** The data frozen, showing itself in a notebook by `bundle`, which is made only when asked for. */
export function shownAs<T extends object>(data: T, bundle: () => Bundle): T {
  const copy = (Array.isArray(data) ? [...data] : { ...data }) as T;
  return Object.freeze(Object.defineProperty(copy, displaySymbol, { value: bundle }));
}

/** A prefix for a figure's ids, the same for the same figure: a notebook page holds many. FNV-1a over its data. */
export function figurePrefix(spec: object): string {
  let hash = 0x811c9dc5;
  for (const character of JSON.stringify(spec))
    hash = Math.imul(hash ^ (character.codePointAt(0) ?? 0), 0x01000193) >>> 0;
  return `f${hash.toString(36)}`;
}

/** A sketch with its words for readers and front ends without pictures. */
export function sketchBundle(spec: SketchSpec, text: string): Bundle {
  return { "image/svg+xml": drawSketch(spec, figurePrefix(spec)), "text/plain": text };
}
