import { describe, expect, it } from "vitest";
import { quantity } from "../../lib/quantity/index.ts";
import { atJoint, coupleLoad, partial, pointLoad, uniform, varying } from "../../lib/structure/index.ts";

describe("loads", () => {
  it("uniform(BC, 5.2 kN/m) acts down on the whole member", () => {
    expect(uniform("BC", "5.2 kN/m")).toEqual({
      kind: "distributed",
      member: "BC",
      begin: { fraction: 0 },
      end: { fraction: 1 },
      q1: 5200,
      q2: 5200,
      direction: [0, -1],
      label: "5.2 kN/m",
      from: [],
    });
  });

  it("partial takes metres and parts of L", () => {
    expect(partial("BC", "2 kN/m", { from: "1 m", to: "0.5 L" })).toMatchObject({
      begin: { metres: 1 },
      end: { fraction: 0.5 },
    });
  });

  it("varying carries both values", () => {
    expect(varying("BC", "0 kN/m", "3 kN/m")).toMatchObject({ q1: 0, q2: 3000 });
  });

  it("wind on a column acts to the right", () => {
    expect(uniform("AB", "2 kN/m", { direction: "right" }).direction).toEqual([1, 0]);
  });

  it("pointLoad acts down, coupleLoad counter-clockwise", () => {
    expect(pointLoad("BC", "10 kN", { at: "0.5 L" })).toMatchObject({ fx: 0, fy: -10000, couple: 0 });
    expect(coupleLoad("BC", "10 kN m", { at: "2 m" })).toMatchObject({ fx: 0, fy: 0, couple: 10000 });
  });

  it("atJoint adds what is given", () => {
    expect(atJoint("B", { right: "18 kN", down: "4 kN", up: "1 kN", couple: "-2 kN m" })).toMatchObject({
      fx: 18000,
      fy: -3000,
      couple: -2000,
    });
  });

  it("a load carries the sources of its value and its place", () => {
    const w = quantity(5000, "force per length", { from: ["w@1"] });
    const a = quantity(2, "length", { from: ["a@3"] });
    expect(uniform("BC", w, { from: a }).from).toEqual(["w@1", "a@3"]);
  });

  it("loads are frozen", () => {
    const load = uniform("BC", "5 kN/m");
    expect([load, load.begin, load.direction, load.from].every((part) => Object.isFrozen(part))).toBe(true);
  });

  const refused: readonly (readonly [string, () => unknown, string])[] = [
    ["a force as line load", () => uniform("BC", "5 kN" as "5 kN/m"), "uniform load on BC"],
    [
      "an unknown direction",
      () => uniform("BC", "5 kN/m", { direction: "sideways" as "left" }),
      '"sideways"',
    ],
    ["a joint load of nothing", () => atJoint("B", {}), "the load at joint B has no force or couple"],
    ["a place that is a force", () => pointLoad("BC", "5 kN", { at: "5 kN" as "5 m" }), "a length is wanted"],
  ];
  it.each(refused)("refuses %s", (_, make, words) => {
    expect(make).toThrow(words);
  });
});

describe("a load that fits no member is refused where it is made", () => {
  it.each<[string, () => unknown, string]>([
    [
      "ends reversed, in metres",
      () => uniform("BC", "5 kN/m", { from: "8 m", to: "2 m" }),
      "the load on BC (5 kN/m) runs from 8 m to 2 m; its end must lie beyond its beginning",
    ],
    [
      "ends reversed, in parts",
      () => varying("BC", "1 kN/m", "5 kN/m", { from: "0.75 L", to: "0.25 L", label: "drift" }),
      "the load on BC (drift) runs from 0.75 L to 0.25 L",
    ],
    ["from the end on", () => uniform("BC", "5 kN/m", { from: "1 L" }), "runs from 1 L to 1 L"],
    ["to the beginning", () => uniform("BC", "5 kN/m", { from: "1 m", to: "0 L" }), "runs from 1 m to 0 L"],
    [
      "before the member",
      () => uniform("BC", "5 kN/m", { from: "-1 m" }),
      "the load on BC (5 kN/m) is at -1 m",
    ],
    ["beyond the member", () => uniform("BC", "5 kN/m", { to: "1.5 L" }), "is at 1.5 L, outside its member"],
    [
      "a point load beyond it",
      () => pointLoad("BC", "5 kN", { at: "1.2 L" }),
      "the point load on BC (5 kN) is at 1.2 L, outside its member; from 0 L to 1 L is wanted",
    ],
    [
      "a couple before it",
      () => coupleLoad("BC", "5 kN m", { at: "-0.5 m" }),
      "the couple on BC (5 kN m) is at -0.5 m",
    ],
  ])("%s", (_, make, words) => {
    expect(make).toThrow(words);
  });

  it("a stretch from metres to a part waits for the member's length", () => {
    expect(uniform("BC", "5 kN/m", { from: "8 m", to: "0.5 L" }).begin).toEqual({ metres: 8 });
  });
});
