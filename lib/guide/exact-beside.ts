// The verb `exact`: hand and exact side by side, once sizes are known. Nothing is ever worked out from the exact values.

import { exact } from "../exact/index.ts";
import { printNumber, type Quantity, quantity } from "../quantity/index.ts";
import { valueAt } from "../results/index.ts";
import type { ElasticSolution } from "../results/types.ts";
import { type Ledger, type ResultBand, shownValue, type TableCell } from "../sheet/index.ts";
import { mergeSources } from "../structure/index.ts";
import { actualLoads } from "./actual-loads.ts";
import type { BandBook } from "./band-book.ts";
import { handCells } from "./hand-cells.ts";
import { type HandResult, handResults } from "./hand-results.ts";
import { largestOf } from "./largest.ts";
import { geometrySources, loadSources } from "./sources.ts";
import type { Hand } from "./types.ts";
import { and, counted } from "./words.ts";

/** One hand result beside the exact value. */
export interface ExactRow {
  readonly what: string;
  readonly hand: Quantity;
  readonly exact: Quantity;
  /** Exact over hand; absent where the hand value is near zero. */
  readonly ratio?: number;
  /** Whether the exact value lies where 90 % of the values tried do; absent where there is no band. */
  readonly inside?: boolean;
}

/** Records member end forces, greatest and least moments inside members and reactions by hand and by the exact solution of the
 *  frame with its sections, under all loads together. Throws when members have no section, naming them. */
export function recordExact(ledger: Ledger, bands: BandBook, hand: Hand): readonly ExactRow[] {
  refuseUnsized(hand);
  const loads = actualLoads(hand.solved.map(({ set }) => set));
  const solution = exact(hand.frame, loads);
  const from = mergeSources(
    geometrySources(hand.frame),
    loadSources(loads),
    ...hand.frame.members.map((member) => member.from),
  );
  const results = handResults(hand);
  const cells = handCells(
    bands,
    results.map(({ value }) => ({ value })),
  );
  const shown = bands.of(results.map(({ value }) => value));
  const rows = results.map((one, i) => rowOf(hand, solution, one, shown[i], from));
  ledger.put({
    kind: "table",
    id: `exact ${hand.name}`,
    uses: mergeSources(from, ...results.map(({ value }) => value.from)),
    caption: `Hand and exact side by side under ${hand.name}: direct stiffness with the sections given, linear elastic; no hand value stands on it (signs as above)`,
    columns: ["result", "by hand", "exact", "exact / hand", "in the band"],
    rows: rows.map((row, i): readonly TableCell[] => [
      row.what,
      cells[i] ?? "",
      { value: shownValue(row.exact), uses: from },
      row.ratio === undefined ? "hand near zero" : printNumber(row.ratio),
      row.inside === undefined ? "no band" : row.inside ? "inside" : "OUTSIDE",
    ]),
  });
  ledger.put({
    kind: "finding",
    id: `exact beside hand ${hand.name}`,
    uses: mergeSources(from, ...results.map(({ value }) => value.from)),
    title: `Hand and exact under ${hand.name}`,
    verdict: verdictOf(rows),
    lines: [],
  });
  return Object.freeze(rows);
}

function refuseUnsized({ frame }: Hand): void {
  const bare = frame.members.filter(({ section }) => section === undefined).map(({ name }) => name);
  if (bare.length > 0)
    throw new Error(
      `exact: ${bare.length === 1 ? "member" : "members"} ${and(bare)} ${bare.length === 1 ? "has" : "have"} no section; ` +
        'give A, I and E of every member when the frame is made, or withSections(frame, { columns: { A: "53.8 cm^2", I: "8360 cm^4", E: "210 GPa" }, … })',
    );
}

function rowOf(
  hand: Hand,
  solution: ElasticSolution,
  { what, value, wanted }: HandResult,
  band: ResultBand | undefined,
  from: readonly string[],
): ExactRow {
  const found = quantity(readExact(solution, wanted), value.dimension, { from });
  const scale = largestOf(hand.members, value.dimension === "moment" ? "M" : "force");
  const ratio = Math.abs(value.si) > nearZero * scale ? { ratio: found.si / value.si } : {};
  const beyond = 1e-9 * scale;
  const inside =
    band === undefined
      ? {}
      : { inside: found.si >= band.low.si - beyond && found.si <= band.high.si + beyond };
  return Object.freeze({ what, hand: value, exact: found, ...ratio, ...inside });
}

/** Part of the largest force of its kind below which a hand value counts as near zero, as for bands. */
const nearZero = 0.02;

function readExact({ members, reactions }: ElasticSolution, wanted: HandResult["wanted"]): number {
  if (!("member" in wanted))
    return reactions.find(({ joint }) => joint === wanted.joint)?.[wanted.reaction] ?? Number.NaN;
  const forces = members.find(({ member }) => member === wanted.member);
  if (forces === undefined || typeof wanted.at !== "number") return Number.NaN;
  return valueAt(forces[wanted.force], wanted.at, wanted.side ?? "right");
}

function verdictOf(rows: readonly ExactRow[]): string {
  const ratios = rows.flatMap(({ ratio }) => ratio ?? []);
  const judged = rows.filter(({ inside }) => inside !== undefined);
  const held = judged.filter(({ inside }) => inside === true).length;
  const spread =
    ratios.length === 0
      ? "no hand value is far enough from zero for a ratio"
      : `exact / hand from ${printNumber(Math.min(...ratios))} to ${printNumber(Math.max(...ratios))} over ${counted(ratios.length, "value")}`;
  return judged.length === 0
    ? spread
    : `${spread}; ${held} of ${judged.length} exact values lie in their bands`;
}
