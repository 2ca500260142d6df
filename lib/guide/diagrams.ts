// The verb `diagrams`: N, V and M on the members, with a table of their end values and extremes.

import { type DiagramsFigure, diagramMarks, type ForceQuantity } from "../drawing/index.ts";
import { printValue, quantity } from "../quantity/index.ts";
import { type Side, valueAt } from "../results/index.ts";
import type { MemberForces } from "../results/types.ts";
import type { Ledger, TableCell } from "../sheet/index.ts";
import { memberNamed } from "../structure/index.ts";
import type { BandBook } from "./band-book.ts";
import { type DiagramBands, diagramBands } from "./diagram-bands.ts";
import { handCells } from "./hand-cells.ts";
import { innerExtremes } from "./inner-extremes.ts";
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
export function recordDiagrams(
  ledger: Ledger,
  bands: BandBook,
  hand: Hand,
  options: DiagramOptions,
): DiagramsFigure {
  const moments = options.moments ?? "tension side";
  if (moments !== "tension side" && moments !== "compression side")
    throw new Error(`diagrams: moments "${String(moments)}"; write "tension side" or "compression side"`);
  const drawn = diagramBands(bands, hand);
  const spec = diagramsFigure(hand, moments, drawn);
  const uses = [...new Set(hand.solved.flatMap(({ entries }) => entries))];
  ledger.put({
    kind: "figure",
    id: `figure internal forces ${hand.name}`,
    uses,
    caption: `Axial force, shear and moment under ${hand.name}; moments on the ${moments}${drawn.words}`,
    alternative: spec.description,
    spec,
  });
  ledger.put({
    kind: "table",
    id: `internal forces ${hand.name}`,
    uses,
    caption: `Internal forces under ${hand.name} (N tension +; M + with tension on the reference fibre)`,
    columns: ["member", "at", "N", "V", "M"],
    rows: rows(bands, hand),
  });
  return shownAs(spec, () => sketchBundle(spec, spec.description));
}

function diagramsFigure(
  hand: Hand,
  moments: "tension side" | "compression side",
  { bands, words }: DiagramBands,
): DiagramsFigure {
  const structure = hand.solved.length === 1 ? (hand.solved[0]?.set.hinged ?? hand.frame) : hand.frame;
  const marks = diagramMarks(hand.members, order, {
    value: (si, which) => printValue(quantity(si, dimensions[which])),
  });
  const spoken = hand.members.map((forces) => spokenForces(hand, forces)).join("; ");
  return {
    kind: "diagrams",
    title: `Internal forces under ${hand.name}`,
    description: `${spoken}${words}.`,
    structure,
    forces: hand.members,
    quantities: order,
    moments,
    marks,
    ...(bands.length === 0 ? {} : { bands }),
  };
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

function rows(bands: BandBook, hand: Hand): readonly (readonly TableCell[])[] {
  const places = hand.members.flatMap((forces) =>
    stations(hand, forces).map((place) => ({ ...place, member: forces.member })),
  );
  const values = places.flatMap(({ member, at }) =>
    [hand.axial, hand.shear, hand.moment].map((ask) => ({ value: ask(member, { at }) })),
  );
  const cells = handCells(bands, values);
  return places.map(({ member, label }, i) => [member, label, ...cells.slice(3 * i, 3 * i + 3)]);
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
