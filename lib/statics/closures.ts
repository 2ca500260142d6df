// Equations left over when every force is found: each must close by itself.

import type { Closure } from "../results/index.ts";
import { closureOf, type Equation, equationsOf, termsOf } from "./equations.ts";
import { grows } from "./simultaneous.ts";
import type { Solving } from "./solving.ts";
import { usesOf } from "./uses.ts";

/** The equations of the bodies `which` that do not follow from those used so far in their cutting, body by body. */
export function closuresOf(state: Solving, which: readonly number[]): readonly Closure[] {
  const used = state.used.filter((equation) => equation.bodies.every((i) => which.includes(i)));
  return groupsOf(which, used)
    .flatMap((group) => closuresOfGroup(state, group, used))
    .sort((a, b) => (a.bodies[0] ?? 0) - (b.bodies[0] ?? 0));
}

function closuresOfGroup(
  state: Solving,
  group: readonly number[],
  used: readonly Equation[],
): readonly Closure[] {
  const basis: Float64Array[] = [];
  const row = (equation: Equation): Float64Array => vectorOf(equation, group, state.size);
  for (const equation of used) if (group.includes(equation.bodies[0] ?? -1)) grows(basis, row(equation));
  return group.flatMap((i) =>
    asChecked(equationsOf(state.bodies, [i], state.size))
      .filter((equation) => grows(basis, row(equation)) && equation.entries.length > 0)
      .map((equation) => {
        const uses = usesOf(state.structure, equation, termsOf(equation, state.known), state.known);
        return closureOf(equation, state.known, state.nameOf, uses);
      }),
  );
}

/** Bodies that were joined for an equation go together; all others stand alone, so that few equations are compared. */
function groupsOf(which: readonly number[], used: readonly Equation[]): readonly (readonly number[])[] {
  const group = new Map(which.map((i) => [i, i]));
  for (const { bodies } of used) {
    const roots = new Set(bodies.map((i) => group.get(i)));
    const [first] = bodies.map((i) => group.get(i) ?? i).sort((a, b) => a - b);
    if (roots.size > 1) for (const [i, root] of group) if (roots.has(root)) group.set(i, first ?? i);
  }
  const groups = new Map<number, number[]>();
  for (const [i, root] of group) groups.set(root, [...(groups.get(root) ?? []), i]);
  return [...groups.values()];
}

/** One moment equation, then the forces: the order of a check by hand. Moments about other points follow from these. */
function asChecked(equations: readonly Equation[]): readonly Equation[] {
  const moments = equations.filter((e) => e.kind === "sum M");
  const forces = equations.filter((e) => e.kind !== "sum M");
  return [...moments.slice(0, 1), ...forces];
}

/** An equation as a sum of ΣFx, ΣFy and ΣM/size about the origin of each body: ΣM about P is ΣM - Px ΣFy + Py ΣFx. */
function vectorOf(
  { bodies, kind, about, along }: Equation,
  which: readonly number[],
  size: number,
): Float64Array {
  const row = new Float64Array(3 * which.length);
  for (const body of bodies) {
    const at = 3 * which.indexOf(body);
    if (kind === "sum Fx") row[at] = 1;
    else if (kind === "sum Fy") row[at + 1] = 1;
    else if (kind === "sum F") row.set([along?.direction.x ?? 0, along?.direction.y ?? 0], at);
    else row.set([(about?.point.y ?? 0) / size, -(about?.point.x ?? 0) / size, 1], at);
  }
  return row;
}
