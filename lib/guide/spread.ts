// The verb `spread`: how results move as each hinge moves through its range, and through each unknown.

import { sweeps } from "../accuracy/index.ts";
import { type Quantity, quantity } from "../quantity/index.ts";
import { type Ledger, shownValue, type TableCell } from "../sheet/index.ts";
import { mergeSources } from "../structure/index.ts";
import { actualLoads, solvedLoads } from "./actual-loads.ts";
import { handOf } from "./hand.ts";
import { rangeSources } from "./hinge-ranges.ts";
import { type HingeMove, hingeMoves } from "./moved-hinges.ts";
import type { HandBook } from "./result.ts";
import { standingSets } from "./set-ratios.ts";
import { spreadFigure } from "./spread-figure.ts";
import { type SpreadResult, spreadResults } from "./spread-results.ts";
import { isStill, stillWords } from "./spread-still.ts";
import { rangeText } from "./statement.ts";
import { truthOf } from "./truth.ts";
import type { Hand, SolvedSet } from "./types.ts";

export interface SpreadOptions {
  /** Symbols of results recorded from this hand, or values it answered; otherwise the governing ones recorded from it. */
  readonly results?: readonly (string | Quantity)[];
}

/** One result as one cause goes through its range: a hinge (with its twins), the results solved anew by statics, or an unknown,
 *  the results true values with the other unknowns nominal. */
export interface SpreadRow {
  readonly result: string;
  readonly kind: "hinge" | "unknown";
  readonly cause: string;
  readonly range: string;
  readonly least: Quantity;
  readonly chosen: Quantity;
  readonly greatest: Quantity;
}

export interface SpreadTable {
  readonly rows: readonly SpreadRow[];
  /** Hinges that could not be moved, and why. */
  readonly left: readonly { readonly cause: string; readonly range: string; readonly why: string }[];
}

/** Records the spread as a table and a figure; answers with its rows. Throws where no result of this hand is meant. */
export function recordSpread(
  ledger: Ledger,
  { state, bands }: HandBook,
  hand: Hand,
  options: SpreadOptions,
): SpreadTable {
  const results = spreadResults(ledger, state, hand, options.results);
  const moves = hand.solved.flatMap(({ set }) => hingeMoves(set));
  const named = namedBySet(hand.solved.length > 1 || standingSets(ledger, state) > 1);
  const rows = [...hingeRows(hand, results, moves, named), ...unknownRows(bands, hand, results)];
  const byResult = results.flatMap(({ name }) => rows.filter(({ result }) => result === name));
  const left = moves.flatMap((move) =>
    "none" in move.solved
      ? [Object.freeze({ cause: named(move), range: move.range, why: move.solved.none })]
      : [],
  );
  const spread: SpreadTable = Object.freeze({ rows: Object.freeze(byResult), left: Object.freeze(left) });
  const uses = mergeSources(...byResult.flatMap(({ least, chosen }) => [least.from, chosen.from]));
  const moving = byResult.filter((row) => !isStill(row));
  const still = stillWords(byResult);
  const unmoved = still === "" ? "" : `; ${still}`;
  ledger.put({
    kind: "table",
    id: `spread ${hand.name}`,
    uses,
    caption: `How results under ${hand.name} move: hinges through their isolated-span ranges, the others staying, solved anew by statics; unknowns through their ranges, the others nominal, true values${unmoved}`,
    columns: ["result", "what moves", "through", "at lower end", "as chosen or nominal", "at upper end"],
    rows: [
      ...moving.map(tableRow),
      ...left.map(({ cause, range, why }) => ["every result", cause, range, `not moved: ${why}`, "", ""]),
    ],
  });
  if (moving.length === 0) return spread;
  const spec = spreadFigure(hand, results, moving);
  ledger.put({
    kind: "figure",
    id: `figure spread ${hand.name}`,
    uses,
    caption: `How results under ${hand.name} move: each bar from its value at one end of a range to that at the other, hinges hatched aslant, unknowns upright; the heavy stroke is the value as chosen${unmoved}`,
    alternative: spec.description,
    spec,
  });
  return spread;
}

/** What is moved, with its set where the sheet has more than one: "hinge h1 (S)". */
const namedBySet =
  (several: boolean) =>
  ({ set, cause }: HingeMove): string =>
    several ? `${cause} (${set.name})` : cause;

function tableRow({ result, cause, range, ...values }: SpreadRow): readonly TableCell[] {
  const cell = (value: Quantity): TableCell => ({ value: shownValue(value), uses: value.from });
  return [result, cause, range, cell(values.least), cell(values.chosen), cell(values.greatest)];
}

function hingeRows(
  hand: Hand,
  results: readonly SpreadResult[],
  moves: readonly HingeMove[],
  named: (move: HingeMove) => string,
): readonly SpreadRow[] {
  return moves.flatMap((move) => {
    const { set, hinges, range, solved } = move;
    if ("none" in solved) return [];
    const [least, greatest] = [solved.least, solved.greatest].map((moved) => handWith(hand, moved));
    if (least === undefined || greatest === undefined) return [];
    // the same equations as for the result as chosen, with the hinge where its range ends
    const ends = hinges.map((hinge) => rangeSources(set.hinged, solvedLoads(set), hinge));
    return results.map((one): SpreadRow => {
      const from = mergeSources(one.value.from, ...ends);
      const asked = (other: Hand): Quantity => one.asked(other, from);
      return {
        result: one.name,
        kind: "hinge",
        cause: named(move),
        range,
        least: asked(least),
        chosen: one.value,
        greatest: asked(greatest),
      };
    });
  });
}

/** The hand with one set solved otherwise. */
function handWith(hand: Hand, moved: SolvedSet): Hand {
  return handOf(hand.solved.map((one) => (one.set.name === moved.set.name ? moved : one)));
}

function unknownRows(
  bands: HandBook["bands"],
  hand: Hand,
  results: readonly SpreadResult[],
): readonly SpreadRow[] {
  const taken = bands.taken(
    hand.frame,
    hand.solved.map(({ set }) => set),
  );
  if ("none" in taken) return [];
  const { structure, unknowns, rows } = taken.unknown;
  const loads = actualLoads(hand.solved.map(({ set }) => set));
  const wanted = results.map(({ wanted: one }) => ({ wanted: one }));
  const nominal = truthOf(hand, taken.unknown).nominalOf(wanted);
  const from = bands.uses(hand);
  const swept = sweeps({ structure, cases: [loads], wanted, unknowns, steps: 1 });
  return swept.flatMap(({ unknown, truth }) => {
    const range = rows.find((row) => row.name === unknown.name);
    return results.map((one, i): SpreadRow => {
      const value = (si: number | undefined): Quantity =>
        one.nought(
          quantity((si ?? Number.NaN) * one.factor, one.value.dimension, { unit: one.value.unit, from }),
        );
      const [least, greatest] = truth[i] ?? [];
      return {
        result: one.name,
        kind: "unknown",
        cause: unknown.name,
        range: range === undefined ? "" : rangeText(range),
        least: value(least),
        chosen: value(nominal[i]),
        greatest: value(greatest),
      };
    });
  });
}
