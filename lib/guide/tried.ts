// What was tried for the bands of a frame, in words: what the engineer stated, what was taken by default, or nothing.

import { covers, notVaried } from "../accuracy/index.ts";
import type { Taken } from "./band-book.ts";
import { and } from "./words.ts";

export interface Tried {
  /** Only one frame, nothing that matters being unknown. */
  readonly single: boolean;
  readonly words: string;
}

/** What the bands of a frame stand for. */
export function triedOf(taken: Taken): Tried {
  if ("none" in taken) return { single: false, words: covers };
  const { unknown, byDefault, about } = taken;
  const { rows, sizesKnown } = unknown;
  const varied = rows.filter(({ least, most }) => least !== most);
  if (varied.length === 0) {
    const as =
      byDefault !== true
        ? "stiffnesses as stated"
        : sizesKnown
          ? "sections as given"
          : "one section throughout";
    const words = `not varied: ${as}; settlements and sections that change along a member not tried; ${notVaried}`;
    return { single: true, words };
  }
  if (byDefault !== true) return { single: false, words: covers };
  const factors = varied.map(({ nominal, most }) => Number((most / nominal).toPrecision(3)));
  const within = and([...new Set(factors)].map(String));
  const nominal = sizesKnown
    ? "sections as given"
    : about === undefined
      ? "nominal ratios of I all 1"
      : `nominal ratios of I as the hinges under ${about} were placed by`;
  return {
    single: false,
    words: `of the stiffnesses tried; what is not known was not stated: by default ${nominal}, each within a factor of ${within}; ${notVaried}`,
  };
}
