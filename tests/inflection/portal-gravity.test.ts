import fc from "fast-check";
import { describe, expect, test } from "vitest";
import { exact } from "../../lib/exact/index.ts";
import { kneeHinge, kneeShare, type PortalSide, portalMoments } from "../../lib/inflection/index.ts";
import { quantity } from "../../lib/quantity/index.ts";
import { valueAt } from "../../lib/results/index.ts";
import { pointLoad, portal, type Section, type Structure, uniform } from "../../lib/structure/index.ts";

const m = (x: number) => quantity(x, "length");
const bases = ["pinned", "fixed"] as const;

/** A portal whose sections have the radii of gyration of rolled or concrete members: 0.12 m columns, 0.18 m beam. */
function portalOf(
  L: number,
  sides: readonly [PortalSide, PortalSide],
  k: number,
  radius: { readonly column: number; readonly beam: number } = { column: 0.12, beam: 0.18 },
): Structure {
  const plain = portal({
    span: m(L),
    height: { left: m(sides[0].height), right: m(sides[1].height) },
    rightBase: m(sides[0].height - sides[1].height),
    bases: { left: sides[0].base, right: sides[1].base },
  });
  const section = (I: number, r: number): Section => ({ E: 1, I, A: I / r ** 2 });
  const [AB, BC, CD] = plain.members;
  if (AB === undefined || BC === undefined || CD === undefined) throw new Error("a portal has three members");
  return {
    ...plain,
    members: [
      { ...AB, section: section(sides[0].k * sides[0].height, radius.column) },
      { ...BC, section: section(k * L, radius.beam) },
      { ...CD, section: section(sides[1].k * sides[1].height, radius.column) },
    ],
  };
}

describe("kneeShare and kneeHinge", () => {
  test.each(bases)(
    "%s bases: within a hundredth of exact over k = 0.2 to 5, span and height as they are built",
    (base) => {
      let compared = 0;
      for (const L of [6, 10, 14])
        for (let k = 0.2; k < 5.01; k += 0.2) {
          const side = { k: 1, height: 4, base };
          const [, beam] = exact(portalOf(L, [side, side], k), [uniform("BC", "20 kN/m")]).members;
          const FEM = (20e3 * L ** 2) / 12;
          const knee = beam === undefined ? Number.NaN : -valueAt(beam.M, 0);
          expect(Math.abs((FEM * kneeShare(k, base)) / knee - 1), `k = ${k}, L = ${L}`).toBeLessThan(0.01);
          expect(Math.abs(kneeHinge(k, base) * L - (beam?.inflection[0] ?? 0)) / L).toBeLessThan(0.002);
          compared += 1;
        }
      expect(compared).toBe(75);
    },
  );

  // A. Kleinlogel, Rigid Frame Formulas, from memory: -wL²/(4(2k + 3)) pinned, -wL²/(6(k + 2)) fixed
  test.each([0.2, 0.5, 1, 2, 5])("k = %f: the published closed forms", (k) => {
    expect(kneeShare(k, "pinned") / 12).toBeCloseTo(1 / (4 * (2 * k + 3)), 14);
    expect(kneeShare(k, "fixed") / 12).toBeCloseTo(1 / (6 * (k + 2)), 14);
  });

  test("a beam as between fixed ends, and as simply supported", () => {
    expect(kneeHinge(1e-9, "fixed")).toBeCloseTo(0.5 - Math.sqrt(3) / 6, 8);
    expect(kneeHinge(1e9, "pinned")).toBeCloseTo(0, 8);
    expect(() => kneeShare(-1, "fixed")).toThrow("is -1");
  });
});

describe("portalMoments", () => {
  const side = fc.record({
    k: fc.double({ min: 0.5, max: 2, noNaN: true }),
    height: fc.double({ min: 3.5, max: 5, noNaN: true }),
    base: fc.constantFrom(...bases),
  });

  test("equal columns: the closed form, nothing to hold", () => {
    const one = { k: 0.7, height: 4, base: "fixed" as const };
    const { left, right, holding } = portalMoments(1.4, [one, one], { left: -100, right: -100 });
    expect(left.knee).toBeCloseTo(-100 * kneeShare(2, "fixed"), 12);
    expect(right).toEqual(left);
    expect(left.base).toBeCloseTo(-left.knee / 2, 12);
    expect(holding).toBeCloseTo(0, 12);
  });

  test("a force off the middle, equal columns that keep their length: exact", () => {
    fc.assert(
      fc.property(side, fc.double({ min: 0.1, max: 0.9, noNaN: true }), (one, c) => {
        const [L, P] = [10, 60e3];
        const structure = portalOf(L, [one, one], 0.8, { column: 1e-4, beam: 1e-4 });
        const solution = exact(structure, [pointLoad("BC", quantity(P, "force"), { at: `${c} L` })]);
        const fixedEnds = { left: -P * L * c * (1 - c) ** 2, right: -P * L * c ** 2 * (1 - c) };
        const found = portalMoments(0.8, [one, one], fixedEnds);
        const [AB, BC, CD] = solution.members;
        if (AB === undefined || BC === undefined || CD === undefined) throw new Error("three members");
        const size = P * L;
        const near = (value: number, wanted: number): void =>
          expect(Math.abs(value - wanted) / size).toBeLessThan(1e-6);
        near(found.left.knee, valueAt(BC.M, 0));
        near(found.right.knee, valueAt(BC.M, BC.length, "left"));
        near(found.left.base, valueAt(AB.M, 0));
        near(found.right.base, valueAt(CD.M, CD.length, "left"));
      }),
      { seed: 5213, numRuns: 100 },
    );
  });

  test("unequal columns: knees within 10 % of the larger one of exact, nine in ten within 3 %", () => {
    const errors: number[] = [];
    fc.assert(
      fc.property(side, side, fc.constantFrom(...bases), (left, right, base) => {
        const sides = [
          { ...left, base },
          { ...right, base },
        ] as const;
        const structure = portalOf(10, sides, 0.8);
        const [, BC] = exact(structure, [uniform("BC", "20 kN/m")]).members;
        if (BC === undefined) throw new Error("no beam");
        const FEM = (-20e3 * 100) / 12;
        const found = portalMoments(0.8, sides, { left: FEM, right: FEM });
        const [a, b] = [valueAt(BC.M, 0), valueAt(BC.M, 10, "left")];
        const size = Math.max(Math.abs(a), Math.abs(b));
        errors.push(Math.abs(found.left.knee - a) / size, Math.abs(found.right.knee - b) / size);
      }),
      { seed: 5214, numRuns: 200 },
    );
    errors.sort((a, b) => a - b);
    expect(errors.length).toBe(400);
    expect(errors[359]).toBeLessThan(0.03);
    expect(errors[399]).toBeLessThan(0.1);
  });

  test("refuses columns without height", () => {
    const one = { k: 1, height: 4, base: "fixed" as const };
    expect(() => portalMoments(1, [one, { ...one, height: 0 }], { left: 0, right: 0 })).toThrow(
      "height of a column is 0",
    );
  });
});
