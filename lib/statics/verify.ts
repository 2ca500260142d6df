// The sequence of free bodies against the whole structure solved at once: an internal check on every solution.

import { type MemberForces, valueAt } from "../results/index.ts";
import type { Load, Structure } from "../structure/index.ts";
import { eliminate } from "./elimination.ts";
import type { Found } from "./equations.ts";
import { equilibriumMatrix, loadVector, type Unknown } from "./equilibrium-matrix.ts";
import { StaticsError } from "./faults.ts";
import { reactionForce } from "./force-names.ts";

/** Throws when a reaction or an end force differs by more than 1e-9 of the largest force (moments: times the structure's size). */
export function verifyAgainstWhole(
  structure: Structure,
  loads: readonly Load[],
  known: ReadonlyMap<string, Found>,
  members: readonly MemberForces[],
): void {
  const equilibrium = equilibriumMatrix(structure);
  const { size, unknowns, matrix } = equilibrium;
  const b = loadVector(equilibrium, loads).map((v) => -v);
  const [t] = eliminate(matrix, unknowns.length, [b]).solutions;
  const scale = Math.max(...b.map(Math.abs), ...(t ?? []).map(Math.abs));
  unknowns.forEach((unknown, k) => {
    const whole = t?.[k] ?? Number.NaN;
    const { what, sequence, lever } = bySequence(
      equilibrium.skeleton.segments,
      unknown,
      known,
      members,
      size,
    );
    if (!(Math.abs(sequence / lever - whole) <= 1e-9 * scale))
      throw new StaticsError({ kind: "differs", what, sequence, whole: whole * lever });
  });
}

function bySequence(
  segments: ReturnType<typeof equilibriumMatrix>["skeleton"]["segments"],
  unknown: Unknown,
  known: ReadonlyMap<string, Found>,
  members: readonly MemberForces[],
  size: number,
): { readonly what: string; readonly sequence: number; readonly lever: number } {
  if (unknown.kind === "reaction") {
    const { name } = reactionForce(unknown.joint, unknown.component === "moment" ? "M" : unknown.component);
    return {
      what: name,
      sequence: known.get(name)?.value ?? Number.NaN,
      lever: unknown.component === "moment" ? size : 1,
    };
  }
  const segment = segments[unknown.segment];
  const forces = members.find((m) => m.member === segment?.member);
  if (segment === undefined || forces === undefined)
    return { what: unknown.kind, sequence: Number.NaN, lever: 1 };
  const what = `${unknown.kind} of ${segment.member}`;
  if (unknown.kind === "N")
    return { what, sequence: valueAt(forces.N, segment.end, endSide(forces, segment.end)), lever: 1 };
  const sequence =
    unknown.kind === "M start" ? valueAt(forces.M, segment.begin) : valueAt(forces.M, segment.end, "left");
  return { what, sequence, lever: size };
}

/** A load at a cut belongs to the segment that ends there, so N at its end is taken beyond the load. */
function endSide(forces: MemberForces, end: number): "left" | "right" {
  return end < forces.length ? "right" : "left";
}
