import { describe, expect, it } from "vitest";
import { diagramMarks } from "../../lib/drawing/index.ts";
import type { MemberForces } from "../../lib/results/index.ts";
import { portalForces } from "./fixtures.ts";

const texts = { value: (si: number) => (si / 1000).toFixed(1), place: (x: number) => `${x.toFixed(2)} m` };

describe("diagramMarks", () => {
  it("diagramMarks(M of the hinged portal): knees, midspan and the two hinges, nothing at the pinned bases", () => {
    const marks = diagramMarks(portalForces, ["M"], texts);
    // w = 12.8 kN/m, L = 14 m, hinges at 1.75 m: knee -137.2, midspan 12.8*14^2/8 - 137.2 = 176.4 kN·m.
    expect(marks.map((m) => [m.member, m.kind, m.at.toFixed(2), m.text])).toEqual([
      ["AB", "end", "5.50", "-137.2"],
      ["BC", "end", "0.00", "-137.2"],
      ["BC", "end", "14.00", "-137.2"],
      ["BC", "extreme", "7.00", "176.4"],
      ["BC", "zero", "1.75", "1.75 m"],
      ["BC", "zero", "12.25", "12.25 m"],
      ["CD", "end", "0.00", "-137.2"],
    ]);
  });

  it("diagramMarks(N) prints a constant force once, at the middle", () => {
    const marks = diagramMarks(portalForces, ["N"], texts);
    expect(marks.map((m) => [m.member, m.at, m.text])).toEqual([
      ["AB", 2.75, "-89.6"],
      ["BC", 7, "-24.9"],
      ["CD", 2.75, "-89.6"],
    ]);
  });

  // Simple beam of 6 m with 30 kN at 2 m: V = 20 and -10 kN, M = 40 kN·m under the load (P·a·b/L).
  const beam: MemberForces = {
    member: "AB",
    length: 6,
    N: { breaks: [0, 6], pieces: [[0]] },
    V: { breaks: [0, 2, 6], pieces: [[20000], [-10000]] },
    M: {
      breaks: [0, 2, 6],
      pieces: [
        [0, 20000],
        [40000, -10000],
      ],
    },
    uses: [],
  };

  it("diagramMarks(V with a jump) prints both sides of it", () => {
    const marks = diagramMarks([beam], ["V"], texts);
    expect(marks.map((m) => [m.kind, m.at, m.text])).toEqual([
      ["end", 0, "20.0"],
      ["end", 6, "-10.0"],
      ["jump", 2, "20.0"],
      ["jump", 2, "-10.0"],
    ]);
  });

  it("diagramMarks(M with a corner under a point load) prints the corner", () => {
    const marks = diagramMarks([beam], ["M"], texts);
    expect(marks.map((m) => [m.kind, m.at, m.text])).toEqual([["extreme", 2, "40.0"]]);
  });

  it("diagramMarks(no force at all) is empty", () => {
    expect(diagramMarks([beam], ["N"], texts)).toEqual([]);
  });

  it("diagramMarks without place texts still marks zeros", () => {
    const zeros = diagramMarks(portalForces, ["M"], { value: texts.value }).filter((m) => m.kind === "zero");
    expect(zeros.map((m) => m.text)).toEqual(["", ""]);
  });
});
