// What must hold of every solution, on random beams and portals with random hinges and loads.

import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { derivative, type FreeBodySolution, magnitude, valueAt } from "../../lib/results/index.ts";
import { equilibriumMatrix, loadVector } from "../../lib/statics/equilibrium-matrix.ts";
import { balance, equilibrium, freeBodies } from "../../lib/statics/index.ts";
import type { Load, Structure } from "../../lib/structure/index.ts";
import { forceScale, loadsOf, type Recipe, recipes, seed, structureOf, sumsOf } from "./frames.ts";

const options = { seed, numRuns: 80 };
const places = [0, 0.1313, 0.3737, 0.7171, 0.9991];

/** Values of N, V and M of every member at some places, in order. */
const sampled = (solution: FreeBodySolution): readonly number[] =>
  solution.members.flatMap((m) =>
    places.flatMap((t) => [m.N, m.V, m.M].map((f) => valueAt(f, t * m.length))),
  );

const reactions = (solution: FreeBodySolution): readonly number[] =>
  solution.reactions.flatMap((r) => [r.x ?? 0, r.y ?? 0, r.moment ?? 0]);

function expectSame(one: readonly number[], other: readonly number[], tolerance: number): void {
  expect(one).toHaveLength(other.length);
  for (const [i, value] of one.entries())
    expect(Math.abs(value - (other[i] ?? Number.NaN))).toBeLessThanOrEqual(tolerance);
}

describe(`free bodies of random structures (seed ${seed})`, () => {
  it("every body is in equilibrium", () => {
    fc.assert(
      fc.property(recipes, (recipe) => {
        const structure = structureOf(recipe);
        const solution = freeBodies(structure, loadsOf(recipe, structure));
        expect(solution.bodies.length).toBeGreaterThan(0);
        const size = forceScale(solution);
        for (const body of solution.bodies) {
          const { sums, scales } = sumsOf(body);
          for (const [i, sum] of sums.entries())
            expect(Math.abs(sum)).toBeLessThanOrEqual(1e-9 * Math.max(size, scales[i] ?? 0));
        }
      }),
      options,
    );
  });

  it("every step re-adds to zero from its own terms, and uses only earlier steps", () => {
    fc.assert(
      fc.property(recipes, (recipe) => {
        const structure = structureOf(recipe);
        const { steps } = freeBodies(structure, loadsOf(recipe, structure));
        steps.forEach((step, i) => {
          const parts = [...step.terms.map((t) => t.coefficient * t.value), step.coefficient * step.result];
          const largest = Math.max(1e-9, ...parts.map(Math.abs));
          expect(Math.abs(parts.reduce((sum, p) => sum + p, 0))).toBeLessThanOrEqual(1e-9 * largest);
          for (const used of step.uses.steps) expect(used).toBeLessThan(i);
          for (const term of step.terms)
            if ("force" in term.source && step.together.length === 0)
              expect(steps[term.source.step]?.unknown).toBe(term.source.force);
        });
      }),
      options,
    );
  });

  it("reactions and inner forces are those of the whole structure solved at once, to 1e-9", () => {
    fc.assert(
      fc.property(recipes, (recipe) => {
        const structure = structureOf(recipe);
        const loads = loadsOf(recipe, structure);
        const solution = freeBodies(structure, loads);
        const whole = solvedAtOnce(structure, loads);
        expectSame(bySequence(structure, solution), whole, 1e-9 * Math.max(1, ...whole.map(Math.abs)));
      }),
      options,
    );
  });

  it("loads and reactions of the whole structure close", () => {
    fc.assert(
      fc.property(recipes, (recipe) => {
        const structure = structureOf(recipe);
        const loads = loadsOf(recipe, structure);
        const found = equilibrium(structure, loads, freeBodies(structure, loads).reactions);
        const force = Math.max(1, found.scale.force);
        expect([found.sumFx, found.sumFy].every((sum) => Math.abs(sum) <= 1e-9 * force)).toBe(true);
        expect(Math.abs(found.sumM)).toBeLessThanOrEqual(1e-9 * Math.max(1, found.scale.moment, 10 * force));
      }),
      options,
    );
  });

  it("the moment is zero at every hinge and its slope is the shear", () => {
    fc.assert(
      fc.property(recipes, (recipe) => {
        const structure = structureOf(recipe);
        const solution = freeBodies(structure, loadsOf(recipe, structure));
        const size = forceScale(solution) * 20;
        for (const { member, at } of structure.hinges) {
          const M = solution.members.find((m) => m.member === member)?.M;
          expect(M === undefined ? Number.NaN : Math.abs(valueAt(M, at))).toBeLessThanOrEqual(1e-9 * size);
        }
        for (const { M, V, length } of solution.members)
          for (const t of [0.21, 0.63])
            expect(Math.abs(valueAt(derivative(M), t * length) - valueAt(V, t * length))).toBeLessThanOrEqual(
              1e-9 * (size + magnitude(V)),
            );
      }),
      options,
    );
  });

  it("a mirrored structure gives the mirror image", () => {
    fc.assert(
      fc.property(recipes.map(onlyDown), (recipe) => {
        const structure = structureOf(recipe);
        const loads = loadsOf(recipe, structure);
        const one = freeBodies(structure, loads);
        const other = freeBodies(
          structureOf(mirrored(recipe)),
          loads.map((load) => mirroredLoad(structure, load)),
        );
        const tolerance = 1e-9 * forceScale(one) * 20;
        const last = one.members.length - 1;
        one.members.forEach((m, i) => {
          const twin = other.members[last - i];
          if (twin === undefined) throw new Error("a member is missing");
          for (const t of [0.1713, 0.4337, 0.8329]) {
            const [x, y] = [t * m.length, (1 - t) * m.length];
            expect(Math.abs(valueAt(m.M, x) - valueAt(twin.M, y))).toBeLessThanOrEqual(tolerance);
            expect(Math.abs(valueAt(m.V, x) + valueAt(twin.V, y))).toBeLessThanOrEqual(tolerance);
          }
        });
      }),
      options,
    );
  });

  it("loads superpose", () => {
    fc.assert(
      fc.property(recipes, (recipe) => {
        const structure = structureOf(recipe);
        const loads = loadsOf(recipe, structure);
        const all = freeBodies(structure, loads);
        const parts = loads.map((load) => freeBodies(structure, [load]));
        const sums = sampled(all).map((_, i) => parts.reduce((sum, p) => sum + (sampled(p)[i] ?? 0), 0));
        const tolerance = 1e-9 * Math.max(1, ...parts.map(forceScale)) * 20;
        expectSame(sampled(all), sums, tolerance);
      }),
      { ...options, numRuns: 40 },
    );
  });

  it("a change of units changes nothing: kip and ft for kN and m", () => {
    const kip = 4448.2216152605; // N, exact by definition of the pound-force (NIST SP 811, from memory)
    fc.assert(
      fc.property(recipes, (recipe) => {
        const [metric, customary] = [structureOf(recipe), structureOf(recipe, "ft")];
        const one = freeBodies(metric, loadsOf(recipe, metric));
        const other = freeBodies(customary, loadsOf(recipe, customary, "kip", "ft"));
        const forces = (s: FreeBodySolution, unit: number): readonly number[] =>
          s.reactions.flatMap((r) => [(r.x ?? 0) / unit, (r.y ?? 0) / unit]);
        expectSame(forces(one, 1000), forces(other, kip), 1e-9 * (forceScale(one) / 1000 + 1));
        expect(other.steps.map((s) => s.id)).toEqual(one.steps.map((s) => s.id));
      }),
      options,
    );
  });

  it("a structure that is stable balances any load", () => {
    fc.assert(
      fc.property(recipes, (recipe) => {
        const structure = structureOf(recipe);
        expect(balance(structure, loadsOf(recipe, structure)).balanced).toBe(true);
      }),
      { ...options, numRuns: 40 },
    );
  });

  it("reactions do not change when a load is applied twice and once taken back", () => {
    fc.assert(
      fc.property(recipes, (recipe) => {
        const structure = structureOf(recipe);
        const loads = loadsOf(recipe, structure);
        const back = loads.map(
          (load): Load =>
            load.kind === "distributed"
              ? { ...load, q1: -load.q1, q2: -load.q2 }
              : { ...load, fx: -load.fx, fy: -load.fy, couple: -load.couple },
        );
        const once = freeBodies(structure, loads);
        expectSame(
          reactions(freeBodies(structure, [...loads, ...loads, ...back])),
          reactions(once),
          1e-9 * forceScale(once) * 20,
        );
      }),
      { ...options, numRuns: 40 },
    );
  });
});

/** The equilibrium equations solved by plain Gauss elimination with row exchange, written here. */
function solvedAtOnce(structure: Structure, loads: readonly Load[]): readonly number[] {
  const equations = equilibriumMatrix(structure);
  const b = loadVector(equations, loads);
  const rows = equations.matrix.map((row, i) => [...row, -(b[i] ?? 0)]);
  const n = rows.length;
  for (let k = 0; k < n; k++) {
    const pivot = rows.reduce(
      (best, row, i) => (i >= k && Math.abs(row[k] ?? 0) > Math.abs(rows[best]?.[k] ?? 0) ? i : best),
      k,
    );
    [rows[k], rows[pivot]] = [rows[pivot] ?? [], rows[k] ?? []];
    rows.forEach((row, i) => {
      const factor = i === k ? 0 : (row[k] ?? 0) / (rows[k]?.[k] ?? Number.NaN);
      if (factor !== 0) for (let j = k; j <= n; j++) row[j] = (row[j] ?? 0) - factor * (rows[k]?.[j] ?? 0);
    });
  }
  return rows.map((row, k) => ((row[n] ?? 0) / (row[k] ?? Number.NaN)) * leverOf(structure, k));
}

/** Moments stand in the matrix divided by the size of the structure. */
function leverOf(structure: Structure, k: number): number {
  const { unknowns, size } = equilibriumMatrix(structure);
  const unknown = unknowns[k];
  if (unknown?.kind === "reaction") return unknown.component === "moment" ? size : 1;
  return unknown?.kind === "N" ? 1 : size;
}

/** The same quantities in the same order, read from the free bodies. */
function bySequence(structure: Structure, solution: FreeBodySolution): readonly number[] {
  const { unknowns, skeleton } = equilibriumMatrix(structure);
  return unknowns.map((unknown) => {
    if (unknown.kind === "reaction")
      return solution.reactions.find((r) => r.joint === unknown.joint)?.[unknown.component] ?? Number.NaN;
    const segment = skeleton.segments[unknown.segment];
    const member = solution.members.find((m) => m.member === segment?.member);
    if (segment === undefined || member === undefined) return Number.NaN;
    if (unknown.kind === "M start") return valueAt(member.M, segment.begin);
    if (unknown.kind === "M end") return valueAt(member.M, segment.end, "left");
    return valueAt(member.N, segment.end, segment.end < member.length ? "right" : "left");
  });
}

/** Without forces along a beam, whose one pin is not mirrored. */
function onlyDown(recipe: Recipe): Recipe {
  if (recipe.kind !== "beam") return recipe;
  const loads = recipe.loads.map((load) => ({
    ...load,
    sideways: false,
    kind: load.kind === "joint" ? ("point" as const) : load.kind,
  }));
  return { ...recipe, loads };
}

function mirrored(recipe: Recipe): Recipe {
  const last = recipe.kind === "beam" ? recipe.lengths.length - 1 : 2;
  const lengths = recipe.kind === "beam" ? [...recipe.lengths].reverse() : recipe.lengths;
  return {
    ...recipe,
    lengths,
    hinges: recipe.hinges.map((h) => ({ member: last - h.member, part: 1 - h.part })),
  };
}

function mirroredLoad({ members, joints }: Structure, load: Load): Load {
  if (load.kind === "joint") {
    const joint = joints[joints.length - 1 - joints.findIndex((j) => j.name === load.joint)]?.name ?? "";
    return { ...load, joint, fx: -load.fx, couple: -load.couple };
  }
  const member = members[members.length - 1 - members.findIndex((m) => m.name === load.member)]?.name ?? "";
  const far = (place: { readonly fraction?: number }): { fraction: number } => ({
    fraction: 1 - (place.fraction ?? Number.NaN),
  });
  if (load.kind === "member point")
    return { ...load, member, at: far(load.at as { fraction: number }), fx: -load.fx, couple: -load.couple };
  const [begin, end] = [far(load.end as { fraction: number }), far(load.begin as { fraction: number })];
  return {
    ...load,
    member,
    begin,
    end,
    q1: load.q2,
    q2: load.q1,
    direction: [-load.direction[0], load.direction[1]],
  };
}
