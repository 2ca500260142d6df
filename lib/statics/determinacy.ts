// Is a structure determinate? By the trade's count and by the rank of the equilibrium matrix; where they differ the rank rules.

import type { Determinacy } from "../results/index.ts";
import { deepFreeze, heldCount, type Structure } from "../structure/index.ts";
import { eliminate } from "./elimination.ts";
import { type Equilibrium, equilibriumMatrix } from "./equilibrium-matrix.ts";
import { mechanism, motionsOf } from "./mechanisms.ts";
import { and, counted, ordinal } from "./words.ts";

/** Count, rank, states of self-stress and mechanisms of a structure with its hinges.
 *  A hinge inside a member is one condition; a joint at which all n member ends are released counts n - 1.
 *  Source: S. Pellegrino & C. R. Calladine, Int. J. Solids Structures 22 (1986) 409-428. */
export function determinacy(structure: Structure): Determinacy {
  const equilibrium = equilibriumMatrix(structure);
  const { matrix, unknowns, equations } = equilibrium;
  const { rank, nullSpace } = eliminate(matrix, unknowns.length);
  const mechanisms = motionsOf(equilibrium).map((motion) => mechanism(equilibrium, motion));
  const found = { count: countOf(structure), rank, unknowns: unknowns.length, equations };
  const selfStress = unknowns.length - rank;
  const axial = selfStress > 0 && nullSpace.every((state) => isAxial(equilibrium, state));
  const answer = { ...found, selfStress, mechanisms, verdict: verdictOf(selfStress, mechanisms.length) };
  return deepFreeze({ ...answer, words: wordsOf(answer, axial) });
}

/** r, m, j and c as the trade counts them. */
export function countOf(structure: Structure): Determinacy["count"] {
  const reactions = structure.supports.reduce((n, s) => n + heldCount(s), 0);
  const [members, joints] = [structure.members.length, structure.joints.length];
  const released = structure.joints.reduce((n, joint) => n + conditionsAt(structure, joint.name), 0);
  const conditions = structure.hinges.length + released;
  return {
    reactions,
    members,
    joints,
    conditions,
    degree: 3 * members + reactions - 3 * joints - conditions,
  };
}

/** Whether a state of self-stress bends nothing. */
export function isAxial({ unknowns }: Equilibrium, state: Float64Array): boolean {
  const size = Math.max(...state.map(Math.abs));
  return unknowns.every(
    (u, k) => (u.kind !== "M start" && u.kind !== "M end") || Math.abs(state[k] ?? 0) <= 1e-9 * size,
  );
}

function conditionsAt(structure: Structure, joint: string): number {
  const ends = structure.members.flatMap((m) => [
    ...(m.start === joint ? [m.releases.start.moment] : []),
    ...(m.end === joint ? [m.releases.end.moment] : []),
  ]);
  const released = ends.filter((r) => r).length;
  return released > 0 && released === ends.length ? released - 1 : released;
}

function verdictOf(selfStress: number, motions: number): Determinacy["verdict"] {
  if (motions === 0) return selfStress === 0 ? "determinate" : "indeterminate";
  return selfStress === 0 ? "mechanism" : "mechanism with self-stress";
}

function wordsOf(found: Omit<Determinacy, "words">, axial: boolean): string {
  const { count, selfStress, mechanisms } = found;
  const { reactions: r, members: m, joints: j, conditions: c, degree } = count;
  const sum = `3m + r - 3j - c = ${3 * m} + ${r} - ${3 * j} - ${c} = ${degree}`;
  const motions = and(mechanisms.map((one) => one.words));
  switch (found.verdict) {
    case "determinate":
      return `determinate and stable: ${sum}`;
    case "indeterminate":
      return `indeterminate to the ${ordinal(selfStress)} degree: ${sum}${axial ? "; only axial force along a straight line is redundant, no moment" : ""}`;
    case "mechanism":
      return `a mechanism: ${sum}; nothing resists ${counted(mechanisms.length, "motion")}: ${motions}`;
    case "mechanism with self-stress":
      return `${countWords(degree)} (${sum}), but the rank of the equilibrium equations is ${found.rank} of ${found.equations} and rules: a mechanism, nothing resists ${counted(mechanisms.length, "motion")} (${motions}), while ${counted(selfStress, "restraint")} elsewhere ${selfStress === 1 ? "is" : "are"} redundant`;
  }
}

function countWords(degree: number): string {
  if (degree === 0) return "the count says determinate";
  return degree > 0
    ? `the count says indeterminate to the ${ordinal(degree)} degree`
    : "the count says mechanism";
}
