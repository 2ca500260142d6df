// Is a structure determinate? By the trade's count and by the rank of the equilibrium matrix; where they differ the rank rules.

import type { Determinacy } from "../results/index.ts";
import { deepFreeze, heldCount, type Structure } from "../structure/index.ts";
import { equilibriumMatrix } from "./equilibrium-matrix.ts";
import { mechanism, motionsOf } from "./mechanisms.ts";
import { selfStress, selfStressVectors } from "./self-stress.ts";
import { and, counted, ordinal } from "./words.ts";

/** Count, rank, states of self-stress and mechanisms of a structure with its hinges.
 *  A hinge inside a member is one condition; a joint at which all n member ends are released counts n - 1. An end released
 *  for shear or axial force is one condition each; a spring of a support counts as held.
 *  Source: S. Pellegrino & C. R. Calladine, Int. J. Solids Structures 22 (1986) 409-428. */
export function determinacy(structure: Structure): Determinacy {
  const equilibrium = equilibriumMatrix(structure);
  const { unknowns, equations } = equilibrium;
  const states = selfStressVectors(equilibrium);
  const rank = unknowns.length - states.length;
  const motions = rank < equations ? motionsOf(equilibrium) : [];
  const mechanisms = motions.map((motion) => mechanism(equilibrium, motion));
  const selfStresses = states.map((state) => selfStress(equilibrium, state));
  const answer = {
    count: countOf(structure),
    rank,
    unknowns: unknowns.length,
    equations,
    selfStress: states.length,
    selfStresses,
    mechanisms,
    hidden: Math.min(states.length, mechanisms.length),
    verdict: verdictOf(states.length, mechanisms.length),
  };
  return deepFreeze({ ...answer, words: wordsOf(answer) });
}

/** r, m, j and c as the trade counts them. */
export function countOf(structure: Structure): Determinacy["count"] {
  const reactions = structure.supports.reduce((n, s) => n + heldCount(s), 0);
  const [members, joints] = [structure.members.length, structure.joints.length];
  const released = structure.joints.reduce((n, joint) => n + conditionsAt(structure, joint.name), 0);
  const sliding = structure.members.flatMap(({ releases: { start, end } }) =>
    [start.shear, start.axial, end.shear, end.axial].filter((r) => r === true),
  );
  const conditions = structure.hinges.length + released + sliding.length;
  return {
    reactions,
    members,
    joints,
    conditions,
    degree: 3 * members + reactions - 3 * joints - conditions,
  };
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

function wordsOf(found: Omit<Determinacy, "words">): string {
  const { count, selfStress, selfStresses, mechanisms } = found;
  const { reactions: r, members: m, joints: j, conditions: c, degree } = count;
  const sum = `3m + r - 3j - c = ${3 * m} + ${r} - ${3 * j} - ${c} = ${degree}`;
  const motions = and(mechanisms.map((one) => one.words));
  switch (found.verdict) {
    case "determinate":
      return `determinate and stable: ${sum}`;
    case "indeterminate":
      return `indeterminate to the ${ordinal(selfStress)} degree: ${sum}${axialWords(selfStresses)}`;
    case "mechanism":
      return `a mechanism: ${sum}; nothing resists ${counted(mechanisms.length, "motion")}: ${motions}`;
    case "mechanism with self-stress":
      return `${countWords(degree)} (${sum}), but the rank of the equilibrium equations is ${found.rank} of ${found.equations} and rules: a mechanism, nothing resists ${counted(mechanisms.length, "motion")} (${motions}), while ${counted(selfStress, "restraint")} elsewhere ${selfStress === 1 ? "is" : "are"} redundant`;
  }
}

/** What of the redundancy is not a moment: settled by no hinge. */
function axialWords(states: Determinacy["selfStresses"]): string {
  const lines = states.filter((s) => s.kind === "line");
  if (lines.length === 0) return "";
  if (lines.length === states.length)
    return "; only axial force along a straight line is redundant, no moment";
  return `; ${counted(lines.length, "degree")} of it ${lines.length === 1 ? "is" : "are"} axial force along a straight line`;
}

function countWords(degree: number): string {
  if (degree === 0) return "the count says determinate";
  return degree > 0
    ? `the count says indeterminate to the ${ordinal(degree)} degree`
    : "the count says mechanism";
}
