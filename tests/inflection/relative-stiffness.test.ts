// Hinges by relative stiffness against published tables and closed forms, and against the stiffness solution.

import { describe, expect, test } from "vitest";
import { exact } from "../../lib/exact/index.ts";
import { hingeByStiffness, kneeHinge, momentsByStiffness, twoSpanHinge } from "../../lib/inflection/index.ts";
import {
  atJoint,
  beam,
  buildingFrame,
  pointLoad,
  portal,
  uniform,
  withRelativeStiffness,
} from "../../lib/structure/index.ts";
import type { Load, Structure } from "../../lib/structure/types.ts";

const alike = (structure: Structure): Structure => withRelativeStiffness(structure, {});
const spans = (n: number): Structure =>
  alike(beam({ spans: Array.from({ length: n }, () => "6 m" as const) }));
const onAll = (structure: Structure): readonly Load[] =>
  structure.members.filter(({ group }) => group === "beams").map(({ name }) => uniform(name, "12 kN/m"));

describe("hingeByStiffness(continuous beam)", () => {
  // Equal spans under a uniform load: Hicks, Civil Engineering Formulas, Table 2.1, read; x/L from the nearer support on the left.
  test.each<[number, string, "start" | "end", number, number]>([
    [2, "AB", "end", 0.25, 1e-9],
    [2, "BC", "start", 0.25, 1e-9],
    [3, "AB", "end", 0.2, 5e-3],
    [3, "BC", "start", 0.276, 5e-3],
    [4, "AB", "end", 1 - 0.786, 5e-3],
    [4, "BC", "start", 0.266, 5e-3],
    [4, "BC", "end", 1 - 0.805, 5e-3],
    [5, "CD", "start", 0.197, 5e-3],
  ])("%i equal spans, %s from its %s: %f L", (n, member, from, part, within) => {
    const structure = spans(n);
    const found = momentsByStiffness(structure, onAll(structure));
    expect(Math.abs(hingeByStiffness(found, member, from) / 6 - part)).toBeLessThan(within);
    expect(found.formula).toBe(n === 2 ? "two spans" : "moment distribution");
  });

  test("two uneven spans: the three-moment equation in either span, with its ratios in words", () => {
    const structure = withRelativeStiffness(beam({ spans: ["5 m", "8 m"] }), { "I of BC / I of AB": 1.6 });
    const found = momentsByStiffness(structure, [uniform("AB", "9 kN/m"), uniform("BC", "12 kN/m")]);
    const long = twoSpanHinge({ spans: 5 / 8, loads: 0.75, rigidity: 1.6 });
    const short = twoSpanHinge({ spans: 8 / 5, loads: 4 / 3, rigidity: 1 / 1.6 });
    expect(hingeByStiffness(found, "BC", "start") / 8).toBeCloseTo(long, 12);
    expect(hingeByStiffness(found, "AB", "end") / 5).toBeCloseTo(short, 12);
    expect(found.words("BC")).toContain(`= ${long.toFixed(3)} with s = 0.625, t = 0.75, i = 1.6`);
    expect(found.words("AB")).toContain(`= ${short.toFixed(3)} with s = 1.6, t = 1.33, i = 0.625`);
  });
});

describe("hingeByStiffness(portal)", () => {
  // A. Kleinlogel, Rigid Frame Formulas, from memory: knees wL²/(4(2k + 3)) pinned, wL²/(6(k + 2)) fixed; bases half of that.
  test.each([
    ["pinned", 0.2],
    ["pinned", 1.2],
    ["pinned", 5],
    ["fixed", 0.2],
    ["fixed", 1.2],
    ["fixed", 5],
  ] as const)("%s bases, k = %f: where the closed form puts it, and M as Kleinlogel", (bases, k) => {
    const [L, h, w] = [12, 5, 10_000];
    const structure = withRelativeStiffness(portal({ span: "12 m", height: "5 m", bases }), {
      "I of beam / I of columns": (k * L) / h,
    });
    const found = momentsByStiffness(structure, [uniform("BC", "10 kN/m")]);
    const knee = bases === "pinned" ? (w * L ** 2) / (4 * (2 * k + 3)) : (w * L ** 2) / (6 * (k + 2));
    expect(found.formula).toBe("symmetric portal");
    expect(found.ends[2]).toBeCloseTo(knee, 3); // counter-clockwise on the beam's left end
    expect(found.ends[1]).toBeCloseTo(-knee, 3);
    expect(found.ends[0]).toBeCloseTo(bases === "fixed" ? -knee / 2 : 0, 3);
    expect(hingeByStiffness(found, "BC", "start") / L).toBeCloseTo(kneeHinge(k, bases), 9);
    expect(hingeByStiffness(found, "BC", "end") / L).toBeCloseTo(kneeHinge(k, bases), 9);
    if (bases === "fixed") expect(hingeByStiffness(found, "AB", "start") / h).toBeCloseTo(1 / 3, 9);
    else
      expect(() => hingeByStiffness(found, "AB", "start")).toThrow(
        /moment of member "AB" does not change sign/,
      );
    expect(found.words("BC")).toMatch(/M = FEM m\/\(m \+ 2k\) = 0\.\d+ FEM.*m = [34]/);
  });

  test("is the same drawn as a building frame, whose columns both go up", () => {
    const ratios = { "I of beams / I of columns": 2 };
    const load = (member: string): readonly Load[] => [uniform(member, "10 kN/m")];
    const a = momentsByStiffness(
      withRelativeStiffness(portal({ span: "9 m", height: "4 m", bases: "fixed" }), ratios),
      load("BC"),
    );
    const b = momentsByStiffness(
      withRelativeStiffness(buildingFrame({ bays: ["9 m"], storeys: ["4 m"], bases: "fixed" }), ratios),
      load("A1B1"),
    );
    expect(b.formula).toBe("symmetric portal");
    for (const [one, other] of [
      ["AB", "A0A1"],
      ["CD", "B0B1"],
    ] as const)
      expect(hingeByStiffness(b, other, "start")).toBeCloseTo(
        hingeByStiffness(a, one, one === "AB" ? "start" : "end"),
        9,
      );
    expect(hingeByStiffness(b, "A1B1", "start")).toBeCloseTo(hingeByStiffness(a, "BC", "start"), 9);
  });

  // Uneven columns and an uneven load: knees within 3 % of the greater one, as the study of the one sway correction found.
  test("uneven columns: knees near the stiffness solution", () => {
    const frame = withRelativeStiffness(
      portal({ span: "10 m", height: { left: "5 m", right: "4 m" }, rightBase: "1 m", bases: "fixed" }),
      { "I of BC": 2, "I of CD": 1.5 },
    );
    const loads = [pointLoad("BC", "60 kN", { at: "4 m" })];
    const found = momentsByStiffness(frame, loads);
    const truth = exact(frame, loads).members;
    const knees = [truth[1]?.M.pieces[0]?.[0] ?? 0, truth[2]?.M.pieces[0]?.[0] ?? 0];
    expect(found.formula).toBe("portal");
    const scale = Math.max(...knees.map(Math.abs));
    expect(Math.abs(-(found.ends[2] ?? 0) - (knees[0] ?? 0)) / scale).toBeLessThan(0.03);
    expect(Math.abs((found.ends[3] ?? 0) - (knees[1] ?? 0)) / scale).toBeLessThan(0.03);
    expect(found.words("BC")).toContain("left and");
  });
});

describe("momentsByStiffness", () => {
  const tower = withRelativeStiffness(
    buildingFrame({ bays: ["6 m", "7 m"], storeys: ["4 m", "3.5 m"], bases: "fixed" }),
    { "I of beams / I of columns": 2 },
  );
  test("names the stiffness ratios at a member's joints", () => {
    const found = momentsByStiffness(tower, onAll(tower));
    expect(found.formula).toBe("joint turns");
    // k of the beam 2/6, of the columns 1/4 + 1/3.5 at A1; 1/4 + 1/3.5 at B1
    expect(found.words("A1B1")).toContain("I/L of A1B1 to that of the columns = 0.622 at A1 and 0.622 at B1");
    expect(found.words("A0A1")).toContain("to that of the beams = 0.75 at A1");
  });
  test.each<[string, readonly Load[], RegExp]>([
    ["a push at a joint", [atJoint("A1", { right: "3 kN" })], /a load on joint A1 pushes the frame sideways/],
    ["wind on a column", [uniform("A0A1", "2 kN/m", { direction: "right" })], /a load on A0A1 pushes/],
    ["a couple at a joint", [atJoint("A1", { couple: "3 kN m" })], /a couple acts on joint A1/],
  ])("refuses %s", (_, loads, words) => {
    expect(() => momentsByStiffness(tower, loads)).toThrow(words);
  });
});
