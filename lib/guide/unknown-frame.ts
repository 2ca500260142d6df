// A frame with what is not known of it: nominal sections where it has none, and the ranges of its unknowns.

import { type StatedText, statedUnknowns, type UnknownRow, type Unknowns } from "../accuracy/index.ts";
import type { Structure } from "../structure/types.ts";

export interface UnknownFrame {
  /** The frame with a section for every member. */
  readonly structure: Structure;
  readonly unknowns: Unknowns;
  readonly rows: readonly UnknownRow[];
  /** The nominal ratios, one line per group of members. */
  readonly nominal: readonly string[];
  readonly sizesKnown: boolean;
}

/** What a statement means for a frame. Throws on what cannot be read, and where only some members have a section. */
export function unknownFrame(frame: Structure, stated: StatedText): UnknownFrame {
  const { structure, unknowns, rows, nominal, sizesKnown } = statedUnknowns(frame, stated);
  return { structure, unknowns, rows, nominal, sizesKnown };
}
