import { describe, expect, it } from "vitest";
import { bentCurves } from "../../lib/drawing/bent.ts";
import { drawSketch, type ShapeFigure, type SketchSpec } from "../../lib/drawing/index.ts";
import { axisOf, memberNamed } from "../../lib/structure/index.ts";
import { expectGolden } from "./golden.ts";
import * as shapes from "./shapes.ts";

const slope = (f: (x: number) => number, x: number, h: number): number => (f(x + h) - f(x)) / h;

const qualitative: readonly (readonly [string, ShapeFigure])[] = [
  ["two-span beam", shapes.beamShape],
  ["portal pushed sideways", shapes.swayShape],
  ["three-storey frame", shapes.buildingShape],
];

describe("bentCurves", () => {
  it.each(qualitative)("bentCurves(%s) bends every stretch the way it is told", (_, spec) => {
    const curves = bentCurves(spec);
    let stretches = 0;
    for (const { member, bends } of spec.members) {
      const { length } = axisOf(spec.structure, memberNamed(spec.structure, member, "test"));
      const f = curves.get(member)?.across ?? (() => Number.NaN);
      for (const { begin, end, sense } of bends) {
        const [x, h] = [((begin + end) / 2) * length, ((end - begin) / 8) * length];
        const curvature = f(x + h) - 2 * f(x) + f(x - h);
        expect(Math.sign(curvature), `${member} ${sense}`).toBe(sense === "sagging" ? 1 : -1);
        stretches++;
      }
    }
    expect(stretches).toBeGreaterThanOrEqual(4);
  });

  it.each(qualitative)(
    "bentCurves(%s) keeps corners and supports within two degrees of the drawing",
    (_, spec) => {
      const { structure } = spec;
      const curves = bentCurves(spec);
      const size = Math.max(...[...curves.values()].map((c) => Math.abs(c.across(3))));
      expect(size).toBeGreaterThan(0);
      for (const { name } of structure.joints) {
        const slopes = structure.members.flatMap((member) => {
          const { length } = axisOf(structure, member);
          const f = curves.get(member.name)?.across ?? (() => Number.NaN);
          if (member.start === name) return [slope(f, 0, 1e-6 * length)];
          return member.end === name ? [-slope((x) => f(length - x), 0, 1e-6 * length)] : [];
        });
        expect(Math.max(...slopes) - Math.min(...slopes), name).toBeLessThan(0.035);
        if (structure.supports.find((s) => s.joint === name)?.kind === "fixed")
          expect(Math.abs(slopes[0] ?? 1)).toBeLessThan(0.035);
      }
    },
  );

  it("bentCurves(portal pushed sideways) moves both knees alike and leaves the bases", () => {
    const curves = bentCurves(shapes.swayShape);
    const [ab, bc, cd] = ["AB", "BC", "CD"].map((name) => curves.get(name));
    // AB goes up: left of the walk is to the left, so a move to the right is negative across it.
    expect(ab?.across(0)).toBeCloseTo(0, 9);
    expect(ab?.across(5)).toBeLessThan(-0.1);
    expect(bc?.along(0)).toBeCloseTo(-(ab?.across(5) ?? 0), 9);
    expect(bc?.along(12)).toBeCloseTo(cd?.across(0) ?? 0, 9);
    expect(cd?.across(5)).toBeCloseTo(0, 9);
  });
});

const trussReached = () => shapes.trussStress.forces.filter((f) => f.N.pieces[0]?.[0] !== 0);

describe("drawSketch of shapes", () => {
  it.each(Object.entries(shapes) as [string, SketchSpec][])(
    "drawSketch(%s) is the kept drawing",
    (name, spec) => {
      expectGolden(import.meta.url, `shapes/${name}.svg`, drawSketch(spec, "fig"));
    },
  );

  it("drawSketch(shape) says that it is qualitative and marks each point of inflection once", () => {
    const svg = drawSketch(shapes.beamShape, "f");
    expect(svg).toContain(">qualitative, to no scale; dots: probable points of inflection</text>");
    expect(svg.match(/<circle[^>]*class="fig-sought"/g)).toHaveLength(2);
    // Three-storey frame: two in each of six beams, one in each of six outer columns.
    expect(drawSketch(shapes.buildingShape, "f").match(/<circle[^>]*class="fig-sought"/g)).toHaveLength(18);
  });

  it("drawSketch(self-stress) leaves out what is nothing and gives parts of the greatest", () => {
    const svg = drawSketch(shapes.trussStress, "f");
    expect(svg).not.toMatch(/>[VM] {2}self-stress/);
    for (const text of ["1.00", "−0.80", "−0.60"]) expect(svg).toContain(`>${text}</text>`);
  });

  it("drawSketch(self-stress without its members at rest) is the same drawing", () => {
    const reached = trussReached();
    expect(reached.length).toBeLessThan(shapes.trussStress.forces.length);
    expect(drawSketch({ ...shapes.trussStress, forces: reached }, "f")).toBe(
      drawSketch(shapes.trussStress, "f"),
    );
  });

  it("drawSketch(mechanism of four bodies) turns six stretches as four bodies", () => {
    const arcs = drawSketch(shapes.chainMechanism, "f").match(/<polyline[^>]*class="fig-sought"/g);
    expect(arcs).toHaveLength(4);
  });

  const wrong: readonly (readonly [string, SketchSpec, RegExp])[] = [
    [
      "bends out of order",
      {
        ...shapes.beamShape,
        members: [{ member: "AB", bends: [{ begin: 0.5, end: 0.2, sense: "sagging" }] }],
      },
      /bend of member "AB" goes from 0.5 to 0.2; fractions/,
    ],
    [
      "bend that is no number",
      {
        ...shapes.beamShape,
        members: [{ member: "AB", bends: [{ begin: 0, end: Number.NaN, sense: "sagging" }] }],
      },
      /bend of member "AB" goes from 0 to NaN/,
    ],
    [
      "shape of an unknown member",
      { ...shapes.beamShape, members: [{ member: "XY", bends: [] }] },
      /member "XY", which is not defined; members are AB, BC/,
    ],
    [
      "deflection mark on an unknown member",
      { ...shapes.deflected, marks: [{ member: "XY", at: 0, text: "1 mm" }] },
      /names member "XY", which has no curve; members are AB, BC, CD/,
    ],
    [
      "self-stress of an unknown member",
      {
        ...shapes.trussStress,
        forces: shapes.trussStress.forces.map((f) => (f.member === "L0L1" ? { ...f, member: "XY" } : f)),
      },
      /member "XY", which is not defined/,
    ],
    [
      "self-stress of nothing",
      { ...shapes.trussStress, forces: shapes.trussStress.forces.filter((f) => f.member === "L1L2") },
      /every force is zero/,
    ],
  ];
  it.each(wrong)("drawSketch(%s) is refused, naming it", (_, spec, message) => {
    expect(() => drawSketch(spec, "f")).toThrow(message);
  });
});
