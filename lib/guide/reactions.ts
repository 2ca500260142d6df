// The verb `reactions`: what the supports give, and whether the whole closes.

import { footing, type Quantity, quantity } from "../quantity/index.ts";
import {
  type EquationTerm,
  type FormulaLines,
  type Ledger,
  type ShownValue,
  shownValue,
  type TableCell,
  valueTex,
} from "../sheet/index.ts";
import { equilibrium } from "../statics/index.ts";
import { mergeSources } from "../structure/index.ts";
import type { Structure } from "../structure/types.ts";
import { actualLoads } from "./actual-loads.ts";
import type { BandBook } from "./band-book.ts";
import { type CellOf, handCells } from "./hand-cells.ts";
import { closedSum, isNought } from "./nought.ts";
import { shownAs } from "./shown.ts";
import { geometrySources, loadSources } from "./sources.ts";
import type { Hand } from "./types.ts";
import { unreleasedForces } from "./unreleased.ts";

type Component = "x" | "y" | "moment";

/** One support's reactions, absent where it holds nothing. */
export interface SupportReaction {
  readonly joint: string;
  readonly x?: Quantity<"force">;
  readonly y?: Quantity<"force">;
  readonly moment?: Quantity<"moment">;
  /** A force taken to hold a floor against sway, which no support gives. */
  readonly holding?: true;
}

const headings: Readonly<Record<Component, string>> = {
  x: "horizontal, to the right",
  y: "vertical, up",
  moment: "moment, counter-clockwise",
};

/** Records the reactions as a table whose printed forces foot, and the equilibrium of the whole as three checks. */
export function recordReactions(ledger: Ledger, bands: BandBook, hand: Hand): readonly SupportReaction[] {
  const reactions = supportReactions(hand);
  const used = (["x", "y", "moment"] as const).filter((one) =>
    reactions.some((reaction) => reaction[one] !== undefined),
  );
  const columns = used.map((component) => column(reactions, component));
  const shown = handCells(bands, columns.flat());
  const height = reactions.length + 1;
  const cells = (row: number): readonly TableCell[] => columns.map((_, i) => shown[i * height + row] ?? "");
  ledger.put({
    kind: "table",
    id: `reactions ${hand.name}`,
    uses: mergeSources(...reactions.flatMap(quantities).map(({ from }) => from)),
    caption: `Reactions under ${hand.name}, on the structure`,
    columns: ["support", ...used.map((component) => headings[component])],
    rows: [
      ...reactions.map((one, row) => [nameOf(one), ...cells(row)]),
      ["sum of forces", ...cells(reactions.length)],
    ],
  });
  recordEquilibrium(ledger, hand, reactions);
  const lines = reactions.map(
    (values) => `  ${nameOf(values)}: ${used.map((c) => `${c} ${values[c] ?? "free"}`).join(", ")}`,
  );
  return shownAs(reactions, () => ({ "text/plain": [`reactions under ${hand.name}`, ...lines].join("\n") }));
}

const nameOf = ({ joint, holding }: SupportReaction): string =>
  holding === true ? `${joint}, holding force` : joint;

function supportReactions(hand: Hand): readonly SupportReaction[] {
  const supports = hand.frame.supports
    .filter(({ kind }) => kind !== "free")
    .map(({ joint, holds }) => ({
      joint,
      ...(holds.x ? { x: hand.reaction(joint, "x") } : {}),
      ...(holds.y ? { y: hand.reaction(joint, "y") } : {}),
      ...(holds.rotation ? { moment: hand.reaction(joint, "moment") } : {}),
    }));
  const holding = unreleasedForces(hand).map(({ joint, force }) => ({
    joint,
    x: force,
    holding: true as const,
  }));
  return [...supports, ...holding];
}

function quantities({ x, y, moment }: SupportReaction): readonly Quantity[] {
  return [x, y, moment].filter((value) => value !== undefined);
}

/** What stands in one column, then its sum; forces are printed so that they foot. */
function column(reactions: readonly SupportReaction[], component: Component): readonly CellOf[] {
  const values = reactions.map((reaction): Quantity | undefined => reaction[component]);
  if (component === "moment") return [...values.map((value) => ({ value })), { value: undefined }];
  const forces = values.filter((value) => value !== undefined) as readonly Quantity<"force">[];
  const { parts, total } = footing(forces);
  let next = 0;
  const cells = values.map((value) => ({ value, text: value === undefined ? undefined : parts[next++] }));
  const largest = Math.max(...forces.map(({ si }) => Math.abs(si)));
  const sum = closedSum(
    forces.reduce((a, b) => a + b.si, 0),
    largest,
  );
  const from = mergeSources(...forces.map((force) => force.from));
  return [...cells, { value: quantity(sum, "force", { from }), text: total }];
}

function recordEquilibrium(ledger: Ledger, hand: Hand, reactions: readonly SupportReaction[]): void {
  const loads = actualLoads(hand.solved.map(({ set }) => set));
  const plain = reactions.map(({ joint, x, y, moment }) => ({
    joint,
    ...(x === undefined ? {} : { x: x.si }),
    ...(y === undefined ? {} : { y: y.si }),
    ...(moment === undefined ? {} : { moment: moment.si }),
    steps: {},
  }));
  const [ofLoads, ofReactions, all] = [
    equilibrium(hand.frame, loads, []),
    equilibrium(hand.frame, [], plain),
    equilibrium(hand.frame, loads, plain),
  ];
  const steps = mergeSources(...reactions.flatMap(quantities).map(({ from }) => from));
  const sums = [
    { key: "sumFx", name: "sum Fx", tex: "\\sum F_x", dimension: "force", scale: all.scale.force },
    { key: "sumFy", name: "sum Fy", tex: "\\sum F_y", dimension: "force", scale: all.scale.force },
    {
      key: "sumM",
      name: `sum M about ${all.about}`,
      tex: `\\sum M_{${all.about}}`,
      dimension: "moment",
      scale: all.scale.moment,
    },
  ] as const;
  for (const { key, name, tex, dimension, scale } of sums) {
    const shown = (value: number): ShownValue => shownValue(quantity<"force" | "moment">(value, dimension));
    ledger.put({
      kind: "check",
      id: `equilibrium ${hand.name} ${name}`,
      uses: mergeSources(loadSources(loads), steps, key === "sumM" ? geometrySources(hand.frame) : []),
      formula: `${name} = 0`,
      lines: sumLines(tex, shown(ofReactions[key]), shown(ofLoads[key]), shown(closedSum(all[key], scale))),
      inputs: {},
      closure: true,
      terms: [
        ...reactions.flatMap((one) => reactionTerms(hand.frame, all.about, one, key)),
        { coefficient: 1, value: ofLoads[key] },
      ],
      passed: isNought(all[key], scale),
      description: `whole structure under ${hand.name}: reactions and loads, ${name.replace("sum ", "Σ")}`,
    });
  }
}

/** What one support's reactions add to a sum. Moments are taken about a joint; levers in m. */
function reactionTerms(
  frame: Structure,
  about: string,
  { joint, x, y, moment }: SupportReaction,
  key: "sumFx" | "sumFy" | "sumM",
): readonly EquationTerm[] {
  const term = (coefficient: number, of: Quantity | undefined): readonly EquationTerm[] => {
    if (of === undefined) return [];
    const [from, ...more] = of.from;
    return [{ coefficient, value: of.si, ...(from === undefined || more.length > 0 ? {} : { from }) }];
  };
  if (key === "sumFx") return term(1, x);
  if (key === "sumFy") return term(1, y);
  const [at, centre] = [joint, about].map((name) => frame.joints.find((one) => one.name === name));
  const [dx, dy] = [(at?.x ?? 0) - (centre?.x ?? 0), (at?.y ?? 0) - (centre?.y ?? 0)];
  return [...term(-dy, x), ...term(dx, y), ...term(1, moment)];
}

function sumLines(tex: string, reactions: ShownValue, loads: ShownValue, total: ShownValue): FormulaLines {
  return {
    symbols: `${tex} = \\text{reactions} + \\text{loads}`,
    numbers: `(${valueTex(reactions)}) + (${valueTex(loads)})`,
    result: `${tex} = ${valueTex(total)}`,
  };
}
