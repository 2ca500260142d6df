// Hinges beside the range of the isolated span: a table of all, and a query for each that lies outside.

import { beyondEnds, type Placement, placement } from "../inflection/index.ts";
import { quantity } from "../quantity/index.ts";
import { memberLoads } from "../results/index.ts";
import { type Ledger, shownValue, type TableCell } from "../sheet/index.ts";
import { axisOf, memberNamed, mergeSources } from "../structure/index.ts";
import type { Hinge, Load, Sources, Structure } from "../structure/types.ts";
import { loadSources, memberSources } from "./sources.ts";
import { spanPart } from "./words.ts";

/** End joints and length of a member, m. */
export function endsOf(structure: Structure, member: string): { start: string; end: string; length: number } {
  const found = memberNamed(structure, member, "hinge");
  return { start: found.start, end: found.end, length: axisOf(structure, found).length };
}

/** A hinge judged from the nearer end of its member by the range of the isolated span; from the other end where the member
 *  turns freely at the nearer one. None where both turn freely. */
export function judge(
  frame: Structure,
  loads: readonly Load[],
  { member, at }: Hinge,
): Placement | undefined {
  const { start, end, length } = endsOf(frame, member);
  const near = at <= length / 2;
  for (const fromStart of [near, !near]) {
    const distance = quantity(fromStart ? at : length - at, "length");
    try {
      return placement(frame, loads, { member, from: fromStart ? start : end, at: distance });
    } catch (error) {
      if (!isPinnedEnd(error)) throw error;
    }
  }
  return undefined;
}

function isPinnedEnd(error: unknown): boolean {
  return (error as { fault?: { kind?: unknown } } | undefined)?.fault?.kind === "pinned end";
}

const whyOutside =
  "The true point can lie there beside loaded or much longer spans, or where a joint moves; say why it does here.";

type Outside = Placement & Required<Pick<Placement, "range">>;

const isOutside = (judged: Placement | undefined): judged is Outside =>
  judged?.inside === false && judged.range !== undefined;

/** What to ask about a hinge outside the range; none where it lies inside or has none. */
export function outsideWords(name: string, set: string, judged: Placement | undefined): string | undefined {
  if (!isOutside(judged)) return undefined;
  const { distance, length, from, range, member } = judged;
  return (
    `Hinge ${name} under ${set}, ${spanPart(distance / length)} from ${from}, lies outside the isolated-span range ` +
    `${spanPart(range.least / length)} to ${spanPart(range.most / length)} of ${member} under this load. ` +
    whyOutside
  );
}

/** One query for all hinges of a set that lie outside their ranges; none where all lie inside. */
export function queryOutside(
  ledger: Ledger,
  set: string,
  hinges: readonly Hinge[],
  judged: readonly (Placement | undefined)[],
): void {
  const outside = hinges.filter((_, i) => isOutside(judged[i]));
  if (outside.length === 0) return;
  const places = outside.map(({ name, member }) => `${name} in ${member}`).join(", ");
  ledger.query(
    `Under ${set} ${places} ${outside.length === 1 ? "lies" : "lie"} outside the isolated-span range under this load (see the table of ranges). ${whyOutside}`,
    mergeSources(...outside.map(({ from }) => from)),
  );
}

/** What the range of an isolated span stands on: the member's length and the loads on it, and overhangs beyond its ends with theirs. */
export function rangeSources(structure: Structure, loads: readonly Load[], { member }: Hinge): Sources {
  const own = memberLoads(structure, loads, member).loads.flatMap((i) => loads[i] ?? []);
  const beyond = beyondEnds(structure, loads, memberNamed(structure, member, "hinge"));
  return mergeSources(
    ...[member, ...beyond.members].map((name) => memberSources(structure, name)),
    loadSources([...own, ...beyond.loads]),
  );
}

/** Records places and ranges of hinges in a table; `verdicts` say something else of hinges that have no range. */
export function recordRanges(
  ledger: Ledger,
  set: string,
  structure: Structure,
  loads: readonly Load[],
  hinges: readonly Hinge[],
  judged: readonly (Placement | undefined)[],
  verdicts: readonly string[] = [],
): void {
  const grounds = hinges.map((one) => rangeSources(structure, loads, one));
  const rows = hinges.map((one, i): readonly TableCell[] => {
    const uses = grounds[i] ?? [];
    const { start, length } = endsOf(structure, one.member);
    const { from = start, distance = one.at, range, inside } = judged[i] ?? {};
    const cell = (metres: number, on: readonly string[]): TableCell => {
      const shown = shownValue(quantity(metres, "length"));
      return { value: { ...shown, text: `${shown.text} (${spanPart(metres / length)})` }, uses: on };
    };
    const own = [one.name, `${from} in ${one.member}`, cell(distance, one.from)];
    if (range === undefined)
      return [...own, "none", "none", verdicts[i] || "not judged: no range from the member's own loads"];
    const verdict = inside === true ? "inside" : "OUTSIDE";
    return [...own, cell(range.least, uses), cell(range.most, uses), verdict];
  });
  ledger.put({
    kind: "table",
    id: `hinge ranges ${set}`,
    uses: mergeSources(...grounds, ...hinges.map(({ from }) => from)),
    caption: `Where the moment can be zero under ${set}: isolated span, ends from free to turn to fully held (end fixity as a rotational spring); beside loaded or much longer spans, or where a joint moves, the true point can lie outside`,
    columns: ["hinge", "from", "chosen", "least", "greatest", "verdict"],
    rows,
  });
}
