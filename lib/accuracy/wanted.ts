// Which results of a solved frame are wanted, and reading them without making anything.

import type { Prepared, Solved, Stiffness } from "../exact/index.ts";
import type { Side } from "../results/index.ts";
import { axisOf, memberNamed } from "../structure/index.ts";
import { AccuracyError } from "./faults.ts";
import { extremeIn, memberPieces, type Piece, pieceHolding, valueIn } from "./member-pieces.ts";

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

/** A wanted result made ready: what to read of end forces `F`, or of displacements and what is left over at them. */
export type Reading =
  | {
      readonly kind: "place";
      readonly loadCase: number;
      readonly force: "N" | "V" | "M";
      readonly piece: Piece;
      readonly s: number;
    }
  | {
      readonly kind: "extreme";
      readonly loadCase: number;
      readonly force: "N" | "V" | "M";
      readonly pieces: readonly Piece[];
      readonly sense: 1 | -1;
    }
  | { readonly kind: "reaction"; readonly loadCase: number; readonly terms: readonly Term[] };

/** Part of a reaction: factor times the force at a displacement, which is held or has a spring. */
interface Term {
  readonly place: number;
  readonly spring: number;
  readonly factor: number;
  readonly ground: number;
}

/** Makes a wanted result of one load case ready. Throws where there is no such thing. */
export function readingOf(prepared: Prepared, wanted: Wanted, loadCase: number): Reading {
  const count = prepared.cases.length;
  if (!Number.isInteger(loadCase) || loadCase < 0 || loadCase >= count)
    throw new AccuracyError({ kind: "no such case", value: wordsFor(wanted), loadCase, count });
  if (!("member" in wanted))
    return { kind: "reaction", loadCase, terms: reactionTerms(prepared, wanted, loadCase) };
  const { member, force, at } = wanted;
  const { length } = axisOf(prepared.structure, memberNamed(prepared.structure, member, "the hand value"));
  const pieces = memberPieces(prepared, loadCase, member);
  if (typeof at !== "number")
    return { kind: "extreme", loadCase, force, pieces, sense: at === "greatest" ? 1 : -1 };
  if (!(at >= -1e-9 * length && at <= (1 + 1e-9) * length))
    throw new AccuracyError({ kind: "outside", member, at, length });
  const piece = pieces[pieceHolding(pieces, at, wanted.side ?? "right")];
  if (piece === undefined) throw new Error(`member "${member}" has no pieces`);
  return { kind: "place", loadCase, force, piece, s: Math.min(Math.max(at - piece.begin, 0), piece.length) };
}

function reactionTerms(
  prepared: Prepared,
  { joint, reaction }: WantedReaction,
  loadCase: number,
): readonly Term[] {
  const { structure, numbering, springs, loadCases } = prepared;
  const support = structure.supports.find((s) => s.joint === joint);
  const node = numbering.node.get(joint) ?? -1;
  const [c, s] = [numbering.axes[2 * node] ?? 1, numbering.axes[2 * node + 1] ?? 0];
  const factors = { x: [c, -s, 0], y: [s, c, 0], moment: [0, 0, 1] }[reaction];
  const terms = (["x", "y", "rotation"] as const).flatMap((axis, k): Term[] => {
    const factor = factors[k] ?? 0;
    const active = support?.holds[axis] === true || support?.springs?.[axis] !== undefined;
    if (support === undefined || !active || Math.abs(factor) < 1e-12) return [];
    const place = numbering.places[3 * node + k] ?? -1;
    const spring = springs.findIndex((p) => p.place === place);
    return [{ place, spring, factor, ground: loadCases[loadCase]?.ground?.[place] ?? 0 }];
  });
  if (terms.length === 0) throw new AccuracyError({ kind: "no reaction", joint, component: reaction });
  return terms;
}

/** Reads a result of a solved frame; `F` are the end forces of its load case. */
export function read(reading: Reading, F: Float64Array, solved: Solved, { springs }: Stiffness): number {
  if (reading.kind === "place") return valueIn(reading.piece, reading.force, F, reading.s);
  if (reading.kind === "extreme") return extremeIn(reading.pieces, reading.force, F, reading.sense);
  const found = solved.cases[reading.loadCase];
  if (found === undefined) return Number.NaN;
  let sum = 0;
  for (let i = 0; i < reading.terms.length; i++) {
    const { place, spring, factor, ground } = reading.terms[i] as Term; // i is within the length
    sum -=
      factor *
      (spring < 0 ? (found.r[place] ?? 0) : (springs[spring] ?? 0) * ((found.u[place] ?? 0) - ground));
  }
  return sum;
}
