// Ratios stated between parts hang together in chains: roof over beams, beams over columns. What follows for each part.

import { AccuracyError } from "./faults.ts";
import type { Part } from "./parts.ts";
import type { RatioRange } from "./stated-range.ts";

/** What is stated of I, or of A, of one part: by itself, or as a ratio to another part. Parts are counted. */
export interface Claim extends RatioRange {
  readonly key: string;
  readonly part: number;
  readonly over?: number;
}

/** A part with what is stated of it, and the parts whose ratio to it, or to one of those, is stated. */
export interface Link {
  readonly claim?: Claim;
  readonly along: readonly number[];
}

/** One link per part. Throws on a part stated twice and on ratios that lead in a circle. */
export function linksOf(parts: readonly Part[], claims: readonly Claim[], kind: "I" | "A"): readonly Link[] {
  const byPart = new Map<number, Claim>();
  for (const claim of claims) {
    const other = byPart.get(claim.part);
    if (other !== undefined)
      throw new AccuracyError({
        kind: "stated twice",
        what: `${kind} of ${parts[claim.part]?.name}`,
        keys: [other.key, claim.key],
      });
    byPart.set(claim.part, claim);
  }
  const along = parts.map((): number[] => []);
  for (const { part } of claims) for (const above of chainFrom(byPart, part)) along[above]?.push(part);
  return parts.map((_, i): Link => {
    const claim = byPart.get(i);
    return { ...(claim === undefined ? {} : { claim }), along: along[i] ?? [] };
  });
}

/** The parts a part's ratios lead to, nearest first. */
export function chainFrom(byPart: ReadonlyMap<number, Claim>, part: number): readonly number[] {
  const chain: number[] = [];
  const keys: string[] = [];
  for (let at = byPart.get(part); at?.over !== undefined; at = byPart.get(at.over)) {
    keys.push(at.key);
    if (at.over === part || chain.includes(at.over)) throw new AccuracyError({ kind: "in a circle", keys });
    chain.push(at.over);
  }
  return chain;
}
