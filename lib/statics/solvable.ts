// Whether statics alone gives the forces of a structure under its loads, and the whole-structure solution if so.

import type { Load, Structure } from "../structure/index.ts";
import { balanceOf } from "./balance.ts";
import { determinacy } from "./determinacy.ts";
import { eliminate } from "./elimination.ts";
import { type Equilibrium, equilibriumMatrix, loadVector } from "./equilibrium-matrix.ts";
import { StaticsError } from "./faults.ts";

export interface Whole {
  readonly equilibrium: Equilibrium;
  /** The unknowns of the equations, moments over the structure's size. */
  readonly whole: Float64Array;
  /** Largest entry of the load vector. */
  readonly largest: number;
}

/** The equations of the structure solved at once. Throws, in words, when hinges are missing or the load is not balanced. */
export function solvableWhole(structure: Structure, loads: readonly Load[]): Whole {
  const equilibrium = equilibriumMatrix(structure);
  const { matrix, unknowns, equations } = equilibrium;
  const b = loadVector(equilibrium, loads).map((v) => -v);
  const { rank, solutions } = eliminate(matrix, unknowns.length, [b]);
  const hinges = structure.hinges.length;
  if (rank < equations) {
    const { balanced, driven, words } = balanceOf(equilibrium, loads);
    if (!balanced) throw new StaticsError({ kind: "not balanced", driven, words, hinges });
    if (rank < unknowns.length)
      throw new StaticsError({ kind: "self-stress in a mechanism", words: determinacy(structure).words });
  }
  if (rank < unknowns.length)
    throw new StaticsError({ kind: "indeterminate", degree: unknowns.length - rank, hinges });
  const largest = b.reduce((most, v) => Math.max(most, Math.abs(v)), 0);
  return { equilibrium, whole: solutions[0] ?? new Float64Array(0), largest };
}
