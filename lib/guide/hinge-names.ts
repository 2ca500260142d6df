// What hinge sets and their hinges are called on the sheet.

import type { HingesOptions, LoadCase } from "./types.ts";

/** The id of a hinge's assumption; also the name its place is set by from outside. */
export const hingeId = (name: string, set: string): string => `hinge ${name} (${set})`;

/** The name given, or the keys of the load cases: "G + S". Throws without load cases, and on a name that cannot be one. */
export function setName(verb: string, cases: readonly LoadCase[], { name }: HingesOptions): string {
  if (cases.length === 0)
    throw new Error(`${verb}: no load case; hinges belong to the loads they were chosen for`);
  const keys = cases.map(({ key }) => key).join(" + ");
  if (name === undefined) return keys;
  if (typeof name !== "string" || !/^[\p{L}\p{N}][^=@:\n]*$/u.test(name) || name.trim() !== name)
    throw new Error(
      `${verb}: the name "${String(name)}" of the hinge set is refused; write a few words beginning with a letter, without = @ and :, such as "${keys}, hinge in the short span"`,
    );
  return name;
}
