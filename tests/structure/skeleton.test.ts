import { describe, expect, it } from "vitest";
import { portal, skeleton, withHinges } from "../../lib/structure/index.ts";

const frame = withHinges(portal({ span: "14 m", height: "5 m", bases: "pinned" }), [
  { member: "BC", from: "B", at: "2 m" },
  { member: "BC", from: "C", at: "2 m" },
]);

describe("skeleton", () => {
  it("cuts members at their hinges", () => {
    const { nodes, segments } = skeleton(frame);
    expect(nodes.map((n) => n.name)).toEqual(["A", "B", "C", "D", "h1", "h2"]);
    expect(segments.map(({ member, begin, end }) => [member, begin, end])).toEqual([
      ["AB", 0, 5],
      ["BC", 0, 2],
      ["BC", 2, 12],
      ["BC", 12, 14],
      ["CD", 0, 5],
    ]);
  });

  it("both ends at a hinge are released, ends at rigid joints are not", () => {
    const { segments } = skeleton(frame);
    expect(segments.map((s) => [s.releasedStart, s.releasedEnd])).toEqual([
      [false, false],
      [false, true],
      [true, true],
      [true, false],
      [false, false],
    ]);
  });

  it("further cuts do not weaken, and fall away at ends and hinges", () => {
    const cuts = [7, 0, 14, 2].map((at) => ({ member: "BC", at }));
    const { nodes, segments } = skeleton(frame, cuts);
    expect(nodes.filter((n) => n.kind === "cut").map((n) => [n.name, n.x, n.y])).toEqual([["BC@7", 7, 5]]);
    expect(segments).toHaveLength(6);
    expect(segments[2]?.releasedEnd).toBe(false);
  });

  it("the segments of a member add up to its length and point along it", () => {
    const { segments } = skeleton(frame);
    const beamLength = segments.filter((s) => s.member === "BC").reduce((sum, s) => sum + s.length, 0);
    expect(beamLength).toBeCloseTo(14, 12);
    expect(segments.filter((s) => s.member === "CD").map(({ c, s }) => [c, s])).toEqual([[0, -1]]);
  });
});
