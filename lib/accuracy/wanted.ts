// Which results of a solved frame are wanted, and reading them from its state without making anything.

import type { Side } from "../results/index.ts";
import { axisOf, memberNamed } from "../structure/index.ts";
import { AccuracyError } from "./faults.ts";
import { extremeIn, type Piece, pieceHolding, valueIn } from "./member-pieces.ts";
import type { Varied } from "./varied.ts";

/** A force in a member, `at` metres from its start or its greatest or least value along it (N, V, M with signs as in results);
 *  where it jumps, the value on the `side` asked for, otherwise the right (the left at the member's end). */
export interface WantedForce {
  readonly member: string;
  readonly force: "N" | "V" | "M";
  readonly at: number | "greatest" | "least";
  readonly side?: Side;
}

/** A component of a reaction on the structure: x to the right, y up, moment counter-clockwise. */
export interface WantedReaction {
  readonly joint: string;
  readonly reaction: "x" | "y" | "moment";
}

export type Wanted = WantedForce | WantedReaction;

/** What a wanted result is measured in: axial forces, shears and reactions, moments each have their own scale. */
export type Scale = "N" | "V" | "M";

export function scaleOf(wanted: Wanted): Scale {
  if ("member" in wanted) return wanted.force;
  return wanted.reaction === "moment" ? "M" : "V";
}

/** Words for a wanted result: "M of BC at 2.5 m", "greatest M of BC", "reaction A_x". */
export function wordsFor(wanted: Wanted): string {
  if (!("member" in wanted))
    return `reaction ${wanted.joint}_${wanted.reaction === "moment" ? "M" : wanted.reaction}`;
  const { member, force, at } = wanted;
  return typeof at === "number"
    ? `${force} of ${member} at ${Number(at.toPrecision(4))} m`
    : `${at} ${force} of ${member}`;
}

/** A wanted result made ready: what to read of a state. */
export type Reading =
  | { readonly kind: "place"; readonly force: "N" | "V" | "M"; readonly piece: Piece; readonly s: number }
  | {
      readonly kind: "extreme";
      readonly force: "N" | "V" | "M";
      readonly pieces: readonly Piece[];
      readonly sense: 1 | -1;
    }
  | { readonly kind: "reaction"; readonly terms: readonly Term[] };

/** Part of a reaction: factor times a number of the state. */
interface Term {
  readonly at: number;
  readonly factor: number;
}

/** Makes a wanted result ready; `piecesOf` gives the pieces of a member under the load in question. Throws where there is no
 *  such thing. */
export function readingOf(
  varied: Varied,
  wanted: Wanted,
  piecesOf: (member: string) => readonly Piece[],
): Reading {
  if (!("member" in wanted)) return { kind: "reaction", terms: reactionTerms(varied, wanted) };
  const { structure } = varied.prepared;
  const { member, force, at } = wanted;
  const { length } = axisOf(structure, memberNamed(structure, member, "the hand value"));
  const pieces = piecesOf(member);
  if (typeof at !== "number") return { kind: "extreme", force, pieces, sense: at === "greatest" ? 1 : -1 };
  if (!(at >= -1e-9 * length && at <= (1 + 1e-9) * length))
    throw new AccuracyError({ kind: "outside", member, at, length });
  const piece = pieces[pieceHolding(pieces, at, wanted.side ?? "right")];
  if (piece === undefined) throw new Error(`member "${member}" has no pieces`);
  return { kind: "place", force, piece, s: Math.min(Math.max(at - piece.begin, 0), piece.length) };
}

function reactionTerms(
  { prepared, supports, size }: Varied,
  { joint, reaction }: WantedReaction,
): readonly Term[] {
  const { numbering } = prepared;
  const node = numbering.node.get(joint) ?? -1;
  const [c, s] = [numbering.axes[2 * node] ?? 1, numbering.axes[2 * node + 1] ?? 0];
  const factors = { x: [c, -s, 0], y: [s, c, 0], moment: [0, 0, 1] }[reaction];
  const first = size - supports.length;
  const terms = supports.flatMap((place, k): Term[] => {
    const factor = place.joint === joint ? (factors[place.axis] ?? 0) : 0;
    return Math.abs(factor) < 1e-12 ? [] : [{ at: first + k, factor }];
  });
  if (terms.length === 0) throw new AccuracyError({ kind: "no reaction", joint, component: reaction });
  return terms;
}

/** Reads a result from a state that stands in `states` from `begin` on. */
export function read(reading: Reading, states: Float64Array, begin = 0): number {
  if (reading.kind === "place") return valueIn(reading.piece, reading.force, states, reading.s, begin);
  if (reading.kind === "extreme")
    return extremeIn(reading.pieces, reading.force, states, reading.sense, begin);
  let sum = 0;
  for (let i = 0; i < reading.terms.length; i++) {
    const { at, factor } = reading.terms[i] as Term; // i is within the length
    sum += factor * (states[begin + at] ?? 0);
  }
  return sum;
}
