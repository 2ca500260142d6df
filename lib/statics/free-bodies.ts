// Free bodies in the order a person would choose, first between hinges, then member by member and joint by joint.

import type { FreeBody, FreeBodySolution, Step } from "../results/index.ts";
import { checkLoads, deepFreeze, inGlobalAxes, type Load, type Structure } from "../structure/index.ts";
import { settleAxial } from "./axial.ts";
import {
  type Body,
  forceNames,
  freeBody,
  joinedBody,
  membersAndJoints,
  partsBetweenHinges,
} from "./bodies.ts";
import { bodyNames } from "./body-names.ts";
import { closuresOf } from "./closures.ts";
import { type Cutting, cutting } from "./cutting.ts";
import { actingOn, type NameOf } from "./equations.ts";
import { memberForces } from "./member-forces.ts";
import { reactionsOf } from "./reactions.ts";
import { sizeOf } from "./size.ts";
import { solvableWhole } from "./solvable.ts";
import { type Solving, solveBodies } from "./solving.ts";
import { verifyAgainstWhole } from "./verify.ts";

/** Reactions, forces through hinges, in bars and at joints, and N, V, M along every member, each found by a step that can be
 *  re-added. N, N·m, m; senses as in results/types.ts. Throws, in words, when hinges are missing, when the load is not
 *  balanced, and when a load acts along a line held at both ends. The result is checked against the whole-structure solution
 *  to 1e-9. */
export function freeBodies(structure: Structure, given: readonly Load[]): FreeBodySolution {
  checkLoads(structure, given);
  const loads = given.map((load) => inGlobalAxes(structure, load));
  const settled = settleAxial(structure, loads);
  const { equilibrium, whole, largest } = solvableWhole(settled.structure, loads);
  const cut = cutting(settled.structure, loads, given);
  const parts = partsBetweenHinges(cut);
  const bodies = [...parts, ...membersAndJoints(cut)];
  const names = bodyNames(structure, bodies);
  const nameOf = namesOfSets(names, parts.length);
  const state: Solving = {
    structure: settled.structure,
    bodies,
    nameOf,
    size: sizeOf(structure),
    known: new Map(),
    steps: [],
    used: [],
  };
  const [first, second] = [parts.map((_, i) => i), bodies.map((_, i) => i).slice(parts.length)];
  solveBodies(state, first, "pick");
  solveBodies(state, second, "walk");
  const members = memberForces(cut, state.known);
  const reactions = reactionsOf(settled.structure, state.known, settled.zero);
  verifyAgainstWhole(equilibrium, whole, largest, members, reactions);
  const value = (force: string): number | undefined => state.known.get(force)?.value;
  const cutFree = bodies.map((body, i) => freeBody(names[i] ?? "", body, value));
  const joined = joinedBodies(cut, bodies, state.steps, nameOf, value);
  return deepFreeze({
    forces: forceNames(bodies),
    bodies: [...cutFree, ...joined.map(({ body }) => body)],
    steps: state.steps.map((step) => asJoined(step, joined, cutFree.length)),
    closures: [...closuresOf(state, first), ...closuresOf(state, second)],
    reactions,
    members,
    notes: settled.notes,
  });
}

/** The parts between hinges, all together, are the whole structure. */
function namesOfSets(names: readonly string[], parts: number): NameOf {
  return (bodies) =>
    bodies.length === parts && parts > 1 && bodies.every((i) => i < parts)
      ? "whole structure"
      : bodies.map((i) => names[i] ?? "").join(" + ");
}

interface Joined {
  readonly key: string;
  readonly body: FreeBody;
}

/** What bodies are together, once for each set that was joined. */
function joinedBodies(
  cut: Cutting,
  bodies: readonly Body[],
  steps: readonly Step[],
  nameOf: NameOf,
  value: (force: string) => number | undefined,
): readonly Joined[] {
  const sets = new Map(steps.filter((s) => s.bodies.length > 1).map((s) => [s.bodies.join(" "), s.bodies]));
  return [...sets].map(([key, set]) => {
    const parts = set.flatMap((i) => bodies[i] ?? []);
    const body = joinedBody(cut, parts, actingOn(bodies, set));
    return { key, body: freeBody(nameOf(set).replaceAll(" + ", " with "), body, value) };
  });
}

function asJoined(step: Step, joined: readonly Joined[], offset: number): Step {
  const found = joined.findIndex(({ key }) => key === step.bodies.join(" "));
  return found === -1 ? step : { ...step, joined: offset + found };
}
