// Can a structure carry a load, mechanism or not? It can when the load does no work on any motion that strains nothing.

import type { LoadBalance } from "../results/index.ts";
import { checkLoads, deepFreeze, type Load, type Structure } from "../structure/index.ts";
import { type Equilibrium, equilibriumMatrix, loadVector } from "./equilibrium-matrix.ts";
import { mechanism, motionsOf } from "./mechanisms.ts";
import { and } from "./words.ts";

/** Whether the load lies in the range of the equilibrium matrix, and which motion it drives when it does not.
 *  A mechanism that balances the load is never called stable. */
export function balance(structure: Structure, loads: readonly Load[]): LoadBalance {
  checkLoads(structure, loads);
  return balanceOf(equilibriumMatrix(structure), loads);
}

/** The same from equations already written. */
export function balanceOf(equilibrium: Equilibrium, loads: readonly Load[]): LoadBalance {
  const motions = motionsOf(equilibrium);
  const b = loadVector(equilibrium, loads);
  const driven = motions.flatMap((motion) => {
    const { work, scale } = workOf(equilibrium, b, motion);
    return Math.abs(work) > 1e-9 * scale ? [mechanism(equilibrium, motion, work < 0 ? -1 : 1)] : [];
  });
  const balanced = driven.length === 0;
  const said = balanced
    ? balancedWords(motions.map((motion) => mechanism(equilibrium, motion).words))
    : and(driven.map((m) => `nothing resists ${asObject(m.words)}`));
  return deepFreeze({ balanced, driven, words: said });
}

/** Work of the load on a motion, and the sum of its parts' magnitudes, to judge zero by. */
function workOf(
  { equations }: Equilibrium,
  b: Float64Array,
  motion: Float64Array,
): { readonly work: number; readonly scale: number } {
  let [work, scale] = [0, 0];
  for (let i = 0; i < equations; i++) {
    const part = (b[i] ?? 0) * (motion[i] ?? 0);
    work += part;
    scale += Math.abs(part);
  }
  return { work, scale };
}

function balancedWords(motions: readonly string[]): string {
  if (motions.length === 0) return "stable: this load and any other is balanced";
  const would = motions.map((m) => (m.startsWith("sway: ") ? "sway" : `move (${m})`));
  return `a mechanism; balances this load only; would ${and([...new Set(would)])} under any other`;
}

function asObject(motion: string): string {
  return motion.startsWith("sway: ") ? motion : `this motion: ${motion}`;
}
