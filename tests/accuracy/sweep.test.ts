import { describe, expect, test } from "vitest";
import { sweeps, within } from "../../lib/accuracy/index.ts";
import { kneeShare } from "../../lib/inflection/index.ts";
import { portal, uniform } from "../../lib/structure/index.ts";

describe("sweeps", () => {
  const structure = portal({
    span: "12 m",
    height: "4 m",
    bases: "pinned",
    sections: { columns: { E: 1, I: 1, A: "stiff" }, beams: { E: 1, I: 2, A: "stiff" } },
  });
  const question = {
    structure,
    cases: [[uniform("BC", "20 kN/m")]],
    wanted: [{ wanted: { member: "BC", force: "M" as const, at: 0 } }],
  };
  const FEM = (20e3 * 144) / 12;

  test("the knee moment along the beam's I follows the closed form", () => {
    const unknowns = { groups: [{ group: "beams", I: within(4) }], bases: [] };
    const [sweep] = sweeps({ ...question, unknowns, steps: 4 });
    expect(sweep?.unknown.name).toBe("I of beams");
    expect(sweep?.at.map((x) => Number(x.toFixed(9)))).toEqual([0.25, 0.5, 1, 2, 4]);
    sweep?.at.forEach((x, i) => {
      expect(
        Math.abs((sweep.truth[0]?.[i] ?? 0) / (-FEM * kneeShare((2 * x) / 3, "pinned")) - 1),
      ).toBeLessThan(1e-6);
    });
  });

  test("along the fixity of the bases it goes from the pinned to the fixed portal", () => {
    const unknowns = { groups: [], bases: [{ joints: ["A", "D"], fixity: { least: 0, most: 1 } }] };
    const [sweep] = sweeps({ ...question, unknowns, steps: 2 });
    const truth = sweep?.truth[0] ?? [];
    expect((truth[0] ?? 0) / -FEM).toBeCloseTo(kneeShare(2 / 3, "pinned"), 5);
    expect((truth[2] ?? 0) / -FEM).toBeCloseTo(kneeShare(2 / 3, "fixed"), 4);
  });

  test("what has no range is not swept", () => {
    const half = { joints: ["A", "D"], fixity: { least: 0.5, most: 0.5 } };
    const unknowns = { groups: [{ group: "beams", I: within(4) }], bases: [half] };
    expect(sweeps({ ...question, unknowns }).map((s) => s.unknown.name)).toEqual(["I of beams"]);
  });

  test("refuses no steps", () => {
    expect(() => sweeps({ ...question, steps: 0 })).toThrow("a sweep of 0 steps");
  });
});
