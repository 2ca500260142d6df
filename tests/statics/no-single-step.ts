// Whether one equation of a body, or of bodies joined, could have given a single unknown: by linear algebra, for sums of forces
// in any direction and moments about any point at once, without the library's own list of equations.

import type { Action, FreeBodySolution, Step } from "../../lib/results/index.ts";

type Wrench = readonly [number, number, number];

/** Force x, force y and moment about the origin over `size`, of a unit of an action. */
function wrenchOf({ at, direction: [dx, dy], turn }: Action, size: number): Wrench {
  return [dx, dy, (turn === 0 ? at.x * dy - at.y * dx : turn) / size];
}

/** The unknown that some equation of the joined bodies would have held alone before the step `before`, if there is one.
 *  An equation is a vector e; it holds u alone when e . w(u) is not zero and e . w is zero for all other unknowns w. */
export function singleUnknown(
  solution: FreeBodySolution,
  before: number,
  joined: readonly number[],
  size: number,
): string | undefined {
  const known = new Set(solution.steps.slice(0, before).map((s) => s.unknown));
  const sums = new Map<string, [number, number, number]>();
  for (const i of joined)
    for (const action of solution.bodies[i]?.actions ?? []) {
      if (!("force" in action.source) || known.has(action.source.force)) continue;
      const own = sums.get(action.source.force) ?? [0, 0, 0];
      wrenchOf(action, size).forEach((part, k) => {
        own[k] = (own[k] ?? 0) + part;
      });
      sums.set(action.source.force, own);
    }
  const open = [...sums].filter(([, w]) => Math.hypot(...w) > 1e-9);
  return open.find(([name, w]) => {
    const others = open.filter(([other]) => other !== name).map(([, o]) => o);
    return distanceTo(others, w) > 1e-7;
  })?.[0];
}

/** Distance of a vector from the span of others, over its length (Gram-Schmidt, twice). */
function distanceTo(others: readonly Wrench[], w: Wrench): number {
  const basis: number[][] = [];
  const rest = (v: readonly number[]): number[] => {
    let left = [...v];
    for (let pass = 0; pass < 2; pass++)
      for (const unit of basis) {
        const along = left.reduce((sum, x, k) => sum + x * (unit[k] ?? 0), 0);
        left = left.map((x, k) => x - along * (unit[k] ?? 0));
      }
    return left;
  };
  for (const other of others) {
    const left = rest(other);
    const length = Math.hypot(...left);
    if (length > 1e-7 * Math.hypot(...other)) basis.push(left.map((x) => x / length));
  }
  return Math.hypot(...rest(w)) / Math.hypot(...w);
}

/** All sets of two or more of a few things. */
export function setsOf(things: readonly number[]): readonly (readonly number[])[] {
  const sets: (readonly number[])[] = [[]];
  for (const next of things) sets.push(...sets.map((s) => [...s, next]));
  return sets.filter((s) => s.length > 1);
}

/** A step at which bodies were joined, or the first of equations taken together. */
export interface NotSingle {
  readonly index: number;
  readonly kind: "joined" | "together";
}

/** All such steps of a solution. */
export function notSingle(steps: readonly Step[]): readonly NotSingle[] {
  return steps.flatMap((step, index): readonly NotSingle[] => {
    if (step.together.length > 0)
      return step.together.every((other) => other > index) ? [{ index, kind: "together" as const }] : [];
    return step.bodies.length > 1 ? [{ index, kind: "joined" as const }] : [];
  });
}
