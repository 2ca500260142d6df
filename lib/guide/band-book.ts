// The bands of a sheet: what is taken as unknown of each frame, and the band of any hand result asked for.

import type { Band, Wanted } from "../accuracy/index.ts";
import type { Quantity } from "../quantity/index.ts";
import type { ResultBand } from "../sheet/index.ts";
import { mergeSources } from "../structure/index.ts";
import type { Structure } from "../structure/types.ts";
import { actualLoads } from "./actual-loads.ts";
import { type Origin, originOf } from "./origin.ts";
import { shownBand } from "./shown-band.ts";
import { geometrySources, loadSources } from "./sources.ts";
import { triedOf } from "./tried.ts";
import { truthOf } from "./truth.ts";
import type { Hand, HingeSet } from "./types.ts";
import type { UnknownFrame } from "./unknown-frame.ts";

/** What is taken as unknown of a frame: the entry that says so, and what it means for the frame in hand; or why no band is
 *  worked out for it. */
export type Taken =
  | {
      readonly use: string;
      readonly unknown: UnknownFrame;
      /** Nobody stated any of it; the set it starts from, where hinges of that were placed by ratios. */
      readonly byDefault?: true;
      readonly about?: string;
    }
  | { readonly none: string };

export interface BandBook {
  /** What is taken of a frame; recorded by default where nothing was stated, about the ratios `sets` were placed by. */
  taken(frame: Structure, sets: readonly HingeSet[]): Taken;
  /** The bands of values, in order; undefined for those that are no hand results, and where the frame has none. */
  of(values: readonly Quantity[]): readonly (ResultBand | undefined)[];
  /** The bands of results of one hand as accuracy gives them, SI; undefined where the frame has none. */
  raw(
    hand: Hand,
    asked: readonly { readonly wanted: Wanted; readonly value: number }[],
  ): readonly Band[] | undefined;
  /** What the bands of a hand stand on, what is stated as unknown first. */
  uses(hand: Hand): readonly string[];
}

/** The bands of one sheet. `taken` says what is unknown of a frame. */
export function bandBook(taken: BandBook["taken"]): BandBook {
  const takenOf = ({ frame, solved }: Hand): Taken =>
    taken(
      frame,
      solved.map(({ set }) => set),
    );
  const uses = (hand: Hand): readonly string[] => {
    const found = takenOf(hand);
    const sections = hand.frame.members.flatMap(({ section, from }) => (section === undefined ? [] : [from]));
    return "none" in found
      ? []
      : mergeSources(
          [found.use],
          geometrySources(hand.frame),
          loadSources(actualLoads(hand.solved.map(({ set }) => set))),
          ...sections,
        );
  };
  const raw: BandBook["raw"] = (hand, asked) => {
    const found = takenOf(hand);
    return "none" in found ? undefined : truthOf(hand, found.unknown).bandsOf(asked);
  };
  const ofHand = (group: readonly Known[]): readonly (ResultBand | undefined)[] => {
    const hand = group[0]?.origin.hand;
    if (hand === undefined) return [];
    const found = raw(
      hand,
      group.map(({ origin, handValue }) => ({ wanted: origin.wanted, value: handValue.si })),
    );
    const on = uses(hand);
    const tried = triedOf(takenOf(hand));
    return group.map(({ value, factor }, i) => {
      const band = found?.[i];
      return band === undefined
        ? undefined
        : shownBand(band, value, factor, { members: hand.members, uses: on, tried });
    });
  };
  const of: BandBook["of"] = (values) => {
    const known = values.map(knownOf);
    const results = known.filter((one) => one !== undefined);
    const hands = [...new Set(results.map(({ origin }) => origin.hand.solved))];
    const bands = hands.flatMap((solved) => {
      const group = results.filter(({ origin }) => origin.hand.solved === solved);
      const found = ofHand(group);
      return group.map((one, i) => [one, found[i]] as const);
    });
    const byResult = new Map(bands);
    return known.map((one) => (one === undefined ? undefined : byResult.get(one)));
  };
  return Object.freeze({ taken, of, raw, uses });
}

interface Known {
  readonly value: Quantity;
  readonly origin: Origin;
  readonly handValue: Quantity;
  readonly factor: number;
}

function knownOf(value: Quantity): Known | undefined {
  const found = originOf(value);
  return found === undefined
    ? undefined
    : { value, origin: found.origin, handValue: found.hand, factor: found.factor };
}
