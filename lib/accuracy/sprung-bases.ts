// Bases whose restraint is varied: supports that held or did not hold rotation get a rotational spring.

import { endsReleasedAt } from "../structure/index.ts";
import type { Structure, Support } from "../structure/types.ts";
import { AccuracyError } from "./faults.ts";
import type { Unknown } from "./unknowns.ts";

/** Fixities from here to 1 count as this one: a spring a million times as stiff as the member end. */
export const almostFixed: number = 1 - 1e-6;

/** The structure with a rotational spring at every joint whose fixity is unknown. Throws where there is no support, where
 *  nothing takes a moment, and when a joint stands in two unknowns. */
export function withSprungBases(structure: Structure, unknowns: readonly Unknown[]): Structure {
  const joints = unknowns.flatMap((u) => (u.kind === "fixity" ? u.joints : []));
  if (joints.length === 0) return structure;
  const known = structure.supports.map((s) => s.joint);
  joints.forEach((joint, i) => {
    const refuse = (why: string): never => {
      throw new AccuracyError({ kind: "not a base", joint, why, known });
    };
    if (!known.includes(joint)) refuse("no support is there");
    if (joints.indexOf(joint) !== i) refuse("it is varied already");
    if (endsReleasedAt(structure, joint)) refuse("every member end there is released");
  });
  const supports = structure.supports.map((s) => (joints.includes(s.joint) ? sprung(s) : s));
  return Object.freeze({ ...structure, supports: Object.freeze(supports) });
}

function sprung(support: Support): Support {
  const { holds, springs } = support;
  return Object.freeze({
    ...support,
    kind: holds.x && holds.y ? "pinned" : holds.x || holds.y ? "roller" : "free",
    holds: Object.freeze({ ...holds, rotation: false }),
    springs: Object.freeze({ ...springs, rotation: 0 }),
  });
}
