// Wording shared by the verbs.

import { printValue, quantity } from "../quantity/index.ts";
import { counted } from "../statics/index.ts";
import type { Structure } from "../structure/types.ts";

export { and, counted } from "../statics/index.ts";

const calls: Readonly<Record<Structure["family"], string>> = {
  beam: "beam",
  portal: "frame",
  general: "structure",
};

/** "frame ABCD", "beam ABC": the family and its joints; long ones by their number of members, building frames by their bays and
 *  storeys. */
export function structureName(structure: Structure): string {
  const joints = structure.joints.map((joint) => joint.name).join("");
  if (structure.form === "building frame") return buildingFrameName(structure);
  const called = calls[structure.family];
  return joints.length <= 8 ? `${called} ${joints}` : `${called} of ${structure.members.length} members`;
}

/** "frame of 2 bays and 3 storeys"; where members are left out or bays set back, with their number, which tells such frames apart. */
function buildingFrameName({ joints, members }: Structure): string {
  const lines = (at: readonly number[]): number => new Set(at.map((x) => x.toFixed(6))).size;
  const [bays, storeys] = [lines(joints.map(({ x }) => x)) - 1, lines(joints.map(({ y }) => y)) - 1];
  const name = `frame of ${counted(bays, "bay")} and ${counted(storeys, "storey")}`;
  const full = bays * storeys + (bays + 1) * storeys;
  return members.length === full ? name : `${name}, ${counted(members.length, "member")}`;
}

/** With a capital at its head, to begin a line with. */
export function capital(text: string): string {
  return text.charAt(0).toUpperCase() + text.slice(1);
}

/** Metres printed in the sheet's length unit. */
export function lengthText(metres: number): string {
  return printValue(quantity(metres, "length"));
}

/** A part of the span: 0.21132 is "0.211 L". */
export function spanPart(fraction: number): string {
  return `${fraction.toFixed(3)} L`;
}
