// The verb `beside`: a hinge set and its alternatives for the same loads side by side, each solved by statics.

import { type Quantity, quantity } from "../quantity/index.ts";
import type { MemberForces } from "../results/types.ts";
import type { Ledger } from "../sheet/index.ts";
import { axisOf, calledBy, mergeSources } from "../structure/index.ts";
import type { Member, Structure } from "../structure/types.ts";
import type { BandBook } from "./band-book.ts";
import { solvedQuietly } from "./free-bodies.ts";
import { handOf } from "./hand.ts";
import { handCells } from "./hand-cells.ts";
import { asResultOf, originOf } from "./origin.ts";
import { geometrySources, loadSources } from "./sources.ts";
import type { Hand, HingeSet } from "./types.ts";
import { and, lengthText } from "./words.ts";

/** One result by every set, in the order of the sets. */
export interface BesideRow {
  readonly what: string;
  readonly values: readonly Quantity<"force" | "moment">[];
}

/** Records moments at joints, greatest and least moments inside members and reactions of all sets in one table; answers with
 *  its rows. Throws on fewer than two sets and on sets of different frames or loads. */
export function recordBeside(
  ledger: Ledger,
  bands: BandBook,
  sets: readonly HingeSet[],
): readonly BesideRow[] {
  checkAlike(sets);
  const hands = sets.map((set) => handOf([solvedQuietly(set)]));
  const rows = hands[0] === undefined ? [] : rowsOf(hands[0].frame, hands);
  const uses = mergeSources(...sets.map((set) => standsOn(set)));
  const names = sets.map(({ name }) => name);
  ledger.put({
    kind: "table",
    id: `beside ${names.join(" | ")}`,
    uses,
    caption: `${names[0]} beside ${and(names.slice(1))}: the same loads with hinges at other places, by statics (M + with tension on the reference fibre)`,
    columns: ["result", `${names[0]}, chosen`, ...names.slice(1)],
    rows: rows.map(({ what, values }) => [
      what,
      ...handCells(
        bands,
        values.map((value) => ({ value })),
      ),
    ]),
  });
  return Object.freeze(rows);
}

function standsOn({ hinged, cases }: HingeSet): readonly string[] {
  return mergeSources(
    geometrySources(hinged),
    ...hinged.hinges.map(({ from }) => from),
    ...cases.map(({ loads }) => loadSources(loads)),
  );
}

function rowsOf(frame: Structure, hands: readonly Hand[]): readonly BesideRow[] {
  const row = (what: string, ask: (hand: Hand) => Quantity<"force" | "moment">): readonly BesideRow[] => {
    const values = hands.map((hand) => {
      const value = ask(hand);
      const from = mergeSources(value.from, ...hand.solved.map(({ set }) => standsOn(set)));
      const kept = quantity(value.si, value.dimension, { from });
      const known = originOf(value);
      return known === undefined ? kept : asResultOf(kept, known.origin);
    });
    const largest = Math.max(...values.map(({ si }) => Math.abs(si)));
    return largest <= noughtOf(hands) ? [] : [Object.freeze({ what, values: Object.freeze(values) })];
  };
  return [
    ...endRows(frame).flatMap(({ what, member, joint }) =>
      row(what, (hand) => hand.moment(member, { at: joint })),
    ),
    ...frame.members.flatMap(({ name }) =>
      (["positive", "negative"] as const).flatMap((sign) =>
        hands.some((hand) => isInside(hand, name, sign))
          ? row(peakText(frame, hands, name, sign), (hand) => hand.peakMoment(name, sign).moment)
          : [],
      ),
    ),
    ...frame.supports.flatMap(({ joint, holds }) => [
      ...(holds.x ? row(`reaction at ${joint}, to the right`, (hand) => hand.reaction(joint, "x")) : []),
      ...(holds.y ? row(`reaction at ${joint}, up`, (hand) => hand.reaction(joint, "y")) : []),
      ...(holds.rotation
        ? row(`reaction at ${joint}, moment counter-clockwise`, (hand) => hand.reaction(joint, "moment"))
        : []),
    ]),
  ];
}

/** Member ends whose moments tell the joints' apart: of two members that meet, alone, in a line or at a knee one is enough. */
function endRows(
  frame: Structure,
): readonly { readonly what: string; readonly member: string; readonly joint: string }[] {
  return frame.joints.flatMap(({ name: joint }) => {
    const ends = frame.members.filter(({ start, end }) => start === joint || end === joint);
    const held = frame.supports.some((support) => support.joint === joint && support.holds.rotation);
    const shown = ends.length === 2 && !held ? [preferred(frame, ends)] : ends;
    return shown.map(({ name: member }) => ({
      what: shown.length === 1 ? `M at ${joint}` : `M of ${member} at ${joint}`,
      member,
      joint,
    }));
  });
}

function preferred(frame: Structure, [first, second]: readonly Member[]): Member {
  if (first === undefined || second === undefined) throw new Error("two members are wanted");
  return calledBy(axisOf(frame, first)) === "beam" ? first : second;
}

function isInside(hand: Hand, member: string, sign: "positive" | "negative"): boolean {
  const { moment, at } = hand.peakMoment(member, sign);
  const length = lengthOf(hand.members, member);
  const right = sign === "positive" ? moment.si > 0 : moment.si < 0;
  return right && at.si > 1e-9 * length && at.si < (1 - 1e-9) * length;
}

function peakText(
  frame: Structure,
  hands: readonly Hand[],
  member: string,
  sign: "positive" | "negative",
): string {
  const start = frame.members.find(({ name }) => name === member)?.start ?? "";
  const places = hands.map((hand) => lengthText(hand.peakMoment(member, sign).at.si));
  const one = new Set(places).size === 1;
  return `${sign === "positive" ? "greatest" : "least"} M of ${member}, ${one ? (places[0] ?? "") : places.join(" | ")} from ${start}`;
}

function lengthOf(members: readonly MemberForces[], name: string): number {
  return members.find(({ member }) => member === name)?.length ?? 1;
}

/** What counts as nought beside the results of the sets: forces and moments of rounding. */
function noughtOf(hands: readonly Hand[]): number {
  const largest = hands.flatMap(({ members }) =>
    members.flatMap(({ M }) => M.pieces.map((piece) => Math.abs(piece[0] ?? 0))),
  );
  return 1e-9 * Math.max(1e-3, ...largest);
}

function checkAlike(sets: readonly HingeSet[]): void {
  const [first, ...others] = sets;
  if (first === undefined || others.length === 0)
    throw new Error(
      `beside: ${sets.length === 0 ? "no hinge set" : "one hinge set"} given; give the chosen set and at least one alternative for the same loads`,
    );
  const names = sets.map(({ name }) => name);
  const twice = names.find((name, i) => names.indexOf(name) !== i);
  if (twice !== undefined)
    throw new Error(
      `beside: two sets are called "${twice}"; give one a name of its own: sheet.hinges(frame, […], […], { name: "${twice}, …" })`,
    );
  for (const other of others) {
    if (JSON.stringify(other.frame) !== JSON.stringify(first.frame))
      throw new Error(`beside: ${first.name} and ${other.name} are of different structures`);
    if (keysOf(other) !== keysOf(first))
      throw new Error(
        `beside: ${first.name} is for ${keysOf(first)}, ${other.name} for ${keysOf(other)}; alternatives are for the same load cases`,
      );
  }
}

const keysOf = ({ cases }: HingeSet): string =>
  cases
    .map(({ key }) => key)
    .sort()
    .join(" + ");
