// The formulas of building frames worked by hand on one bay and two, and the trade's rules.

import { describe, expect, test } from "vitest";
import {
  asBending,
  coefficientMoments,
  coefficientSags,
  exteriorRestraint,
  hingedBeams,
  jointRotations,
  netOf,
  usualPlaces,
} from "../../lib/inflection/index.ts";
import { pointLoad } from "../../lib/structure/index.ts";
import { everyBeam, heldFrame } from "./restrained.ts";

/** Two bays of 6 m, one storey of 3 m: k of columns 1, of beams 1. */
const twoBays = (bases: "pinned" | "fixed") =>
  heldFrame([6, 6], [3], bases, (_, g) => (g === "beams" ? 6 : 3));
const FEM = (20e3 * 36) / 12;

describe("exteriorRestraint, by hand", () => {
  test.each([
    ["fixed", 1],
    ["pinned", 0.75],
  ] as const)("two bays, %s bases", (bases, S) => {
    const frame = twoBays(bases);
    const net = netOf(frame, everyBeam(frame));
    const ends = new Map(asBending(net, exteriorRestraint(net)).map((e) => [e.member, e]));
    const M = (FEM * S) / (S + 0.9);
    expect(ends.get("A1B1")?.start).toBeCloseTo(-M, 6);
    expect(ends.get("A1B1")?.end).toBeCloseTo(-(FEM + 0.4 * (FEM - M)), 6); // symmetric, so nothing to balance
    expect(ends.get("A0A1")?.end).toBeCloseTo(-M, 6);
    expect(ends.get("A0A1")?.start).toBeCloseTo(bases === "fixed" ? M / 2 : 0, 6);
    expect(ends.get("B0B1")?.end).toBeCloseTo(0, 6);
  });

  test("one bay of two storeys: 0.5 k of the beam, and 1.5 k of a column to the next floor", () => {
    const frame = heldFrame([6], [3, 3], "fixed", (_, g) => (g === "beams" ? 6 : 3));
    const net = netOf(frame, everyBeam(frame));
    const ends = new Map(asBending(net, exteriorRestraint(net)).map((e) => [e.member, e]));
    expect(ends.get("A1B1")?.start).toBeCloseTo((-FEM * 2.5) / 3, 6);
    expect(ends.get("A2B2")?.end).toBeCloseTo((-FEM * 1.5) / 2, 6);
    // the joint moment shared by k over the columns below and above
    expect(ends.get("A0A1")?.end).toBeCloseTo((-FEM * 2.5) / 6, 6);
    expect(ends.get("A1A2")?.start).toBeCloseTo((FEM * 2.5) / 6, 6);
  });
});

test("jointRotations, by hand: one bay, one storey, no correction", () => {
  const frame = heldFrame([6], [3], "fixed", (_, g) => (g === "beams" ? 6 : 3));
  const net = netOf(frame, everyBeam(frame));
  // θ = -FEM / (4 + 4), opposite at the other end: beam end FEM + 4θ - 2θ = 3/4 FEM, column end 4θ = -FEM/2;
  // the quarter left is shared evenly
  const ends = asBending(net, jointRotations(net, 0));
  expect(ends.find((e) => e.member === "A1B1")?.start).toBeCloseTo(-0.625 * FEM, 6);
  expect(ends.find((e) => e.member === "A0A1")?.end).toBeCloseTo(-0.625 * FEM, 6);
});

describe("the trade's rules", () => {
  const frame = twoBays("fixed");
  const net = netOf(frame, everyBeam(frame));

  test("hinges at a tenth: 0.045 wL² at every beam end, the outer ones into the columns", () => {
    const ends = new Map(
      asBending(net, hingedBeams(net, { outer: 0.1, inner: 0.1 })).map((e) => [e.member, e]),
    );
    for (const member of ["A1B1", "B1C1"]) {
      expect(ends.get(member)?.start).toBeCloseTo(-0.045 * 20e3 * 36, 6);
      expect(ends.get(member)?.end).toBeCloseTo(-0.045 * 20e3 * 36, 6);
    }
    expect(ends.get("A0A1")?.end).toBeCloseTo(-0.045 * 20e3 * 36, 6);
  });

  test("coefficients: 1/16 outer, 1/9 at the middle of two bays; 1/14 sagging (ACI 318, simplified method, from memory)", () => {
    const ends = new Map(asBending(net, coefficientMoments(net)).map((e) => [e.member, e]));
    expect(ends.get("A1B1")?.start).toBeCloseTo((-20e3 * 36) / 16, 6);
    expect(ends.get("A1B1")?.end).toBeCloseTo((-20e3 * 36) / 9, 6);
    expect(coefficientSags(net).map((s) => [s.member, Math.round(s.moment)])).toEqual([
      ["A1B1", Math.round((20e3 * 36) / 14)],
      ["B1C1", Math.round((20e3 * 36) / 14)],
    ]);
  });

  test("coefficients: 1/10 and 1/11 about the first inner column of three bays, 1/16 sagging between", () => {
    const three = heldFrame([6, 6, 6], [3], "fixed", (_, g) => (g === "beams" ? 6 : 3));
    const net = netOf(three, everyBeam(three));
    const ends = new Map(asBending(net, coefficientMoments(net)).map((e) => [e.member, e]));
    expect(ends.get("A1B1")?.end).toBeCloseTo((-20e3 * 36) / 10, 6);
    expect(ends.get("B1C1")?.start).toBeCloseTo((-20e3 * 36) / 11, 6);
    expect(coefficientSags(net)[1]?.moment).toBeCloseTo((20e3 * 36) / 16, 6);
  });

  test("the usual places are those of a uniform load (handbook tables): 0.211325 L and L/4", () => {
    expect(usualPlaces["fixed ends"].part).toBeCloseTo(0.211325, 6);
    expect(usualPlaces.propped.part).toBe(0.25);
    expect(usualPlaces.tenth.words).toContain("common practice");
  });

  test("coefficients refuse a load that is not uniform", () => {
    const loads = [pointLoad("A1B1", "10 kN", { at: "2 m" })];
    expect(() => coefficientMoments(netOf(frame, loads))).toThrow('the load of "A1B1" is another');
  });
});
