import { describe, expect, it } from "vitest";
import { placement } from "../../lib/inflection/index.ts";
import { quantity } from "../../lib/quantity/index.ts";
import {
  atJoint,
  beam,
  coupleLoad,
  portal,
  structure,
  uniform,
  withHinges,
} from "../../lib/structure/index.ts";

const fixed = portal({ span: "14 m", height: "6 m", bases: "fixed" });
const gravity = [uniform("BC", "12 kN/m")];

describe("placement", () => {
  it("by a part of the span: inside the range of the isolated span", () => {
    const placed = placement(fixed, gravity, { member: "BC", from: "C", at: "0.125 L" });
    expect(placed).toMatchObject({ distance: 1.75, at: 12.25, inside: true });
    expect(placed.range?.most).toBeCloseTo(3.5, 10);
    expect(placed.words).toBe(
      "hinge in BC 1.75 m (0.125 L) from C; inside the range 0 to 0.25 L (isolated span, C from free to turn to fixed, B likewise)",
    );
  });

  it("outside the range it says so", () => {
    const placed = placement(fixed, gravity, { member: "BC", from: "B", at: "0.3 L" });
    expect(placed.inside).toBe(false);
    expect(placed.words).toContain("OUTSIDE the range 0 to 0.25 L");
  });

  it("by end fixity: fixed at both ends gives 0.2113 L", () => {
    const placed = placement(fixed, gravity, { member: "BC", from: "B", fixity: { near: 1, far: 1 } });
    expect(placed.distance / 14).toBeCloseTo(0.5 - Math.sqrt(3) / 6, 10);
    expect(placed.words).toContain("end fixities 1 at B and 1 at the far end");
  });

  it("the hinge it gives goes straight into the structure", () => {
    const hinges = (["B", "C"] as const).map((from) =>
      placement(fixed, gravity, { member: "BC", from, fixity: { near: 0.5, far: 0.5 } }),
    );
    const hinged = withHinges(
      fixed,
      hinges.map((p) => p.hinge),
    );
    expect(hinged.hinges[0]?.at).toBeCloseTo(14 - (hinged.hinges[1]?.at ?? 0), 10);
  });

  it("a distance carries its sources to the hinge", () => {
    const a = quantity(1.5, "length", { from: ["a@1"] });
    const placed = placement(fixed, gravity, { member: "BC", from: "B", at: a });
    expect([placed.sources, withHinges(fixed, [placed.hinge]).hinges[0]?.from]).toEqual([["a@1"], ["a@1"]]);
  });

  it("an outer end on a roller is free to turn: the range is that of the propped span", () => {
    const two = beam({ spans: ["8 m", "8 m"] });
    const placed = placement(two, [uniform("AB", "5 kN/m")], { member: "AB", from: "B", at: "0.25 L" });
    expect(placed.range?.most).toBeCloseTo(2, 10);
    expect(placed.inside).toBe(true);
    expect(placed.words).toContain("A free to turn");
  });

  it("a column turned at its top under gravity: 0 to h/3 above its base", () => {
    const placed = placement(fixed, gravity, { member: "AB", from: "A", at: "1.9 m" });
    expect(placed.range).toEqual({ least: 0, most: 2 });
    expect(placed.inside).toBe(true);
  });

  it("under a force at the eave the column's own loads give no range", () => {
    const placed = placement(fixed, [atJoint("B", { right: "18 kN" })], {
      member: "AB",
      from: "A",
      at: "3 m",
    });
    expect([placed.range, placed.inside]).toEqual([undefined, undefined]);
    expect(placed.words).toContain("its own loads give no range");
  });

  it("a load that cannot make the end hog gives no range, in words", () => {
    const placed = placement(fixed, [uniform("BC", "-3 kN/m")], { member: "BC", from: "B", at: "2 m" });
    expect(placed.range).toBeUndefined();
    expect(placed.words).toContain("gives no point of inflection");
  });

  const refused: readonly (readonly [string, () => unknown, string])[] = [
    [
      "both a distance and fixities",
      () => placement(fixed, gravity, { member: "BC", from: "B", at: "1 m", fixity: { near: 1, far: 1 } }),
      "one of the two",
    ],
    ["neither", () => placement(fixed, gravity, { member: "BC", from: "B" }), "one of the two"],
    [
      "a joint that is no end of the member",
      () => placement(fixed, gravity, { member: "BC", from: "A", at: "1 m" }),
      'measured from "A", which is not an end of member BC; its ends are B and C',
    ],
    [
      "a place outside",
      () => placement(fixed, gravity, { member: "BC", from: "B", at: "20 m" }),
      "20 m along is not inside member BC",
    ],
    [
      "an end that is free to turn",
      () =>
        placement(beam({ spans: ["8 m", "8 m"] }), [uniform("AB", "5 kN/m")], {
          member: "AB",
          from: "A",
          at: "1 m",
        }),
      "free to turn at A, where its moment is zero already",
    ],
    [
      "fixities on an unloaded member",
      () => placement(fixed, gravity, { member: "AB", from: "A", fixity: { near: 1, far: 1 } }),
      "no load acts across the span",
    ],
    ["an unknown member", () => placement(fixed, gravity, { member: "XY", from: "B", at: "1 m" }), '"XY"'],
  ];
  it.each(refused)("refuses %s", (_, make, words) => {
    expect(make).toThrow(words);
  });

  it("a released end is free to turn; a couple loads a span", () => {
    const tied = structure({
      joints: { A: ["0 m", "0 m"], B: ["4 m", "0 m"], C: ["8 m", "0 m"] },
      members: { AB: ["A", "B"], BC: { ends: ["B", "C"], released: ["B"] } },
      supports: { A: "fixed", B: "roller", C: "fixed" },
    });
    expect(() => placement(tied, [uniform("BC", "1 kN/m")], { member: "BC", from: "B", at: "1 m" })).toThrow(
      "free to turn at B",
    );
    const turned = placement(tied, [coupleLoad("BC", "-4 kN m", { at: "2 m" })], {
      member: "BC",
      from: "C",
      at: "1 m",
    });
    expect(turned.words).toContain("hinge in BC 1 m");
  });
});

describe("placement(a span beside an overhang)", () => {
  // w L²/8 of the propped span less half of the moment at C; M = 0 where a quadratic has its roots.
  const of = beam({ spans: ["8 m", "6 m", "2 m"], supports: ["pinned", "roller", "roller", "free"] });
  const tip = (P: `${number} kN`) => [uniform("BC", "10 kN/m"), atJoint("D", { down: P })];
  /** First zero from B of 10 kN/m on 6 m between moments M_B and M_C, kN·m. */
  const zero = (M_B: number, M_C: number): number => {
    const V = 30 + (M_C - M_B) / 6;
    return (V - Math.sqrt(V ** 2 + 20 * M_B)) / 10;
  };

  it("from B: B free to turn to fixed, the moment at C as it is", () => {
    const placed = placement(of, tip("10 kN"), { member: "BC", from: "B", at: "0.2 L" });
    expect(placed.range?.least).toBe(0);
    expect(placed.range?.most).toBeCloseTo(zero(-45 + 10, -20), 10);
    expect(placed.words).toContain("B from free to turn to fixed, the moment at C known by statics");
  });

  it("from C: where that moment puts it", () => {
    const placed = placement(of, tip("10 kN"), { member: "BC", from: "C", at: "0.1 L" });
    const [free, fixed] = [zero(-20, 0), zero(-20, -35)];
    expect(placed.range?.least).toBeCloseTo(Math.min(free, fixed), 10);
    expect(placed.range?.most).toBeCloseTo(Math.max(free, fixed), 10);
    expect(placed.words).toContain("the moment at C known by statics, B from free to turn to fixed");
  });

  it("an overhang without load leaves C free to turn", () => {
    const loads = [uniform("BC", "10 kN/m")];
    const placed = placement(of, loads, { member: "BC", from: "B", at: "0.2 L" });
    expect(placed.range?.most).toBeCloseTo(1.5, 10);
    expect(placed.words).toContain("C free to turn");
    expect(() => placement(of, loads, { member: "BC", from: "C", at: "0.2 L" })).toThrow(
      "member BC is free to turn at C",
    );
  });

  it("a heavy overhang: no restraint at B gives a point near it", () => {
    const placed = placement(of, tip("60 kN"), { member: "BC", from: "B", at: "0.2 L" });
    expect([placed.range, placed.inside]).toEqual([undefined, undefined]);
    expect(placed.words).toContain("the moment does not change sign near the left end");
  });

  it("without load of its own: 0 to L/3 from the end that holds against it", () => {
    const loads = [atJoint("D", { down: "10 kN" })];
    expect(placement(of, loads, { member: "BC", from: "B", at: "0.2 L" }).range).toEqual({
      least: 0,
      most: 2,
    });
    expect(placement(of, loads, { member: "BC", from: "C", at: "0.8 L" }).range).toEqual({
      least: 4,
      most: 6,
    });
  });

  it("by end fixity: that of B counts, and it is said that C's is not used", () => {
    const placed = placement(of, tip("10 kN"), { member: "BC", from: "B", fixity: { near: 1, far: 0.5 } });
    expect(placed.distance).toBeCloseTo(zero(-35, -20), 10);
    expect(placed.known).toEqual(["C"]);
    expect(placed.words).toContain("0.5 at the far end, the moment at C known by statics");
  });

  it("a hinge in the overhang itself has no range", () => {
    const placed = placement(of, tip("10 kN"), { member: "CD", from: "C", at: "0.5 L" });
    expect(placed.range).toBeUndefined();
    expect(placed.words).toContain("an overhang: its moment is known by statics");
  });
});
