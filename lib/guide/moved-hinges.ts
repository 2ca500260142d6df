// Hinges moved through the range of the isolated span, and the set solved anew by statics.

import { balance, StaticsError } from "../statics/index.ts";
import { axisOf, calledBy, memberNamed } from "../structure/index.ts";
import type { Hinge, Structure } from "../structure/types.ts";
import { solvedLoads } from "./actual-loads.ts";
import { solvedQuietly } from "./free-bodies.ts";
import { withHingeAt } from "./hinge-at.ts";
import { endsOf, judge } from "./hinge-ranges.ts";
import type { HingeSet, SolvedSet } from "./types.ts";
import { and, counted, spanPart } from "./words.ts";

/** A hinge, with the twins it moves together with, and the set solved with them at the two ends of the range; or why not. */
export interface HingeMove {
  readonly set: HingeSet;
  /** "hinge h1", "hinges h1 and h2 together". */
  readonly cause: string;
  readonly hinges: readonly Hinge[];
  /** "0 to 0.211 L from B and C". */
  readonly range: string;
  readonly solved: { readonly least: SolvedSet; readonly greatest: SolvedSet } | { readonly none: string };
}

/** Of a set with more hinges than this those in beams move together, and those in columns. */
const mostAlone = 8;

/** Every hinge of a set through its range, the others staying; twins of a set that a single move would leave unbalanced move
 *  together, and in sets of many hinges all that lie in beams, and all in columns. Each hinge is named once. */
export function hingeMoves(set: HingeSet): readonly HingeMove[] {
  const own = ownHinges(set);
  if (own.length > mostAlone) return movesByKind(set, own);
  const moves: HingeMove[] = [];
  const done = new Set<string>();
  for (const hinge of own) {
    if (done.has(hinge.name)) continue;
    const move = moveOf(set, hinge);
    for (const { name } of move.hinges) done.add(name);
    moves.push(move);
  }
  return moves;
}

function movesByKind(set: HingeSet, own: readonly Hinge[]): readonly HingeMove[] {
  return (["beam", "column", "member"] as const).flatMap((kind): readonly HingeMove[] => {
    const group = own
      .filter(({ member }) => kindOf(set.frame, member) === kind)
      .flatMap((hinge) => ranged(set, hinge) ?? []);
    if (group.length === 0) return [];
    const hinges = group.map(({ hinge }) => hinge);
    return [
      {
        set,
        cause: `the ${counted(group.length, "hinge")} in ${kind}s that ${group.length === 1 ? "has" : "have"} a range, together`,
        hinges,
        range: "each through its own",
        solved: isMovable(set, group) ? solvedAtEnds(set, group) : unbalanced,
      },
    ];
  });
}

const kindOf = (frame: Structure, member: string): string =>
  calledBy(axisOf(frame, memberNamed(frame, member, "hinge")));

/** The hinges that were chosen, without those the frame has itself. */
function ownHinges({ hinged, frame }: HingeSet): readonly Hinge[] {
  const given = new Set(frame.hinges.map(({ name }) => name));
  return hinged.hinges.filter(({ name }) => !given.has(name));
}

interface Ranged {
  readonly hinge: Hinge;
  /** The end it is judged from, and the range there, m. */
  readonly from: string;
  readonly distance: number;
  readonly length: number;
  readonly least: number;
  readonly most: number;
}

function ranged({ frame, cases }: HingeSet, hinge: Hinge): Ranged | undefined {
  const found = judge(
    frame,
    cases.flatMap(({ loads }) => loads),
    hinge,
  );
  if (found?.range === undefined) return undefined;
  const { from, distance, length, range } = found;
  return { hinge, from, distance, length, least: range.least, most: range.most };
}

function moveOf(set: HingeSet, hinge: Hinge): HingeMove {
  const own = ranged(set, hinge);
  const about = (hinges: readonly Hinge[], range: string): Omit<HingeMove, "solved"> => ({
    set,
    cause:
      hinges.length === 1
        ? `hinge ${hinges[0]?.name}`
        : `hinges ${and(hinges.map(({ name }) => name))} together`,
    hinges,
    range,
  });
  if (own === undefined)
    return {
      ...about([hinge], "no range"),
      solved: { none: "its own loads give no range to move it through" },
    };
  const twins = ownHinges(set)
    .filter(({ name }) => name !== hinge.name)
    .flatMap((other) => ranged(set, other) ?? [])
    .filter((other) => isAlike(own, other));
  const tries = [[own], ...twins.map((twin) => [own, twin]), [own, ...twins]];
  const moved = tries.find((group) => isMovable(set, group));
  const group = moved ?? [own];
  const range = `${part(own.least / own.length)} to ${part(own.most / own.length)} from ${and(group.map(({ from }) => from))}`;
  const hinges = group.map((one) => one.hinge);
  if (moved === undefined) return { ...about(hinges, range), solved: unbalanced };
  return { ...about(hinges, range), solved: solvedAtEnds(set, group) };
}

function solvedAtEnds(set: HingeSet, group: readonly Ranged[]): HingeMove["solved"] {
  try {
    const [least, greatest] = [movedTo(set, group, 0), movedTo(set, group, 1)].map(solvedQuietly);
    if (least !== undefined && greatest !== undefined) return { least, greatest };
  } catch (error) {
    if (!(error instanceof StaticsError)) throw error;
    return { none: error.message };
  }
  return { none: "not solved" };
}

const part = (share: number): string => (share === 0 ? "0" : spanPart(share));

/** Equally far from the ends they are judged from, in members of equal length. */
function isAlike(one: Ranged, other: Ranged): boolean {
  const near = 1e-6 * one.length;
  return (
    Math.abs(one.length - other.length) <= near &&
    Math.abs(one.distance - other.distance) <= near &&
    Math.abs(one.least - other.least) <= near &&
    Math.abs(one.most - other.most) <= near
  );
}

const unbalanced = { none: "moved so, the hinges no longer balance the load" };

/** Whether the load is balanced at both ends of the range. */
function isMovable(set: HingeSet, group: readonly Ranged[]): boolean {
  return [0, 1].every((end) => balance(movedTo(set, group, end).hinged, solvedLoads(set)).balanced);
}

/** The set with hinges at the least (end 0) or greatest (end 1) of their ranges. */
function movedTo(set: HingeSet, group: readonly Ranged[], end: number): HingeSet {
  const hinged = group.reduce((structure, one) => {
    const distance = end === 0 ? one.least : one.most;
    const { start } = endsOf(structure, one.hinge.member);
    return withHingeAt(structure, one.hinge, one.from === start ? distance : one.length - distance);
  }, set.hinged);
  return { ...set, hinged };
}
