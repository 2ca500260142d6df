// Frames for the restraint formulas: held against sway and hardly changing length, so that only the turns of joints matter.

import { type Quantity, quantity } from "../../lib/quantity/index.ts";
import {
  buildingFrame,
  type Load,
  type Section,
  type Structure,
  uniform,
} from "../../lib/structure/index.ts";

/** EI = 1 in ratio; A so large that lengths stay. */
export const stiffSection = (I: number, E = 1): Section => ({ E, I, A: I * 1e7 });

export const metres = (x: number): Quantity<"length"> => quantity(x, "length");

/** A building frame with a horizontal support at the left end of every floor; `I` by member name. */
export function heldFrame(
  bays: readonly number[],
  storeys: readonly number[],
  bases: "pinned" | "fixed",
  I: (member: string, group: string) => number,
): Structure {
  const frame = buildingFrame({ bays: bays.map(metres), storeys: storeys.map(metres), bases });
  const floors = storeys.map((_, i) => `A${i + 1}`);
  return {
    ...frame,
    members: frame.members.map((m) => ({ ...m, section: stiffSection(I(m.name, m.group ?? "")) })),
    supports: [
      ...frame.supports,
      ...floors.map((joint) => ({
        joint,
        kind: "roller" as const,
        holds: { x: true, y: false, rotation: false },
        from: [],
      })),
    ],
  };
}

/** The same uniform load on every beam. */
export function everyBeam(structure: Structure, w = 20e3): readonly Load[] {
  return structure.members
    .filter((m) => m.group === "beams")
    .map((m) => uniform(m.name, quantity(w, "force per length")));
}
