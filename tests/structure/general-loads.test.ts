// Loads in member directions and per projection, temperature, settlement; supports in full; releases.
import { describe, expect, test } from "vitest";
import {
  atJoint,
  beam,
  checkLoads,
  heldCount,
  type Imposed,
  inGlobalAxes,
  type Load,
  pointLoad,
  portal,
  type Structure,
  settlement,
  structure,
  support,
  temperature,
  uniform,
  withSections,
} from "../../lib/structure/index.ts";

const sloped = structure({
  joints: { A: ["0 m", "0 m"], B: ["4 m", "3 m"] },
  members: { AB: ["A", "B"] },
  supports: { A: "fixed" },
});

describe("inGlobalAxes", () => {
  test("snow per horizontal metre on a rafter 4 long and 3 high: four fifths per metre of rafter", () => {
    const load = inGlobalAxes(sloped, uniform("AB", "1 kN/m", { per: "horizontal" }));
    expect(load).toMatchObject({ q1: 800, q2: 800, direction: [0, -1] });
    expect(load).not.toHaveProperty("per");
    expect(
      inGlobalAxes(sloped, uniform("AB", "1 kN/m", { per: "vertical", direction: "right" })).q1,
    ).toBeCloseTo(600, 9);
  });

  test("across is towards the reference fibre (right of the walk), along towards the end", () => {
    const { direction } = inGlobalAxes(sloped, uniform("AB", "1 kN/m", { direction: "across" }));
    expect(direction[0]).toBeCloseTo(0.6, 12);
    expect(direction[1]).toBeCloseTo(-0.8, 12);
    const point = inGlobalAxes(sloped, pointLoad("AB", "10 kN", { at: "1 m", direction: "along" }));
    expect([point.fx, point.fy]).toEqual([8000, 6000]);
  });

  test("a global load comes back unchanged", () => {
    const load = uniform("AB", "1 kN/m");
    expect(inGlobalAxes(sloped, load)).toBe(load);
  });

  test("per vertical projection of a level member is refused", () => {
    const level = beam({ spans: ["4 m"] });
    expect(() => checkLoads(level, [uniform("AB", "1 kN/m", { per: "vertical" })])).toThrow(
      "the load 1 kN/m on AB is per vertical projection, but member AB has none; give it per length of the member",
    );
    expect(() => uniform("AB", "1 kN/m", { per: "sideways" as "vertical" })).toThrow(
      'projection of the load on AB is "sideways"',
    );
  });
});

describe("support in full", () => {
  test("guided lets y go; a spring counts as held", () => {
    expect(support("B", "guided").holds).toEqual({ x: true, y: false, rotation: true });
    const sprung = support("B", { y: "500 kN/m", rotation: "40 kN m/rad" });
    expect(sprung).toMatchObject({ kind: "free", springs: { y: 5e5, rotation: 4e4 } });
    expect(heldCount(sprung)).toBe(2);
    expect(support("B", { y: true, angle: "90 deg" }).angle).toBeCloseTo(Math.PI / 2, 15);
  });

  test("a structure on springs alone is supported", () => {
    const s = structure({
      joints: { A: ["0 m", "0 m"], B: ["4 m", "0 m"] },
      members: { AB: ["A", "B"] },
      supports: { A: { x: "1 kN/m", y: "1 kN/m" }, B: { y: "1 kN/m" } },
    });
    expect(s.supports).toHaveLength(2);
  });

  test.each([
    [{ y: "-5 kN/m" }, "y spring of the support at B is -5000 N/m; more than zero is wanted"],
    [{ y: "5 kN" }, 'y spring of the support at B: "5 kN" is a force; a force per length is wanted'],
    [{ rotation: "5 kN/m" }, 'rotation spring of the support at B: "5 kN/m" is a force per length'],
    [{ y: true, angle: "3 m" }, 'angle of the support at B: "3 m" is a length; an angle is wanted'],
  ])("%j is refused", (parts, words) => {
    const make = (): Structure =>
      structure({
        joints: { A: ["0 m", "0 m"], B: ["4 m", "0 m"] },
        members: { AB: ["A", "B"] },
        supports: { A: "fixed", B: parts as Parameters<typeof support>[1] },
      });
    expect(make).toThrow(words);
  });
});

describe("releases", () => {
  const make = (more: object): Structure =>
    structure({
      joints: { A: ["0 m", "0 m"], B: ["4 m", "0 m"] },
      members: { AB: { ends: ["A", "B"], ...more } },
      supports: { A: "pinned", B: "pinned" },
    });
  test("shear and axial force by joint", () => {
    const [AB] = make({ released: ["A"], shearReleased: ["A"], axialReleased: ["B"] }).members;
    expect(AB?.releases).toEqual({
      start: { moment: true, shear: true },
      end: { moment: false, axial: true },
    });
  });
  test.each([
    [{ axialReleased: ["A", "B"] }, "slides along its axis"],
    [{ shearReleased: ["A", "B"] }, "moves sideways"],
    [{ released: ["A", "B"], shearReleased: ["A"] }, "turns"],
  ])("%j: floats by itself, refused", (more, motion) => {
    expect(() => make(more)).toThrow(
      `member "AB" is released at both ends so far that it ${motion} by itself; drop one of the releases`,
    );
  });
  test("a release at a joint that is no end", () => {
    expect(() => make({ axialReleased: ["C"] })).toThrow('a release of member AB is measured from "C"');
  });
});

describe("imposed deformations", () => {
  const steel = { E: "210 GPa", I: "8360 cm^4", A: "53.8 cm^2", alpha: "12e-6 1/K", depth: "0.3 m" } as const;
  const bare = beam({ spans: ["4 m"], supports: ["fixed", "roller"] });
  const s = withSections(bare, { all: steel });
  const check =
    (on: Structure, ...loads: (Load | Imposed)[]): (() => void) =>
    () =>
      checkLoads(on, loads);

  test("temperature and settlement are plain frozen data", () => {
    expect(temperature("AB", { uniform: "25 K", difference: "-10 °C" })).toMatchObject({
      uniform: 25,
      difference: -10,
      label: "25 K, -10 °C",
    });
    const moved = settlement("B", { down: "12 mm", rotation: "2 mrad" });
    expect(moved).toMatchObject({ x: 0, y: -0.012, rotation: 0.002 });
    expect(Object.isFrozen(moved)).toBe(true);
  });

  test("they fit", () => {
    expect(
      check(s, temperature("AB", { uniform: "25 K", difference: "5 K" }), settlement("B", { down: "5 mm" })),
    ).not.toThrow();
  });

  test.each([
    [
      "temperature on an unknown member",
      s,
      temperature("XY", { uniform: "25 K" }),
      'load 1 (25 K) is on member "XY", which is not defined',
    ],
    [
      "a member without alpha",
      bare,
      temperature("AB", { uniform: "25 K" }),
      'member "AB" has no alpha; load 1 (25 K) needs it',
    ],
    [
      "a difference without depth",
      withSections(bare, { all: { E: 1, I: 1, A: 1, alpha: "1e-5 1/K" } }),
      temperature("AB", { difference: "25 K" }),
      'member "AB" has no depth; load 1 (25 K) needs it',
    ],
    [
      "a settlement where nothing is held",
      s,
      settlement("B", { right: "5 mm" }),
      "load 1 (5 mm) moves joint B in x, where no support holds it",
    ],
    [
      "a settlement of an unknown joint",
      s,
      settlement("Z", { down: "5 mm" }),
      'load 1 (5 mm) is at joint "Z"',
    ],
    [
      "an infinite change",
      s,
      { ...temperature("AB", { uniform: "25 K" }), uniform: Number.POSITIVE_INFINITY },
      "load 1 (25 K) is Infinity; a finite number is wanted",
    ],
  ] as const)("%s is refused", (_, on, load, words) => {
    expect(check(on, load)).toThrow(words);
  });

  test("nothing given, and a wrong unit", () => {
    expect(() => temperature("AB", {})).toThrow("the temperature change of AB has no force or couple");
    expect(() => settlement("B", {})).toThrow("the settlement of B has no force or couple");
    expect(() => settlement("B", { down: "3 kN" as "3 m" })).toThrow(
      'settlement of B: "3 kN" is a force; a length is wanted',
    );
  });
});

describe("portal in full", () => {
  test("a pitched beam has its ridge between the knees", () => {
    const p = portal({ span: "12 m", height: "5 m", bases: "pinned", rise: "1.5 m" });
    expect(p.joints.map((j) => [j.name, j.x, j.y])).toEqual([
      ["A", 0, 0],
      ["B", 0, 5],
      ["C", 6, 6.5],
      ["D", 12, 5],
      ["E", 12, 0],
    ]);
    expect(p.members.map((m) => [m.name, m.group])).toEqual([
      ["AB", "columns"],
      ["BC", "beams"],
      ["CD", "beams"],
      ["DE", "columns"],
    ]);
  });
  test("unequal columns under a level beam, the right base higher", () => {
    const p = portal({
      span: "12 m",
      height: { left: "6 m", right: "4 m" },
      rightBase: "2 m",
      bases: { left: "fixed", right: "pinned" },
    });
    expect(p.joints.map((j) => [j.x, j.y])).toEqual([
      [0, 0],
      [0, 6],
      [12, 6],
      [12, 2],
    ]);
  });
  test("a ridge outside the span", () => {
    expect(() =>
      portal({ span: "12 m", height: "5 m", bases: "pinned", rise: "1 m", ridgeAt: "12 m" }),
    ).toThrow("the ridge is at 12 m on member beam, outside it");
  });
});

test("a couple on a joint of a truss is still refused", () => {
  const t = structure({
    joints: { A: ["0 m", "0 m"], B: ["4 m", "0 m"] },
    members: { AB: { ends: ["A", "B"], released: ["A", "B"] } },
    supports: { A: "pinned", B: "roller" },
  });
  expect(() => checkLoads(t, [atJoint("B", { couple: "1 kN m" })])).toThrow("nothing takes a couple");
});
