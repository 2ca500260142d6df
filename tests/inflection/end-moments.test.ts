import fc from "fast-check";
import { describe, expect, it } from "vitest";
import {
  endFixity,
  endMoments,
  fixedEndMoments,
  type InflectionError,
  momentsBetween,
  simpleMoments,
} from "../../lib/inflection/index.ts";
import { integralOver, piecewise, product, valueAt } from "../../lib/results/index.ts";
import { bare, forces, span, trapezoid, udl } from "./spans.ts";

const seed = 20310;

describe("endMoments", () => {
  it("a simple span has M0 = wL²/8 at mid-span and zero at its ends", () => {
    const M0 = simpleMoments(udl(6, 10));
    expect(valueAt(M0, 3)).toBeCloseTo(45, 10);
    expect([valueAt(M0, 0), valueAt(M0, 6)].map((m) => Math.abs(m))).toEqual([0, expect.closeTo(0, 10)]);
  });

  it("a couple at mid-span: moments jump by it, and each fixed end takes C/4", () => {
    const turned = span(8, bare(8), [{ x: 4, across: 0, couple: 12 }]);
    const M0 = simpleMoments(turned);
    expect(valueAt(M0, 4, "left") - valueAt(M0, 4, "right")).toBeCloseTo(12, 10);
    // each half takes C/2 at its middle end and carries half of it over, counter-clockwise: hogging left, sagging right
    const { left, right } = fixedEndMoments(turned);
    expect(left).toBeCloseTo(-3, 10);
    expect(right).toBeCloseTo(3, 10);
  });

  it("fixities from 0 to 1 reach from the simple span over the propped to the fixed", () => {
    const s = udl(6, 10);
    expect(endMoments(s, { left: 0, right: 0 })).toEqual({ left: 0, right: 0 });
    expect(endMoments(s, { left: 1, right: 0 }).left).toBeCloseTo(-(10 * 36) / 8, 10);
    expect(endMoments(s, { left: 1, right: 1 }).left).toBeCloseTo(-(10 * 36) / 12, 10);
  });

  it(`the end slopes are those of the springs, for any load and fixity (seed ${seed})`, () => {
    const r = fc.double({ min: 0.05, max: 0.95, noNaN: true });
    const w = fc.integer({ min: -20, max: 20 });
    fc.assert(
      fc.property(r, r, w, w, fc.integer({ min: 1, max: 9 }), w, (rA, rB, w1, w2, c, P) => {
        const L = 7;
        const s = {
          ...trapezoid(L, 0.2, 0.9, w1, w2),
          points: [{ x: (c / 10) * L, across: P, couple: w1 / 2 }],
        };
        const M = momentsBetween(s, { left: rA, right: rB });
        const slopeA = integralOver(product(M, piecewise([0, L], [[1, -1 / L]]))); // EI times slope, clockwise
        const slopeB = integralOver(product(M, piecewise([0, L], [[0, 1 / L]])));
        const spring = (fixity: number): number => (3 / L) * (fixity / (1 - fixity)); // k over EI
        expect(valueAt(M, 0)).toBeCloseTo(-spring(rA) * slopeA, 7);
        expect(valueAt(M, L)).toBeCloseTo(-spring(rB) * slopeB, 7);
      }),
      { seed },
    );
  });

  it("endFixity is 0 for a free end, 1/2 for 3EI/L, 1 for a rigid one", () => {
    expect([endFixity(0), endFixity(3), endFixity(Number.POSITIVE_INFINITY)]).toEqual([0, 0.5, 1]);
  });

  const refused: readonly (readonly [string, () => unknown, string])[] = [
    [
      "a fixity above 1",
      () => endMoments(udl(6, 1), { left: 1.4, right: 0 }),
      "the end fixity at the left end is 1.4; from 0 (free to turn) to 1 (fixed) is wanted",
    ],
    [
      "a fixity that is no number",
      () => endMoments(udl(6, 1), { left: 0, right: Number.NaN }),
      "at the right end is NaN",
    ],
    ["a negative restraint", () => endFixity(-1), "the restraint is -1"],
    ["a span of no length", () => fixedEndMoments({ ...udl(6, 1), length: 0 }), "the span is 0 m"],
    ["a load of another span", () => fixedEndMoments({ ...udl(6, 1), length: 7 }), "[0, 7] is wanted"],
    ["a force outside", () => fixedEndMoments(forces(6, 1, 1.2)), "not on [0, 6]"],
  ];
  it.each(refused)("refuses %s", (_, make, words) => {
    expect(make).toThrow(words);
  });

  it("errors carry their data", () => {
    try {
      endFixity(-1);
      expect.unreachable();
    } catch (error) {
      expect((error as InflectionError).fault).toEqual({ kind: "restraint", value: -1 });
    }
  });
});
