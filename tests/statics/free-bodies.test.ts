import { describe, expect, it } from "vitest";
import { type FreeBodySolution, roots, valueAt } from "../../lib/results/index.ts";
import { freeBodies, type StaticsError } from "../../lib/statics/index.ts";
import {
  atJoint,
  beam,
  buildingFrame,
  type HingeAt,
  type Load,
  pointLoad,
  portal,
  type Structure,
  structure,
  support,
  uniform,
  withHinges,
} from "../../lib/structure/index.ts";

const hinge = (member: string, from: string, at: HingeAt["at"]): HingeAt => ({ member, from, at });
const pinned = portal({ span: "14 m", height: "5.5 m", bases: "pinned" });
const fixed = portal({ span: "14 m", height: "5.5 m", bases: "fixed" });
const twoHinges = withHinges(pinned, [hinge("BC", "B", "0.125 L"), hinge("BC", "C", "0.125 L")]);

const order = (solution: FreeBodySolution): readonly string[] =>
  solution.steps.map((s) => `${s.id} -> ${s.unknown}`);
const found = (solution: FreeBodySolution, unknown: string): number =>
  solution.steps.find((s) => s.unknown === unknown)?.result ?? Number.NaN;

describe("freeBodies: the order a person would choose", () => {
  it("two spans, one hinge: first the part that hangs on the hinge, then the other", () => {
    const gerber = withHinges(beam({ spans: ["8 m", "6 m"] }), [hinge("AB", "B", "0.2 L")]);
    const solution = freeBodies(gerber, [uniform("AB", "10 kN/m"), uniform("BC", "10 kN/m")]);
    expect(order(solution).slice(0, 4)).toEqual([
      "beam from A to h1: sum M about A -> h1_y",
      "beam from A to h1: sum Fy -> A_y",
      "beam from h1 to C: sum M about B -> C_y",
      "beam from h1 to C: sum Fy -> B_y",
    ]);
    // by hand: h1_y = 10·6.4/2 = 32 kN; M at B = -(32·1.6 + 10·1.6²/2) = -64 kN·m; C_y = 30 - 64/6
    expect(found(solution, "h1_y")).toBeCloseTo(32000, 6);
    expect(found(solution, "AB_B_M")).toBeCloseTo(-64000, 6);
    expect(found(solution, "C_y")).toBeCloseTo(30000 - 64000 / 6, 6);
  });

  it("pinned portal, two beam hinges: the suspended part, the left column with its arm, back to the beam, the right one", () => {
    const solution = freeBodies(twoHinges, [uniform("BC", "12 kN/m")]);
    expect(order(solution).slice(0, 14)).toEqual([
      "beam between h1 and h2: sum M about h1 -> h2_y",
      "beam between h1 and h2: sum Fy -> h1_y",
      "column AB with beam to h1: sum M about A -> h1_x",
      "column AB with beam to h1: sum Fy -> A_y",
      "column AB with beam to h1: sum Fx -> A_x",
      "beam between h1 and h2: sum Fx -> h2_x",
      "column CD with beam to h2: sum Fy -> D_y",
      "column CD with beam to h2: sum Fx -> D_x",
      "column AB: sum M about B -> AB_B_M",
      "column AB: sum Fy -> AB_B_N",
      "column AB: sum Fx -> AB_B_V",
      "joint B: sum M about B -> BC_B_M",
      "joint B: sum Fy -> BC_B_V",
      "joint B: sum Fx -> BC_B_N",
    ]);
    // by hand: h1_y = 12·10.5/2 = 63 kN, M at B = -(63·1.75 + 12·1.75²/2) = -128.625 kN·m, H = 128.625/5.5
    expect(found(solution, "h2_y")).toBeCloseTo(63000, 6);
    expect(found(solution, "AB_B_M")).toBeCloseTo(-128625, 6);
    expect(found(solution, "A_x")).toBeCloseTo(128625 / 5.5, 6);
    const [first] = solution.closures;
    expect(first?.id).toBe("column CD with beam to h2: sum M about h2");
  });

  it("fixed portal, three hinges: knees joined for the first moment, then one after the other, then the feet", () => {
    const three = withHinges(fixed, [
      hinge("AB", "A", "0.5 L"),
      hinge("BC", "B", "0.5 L"),
      hinge("CD", "D", "0.5 L"),
    ]);
    const solution = freeBodies(three, [atJoint("B", { right: "18 kN" })]);
    expect(order(solution).slice(0, 9)).toEqual([
      "knee B from h1 to h2 + knee C from h2 to h3: sum M about h1 -> h3_y",
      "knee C from h2 to h3: sum M about h2 -> h3_x",
      "knee C from h2 to h3: sum Fy -> h2_y",
      "knee C from h2 to h3: sum Fx -> h2_x",
      "knee B from h1 to h2: sum Fy -> h1_y",
      "knee B from h1 to h2: sum Fx -> h1_x",
      "column from A to h1: sum M about A -> A_M",
      "column from A to h1: sum Fy -> A_y",
      "column from A to h1: sum Fx -> A_x",
    ]);
    // by hand: each column takes 9 kN at mid-height, so 9·2.75 at foot and knee; beam shear 2·24.75/14
    expect(found(solution, "A_M")).toBeCloseTo(24750, 6);
    expect(found(solution, "A_y")).toBeCloseTo((-2 * 24750) / 14, 6);
  });

  it("four spans, three hinges: hanging parts first, then what they stand on; what has no load along it comes last", () => {
    const four = withHinges(beam({ spans: ["6 m", "8 m", "8 m", "6 m"] }), [
      hinge("BC", "B", "0.2 L"),
      hinge("BC", "C", "0.2 L"),
      hinge("CD", "D", "0.2 L"),
    ]);
    const solution = freeBodies(
      four,
      ["AB", "BC", "CD", "DE"].map((m) => uniform(m, "10 kN/m")),
    );
    expect(order(solution).slice(0, 8)).toEqual([
      "beam between h1 and h2: sum M about h1 -> h2_y",
      "beam between h1 and h2: sum Fy -> h1_y",
      "beam from A to h1: sum M about A -> B_y",
      "beam from A to h1: sum Fy -> A_y",
      "beam from h2 to h3: sum M about C -> h3_y",
      "beam from h2 to h3: sum Fy -> C_y",
      "beam from h3 to E: sum M about D -> E_y",
      "beam from h3 to E: sum Fy -> D_y",
    ]);
    const idle = solution.steps.filter((s) => s.idle === true);
    expect(idle.every((s) => s.equation === "sum Fx" && s.result === 0)).toBe(true);
    expect(idle.length).toBeGreaterThan(0);
  });

  it("a three-hinged frame on two levels: two equations taken together, each standing on both", () => {
    const uneven = structure({
      joints: { A: ["0 m", "0 m"], B: ["4 m", "3 m"], C: ["8 m", "-1 m"] },
      members: { AB: { ends: ["A", "B"], released: ["B"] }, BC: { ends: ["B", "C"], released: ["B"] } },
      supports: { A: "pinned", C: "pinned" },
    });
    const solution = freeBodies(uneven, [uniform("AB", "2 kN/m"), pointLoad("BC", "10 kN", { at: "0.3 L" })]);
    expect(solution.steps.slice(0, 3).map((s) => s.together)).toEqual([[1], [0], []]);
    expect(solution.steps[0]?.uses.loads).toEqual([0, 1]);
    // by hand, X and Y at B on BC: about A 3X - 4Y = 20, about C -4X - 4Y = -28, so X = 48/7, Y = 1/7
    expect(found(solution, "BC_B_x")).toBeCloseTo(48000 / 7, 6);
    expect(found(solution, "BC_B_y")).toBeCloseTo(1000 / 7, 6);
  });
});

describe("freeBodies: what a step stands on", () => {
  const solution = freeBodies(twoHinges, [
    uniform("BC", "12 kN/m"),
    atJoint("B", { down: "5 kN" }),
    atJoint("C", { down: "5 kN" }),
  ]);
  const uses = (unknown: string): unknown => solution.steps.find((s) => s.unknown === unknown)?.uses;

  it("the suspended part stands on its load, its ends and nothing else", () => {
    expect(uses("h2_y")).toEqual({
      loads: [0],
      places: [],
      joints: ["B", "C"],
      coordinates: [
        { joint: "B", axis: "x" },
        { joint: "C", axis: "x" },
      ],
      hinges: ["h1", "h2"],
      steps: [],
    });
  });

  it("a column stands on the joint load above it, the load on its arm and the step before", () => {
    expect(uses("A_y")).toEqual({
      loads: [0, 1],
      places: [],
      joints: ["B", "C"],
      coordinates: [
        { joint: "B", axis: "x" },
        { joint: "C", axis: "x" },
      ],
      hinges: ["h1"],
      steps: [1],
    });
  });

  it("a sum of forces without spread load stands on no geometry", () => {
    expect(uses("A_x")).toEqual({
      loads: [],
      places: [],
      joints: [],
      coordinates: [],
      hinges: [],
      steps: [2],
    });
  });

  it("ids are unique", () => {
    const ids = [...solution.steps.map((s) => s.id), ...solution.closures.map((c) => c.id)];
    expect(new Set(ids).size).toBe(ids.length);
  });

  it("the functions of a member name the steps they start from and the loads between its ends", () => {
    const [AB, BC] = solution.members;
    expect(AB?.uses.map((i) => solution.steps[i]?.unknown)).toEqual(["A_y", "A_x"]);
    expect(BC?.uses.map((i) => solution.steps[i]?.unknown)).toEqual(["BC_B_M", "BC_B_V", "BC_B_N"]);
    expect([AB?.loads, BC?.loads]).toEqual([[], [0]]);
  });
});

describe("freeBodies: results", () => {
  it("the moment is zero at the hinges and nowhere else in the beam", () => {
    const [, BC] = freeBodies(twoHinges, [uniform("BC", "12 kN/m")]).members;
    expect(BC === undefined ? [] : roots(BC.M).map((x) => Number(x.toFixed(9)))).toEqual([1.75, 12.25]);
  });

  it("a force at a hinge goes to the part towards the member's start", () => {
    const gerber = withHinges(beam({ spans: ["4 m", "4 m"] }), [hinge("AB", "B", "1 m")]);
    const solution = freeBodies(gerber, [pointLoad("AB", "6 kN", { at: "3 m" })]);
    const part = solution.bodies.find((b) => b.name === "beam from A to h1");
    expect(part?.actions.filter((a) => "load" in a.source)).toHaveLength(1);
    const [AB] = solution.members;
    expect(
      AB === undefined ? [] : [valueAt(AB.V, 3, "left"), valueAt(AB.V, 3, "right")].map(Math.round),
    ).toEqual([0, -6000]);
  });

  it("a beam fixed at both ends with two hinges: the axial reaction is zero and said to be", () => {
    const both = withHinges(beam({ spans: ["6 m"], supports: ["fixed", "fixed"] }), [
      hinge("AB", "A", "0.2113 L"),
      hinge("AB", "B", "0.2113 L"),
    ]);
    const solution = freeBodies(both, [uniform("AB", "10 kN/m")]);
    expect(solution.reactions.map((r) => r.x)).toEqual([0, 0]);
    expect(solution.notes?.[0]).toContain("B_x = 0");
    // 10·(0.5774·6)/2 carried to the hinge, then w a²/2
    const a = 0.2113 * 6;
    expect(solution.reactions[0]?.moment).toBeCloseTo(1e4 * (3 - a) * a + (1e4 * a * a) / 2, 6);
  });

  it("a simple truss is solved too", () => {
    const bars = ["AB", "BC", "AC"].map(
      (n) => [n, { ends: [n[0] ?? "", n[1] ?? ""], released: [...n] }] as const,
    );
    const truss = structure({
      joints: { A: ["0 m", "0 m"], B: ["2 m", "3 m"], C: ["4 m", "0 m"] },
      members: Object.fromEntries(bars),
      supports: { A: "pinned", C: "roller" },
    });
    const solution = freeBodies(truss, [atJoint("B", { down: "10 kN" })]);
    const force = (name: string): number => {
      const member = solution.members.find((m) => m.member === name);
      return member === undefined ? Number.NaN : valueAt(member.N, member.length / 2);
    };
    // by hand: 5 kN vertical in each leg, so -5·√13/3 along it, tie 5·2/3
    expect(force("AB")).toBeCloseTo((-5000 * Math.sqrt(13)) / 3, 6);
    expect(force("AC")).toBeCloseTo(10000 / 3, 6);
  });
});

describe("freeBodies: a member end released at a fixed support", () => {
  const released = (held: string): Structure => {
    const frame = withHinges(buildingFrame({ bays: ["6 m"], storeys: ["4 m"], bases: "fixed" }), [
      hinge("A1B1", "A1", "0.1 L"),
      hinge("A1B1", "B1", "0.1 L"),
      hinge("B0B1", "B0", "1 m"),
    ]);
    const roller = support(held, { x: true });
    const members = frame.members.map((m) =>
      m.name === "A0A1" ? { ...m, releases: { ...m.releases, start: { moment: true } } } : m,
    );
    return { ...frame, members, supports: [...frame.supports, roller] };
  };
  // by hand: h1_y = 10·4.8/2 = 24 kN; thrust of the left column 24·0.6 + 10·0.6²/2 = 16.2 kN·m over 4 m = 4.05 kN, of the
  // right one 16.2 over the 3 m above its hinge = 5.4 kN, 5.4·1 kN·m at its foot; the roller takes the difference
  it.each([["A1"], ["B1"]])(
    "the support's moment is nought by the joint alone, the frame held at %s",
    (held) => {
      const solution = freeBodies(released(held), [uniform("A1B1", "10 kN/m")]);
      const [A, B, roller] = solution.reactions;
      expect(A).toMatchObject({ joint: "A0", moment: 0 });
      expect([A?.x, A?.y, B?.x, B?.y, B?.moment, roller?.x].map((v) => Math.round(v ?? Number.NaN))).toEqual([
        4050, 30000, -5400, 30000, 5400, 1350,
      ]);
      expect(order(solution)).toContain("joint A0: sum M about A0 -> A0_M");
      expect(solution.steps.filter((s) => s.together.length > 0)).toEqual([]);
    },
  );
});

describe("freeBodies: refusals", () => {
  const rows: readonly (readonly [
    string,
    Structure,
    readonly Load[],
    StaticsError["fault"]["kind"],
    string,
  ])[] = [
    [
      "no hinge in a pinned portal",
      pinned,
      [uniform("BC", "12 kN/m")],
      "indeterminate",
      "still indeterminate to the 1st degree with no hinges: statics alone cannot give the forces; add 1 more hinge where the moment is probably zero",
    ],
    [
      "one hinge in a fixed portal",
      withHinges(fixed, [hinge("BC", "B", "0.5 L")]),
      [uniform("BC", "12 kN/m")],
      "indeterminate",
      "to the 2nd degree with 1 hinge: statics alone cannot give the forces; add 2 more hinges",
    ],
    [
      "half the span loaded over two hinges",
      twoHinges,
      [uniform("BC", "12 kN/m", { to: "0.5 L" })],
      "not balanced",
      "nothing resists sway: B and C move sideways together, columns AB and CD turn about A and D",
    ],
    [
      "a folding beam",
      withHinges(beam({ spans: ["6 m"] }), [hinge("AB", "A", "2 m")]),
      [uniform("AB", "1 kN/m")],
      "not balanced",
      "h1 drops, the beam folds there",
    ],
    [
      "a mechanism with a redundant part, load balanced",
      withHinges(beam({ spans: ["6 m", "6 m", "6 m"] }), [hinge("AB", "A", "2 m"), hinge("AB", "A", "4 m")]),
      [uniform("CD", "1 kN/m")],
      "self-stress in a mechanism",
      "no single answer",
    ],
    [
      "a load along a line held at both ends",
      beam({ spans: ["6 m"], supports: ["pinned", "pinned"] }),
      [pointLoad("AB", "1 kN", { at: "2 m", direction: "right" })],
      "axial",
      "held at both ends (A and B)",
    ],
  ];
  it.each(rows)("refuses %s", (_, of, loads, kind, words) => {
    const make = (): unknown => freeBodies(of, loads);
    expect(make).toThrow(words);
    try {
      make();
    } catch (error) {
      expect((error as StaticsError).fault.kind).toBe(kind);
    }
  });
});
