// Wording shared by the verbs.

import { printValue, quantity } from "../quantity/index.ts";
import type { Structure } from "../structure/types.ts";

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

/** "A", "A and B", "A, B and C". */
export function and(names: readonly string[]): string {
  if (names.length < 2) return names.join("");
  return `${names.slice(0, -1).join(", ")} and ${names[names.length - 1]}`;
}

/** "1 hinge", "2 hinges". */
export function counted(n: number, noun: string): string {
  return `${n} ${noun}${n === 1 ? "" : "s"}`;
}

/** Metres printed in the sheet's length unit. */
export function lengthText(metres: number): string {
  return printValue(quantity(metres, "length"));
}

/** A part of the span: 0.21132 is "0.211 L". */
export function spanPart(fraction: number): string {
  return `${fraction.toFixed(3)} L`;
}
