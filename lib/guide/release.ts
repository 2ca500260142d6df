// Forces that hold the floors of a gravity set against sway: found, printed, and let go as a lateral load case.

import type { EndMomentArray } from "../inflection/index.ts";
import { printValue, quantity } from "../quantity/index.ts";
import { valueAt } from "../results/index.ts";
import type { FreeBodySolution } from "../results/types.ts";
import {
  type EquationTerm,
  type Ledger,
  shownValue,
  symbolTex,
  type TableCell,
  valueTex,
} from "../sheet/index.ts";
import { equilibrium } from "../statics/index.ts";
import { atJoint, axisOf, calledBy, mergeSources } from "../structure/index.ts";
import type { Sources, Structure } from "../structure/types.ts";
import { solvedLoads } from "./actual-loads.ts";
import type { Floor } from "./floors.ts";
import { recordLoadCase } from "./load-case.ts";
import { memberSources } from "./sources.ts";
import type { GravitySet, HingeSet, Holding, LoadCase } from "./types.ts";

/** A holding force below this share of the vertical load is nought. */
const nought = 1e-6;

/** The holding forces of the floors that no support of the frame holds, from end moments on the members, counter-clockwise, two
 *  per member. */
export function heldFloors(
  frame: Structure,
  floors: readonly Floor[],
  ends: EndMomentArray,
): readonly Holding[] {
  return Object.freeze(
    floors
      .filter(({ held }) => !held)
      .map(({ joints, at }) => {
        const terms = shearTerms(columnsAt(frame, joints, ends));
        const force = 0 - terms.reduce((sum, { coefficient, value }) => sum + coefficient * value, 0);
        return Object.freeze({ joint: at, floor: joints, force });
      }),
  );
}

/** End moments on the members of a solved set, counter-clockwise, two per member in the order of the frame. */
export function endMomentsOf(
  { frame }: Pick<HingeSet, "frame">,
  { members }: FreeBodySolution,
): EndMomentArray {
  const found = new Map(members.map(({ member, M, length }) => [member, { M, length }]));
  return Float64Array.from(
    frame.members.flatMap(({ name }) => {
      const own = found.get(name);
      if (own === undefined) throw new Error(`member ${name} was not solved`);
      return [0 - valueAt(own.M, 0, "right"), valueAt(own.M, own.length, "left")];
    }),
  );
}

/** Records how each holding force follows from the column shears, all of them in a table, and those let go as a load case; none
 *  where they are nought. `ends` are the end moments as for `heldFloors`, `moments` is the entry of them. */
export function recordRelease(
  ledger: Ledger,
  set: Omit<GravitySet, "release">,
  ends: EndMomentArray,
  moments: string,
): LoadCase | undefined {
  const { name, frame, holding } = set;
  if (holding.length === 0) return undefined;
  const vertical = Math.abs(equilibrium(frame, solvedLoads(set), []).sumFy);
  const held = holding.map((hold) => ({
    ...hold,
    force: Math.abs(hold.force) <= nought * vertical ? 0 : hold.force,
  }));
  const uses = held.map((hold) => recordStep(ledger, set, hold, ends, moments));
  ledger.put({
    kind: "table",
    id: `holding forces ${name}`,
    uses,
    caption: `Forces that hold the floors against sway under ${name}, on the frame, to the right`,
    columns: ["floor", "held at", "force"],
    rows: held.map(({ floor, joint, force }, i): readonly TableCell[] => [
      floorText(floor),
      joint,
      { value: shownValue(quantity(force, "force")), uses: [uses[i] ?? ""] },
    ]),
  });
  const live = held.filter(({ force }) => force !== 0);
  const release = live.length === 0 ? undefined : recordCase(ledger, set, live, held, uses);
  const largest = Math.max(...held.map(({ force }) => Math.abs(force)));
  ledger.put({
    kind: "finding",
    id: `sway ${name}`,
    uses: release === undefined ? uses : mergeSources([release.entry], uses),
    title: `Holding forces under ${name}`,
    verdict:
      release === undefined
        ? `nought at every floor: nothing sways under ${name} and nothing is to be let go`
        : `up to ${printValue(quantity(largest, "force"))}, ${shareText(largest / vertical)} of the vertical load of ${printValue(quantity(vertical, "force"))}`,
    lines:
      release === undefined
        ? []
        : [
            `let go as load case ${release.key}: a lateral method or hinges of its own find the sway they make, to be added to results under ${name}; until then these leave the sway out`,
          ],
  });
  return release;
}

function shareText(share: number): string {
  return `${(100 * share).toPrecision(2)} %`;
}

function recordCase(
  ledger: Ledger,
  { name }: Pick<HingeSet, "name">,
  live: readonly Holding[],
  holding: readonly Holding[],
  uses: readonly string[],
): LoadCase {
  const loads = live.map((hold) => {
    const from = [uses[holding.indexOf(hold)] ?? ""];
    const size = quantity(Math.abs(hold.force), "force", { from });
    return atJoint(hold.joint, hold.force > 0 ? { left: size } : { right: size });
  });
  const key = `${name.replace(/[^\p{L}\p{N}]/gu, "")}sway`;
  return recordLoadCase(ledger, key, `holding forces of ${name} let go`, loads, name);
}

function floorText(joints: readonly string[]): string {
  const [first, last] = [joints[0] ?? "", joints[joints.length - 1] ?? ""];
  return first === last ? first : `${first} to ${last}`;
}

/** One floor as a body, its columns cut above and below: the holding force and the column shears add up to nothing.
 *  With end moments counter-clockwise a column puts -(M_foot + M_head)/h on the floor at its head and as much the other way on
 *  that at its foot. */
function recordStep(
  ledger: Ledger,
  { name, frame }: Pick<HingeSet, "name" | "frame">,
  { joint, floor, force }: Holding,
  ends: EndMomentArray,
  moments: string,
): string {
  const columns = columnsAt(frame, floor, ends);
  const shear = (above: boolean): number =>
    columns
      .filter((column) => column.above === above)
      .reduce((sum, column) => sum + (column.moments[0] + column.moments[1]) / column.height, 0);
  const terms = shearTerms(columns);
  const tex = symbolTex(`R_${joint}`);
  const shown = (value: number): string => valueTex(shownValue(quantity(value, "force")));
  const part = (which: string): string =>
    `\\sum_{\\text{${which}}} \\frac{M_{\\text{foot}} + M_{\\text{head}}}{h}`;
  const hasAbove = columns.some(({ above }) => above);
  const entry = ledger.put({
    kind: "step",
    id: `${name}: holding force at ${joint}`,
    uses: mergeSources([moments], ...columns.map(({ from }) => from)),
    body: `${name}: floor ${floorText(floor)}, cut from its columns, ΣFx (end moments counter-clockwise on the columns)`,
    lines: {
      symbols: `\\sum F_x = 0:\\quad ${tex} ${hasAbove ? `+ ${part("columns above")} ` : ""}- ${part("columns below")} = 0`,
      numbers: `${tex} ${hasAbove ? `+ (${shown(shear(true))}) ` : ""}- (${shown(shear(false))}) = 0`,
      result: `${tex} = ${shown(force)}`,
    },
    value: shownValue(quantity(force, "force")),
    terms,
    coefficient: 1,
  });
  return `${entry.id}@${entry.version}`;
}

interface FloorColumn {
  readonly above: boolean;
  readonly height: number;
  /** Foot and head, counter-clockwise on the column. */
  readonly moments: readonly [foot: number, head: number];
  readonly from: Sources;
}

/** What the columns do to the floor, to the right: end moments over heights. */
function shearTerms(columns: readonly FloorColumn[]): readonly EquationTerm[] {
  return columns.flatMap(({ above, height, moments: [foot, head] }) => {
    const coefficient = (above ? 1 : -1) / height;
    return [
      { coefficient, value: foot },
      { coefficient, value: head },
    ];
  });
}

function columnsAt(frame: Structure, floor: readonly string[], ends: EndMomentArray): readonly FloorColumn[] {
  return frame.members.flatMap((member, i): readonly FloorColumn[] => {
    const axis = axisOf(frame, member);
    if (calledBy(axis) !== "column") return [];
    const up = axis.s > 0;
    const [foot, head] = up ? [member.start, member.end] : [member.end, member.start];
    const above = floor.includes(foot);
    if (!above && !floor.includes(head)) return [];
    const [start, end] = [ends[2 * i] ?? Number.NaN, ends[2 * i + 1] ?? Number.NaN];
    const moments = up ? ([start, end] as const) : ([end, start] as const);
    return [{ above, height: axis.length, moments, from: memberSources(frame, member.name) }];
  });
}
