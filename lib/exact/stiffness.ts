// What resists: EA and EI per member, and the springs of supports.

import type { Structure } from "../structure/index.ts";
import { ExactError } from "./errors.ts";
import type { Prepared } from "./prepare.ts";

/** Rigidities in the order of the structure's members, N and N·m²; springs in the order of the preparation's, N/m and N·m/rad. */
export interface Stiffness {
  readonly EA: Float64Array;
  readonly EI: Float64Array;
  readonly springs: Float64Array;
}

/** The stiffness a structure's sections and supports give. Throws on a member without section. */
export function stiffnessOf({ structure, springs }: Prepared): Stiffness {
  const { members } = structure;
  const EA = new Float64Array(members.length);
  const EI = new Float64Array(members.length);
  members.forEach(({ name, section }, i) => {
    if (section === undefined) throw new ExactError({ kind: "no section", member: name });
    EA[i] = section.E * section.A;
    EI[i] = section.E * section.I;
  });
  const stiff = springs.map(({ joint, axis }) => springOf(structure, joint, axis));
  return { EA, EI, springs: Float64Array.from(stiff) };
}

function springOf(structure: Structure, joint: string, axis: "x" | "y" | "rotation"): number {
  return structure.supports.find((s) => s.joint === joint)?.springs?.[axis] ?? 0;
}

/** Throws when arrays do not fit the structure, or a rigidity is not finite and more than zero, or a spring negative. */
export function checkStiffness({ structure, springs }: Prepared, stiffness: Stiffness): void {
  const { members } = structure;
  for (const [what, array, wanted] of [
    ["EA", stiffness.EA, members.length],
    ["EI", stiffness.EI, members.length],
    ["springs", stiffness.springs, springs.length],
  ] as const) {
    if (array.length !== wanted)
      throw new ExactError({ kind: "wrong number", what, wanted, got: array.length });
    for (let i = 0; i < wanted; i++) {
      const value = array[i] as number; // i is within the length
      if (value > 0 && value < Number.POSITIVE_INFINITY) continue;
      if (value === 0 && what === "springs") continue;
      const name =
        what === "springs" ? `spring at ${springs[i]?.joint}` : `${what} of member ${members[i]?.name}`;
      throw new ExactError({ kind: "bad stiffness", what: name, value });
    }
  }
}
