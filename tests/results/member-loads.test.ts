import { describe, expect, it } from "vitest";
import { integralOver, memberLoads, valueAt } from "../../lib/results/index.ts";
import {
  atJoint,
  coupleLoad,
  pointLoad,
  portal,
  structure,
  uniform,
  varying,
} from "../../lib/structure/index.ts";

const frame = portal({ span: "10 m", height: "5 m", bases: "pinned" });

describe("memberLoads", () => {
  it("gravity on a beam acts across it, towards the reference fibre", () => {
    const { across, along, loads } = memberLoads(
      frame,
      [atJoint("B", { right: "1 kN" }), uniform("BC", "2 kN/m")],
      "BC",
    );
    expect([valueAt(across, 5), valueAt(along, 5)]).toEqual([2000, 0]);
    expect(loads).toEqual([1]);
  });

  it("gravity on a column going up acts against its walk, wind from the left towards its fibre", () => {
    const own = memberLoads(
      frame,
      [uniform("AB", "2 kN/m"), uniform("AB", "3 kN/m", { direction: "right" })],
      "AB",
    );
    expect([valueAt(own.along, 1), valueAt(own.across, 1)]).toEqual([-2000, 3000]);
  });

  it("on a column going down, wind from the left acts away from its fibre", () => {
    expect(
      valueAt(memberLoads(frame, [uniform("CD", "3 kN/m", { direction: "right" })], "CD").across, 1),
    ).toBe(-3000);
  });

  it("loads on a slope are resolved; per metre of member", () => {
    const rafter = structure({
      joints: { A: ["0 m", "0 m"], B: ["4 m", "3 m"] },
      members: { AB: ["A", "B"] },
      supports: { A: "fixed" },
    });
    const { across, along } = memberLoads(rafter, [uniform("AB", "10 kN/m")], "AB");
    expect(integralOver(across)).toBeCloseTo(40000, 8);
    expect(integralOver(along)).toBeCloseTo(-30000, 8);
  });

  it("partial, varying, point and couple loads keep their places", () => {
    const loads = [
      varying("BC", "0 kN/m", "4 kN/m", { from: "2 m", to: "0.6 L" }),
      pointLoad("BC", "7 kN", { at: "0.5 L" }),
      coupleLoad("BC", "3 kN m", { at: "1 m" }),
    ];
    const own = memberLoads(frame, loads, "BC");
    expect([1, 4, 5.999999999, 7].map((x) => valueAt(own.across, x)).map(Math.round)).toEqual([
      0, 2000, 4000, 0,
    ]);
    expect(own.points.map(({ x, across, couple, load }) => [x, across, couple, load])).toEqual([
      [1, 0, 3000, 2],
      [5, 7000, 0, 1],
    ]);
  });
});
