// Free bodies in the order a person would choose, first between hinges, then member by member and joint by joint.

import type { FreeBodySolution, Reaction } from "../results/index.ts";
import { checkLoads, deepFreeze, inGlobalAxes, type Load, type Structure } from "../structure/index.ts";
import { settleAxial } from "./axial.ts";
import { balance } from "./balance.ts";
import { forceNames, freeBody, membersAndJoints, partsBetweenHinges } from "./bodies.ts";
import { bodyNames } from "./body-names.ts";
import { closuresOf } from "./closures.ts";
import { cutting } from "./cutting.ts";
import { determinacy } from "./determinacy.ts";
import type { Found } from "./equations.ts";
import { StaticsError } from "./faults.ts";
import { reactionForce } from "./force-names.ts";
import { memberForces } from "./member-forces.ts";
import { type Solving, solveBodies } from "./solving.ts";
import { verifyAgainstWhole } from "./verify.ts";

/** Reactions, forces through hinges and at joints, and N, V, M along every member, each found by a step that can be re-added.
 *  N, N·m, m; senses as in results/types.ts. Throws, in words, when hinges are missing, when the load is not balanced,
 *  and when a load acts along a line held at both ends. The result is checked against the whole-structure solution to 1e-9. */
export function freeBodies(structure: Structure, given: readonly Load[]): FreeBodySolution {
  checkLoads(structure, given);
  const loads = given.map((load) => inGlobalAxes(structure, load));
  const settled = settleAxial(structure, loads);
  checkSolvable(settled.structure, loads);
  const cut = cutting(settled.structure, loads);
  const parts = partsBetweenHinges(cut);
  const bodies = [...parts, ...membersAndJoints(cut)];
  const names = bodyNames(structure, bodies);
  const state: Solving = { bodies, names, size: sizeOf(structure), known: new Map(), steps: [], used: [] };
  const [first, second] = [parts.map((_, i) => i), bodies.map((_, i) => i).slice(parts.length)];
  solveBodies(state, first, "pick");
  solveBodies(state, second, "walk");
  const members = memberForces(cut, state.known);
  verifyAgainstWhole(settled.structure, loads, state.known, members);
  return deepFreeze({
    forces: forceNames(bodies),
    bodies: bodies.map((body, i) => freeBody(names[i] ?? "", body, (force) => state.known.get(force)?.value)),
    steps: state.steps,
    closures: [...closuresOf(state, first), ...closuresOf(state, second)],
    reactions: settled.structure.supports.map((s) => reactionAt(s.joint, state.known, settled.zero)),
    members,
    notes: settled.notes,
  });
}

function checkSolvable(structure: Structure, loads: readonly Load[]): void {
  const hinges = structure.hinges.length;
  const { verdict, selfStress, words } = determinacy(structure);
  const { balanced, driven, words: why } = balance(structure, loads);
  if (!balanced) throw new StaticsError({ kind: "not balanced", driven, words: why, hinges });
  if (verdict === "mechanism with self-stress")
    throw new StaticsError({ kind: "self-stress in a mechanism", words });
  if (verdict === "indeterminate")
    throw new StaticsError({ kind: "indeterminate", degree: selfStress, hinges });
}

function reactionAt(
  joint: string,
  known: ReadonlyMap<string, Found>,
  zero: readonly { readonly joint: string; readonly component: "x" | "y" }[],
): Reaction {
  const [x, y, moment] = (["x", "y", "M"] as const).map((c) => known.get(reactionForce(joint, c).name));
  const noForce = zero.filter((z) => z.joint === joint).map((z) => [z.component, 0] as const);
  return {
    joint,
    ...Object.fromEntries(noForce),
    ...(x === undefined ? {} : { x: x.value }),
    ...(y === undefined ? {} : { y: y.value }),
    ...(moment === undefined ? {} : { moment: moment.value }),
    steps: {
      ...(x === undefined ? {} : { x: x.step }),
      ...(y === undefined ? {} : { y: y.step }),
      ...(moment === undefined ? {} : { moment: moment.step }),
    },
  };
}

function sizeOf({ joints }: Structure): number {
  const [xs, ys] = [joints.map((j) => j.x), joints.map((j) => j.y)];
  return Math.hypot(Math.max(...xs) - Math.min(...xs), Math.max(...ys) - Math.min(...ys));
}
