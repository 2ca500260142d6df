// The results of a hand that tell it all: forces at member ends, moments where they are greatest and least between, reactions.

import type { Wanted } from "../accuracy/index.ts";
import { type Quantity, quantity } from "../quantity/index.ts";
import { memberNamed } from "../structure/index.ts";
import { innerExtremes } from "./inner-extremes.ts";
import { originOf } from "./origin.ts";
import type { Hand, Spot } from "./types.ts";
import { lengthText } from "./words.ts";

export interface HandResult {
  readonly what: string;
  readonly value: Quantity;
  readonly wanted: Wanted;
}

const questions = [
  ["N", "axial"],
  ["V", "shear"],
  ["M", "moment"],
] as const;

/** All of them, member by member, then the reactions. */
export function handResults(hand: Hand): readonly HandResult[] {
  return [...hand.members.flatMap(({ member }) => ofMember(hand, member)), ...ofSupports(hand)];
}

function ofMember(hand: Hand, member: string): readonly HandResult[] {
  const { start, end } = memberNamed(hand.frame, member, "member");
  const forces = hand.members.find((one) => one.member === member);
  const inner = forces === undefined ? [] : innerExtremes(forces, "M");
  const ends = [start, end].flatMap((joint) =>
    questions.map(([force, ask]) =>
      named(`${force} of ${member} at ${joint}`, hand[ask](member, { at: joint })),
    ),
  );
  const between = inner.map(({ x }) => {
    const at: Spot = quantity(x, "length");
    return named(`M of ${member}, ${lengthText(x)} from ${start}`, hand.moment(member, { at }));
  });
  return [...ends.slice(0, 3), ...between, ...ends.slice(3)];
}

function ofSupports(hand: Hand): readonly HandResult[] {
  return hand.frame.supports.flatMap(({ joint, kind, holds }) =>
    kind === "free"
      ? []
      : [
          ...(holds.x ? [named(`reaction at ${joint}, to the right`, hand.reaction(joint, "x"))] : []),
          ...(holds.y ? [named(`reaction at ${joint}, up`, hand.reaction(joint, "y"))] : []),
          ...(holds.rotation
            ? [named(`reaction at ${joint}, moment counter-clockwise`, hand.reaction(joint, "moment"))]
            : []),
        ],
  );
}

function named(what: string, value: Quantity): HandResult {
  const known = originOf(value);
  if (known === undefined) throw new Error(`${what} is no hand result`);
  return { what, value, wanted: known.origin.wanted };
}
