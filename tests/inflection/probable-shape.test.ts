// The qualitative shape against the elastic solution: number and order of points of inflection, equal stiffness everywhere.

import { describe, expect, it } from "vitest";
import { exact } from "../../lib/exact/index.ts";
import { type ProbableShape, probableShape } from "../../lib/inflection/index.ts";
import { valueAt } from "../../lib/results/index.ts";
import {
  atJoint,
  beam,
  buildingFrame,
  type Load,
  pointLoad,
  portal,
  type Structure,
  structure,
  uniform,
  withHinges,
} from "../../lib/structure/index.ts";

/** Bending stiff against axial force, so that axial strain does not blur the comparison. */
const section = { A: 1, I: 1e-4, E: 2e11 };
const equal = (of: Structure): Structure => ({
  ...of,
  members: of.members.map((m) => ({ ...m, section })),
});

const spans = (n: number, supports?: Parameters<typeof beam>[0]["supports"]): Structure =>
  beam({
    spans: Array.from({ length: n }, () => "6 m" as const),
    ...(supports === undefined ? {} : { supports }),
  });
const on = (of: Structure, pattern: string): readonly Load[] =>
  of.members.filter((_, i) => pattern[i] === "1").map((m) => uniform(m.name, "10 kN/m"));
const frame = (bays: number, storeys: number, bases: "pinned" | "fixed"): Structure =>
  buildingFrame({
    bays: Array.from({ length: bays }, () => "6 m" as const),
    storeys: Array.from({ length: storeys }, () => "4 m" as const),
    bases,
  });
const beamsOf = (of: Structure): readonly Load[] =>
  of.members.filter((m) => m.group === "beams").map((m) => uniform(m.name, "10 kN/m"));
const overhang = beam({ spans: ["6 m", "2 m"], supports: ["pinned", "roller", "free"] });
const spansAndTip = beam({
  spans: ["6 m", "6 m", "2 m"],
  supports: ["pinned", "roller", "roller", "free"],
});
const stubbed = structure({
  joints: {
    A: ["0 m", "0 m"],
    B: ["0 m", "4 m"],
    C: ["8 m", "4 m"],
    D: ["8 m", "0 m"],
    E: ["10 m", "4 m"],
    F: ["-2 m", "4 m"],
  },
  members: { AB: ["A", "B"], BC: ["B", "C"], CD: ["C", "D"], CE: ["C", "E"], FB: ["F", "B"] },
  supports: { A: "fixed", B: { x: true }, D: "fixed" },
});
const pinnedPortal = portal({ span: "8 m", height: "4 m", bases: "pinned" });
const fixedPortal = portal({ span: "8 m", height: "4 m", bases: "fixed" });

const rows: readonly (readonly [name: string, of: Structure, loads: readonly Load[]])[] = [
  ["simple beam", spans(1), on(spans(1), "1")],
  ["cantilever", spans(1, ["fixed", "free"]), on(spans(1), "1")],
  ["cantilever to the left", spans(1, ["free", "fixed"]), on(spans(1), "1")],
  ["propped cantilever", spans(1, ["fixed", "roller"]), on(spans(1), "1")],
  [
    "propped cantilever, force at a third",
    spans(1, ["fixed", "roller"]),
    [pointLoad("AB", "5 kN", { at: "2 m" })],
  ],
  ["beam fixed at both ends", spans(1, ["fixed", "fixed"]), on(spans(1), "1")],
  [
    "beam fixed at both ends, force off centre",
    spans(1, ["fixed", "fixed"]),
    [pointLoad("AB", "5 kN", { at: "1.5 m" })],
  ],
  ["overhang loaded alone", overhang, on(overhang, "01")],
  ["overhang without load, the span loaded", overhang, on(overhang, "10")],
  ["both loaded", overhang, on(overhang, "11")],
  [
    "force on the joint at the tip, the span loaded",
    overhang,
    [...on(overhang, "10"), atJoint("C", { down: "6 kN" })],
  ],
  ["force on the joint at the tip alone", overhang, [atJoint("C", { down: "6 kN" })]],
  ["an overhang that outweighs the span", overhang, [...on(overhang, "10"), atJoint("C", { down: "60 kN" })]],
  ["two spans and an overhang", spansAndTip, on(spansAndTip, "111")],
  ["two spans and an overhang, the inner span loaded", spansAndTip, on(spansAndTip, "010")],
  ["two spans and an overhang, the overhang loaded", spansAndTip, on(spansAndTip, "001")],
  [
    "two spans and a heavy overhang, the first span without load",
    spansAndTip,
    [...on(spansAndTip, "010"), atJoint("D", { down: "90 kN" })],
  ],
  ["portal with a stub", stubbed, [uniform("BC", "10 kN/m"), atJoint("E", { down: "2 kN" })]],
  ["portal with a heavy stub", stubbed, [uniform("BC", "4 kN/m"), atJoint("E", { down: "40 kN" })]],
  ["two spans", spans(2), on(spans(2), "11")],
  ["two spans, one loaded", spans(2), on(spans(2), "10")],
  [
    "two spans, fixed at the far end, one loaded",
    spans(2, ["pinned", "roller", "fixed"]),
    on(spans(2), "10"),
  ],
  ["three spans, the first loaded", spans(3), on(spans(3), "100")],
  ["three spans, the middle one loaded", spans(3), on(spans(3), "010")],
  ["three spans, the outer ones loaded", spans(3), on(spans(3), "101")],
  ["three spans, two beside one another", spans(3), on(spans(3), "110")],
  ["three spans", spans(3), on(spans(3), "111")],
  ["four spans", spans(4), on(spans(4), "1111")],
  ["four spans, first and last loaded", spans(4), on(spans(4), "1001")],
  ["four spans, the first loaded", spans(4), on(spans(4), "1000")],
  ["five spans", spans(5), on(spans(5), "11111")],
  ["five spans, the middle one loaded", spans(5), on(spans(5), "00100")],
  ["pinned portal", pinnedPortal, on(pinnedPortal, "010")],
  ["fixed portal", fixedPortal, on(fixedPortal, "010")],
  ["fixed portal, force on the beam", fixedPortal, [pointLoad("BC", "30 kN", { at: "0.5 L" })]],
  ["pinned portal pushed to the right", pinnedPortal, [atJoint("B", { right: "20 kN" })]],
  ["fixed portal pushed to the right", fixedPortal, [atJoint("B", { right: "20 kN" })]],
  ["fixed portal pushed to the left", fixedPortal, [atJoint("C", { left: "20 kN" })]],
  ["two storeys, gravity", frame(1, 2, "fixed"), beamsOf(frame(1, 2, "fixed"))],
  [
    "two storeys, pushed",
    frame(1, 2, "fixed"),
    [atJoint("A1", { right: "9 kN" }), atJoint("A2", { right: "9 kN" })],
  ],
  ["two bays, pushed, fixed", frame(2, 1, "fixed"), [atJoint("A1", { right: "9 kN" })]],
  ["two bays, pushed, pinned", frame(2, 1, "pinned"), [atJoint("A1", { right: "9 kN" })]],
  [
    "three storeys, two bays, pushed",
    frame(2, 3, "fixed"),
    ["A1", "A2", "A3"].map((j) => atJoint(j, { right: "9 kN" })),
  ],
];

/** Curvature of the elastic solution from start to end, members that hardly bend left out of the comparison. */
function elasticPieces(of: Structure, loads: readonly Load[]): ReadonlyMap<string, readonly string[]> {
  const { members } = exact(equal(of), loads);
  const at = (m: (typeof members)[number]): readonly number[] => {
    const stops = [0, ...m.inflection, m.length];
    return stops.slice(1).map((stop, i) => valueAt(m.M, ((stops[i] ?? 0) + stop) / 2));
  };
  return new Map(members.map((m) => [m.member, at(m).map((M) => (M > 0 ? "sagging" : "hogging"))]));
}

describe("probableShape against the elastic solution, equal stiffness", () => {
  let compared = 0;
  it.each(rows)("%s: the same points of inflection in the same order", (_, of, loads) => {
    const elastic = elasticPieces(of, loads);
    const shape = probableShape(of, loads);
    expect(shape.label).toBe("qualitative");
    for (const { member, pieces, inflections, unknown } of shape.members) {
      if (unknown !== undefined || pieces[0]?.curvature === "straight") continue;
      expect([member, ...pieces.map((p) => p.curvature)]).toEqual([member, ...(elastic.get(member) ?? [])]);
      expect(inflections).toHaveLength(pieces.length - 1);
      for (const { at, why } of inflections) {
        expect(at > 0 && at < 1).toBe(true);
        expect(why.length).toBeGreaterThan(20);
      }
      compared += 1;
    }
  });

  it("most members were compared", () => {
    expect(compared).toBeGreaterThan(85);
  });
});

describe("probableShape says what it cannot know", () => {
  const unknowns = (shape: ProbableShape): readonly (string | undefined)[] =>
    shape.members.map((m) => m.unknown);
  it("the middle column between two equal loaded beams", () => {
    const of = frame(2, 1, "fixed");
    const shape = probableShape(of, beamsOf(of));
    const B = shape.members.find((m) => m.member === "B0B1");
    expect(B?.unknown).toContain("hold one another");
    expect(shape.members.filter((m) => m.unknown !== undefined)).toHaveLength(1);
  });

  it("gravity and a push at once, opposing pushes, leaning members, a held frame, a hinge", () => {
    const both = probableShape(fixedPortal, [uniform("BC", "5 kN/m"), atJoint("B", { right: "5 kN" })]);
    expect(unknowns(both)).toEqual(Array(3).fill(expect.stringContaining("ask for each sort by itself")));
    const opposed = probableShape(fixedPortal, [
      atJoint("B", { right: "5 kN" }),
      atJoint("C", { left: "5 kN" }),
    ]);
    expect(unknowns(opposed)).toEqual(Array(3).fill("the pushes oppose one another"));
    const gable = portal({ span: "8 m", height: "4 m", rise: "1 m", bases: "fixed" });
    expect(unknowns(probableShape(gable, [atJoint("B", { right: "5 kN" })]))[0]).toContain("leans");
    expect(unknowns(probableShape(gable, [uniform("BC", "5 kN/m")]))[0]).toContain("not level");
    const held = structure({
      joints: { A: ["0 m", "0 m"], B: ["0 m", "4 m"], C: ["6 m", "4 m"] },
      members: { AB: ["A", "B"], BC: ["B", "C"] },
      supports: { A: "fixed", C: "pinned" },
    });
    expect(unknowns(probableShape(held, [atJoint("B", { right: "5 kN" })]))[0]).toContain("holds the frame");
    const hinged = withHinges(fixedPortal, [{ member: "BC", from: "B", at: "1 m" }]);
    expect(unknowns(probableShape(hinged, [uniform("BC", "5 kN/m")]))[1]).toContain("has a hinge");
  });

  it("a loaded span beside an overhang that outweighs it and another loaded span", () => {
    const loads = [...on(spansAndTip, "110"), atJoint("D", { down: "90 kN" })];
    expect(unknowns(probableShape(spansAndTip, loads))).toEqual([
      undefined,
      "what hangs on C outweighs the load of the span: which way it bends at B cannot be known",
      undefined,
    ]);
  });

  it("loads of both senses on one span, and a couple at a joint", () => {
    const up = probableShape(spans(1, ["fixed", "fixed"]), [
      pointLoad("AB", "5 kN", { at: "1 m" }),
      pointLoad("AB", "5 kN", { at: "5 m", direction: "up" }),
    ]);
    expect(unknowns(up)[0]).toContain("both ways");
    expect(unknowns(probableShape(fixedPortal, [atJoint("B", { couple: "5 kN m" })]))[0]).toContain(
      "a couple",
    );
  });
});
