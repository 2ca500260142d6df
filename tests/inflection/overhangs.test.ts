// Overhangs hold no joint: their moments are statics. Against the stiffness solution and the three-moment equation.

import fc from "fast-check";
import { describe, expect, test } from "vitest";
import { exact } from "../../lib/exact/index.ts";
import {
  asBending,
  coefficientMoments,
  columnSinking,
  exteriorRestraint,
  hingeByStiffness,
  hingedBeams,
  jointRotations,
  momentDistribution,
  momentsByStiffness,
  type Net,
  netOf,
  withShortening,
} from "../../lib/inflection/index.ts";
import { valueAt } from "../../lib/results/index.ts";
import {
  atJoint,
  beam,
  coupleLoad,
  type Load,
  pointLoad,
  type Section,
  type Structure,
  structure,
  uniform,
  varying,
  withRelativeStiffness,
} from "../../lib/structure/index.ts";
import { metres, stiffSection } from "./restrained.ts";

const seed = 7741;
const kN = 1000;

/** Largest gap between end moments of a method and the exact ones, over the largest exact one. */
function gap(frame: Structure, loads: readonly Load[], method: (net: Net) => Float64Array): number {
  const net = netOf(frame, loads);
  const found = asBending(net, method(net));
  let [most, size] = [0, 0];
  exact(frame, loads).members.forEach(({ M, length }, i) => {
    const [a, b] = [valueAt(M, 0), valueAt(M, length, "left")];
    most = Math.max(most, Math.abs(a - (found[i]?.start ?? 0)), Math.abs(b - (found[i]?.end ?? 0)));
    size = Math.max(size, Math.abs(a), Math.abs(b));
  });
  return most / size;
}

const alike = (of: Structure): Structure => withRelativeStiffness(of, {});
const bendingAt = (net: Net, m: Float64Array, member: string, end: "start" | "end"): number =>
  asBending(net, m).find((one) => one.member === member)?.[end] ?? Number.NaN;

describe("two spans and an overhang at the right", () => {
  const three = alike(
    beam({ spans: ["8 m", "6 m", "2 m"], supports: ["pinned", "roller", "roller", "free"] }),
  );
  const under = (P: `${number} kN`): readonly Load[] => [
    uniform("AB", "10 kN/m"),
    uniform("BC", "10 kN/m"),
    pointLoad("CD", P, { at: "1 L" }),
  ];

  // Three-moment equation (B. P. E. Clapeyron 1857, from memory), EI alike, M_A = 0 and M_C = -P a:
  //   2 M_B (L1 + L2) + M_C L2 = -w (L1³ + L2³)/4
  test.each([
    [1, "1 kN"],
    [20, "20 kN"],
    [60, "60 kN"],
  ] as const)("P = %d kN at the tip: M_B by the three-moment equation", (P, text) => {
    const M_B = (-(10 * (8 ** 3 + 6 ** 3)) / 4 + P * 2 * 6) / (2 * (8 + 6));
    const { net, ends } = momentsByStiffness(three, under(text));
    expect(bendingAt(net, ends, "AB", "end") / kN).toBeCloseTo(M_B, 9);
    expect(bendingAt(net, ends, "BC", "start") / kN).toBeCloseTo(M_B, 9);
    expect(bendingAt(net, ends, "BC", "end") / kN).toBeCloseTo(-2 * P, 9);
    expect(bendingAt(net, ends, "CD", "start") / kN).toBeCloseTo(-2 * P, 9);
    expect(gap(three, under(text), (own) => momentDistribution(own, 2))).toBeLessThan(1e-6);
  });

  test("the force put on the joint at the tip is the same load", () => {
    const atTip = [...under("20 kN").slice(0, 2), atJoint("D", { down: "20 kN" })];
    const [a, b] = [momentsByStiffness(three, under("20 kN")), momentsByStiffness(three, atTip)];
    a.ends.forEach((m, i) => {
      expect(b.ends[i]).toBeCloseTo(m, 6);
    });
  });

  test("the hinge in AB moves with the load on the overhang, and the words name the spans only", () => {
    // M = 0 at x = 8 + 2 M_B/(w L): 5.9 m for M_B = -84 kN·m, say
    const places = (["1 kN", "60 kN"] as const).map((P) => {
      const found = momentsByStiffness(three, under(P));
      return hingeByStiffness(found, "AB", "end");
    });
    expect(places[0]).toBeCloseTo((2 * 64.5714) / 80, 4);
    expect(places[1]).toBeCloseTo((2 * 39.2857) / 80, 4);
    expect(momentsByStiffness(three, under("1 kN")).words("AB")).toMatch(
      /EI\/L of AB, BC as 1 : 1\.33; overhang CD: no stiffness, the moment known by statics$/,
    );
  });

  test("patterned loads: 25, 10 and 10 kN/m with 20 kN at the tip of 2 m", () => {
    const four = alike(
      beam({
        spans: ["9 m", "7 m", "8 m", "2 m"],
        supports: ["pinned", "roller", "roller", "roller", "free"],
      }),
    );
    const loads = [
      uniform("BC", "10 kN/m"),
      uniform("CD", "10 kN/m"),
      pointLoad("DE", "20 kN", { at: "1 L" }),
    ];
    const heavy = [uniform("AB", "25 kN/m"), ...loads];
    expect(gap(four, heavy, (net) => momentDistribution(net, 4))).toBeLessThan(0.01);
    const even = [uniform("AB", "10 kN/m"), ...loads];
    expect(gap(four, even, (net) => momentDistribution(net, 2))).toBeLessThan(0.04);
    expect(gap(four, even, (net) => momentDistribution(net, 3))).toBeLessThan(0.02);
  });
});

test("an overhang more than half as long as its span, uniform load: three moments at B and C within 2 %", () => {
  const [L1, L2, L3, a, w] = [7.2, 9, 6.6, 3.6, 23];
  const frame = alike(
    beam({
      spans: [metres(L1), metres(L2), metres(L3), metres(a)],
      supports: ["pinned", "roller", "roller", "roller", "free"],
    }),
  );
  const { net, ends } = momentsByStiffness(
    frame,
    frame.members.map((m) => uniform(m.name, "23 kN/m")),
  );
  // 2(L1 + L2) M_B + L2 M_C = F_B and L2 M_B + 2(L2 + L3) M_C = F_C, with M_D = -w a²/2 (Clapeyron 1857, from memory)
  const [FB, FC] = [(-w * (L1 ** 3 + L2 ** 3)) / 4, (-w * (L2 ** 3 + L3 ** 3)) / 4 + (w * a ** 2 * L3) / 2];
  const D = 4 * (L1 + L2) * (L2 + L3) - L2 ** 2;
  const [M_B, M_C] = [(2 * (L2 + L3) * FB - L2 * FC) / D, (2 * (L1 + L2) * FC - L2 * FB) / D];
  expect(Math.abs(bendingAt(net, ends, "BC", "start") / kN / M_B - 1)).toBeLessThan(0.02);
  expect(Math.abs(bendingAt(net, ends, "BC", "end") / kN / M_C - 1)).toBeLessThan(0.02);
  expect(bendingAt(net, ends, "DE", "start") / kN).toBeCloseTo((-w * a ** 2) / 2, 9);
});

const log = (min: number, max: number) =>
  fc.double({ min: Math.log(min), max: Math.log(max), noNaN: true }).map(Math.exp);

test("beams with overhangs at both ends, of one and of two members, any load: distribution comes to exact", () => {
  const beams = fc.record({
    spans: fc.array(log(4, 9), { minLength: 1, maxLength: 4 }),
    left: fc.array(log(0.5, 2), { maxLength: 2 }),
    right: fc.array(log(0.5, 2), { maxLength: 2 }),
    I: fc.array(log(0.3, 3), { minLength: 8, maxLength: 8 }),
    w: fc.array(fc.double({ min: -10, max: 30, noNaN: true }), { minLength: 8, maxLength: 8 }),
    tip: log(5, 60),
  });
  fc.assert(
    fc.property(beams, ({ spans, left, right, I, w, tip }) => {
      const all = [...left, ...spans, ...right];
      const supports = all.map((_, i): "free" | "roller" =>
        i < left.length || i > left.length + spans.length ? "free" : "roller",
      );
      supports[all.length] = right.length === 0 ? "roller" : "free";
      const bare = beam({
        spans: all.map(metres),
        supports: supports.map((s, i) => (i === left.length ? "pinned" : s)),
      });
      const frame = {
        ...bare,
        members: bare.members.map((m, i) => ({ ...m, section: stiffSection(I[i] ?? 1) })),
      };
      const last = frame.members[frame.members.length - 1];
      const loads = [
        ...frame.members.map((m, i) => varying(m.name, `${w[i] ?? 0} kN/m`, "12 kN/m", { from: "0.2 L" })),
        atJoint(last?.end ?? "", { down: `${right.length === 0 ? 0 : tip} kN`, couple: "15 kN m" }),
        coupleLoad(frame.members[0]?.name ?? "", "7 kN m", { at: "0.3 L" }),
      ];
      expect(gap(frame, loads, (net) => momentDistribution(net, 40))).toBeLessThan(1e-5);
      expect(gap(frame, loads, (net) => jointRotations(net, 60))).toBeLessThan(1e-5);
    }),
    { seed, numRuns: 40 },
  );
});

describe("an overhang on a frame joint", () => {
  const sized = (of: Structure, size: (i: number) => Section): Structure => ({
    ...of,
    members: of.members.map((m, i) => ({ ...m, section: size(i) })),
  });
  // two bays with a stub to the right of C, held against sway at A1
  const frame = sized(
    structure({
      joints: {
        A0: ["0 m", "0 m"],
        B0: ["6 m", "0 m"],
        C0: ["11 m", "0 m"],
        A1: ["0 m", "4 m"],
        B1: ["6 m", "4 m"],
        C1: ["11 m", "4 m"],
        D1: ["13 m", "4 m"],
      },
      members: {
        A0A1: ["A0", "A1"],
        B0B1: ["B0", "B1"],
        C0C1: ["C0", "C1"],
        A1B1: ["A1", "B1"],
        B1C1: ["B1", "C1"],
        C1D1: ["C1", "D1"],
      },
      supports: { A0: "fixed", B0: "pinned", C0: "fixed", A1: { x: true } },
    }),
    (i) => stiffSection([1, 2, 1.5, 3, 2.5, 2][i] ?? 1),
  );
  const loads = [
    uniform("A1B1", "20 kN/m"),
    uniform("B1C1", "15 kN/m"),
    uniform("C1D1", "10 kN/m"),
    atJoint("D1", { down: "30 kN" }),
  ];
  // w a²/2 + P a
  const stub = -(10 * 2 ** 2) / 2 - 30 * 2;

  test.each([
    ["momentDistribution, 40 cycles", (net: Net) => momentDistribution(net, 40), 1e-4],
    ["jointRotations, 60 passes", (net: Net) => jointRotations(net, 60), 1e-4],
    ["momentDistribution, 4 cycles", (net: Net) => momentDistribution(net, 4), 0.01],
    ["jointRotations, 1 pass", (net: Net) => jointRotations(net, 1), 0.03],
    ["exteriorRestraint", (net: Net) => exteriorRestraint(net), 0.1],
  ] as const)("%s comes near the exact end moments", (_, method, within) => {
    expect(gap(frame, loads, method)).toBeLessThan(within);
  });

  test.each([
    ["momentDistribution", (net: Net) => momentDistribution(net, 1)],
    ["jointRotations", (net: Net) => jointRotations(net, 1)],
    ["exteriorRestraint", (net: Net) => exteriorRestraint(net)],
    ["hingedBeams", (net: Net) => hingedBeams(net, { outer: 0.1, inner: 0.2 })],
    ["coefficientMoments", (net: Net) => coefficientMoments(net)],
    ["after shortening", (net: Net) => momentDistribution(withShortening(net), 1)],
  ])("%s: the stub has the moment of statics and every joint is in balance", (_, method) => {
    const net = netOf(frame, loads);
    const m = method(net);
    expect(bendingAt(net, m, "C1D1", "start") / kN).toBeCloseTo(stub, 9);
    expect(bendingAt(net, m, "C1D1", "end")).toBeCloseTo(0, 9);
    for (const { held, ends } of net.joints)
      if (!held)
        expect(ends.reduce((sum, { member, end }) => sum + (m[2 * member + end] ?? 0), 0)).toBeCloseTo(0, 6);
  });

  test("what the stub carries goes down the column at its root", () => {
    const net = netOf(frame, loads);
    const area = 1.5 * 1e7;
    const simple = (15 * 5) / 2 + 10 * 2 + 30; // kN: half of B1C1 and all of the stub
    const sinking = columnSinking(net);
    expect(sinking[5]).toBeCloseTo((simple * kN * 4) / area, 12);
    expect(sinking[6]).toBe(sinking[5]);
  });

  test("momentsByStiffness(portal with a stub at one knee) is near exact, and says what the overhang is", () => {
    const portal = structure({
      joints: {
        A: ["0 m", "0 m"],
        B: ["0 m", "4 m"],
        C: ["8 m", "4 m"],
        D: ["8 m", "0 m"],
        E: ["10 m", "4 m"],
      },
      members: { AB: ["A", "B"], BC: ["B", "C"], CD: ["C", "D"], CE: ["C", "E"] },
      supports: { A: "fixed", D: "fixed" },
    });
    const own = sized(portal, (i) => stiffSection([1, 2, 1, 1][i] ?? 1));
    const put = [uniform("BC", "20 kN/m"), atJoint("E", { down: "15 kN" })];
    const found = momentsByStiffness(own, put);
    expect(found.formula).toBe("portal");
    expect(gap(own, put, () => found.ends)).toBeLessThan(0.03);
    expect(bendingAt(found.net, found.ends, "CE", "start") / kN).toBeCloseTo(-30, 9);
    expect(found.words("BC")).toContain("overhang CE: no stiffness");
  });
});
