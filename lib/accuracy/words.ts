// Words for bands, in one place; what they do not cover is always said.

import type { Spread } from "./band.ts";
import type { Unknown } from "./unknowns.ts";

/** What no band covers. */
export const notVaried = "loads, geometry, cracking and second order not varied";

/** What a band covers and what it does not. */
export const covers: string = `of the stiffnesses tried; ${notVaried}`;

/** One sentence for a band; numbers of a difference in N or N·m. */
export function bandWords(measure: "ratio" | "difference", s: Spread): string {
  const times = measure === "ratio";
  const show = (x: number): string => String(Number(x.toPrecision(times ? 3 : 4)));
  const what = times ? "true / hand" : "true less hand";
  return `${what}: 90 % between ${show(s.low)} and ${show(s.high)}, least ${show(s.least)}, greatest ${show(s.greatest)}, middle ${show(s.middle)}, ${covers}`;
}

/** Laws of single unknowns, for a table. */
export const laws = {
  multiple: "at an end of its range, or anywhere within, even in ratio",
  fixity: "at an end of its range, or anywhere within, even",
} as const;

/** What was varied and by which law, in one sentence. */
export function unknownWords(
  unknowns: readonly Unknown[],
  samples: number,
  atEnds: number,
  allCorners: boolean,
): string {
  if (unknowns.length === 0) return `nothing varied: stiffnesses and bases as given; ${covers}`;
  const each = unknowns.map(({ name, kind, least, most, ratio }) => {
    const nominal = ratio?.nominal ?? 1;
    const range = least === most ? short(least) : `${short(nominal * least)} to ${short(nominal * most)}`;
    return `${name} ${range}${kind === "fixity" || ratio !== undefined ? "" : " times nominal"}`;
  });
  if (unknowns.every((u) => u.least === u.most)) return `nothing varied: ${each.join(", ")}; ${covers}`;
  const corners = allCorners
    ? "all combinations of ends solved for least and greatest"
    : "combinations of ends sought for least and greatest of each result";
  return `${each.join(", ")}; of ${samples} frames tried ${atEnds} take every unknown at one end or the other of its range, the others anywhere within it (multiples even in ratio, fixities even); ${corners}; ${covers}`;
}

function short(x: number): string {
  return String(Number(x.toPrecision(3)));
}
