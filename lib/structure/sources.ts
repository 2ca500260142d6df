// Where values came from: opaque marks carried along.

import type { Sources } from "./types.ts";

/** The marks of all values, each once, in order of first appearance; frozen. */
export function mergeSources(...lists: readonly Sources[]): Sources {
  return Object.freeze([...new Set(lists.flat())]);
}
