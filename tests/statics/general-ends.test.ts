// Free bodies with supports at any angle or on springs, and member ends released for shear or axial force.

import { describe, expect, it } from "vitest";
import { valueAt } from "../../lib/results/index.ts";
import { freeBodies } from "../../lib/statics/index.ts";
import { beam, pointLoad, type Structure, structure, uniform } from "../../lib/structure/index.ts";

const found = (of: Structure, loads: Parameters<typeof freeBodies>[1], unknown: string): number =>
  freeBodies(of, loads).steps.find((s) => s.unknown === unknown)?.result ?? Number.NaN;

describe("freeBodies of general supports", () => {
  it("a roller on a slope pushes across it: both components from one step", () => {
    const of = structure({
      joints: { A: ["0 m", "0 m"], B: ["4 m", "0 m"] },
      members: { AB: ["A", "B"] },
      supports: { A: "pinned", B: { y: true, angle: "30 deg" } },
    });
    const solution = freeBodies(of, [uniform("AB", "6 kN/m")]);
    // by hand: 4 · B cos 30° = 24 · 2, so B = 12 / cos 30°; thrust 12 tan 30°
    expect(found(of, [uniform("AB", "6 kN/m")], "B_n")).toBeCloseTo(12000 / Math.cos(Math.PI / 6), 6);
    const [A, B] = solution.reactions;
    expect(B?.x).toBeCloseTo(-12000 * Math.tan(Math.PI / 6), 6);
    expect(A?.x).toBeCloseTo(12000 * Math.tan(Math.PI / 6), 6);
    expect(B?.steps.x).toBe(B?.steps.y);
    const step = solution.steps.find((s) => s.unknown === "B_n");
    expect(step?.uses.supports).toEqual(["B"]);
  });

  it("a pin turned by an angle is a pin", () => {
    const of = structure({
      joints: { A: ["0 m", "0 m"], B: ["4 m", "0 m"] },
      members: { AB: ["A", "B"] },
      supports: { A: { x: true, y: true, angle: "20 deg" }, B: "roller" },
    });
    expect(found(of, [uniform("AB", "6 kN/m")], "A_y")).toBeCloseTo(12000, 6);
  });

  it("a guided end takes the whole moment and no shear", () => {
    const of = beam({ spans: ["4 m"], supports: ["guided", "roller"] });
    const [AB] = freeBodies(of, [uniform("AB", "6 kN/m")]).members;
    expect(AB === undefined ? [] : [valueAt(AB.M, 0), valueAt(AB.V, 0)]).toEqual([
      expect.closeTo(48000, 6),
      expect.closeTo(0, 6),
    ]);
  });

  it("springs hold as far as statics goes", () => {
    const of = beam({ spans: ["4 m"], supports: ["pinned", { y: "900 kN/m" }] });
    expect(found(of, [uniform("AB", "6 kN/m")], "B_y")).toBeCloseTo(12000, 6);
  });
});

describe("freeBodies of ends released for shear or axial force", () => {
  const two = (more: object): Structure =>
    structure({
      joints: { A: ["0 m", "0 m"], B: ["3 m", "0 m"], C: ["8 m", "0 m"] },
      members: { AB: { ends: ["A", "B"], ...more }, BC: ["B", "C"] },
      supports: { A: "fixed", C: "roller" },
    });

  it("no shear across B: the moment is the same on both sides, and each part carries its own load", () => {
    const of = two({ shearReleased: ["B"] });
    const solution = freeBodies(of, [pointLoad("AB", "10 kN", { at: "1 m" }), uniform("BC", "4 kN/m")]);
    // by hand: A_y = 10, C_y = 20, M at B = 20·5 - 20·2.5 = 50, M at A = 50 - 10·1
    const value = (name: string): number =>
      solution.steps.find((s) => s.unknown === name)?.result ?? Number.NaN;
    expect(value("C_y")).toBeCloseTo(20000, 6);
    expect(value("AB_B_M")).toBeCloseTo(50000, 6);
    expect(solution.forces.some((f) => f.name === "AB_B_V")).toBe(false);
    const [AB] = solution.members;
    expect(AB === undefined ? Number.NaN : valueAt(AB.M, 0)).toBeCloseTo(40000, 6);
  });

  it("no axial force across B: the part beyond is held along its axis elsewhere", () => {
    const of = structure({
      joints: { A: ["0 m", "0 m"], B: ["3 m", "0 m"], C: ["8 m", "0 m"] },
      members: { AB: { ends: ["A", "B"], axialReleased: ["B"], released: ["B"] }, BC: ["B", "C"] },
      supports: { A: "fixed", C: "pinned" },
    });
    const solution = freeBodies(of, [
      uniform("BC", "4 kN/m"),
      pointLoad("BC", "7 kN", { at: "2 m", direction: "right" }),
    ]);
    // by hand: BC is a simple beam on the tip of AB: 10 kN there, so M at A = -30
    const value = (name: string): number =>
      solution.steps.find((s) => s.unknown === name)?.result ?? Number.NaN;
    expect(value("C_x")).toBeCloseTo(-7000, 6);
    expect(value("A_x")).toBeCloseTo(0, 6);
    expect(value("A_M")).toBeCloseTo(30000, 6);
  });
});
