// Words for bands, in one place; what they do not cover is always said.

import type { Spread } from "./band.ts";
import type { Unknown } from "./unknowns.ts";

/** What a band covers and what it does not. */
export const covers = "of the stiffnesses tried; loads, geometry, cracking and second order not varied";

/** One sentence for a band; numbers of a difference in N or N·m. */
export function bandWords(measure: "ratio" | "difference", s: Spread): string {
  const times = measure === "ratio";
  const show = (x: number): string => String(Number(x.toPrecision(times ? 3 : 4)));
  const what = times ? "true / hand" : "true less hand";
  return `${what}: 90 % between ${show(s.low)} and ${show(s.high)}, least ${show(s.least)}, greatest ${show(s.greatest)}, middle ${show(s.middle)}, ${covers}`;
}

/** What was varied, in one sentence. */
export function unknownWords(unknowns: readonly Unknown[], samples: number, allCorners: boolean): string {
  if (unknowns.length === 0) return `nothing varied: stiffnesses and bases as given; ${covers}`;
  const each = unknowns.map(({ name, kind, least, most }) => {
    const range = `${short(least)} to ${short(most)}`;
    return kind === "fixity" ? `${name} ${range} (even)` : `${name} ${range} times nominal (even in ratio)`;
  });
  return `${each.join(", ")}; ${samples} frames tried and ${allCorners ? "all corners" : "corners"} of these ranges; ${covers}`;
}

function short(x: number): string {
  return String(Number(x.toPrecision(3)));
}
