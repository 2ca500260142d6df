// Random structures that statics alone can solve, their loads, and equilibrium re-added by hand, for the tests of this room.

import fc from "fast-check";
import type { FreeBody, FreeBodySolution } from "../../lib/results/index.ts";
import { determinacy } from "../../lib/statics/index.ts";
import {
  atJoint,
  beam,
  coupleLoad,
  type HingeAt,
  type Load,
  pointLoad,
  portal,
  type Structure,
  uniform,
  varying,
  withHinges,
} from "../../lib/structure/index.ts";

/** The seed every property of this room runs with; another one by SEED=... */
export const seed: number = Number(process.env.SEED ?? 20310);

/** Plain numbers a structure and its loads are made from, so that a test can mirror or rescale them. m, kN, kN·m. */
export interface Recipe {
  readonly kind: "beam" | "pinned portal" | "fixed portal";
  readonly lengths: readonly number[];
  /** Member index and part of its length from its start. */
  readonly hinges: readonly { readonly member: number; readonly part: number }[];
  readonly loads: readonly LoadRecipe[];
}

export interface LoadRecipe {
  readonly kind: "uniform" | "varying" | "point" | "couple" | "joint";
  readonly member: number;
  readonly part: number;
  readonly further: number;
  readonly size: number;
  readonly other: number;
  readonly sideways: boolean;
}

const part: fc.Arbitrary<number> = fc.integer({ min: 10, max: 90 }).map((n) => n / 100);
const length: fc.Arbitrary<number> = fc.integer({ min: 20, max: 120 }).map((n) => n / 10);
const size: fc.Arbitrary<number> = fc.integer({ min: -40, max: 40 }).map((n) => n / 2);

const loadRecipe: fc.Arbitrary<LoadRecipe> = fc.record({
  kind: fc.constantFrom("uniform", "varying", "point", "couple", "joint"),
  member: fc.nat(7),
  part,
  further: part,
  size,
  other: size,
  sideways: fc.boolean(),
});

/** Recipes of structures that are determinate and stable with their hinges. */
export const recipes: fc.Arbitrary<Recipe> = fc
  .constantFrom("beam" as const, "pinned portal" as const, "fixed portal" as const)
  .chain((kind) =>
    (kind === "beam"
      ? fc.array(length, { minLength: 1, maxLength: 5 })
      : fc.array(length, { minLength: 2, maxLength: 2 })
    ).chain((lengths) => {
      const members = kind === "beam" ? lengths.length : 3;
      const degree = kind === "beam" ? lengths.length - 1 : kind === "pinned portal" ? 1 : 3;
      const hinge = fc.record({ member: fc.nat(members - 1), part });
      return fc.record({
        kind: fc.constant(kind),
        lengths: fc.constant(lengths),
        hinges: fc.uniqueArray(hinge, {
          minLength: degree,
          maxLength: degree,
          selector: (h) => `${h.member} ${h.part}`,
        }),
        loads: fc.array(loadRecipe, { minLength: 1, maxLength: 4 }),
      });
    }),
  )
  .filter((recipe) => determinacy(structureOf(recipe)).verdict === "determinate");

/** The structure of a recipe, in a unit of length. */
export function structureOf(
  { kind, lengths, hinges }: Recipe,
  unit: "m" | "ft" = "m",
  factor = 1,
): Structure {
  const text = (x: number): `${number} m` => `${x * factor} ${unit}` as `${number} m`;
  const [first = 1, second = 1] = lengths;
  const plain =
    kind === "beam"
      ? beam({ spans: lengths.map(text) })
      : portal({
          span: text(first),
          height: text(second),
          bases: kind === "pinned portal" ? "pinned" : "fixed",
        });
  const placed = hinges.map(({ member, part: at }): HingeAt => {
    const on = plain.members[member];
    return { member: on?.name ?? "", from: on?.start ?? "", at: `${at} L` };
  });
  return withHinges(plain, placed);
}

/** The loads of a recipe on its structure, in units of force and length. */
export function loadsOf(recipe: Recipe, structure: Structure, force = "kN", unit = "m"): readonly Load[] {
  const { members, joints } = structure;
  return recipe.loads.map((load): Load => {
    const member = members[load.member % members.length]?.name ?? "";
    const joint = joints[load.member % joints.length]?.name ?? "";
    const on = recipe.hinges.some(
      (h) => members[h.member]?.name === member && Math.abs(h.part - load.part) < 1e-9,
    );
    const at: `${number} L` = `${on ? load.part + 0.005 : load.part} L`;
    const [from, to] = [Math.min(load.part, load.further), Math.max(load.part, load.further) + 0.05];
    const direction = load.sideways ? ("right" as const) : ("down" as const);
    const stretch = { from: `${from} L`, to: `${to} L`, direction } as const;
    const sized = `${load.size} ${force}` as "1 kN";
    const turned = `${load.size} ${force} ${unit}` as "1 kN m";
    const spread = (size: number): "1 kN/m" => `${size} ${force}/${unit}` as "1 kN/m";
    const make: Readonly<Record<LoadRecipe["kind"], () => Load>> = {
      uniform: () => uniform(member, spread(load.size), stretch),
      varying: () => varying(member, spread(load.size), spread(load.other), stretch),
      point: () => pointLoad(member, sized, { at, direction }),
      couple: () => coupleLoad(member, turned, { at }),
      joint: () => atJoint(joint, { right: sized, down: `${load.other} ${force}` as "1 kN", couple: turned }),
    };
    return make[load.kind]();
  });
}

/** Sums over everything that acts on a body: ΣFx, ΣFy, ΣM about the origin, and their scales. Written without the library. */
export function sumsOf(body: FreeBody): {
  readonly sums: readonly number[];
  readonly scales: readonly number[];
} {
  const sums = [0, 0, 0];
  const scales = [0, 0, 0];
  for (const { at, direction, turn, value = Number.NaN } of body.actions) {
    const [fx, fy] = [direction[0] * value, direction[1] * value];
    const parts = [fx, fy, at.x * fy - at.y * fx + turn * value];
    parts.forEach((p, i) => {
      sums[i] = (sums[i] ?? 0) + p;
      scales[i] = Math.max(scales[i] ?? 0, Math.abs(p));
    });
  }
  return { sums, scales };
}

/** Largest force in a solution, N, to judge zero by. */
export function forceScale(solution: FreeBodySolution): number {
  const loads = solution.bodies.flatMap((b) => b.actions.map((a) => Math.abs(a.value ?? 0)));
  return Math.max(1, ...loads);
}
