// Equations left over when every force is found: each must close by itself.

import type { Closure } from "../results/index.ts";
import { closureOf, type Equation, equationsOf } from "./equations.ts";
import { grows } from "./simultaneous.ts";
import type { Solving } from "./solving.ts";

/** The equations of the bodies `which` that do not follow from those used so far in their cutting, body by body. */
export function closuresOf(state: Solving, which: readonly number[]): readonly Closure[] {
  const basis: Float64Array[] = [];
  const row = (equation: Equation): Float64Array => vectorOf(equation, which, state.size);
  for (const equation of state.used)
    if (equation.bodies.every((i) => which.includes(i))) grows(basis, row(equation));
  return which.flatMap((i) =>
    asChecked(equationsOf(state.bodies, [i], state.size))
      .filter((equation) => grows(basis, row(equation)) && equation.entries.length > 0)
      .map((equation) => closureOf(equation, state.known, state.names)),
  );
}

/** One moment equation, then the forces, then moments about other points: the order of a check by hand. */
function asChecked(equations: readonly Equation[]): readonly Equation[] {
  const moments = equations.filter((e) => e.kind === "sum M");
  const forces = equations.filter((e) => e.kind !== "sum M");
  return [...moments.slice(0, 1), ...forces, ...moments.slice(1)];
}

/** An equation as a sum of ΣFx, ΣFy and ΣM/size about the origin of each body: ΣM about P is ΣM - Px ΣFy + Py ΣFx. */
function vectorOf({ bodies, kind, about }: Equation, which: readonly number[], size: number): Float64Array {
  const row = new Float64Array(3 * which.length);
  for (const body of bodies) {
    const at = 3 * which.indexOf(body);
    if (kind === "sum Fx") row[at] = 1;
    else if (kind === "sum Fy") row[at + 1] = 1;
    else row.set([(about?.point.y ?? 0) / size, -(about?.point.x ?? 0) / size, 1], at);
  }
  return row;
}
