// The verb `diagrams`: N, V and M on the members, with a table of their end values and extremes.

import { type DiagramsFigure, diagramMarks, type ForceQuantity } from "../drawing/index.ts";
import { printValue, quantity } from "../quantity/index.ts";
import { extremes, type Side, valueAt } from "../results/index.ts";
import type { MemberForces } from "../results/types.ts";
import { type Ledger, shownValue, type TableCell } from "../sheet/index.ts";
import { memberNamed } from "../structure/index.ts";
import { shownAs, sketchBundle } from "./shown.ts";
import type { Hand, Spot } from "./types.ts";
import { lengthText } from "./words.ts";

export interface DiagramOptions {
  /** On which side of a member its moments are drawn; otherwise the tension side. */
  readonly moments?: "tension side" | "compression side";
}

const dimensions = { N: "force", V: "force", M: "moment" } as const;
const order: readonly ForceQuantity[] = ["N", "V", "M"];

/** Records the figure and the table of internal forces; answers with the figure. */
export function recordDiagrams(ledger: Ledger, hand: Hand, options: DiagramOptions): DiagramsFigure {
  const moments = options.moments ?? "tension side";
  if (moments !== "tension side" && moments !== "compression side")
    throw new Error(`diagrams: moments "${String(moments)}"; write "tension side" or "compression side"`);
  const spec = diagramsFigure(hand, moments);
  const uses = [...new Set(hand.solved.flatMap(({ entries }) => entries))];
  ledger.put({
    kind: "figure",
    id: `figure internal forces ${hand.name}`,
    uses,
    caption: `Axial force, shear and moment under ${hand.name}; moments on the ${moments}`,
    alternative: spec.description,
    spec,
  });
  ledger.put({
    kind: "table",
    id: `internal forces ${hand.name}`,
    uses,
    caption: `Internal forces under ${hand.name} (N tension +; M + with tension on the reference fibre)`,
    columns: ["member", "at", "N", "V", "M"],
    rows: hand.members.flatMap((forces) => rows(hand, forces)),
  });
  return shownAs(spec, () => sketchBundle(spec, spec.description));
}

function diagramsFigure(hand: Hand, moments: "tension side" | "compression side"): DiagramsFigure {
  const structure = hand.solved.length === 1 ? (hand.solved[0]?.set.hinged ?? hand.frame) : hand.frame;
  const marks = diagramMarks(hand.members, order, {
    value: (si, which) => printValue(quantity(si, dimensions[which])),
  });
  const spoken = hand.members.map((forces) => spokenForces(hand, forces)).join("; ");
  return {
    kind: "diagrams",
    title: `Internal forces under ${hand.name}`,
    description: `${spoken}.`,
    structure,
    forces: hand.members,
    quantities: order,
    moments,
    marks,
  };
}

/** Extremes strictly inside the member that say more than its ends do. */
function innerExtremes(forces: MemberForces, which: ForceQuantity): readonly { x: number; value: number }[] {
  if (which === "N") return [];
  const { length } = forces;
  const { greatest, least } = extremes(forces[which]);
  return [greatest, least].filter(
    ({ x, value }) => x > 1e-9 * length && x < (1 - 1e-9) * length && !isNought(value, forces, which),
  );
}

function isNought(value: number, forces: MemberForces, which: ForceQuantity): boolean {
  const { greatest, least } = extremes(forces[which]);
  const size = Math.max(Math.abs(greatest.value), Math.abs(least.value), 1e-3);
  return Math.abs(value) <= 1e-9 * size;
}

function stations(
  hand: Hand,
  forces: MemberForces,
): readonly { readonly label: string; readonly at: Spot }[] {
  const { start, end } = memberNamed(hand.frame, forces.member, "member");
  const inner = innerExtremes(forces, "M").map(({ x }) => ({
    label: `${lengthText(x)} from ${start}`,
    at: quantity(x, "length"),
  }));
  return [{ label: start, at: start }, ...inner, { label: end, at: end }];
}

function rows(hand: Hand, forces: MemberForces): readonly (readonly TableCell[])[] {
  return stations(hand, forces).map(({ label, at }) => [
    forces.member,
    label,
    ...[hand.axial, hand.shear, hand.moment].map((ask): TableCell => {
      const value = ask(forces.member, { at });
      return { value: shownValue(value), uses: value.from };
    }),
  ]);
}

function spokenForces(hand: Hand, forces: MemberForces): string {
  const { start, end } = memberNamed(hand.frame, forces.member, "member");
  const side = (at: number, from: Side): string =>
    `M ${printValue(quantity(valueAt(forces.M, at, from), "moment"))}, V ${printValue(quantity(valueAt(forces.V, at, from), "force"))}`;
  const inner = innerExtremes(forces, "M")
    .map(({ x, value }) => `, M ${printValue(quantity(value, "moment"))} at ${lengthText(x)} from ${start}`)
    .join("");
  const axial = printValue(quantity(valueAt(forces.N, 0, "right"), "force"));
  return `${forces.member}: at ${start} ${side(0, "right")}${inner}, at ${end} ${side(forces.length, "left")}, N ${axial}`;
}
