// The sequence of free bodies against the whole structure solved at once: an internal check on every solution.

import { type MemberForces, type Reaction, valueAt } from "../results/index.ts";
import type { Equilibrium, Unknown } from "./equilibrium-matrix.ts";
import { StaticsError } from "./faults.ts";

/** Throws when a reaction or an end force differs by more than 1e-9 of the largest force (moments: times the structure's
 *  size). `whole` solves the equations of the structure under its loads, which `largest` is the largest of. */
export function verifyAgainstWhole(
  equilibrium: Equilibrium,
  whole: Float64Array,
  largest: number,
  members: readonly MemberForces[],
  reactions: readonly Reaction[],
): void {
  const scale = whole.reduce((most, t) => Math.max(most, Math.abs(t)), largest);
  equilibrium.unknowns.forEach((unknown, k) => {
    const { what, sequence, lever } =
      unknown.kind === "reaction"
        ? reactionBySequence(equilibrium, unknown, reactions)
        : forceBySequence(equilibrium, unknown, members);
    const expected = whole[k] ?? Number.NaN;
    if (!(Math.abs(sequence / lever - expected) <= 1e-9 * scale))
      throw new StaticsError({ kind: "differs", what, sequence, whole: expected * lever });
  });
}

interface Compared {
  readonly what: string;
  readonly sequence: number;
  readonly lever: number;
}

/** Along the support's own axes, as the matrix has it. */
function reactionBySequence(
  { structure, size }: Equilibrium,
  { joint, component }: Extract<Unknown, { readonly kind: "reaction" }>,
  reactions: readonly Reaction[],
): Compared {
  const what = `the reaction at ${joint}`;
  const found = reactions.find((r) => r.joint === joint);
  if (component === "moment") return { what, sequence: found?.moment ?? Number.NaN, lever: size };
  const angle = structure.supports.find((s) => s.joint === joint)?.angle ?? 0;
  if (angle === 0) return { what, sequence: found?.[component] ?? Number.NaN, lever: 1 };
  const [c, s] = [Math.cos(angle), Math.sin(angle)];
  const { x = 0, y = 0 } = found ?? {};
  return { what, sequence: component === "x" ? c * x + s * y : c * y - s * x, lever: 1 };
}

function forceBySequence(
  { skeleton, size }: Equilibrium,
  { kind, segment: index }: Exclude<Unknown, { readonly kind: "reaction" }>,
  members: readonly MemberForces[],
): Compared {
  const segment = skeleton.segments[index];
  const forces = members.find((m) => m.member === segment?.member);
  if (segment === undefined || forces === undefined) return { what: kind, sequence: Number.NaN, lever: 1 };
  const what = `${kind} of ${segment.member}`;
  if (kind === "N")
    return { what, sequence: valueAt(forces.N, segment.end, endSide(forces, segment.end)), lever: 1 };
  const sequence =
    kind === "M end" ? valueAt(forces.M, segment.end, "left") : valueAt(forces.M, segment.begin);
  return { what, sequence, lever: size };
}

/** A load at a cut belongs to the segment that ends there, so N at its end is taken beyond the load. */
function endSide(forces: MemberForces, end: number): "left" | "right" {
  return end < forces.length ? "right" : "left";
}
