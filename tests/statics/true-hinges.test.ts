// Hinges put where the elastic moment is zero change nothing: statics then gives the elastic forces.

import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { exact } from "../../lib/exact/index.ts";
import { quantity } from "../../lib/quantity/index.ts";
import { type ElasticSolution, valueAt } from "../../lib/results/index.ts";
import { rankOf } from "../../lib/statics/elimination.ts";
import { equilibriumMatrix } from "../../lib/statics/equilibrium-matrix.ts";
import { freeBodies } from "../../lib/statics/index.ts";
import {
  atJoint,
  beam,
  buildingFrame,
  type Load,
  pointLoad,
  portal,
  type Structure,
  uniform,
  withHinges,
} from "../../lib/structure/index.ts";
import { seed } from "./frames.ts";

const m = (x: number): ReturnType<typeof quantity<"length">> => quantity(x, "length");
const length = fc.integer({ min: 30, max: 90 }).map((n) => n / 10);
const lengths = (minLength: number, maxLength: number): fc.Arbitrary<number[]> =>
  fc.array(length, { minLength, maxLength });
const bases = fc.constantFrom("pinned" as const, "fixed" as const);

const structures: fc.Arbitrary<Structure> = fc.oneof(
  lengths(2, 5).map((spans) => beam({ spans: spans.map(m) })),
  fc.tuple(length, length, length, bases, fc.boolean()).map(([span, left, right, base, pitched]) =>
    portal({
      span: m(2 * span),
      height: { left: m(left), right: m(right) },
      bases: base,
      ...(pitched ? { rise: m(1.3) } : {}),
    }),
  ),
  fc
    .tuple(lengths(1, 2), lengths(1, 2), bases)
    .map(([bays, storeys, base]) =>
      buildingFrame({ bays: bays.map(m), storeys: storeys.map((h) => m(h / 2 + 2)), bases: base }),
    ),
);

const size = fc.integer({ min: 2, max: 30 });
const models = fc.record({
  of: structures,
  stiffness: fc.array(fc.integer({ min: 1, max: 9 }), { minLength: 4, maxLength: 4 }),
  w: fc.array(size, { minLength: 3, maxLength: 3 }),
  side: fc.option(size, { nil: undefined }),
  force: fc.option(fc.tuple(fc.nat(20), size), { nil: undefined }),
});

/** Sections in the ratio of small numbers; loads on level members, sideways, and a force somewhere. */
function model({ of, stiffness, w, side, force }: typeof models extends fc.Arbitrary<infer T> ? T : never): {
  readonly of: Structure;
  readonly loads: readonly Load[];
} {
  const members = of.members.map((one, i) => ({
    ...one,
    section: { A: 1e-2, I: 1e-5 * (stiffness[i % stiffness.length] ?? 1), E: 2e11 },
  }));
  const level = of.members.filter((one) => one.group === "beams");
  const top = of.joints.reduce((a, b) => (b.y > a.y ? b : a)).name;
  const picked = of.members[(force?.[0] ?? 0) % of.members.length]?.name ?? "";
  const loads: Load[] = level.map((one, i) => uniform(one.name, `${w[i % w.length] ?? 1} kN/m`));
  if (side !== undefined && of.family !== "beam") loads.push(atJoint(top, { right: `${side} kN` }));
  if (force !== undefined) loads.push(pointLoad(picked, `${force[1]} kN`, { at: "0.37 L" }));
  return { of: { ...of, members }, loads };
}

/** Hinges at points of inflection, taken as long as each lowers the degree and leaves no motion; nothing where they do not suffice. */
function determinateAt(of: Structure, { members }: ElasticSolution): Structure | undefined {
  let current = of;
  const degree = (s: Structure): number | undefined => {
    const { matrix, unknowns, equations } = equilibriumMatrix(s);
    return rankOf(matrix, unknowns.length) === equations ? unknowns.length - equations : undefined;
  };
  let left = degree(of) ?? 0;
  for (const { member, inflection, length: L } of members)
    for (const x of inflection) {
      if (left === 0 || x < 0.02 * L || x > 0.98 * L) continue;
      const start = of.members.find((one) => one.name === member)?.start ?? "";
      const next = withHinges(current, [{ member, from: start, at: quantity(x, "length") }]);
      if (degree(next) !== left - 1) continue;
      [current, left] = [next, left - 1];
    }
  return left === 0 ? current : undefined;
}

describe(`hinges at the exact points of inflection (seed ${seed})`, () => {
  it("reproduce the elastic forces", () => {
    let [compared, worst] = [0, 0];
    fc.assert(
      fc.property(models.map(model), ({ of, loads }) => {
        const elastic = exact(of, loads);
        const hinged = determinateAt(of, elastic);
        if (hinged === undefined) return;
        compared += 1;
        const hand = freeBodies(hinged, loads);
        const sizes = elastic.members.flatMap((one) =>
          [0, 0.5, 1].flatMap((t) => [one.N, one.V, one.M].map((f) => Math.abs(valueAt(f, t * one.length)))),
        );
        const scale = Math.max(...sizes);
        hand.members.forEach((one, i) => {
          const other = elastic.members[i];
          if (other === undefined) throw new Error("a member is missing");
          for (const t of [0.011, 0.353, 0.689, 0.983])
            for (const f of ["N", "V", "M"] as const) {
              const gap: number =
                Math.abs(valueAt(one[f], t * one.length) - valueAt(other[f], t * one.length)) / scale;
              worst = Math.max(worst, gap);
              if (!(gap <= 1e-7))
                expect.fail(`${f} of ${one.member} at ${t} L is off by ${gap} of the largest`);
            }
        });
      }),
      { seed, numRuns: 250 },
    );
    expect(compared).toBeGreaterThan(150);
    expect(worst).toBeLessThanOrEqual(1e-7);
  });
});
