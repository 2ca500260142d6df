// Wording shared by the verbs.

import { printValue, quantity } from "../quantity/index.ts";
import type { Structure } from "../structure/types.ts";

export { and, counted } from "../statics/index.ts";

const calls: Readonly<Record<Structure["family"], string>> = {
  beam: "beam",
  portal: "frame",
  general: "structure",
};

/** "frame ABCD", "beam ABC": the family and its joints; long ones by their number of members. */
export function structureName(structure: Structure): string {
  const joints = structure.joints.map((joint) => joint.name).join("");
  const called = calls[structure.family];
  return joints.length <= 8 ? `${called} ${joints}` : `${called} of ${structure.members.length} members`;
}

/** Metres printed in the sheet's length unit. */
export function lengthText(metres: number): string {
  return printValue(quantity(metres, "length"));
}

/** A part of the span: 0.21132 is "0.211 L". */
export function spanPart(fraction: number): string {
  return `${fraction.toFixed(3)} L`;
}
