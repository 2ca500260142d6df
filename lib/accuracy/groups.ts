// Results wanted, by the sum of load cases they belong to, so that each sum is made once per frame.

import type { WantedInCase } from "./asked.ts";
import { type Combination, combinationOf, summed } from "./combination.ts";
import { memberPieces, type Piece } from "./member-pieces.ts";
import type { Varied } from "./varied.ts";
import { type Reading, read, readingOf, wordsFor } from "./wanted.ts";

/** Results of one sum of load cases, each with its place in the question. */
export interface Group {
  readonly combination: Combination;
  readonly readings: readonly Reading[];
  readonly places: readonly number[];
}

/** Pieces of members by combination and member, kept from question to question. */
export type PieceStore = Map<string, readonly Piece[]>;

/** Makes results wanted ready to be read. Throws where there is no such result or no such load case. */
export function groupsOf(
  varied: Varied,
  wanted: readonly WantedInCase[],
  kept: PieceStore = new Map(),
): readonly Group[] {
  const { cases } = varied.prepared;
  const groups = new Map<
    string,
    { readonly combination: Combination; readonly readings: Reading[]; readonly places: number[] }
  >();
  wanted.forEach((asked, place) => {
    const combination = combinationOf(cases, asked, wordsFor(asked.wanted));
    const group = groups.get(combination.key) ?? { combination, readings: [], places: [] };
    groups.set(combination.key, group);
    const pieces = (member: string): readonly Piece[] => piecesOf(varied, group.combination, member, kept);
    group.readings.push(readingOf(varied, asked.wanted, pieces));
    group.places.push(place);
  });
  return [...groups.values()];
}

function piecesOf(
  { prepared }: Varied,
  { key, loads }: Combination,
  member: string,
  kept: PieceStore,
): readonly Piece[] {
  const name = `${key} ${member}`;
  const found = kept.get(name) ?? memberPieces(prepared, loads, member);
  kept.set(name, found);
  return found;
}

/** Reads all groups from states of one solved frame, which stand in `states` from `begin` on, `size` numbers per load case. The
 *  result at place k of the question goes to `out` at `into + k stride`; `room` holds at least one state. */
export function readGroups(
  groups: readonly Group[],
  size: number,
  states: Float64Array,
  begin: number,
  room: Float64Array,
  out: Float64Array,
  into = 0,
  stride = 1,
): void {
  for (let g = 0; g < groups.length; g++) {
    const { combination, readings, places } = groups[g] as Group; // g is within the length
    const [state, from] = summed(combination, states, begin, size, room);
    for (let k = 0; k < readings.length; k++)
      out[into + (places[k] as number) * stride] = read(readings[k] as Reading, state, from); // k is within both
  }
}

/** The largest N, V and M in size along all members: what a value is small against. `states` are those of one solved frame. */
export function largestForces(
  varied: Varied,
  combination: Combination,
  states: Float64Array,
  room: Float64Array,
  kept: PieceStore,
): Readonly<Record<"N" | "V" | "M", number>> {
  const [state, begin] = summed(combination, states, 0, varied.size, room);
  const largest = { N: 0, V: 0, M: 0 };
  for (const { name } of varied.prepared.structure.members) {
    const pieces = piecesOf(varied, combination, name, kept);
    for (const force of ["N", "V", "M"] as const)
      for (const sense of [1, -1] as const) {
        const value = read({ kind: "extreme", force, pieces, sense }, state, begin);
        largest[force] = Math.max(largest[force], Math.abs(value));
      }
  }
  return Object.freeze(largest);
}
