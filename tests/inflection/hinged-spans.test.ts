import fc from "fast-check";
import { describe, expect, test } from "vitest";
import { endMomentsFromHinges, hingesFromEndMoments, momentsWithEnds } from "../../lib/inflection/index.ts";
import { constant, valueAt } from "../../lib/results/index.ts";
import { span, udl } from "./spans.ts";

describe("hinged spans", () => {
  test("hinges at 0.1 L under a uniform load: +0.08 wL² and -0.045 wL² (Saouma, Structural Engineering, eq. 14.29-14.30)", () => {
    const one = udl(1, 1);
    const ends = endMomentsFromHinges(one, 0.1, 0.9);
    expect(ends.left).toBeCloseTo(-0.045, 12);
    expect(ends.right).toBeCloseTo(-0.045, 12);
    expect(valueAt(momentsWithEnds(one, ends), 0.5)).toBeCloseTo(0.08, 12);
  });

  test("from hinges to end moments and back, any load", () => {
    const load = fc.record({
      x: fc.double({ min: 0.05, max: 0.95, noNaN: true }),
      P: fc.double({ min: 1, max: 9, noNaN: true }),
    });
    fc.assert(
      fc.property(
        fc.double({ min: 0, max: 0.45, noNaN: true }),
        fc.double({ min: 0.55, max: 1, noNaN: true }),
        fc.array(load, { maxLength: 3 }),
        (a, b, forces) => {
          const L = 7;
          const one = span(
            L,
            constant(0, L, 3),
            forces.map(({ x, P }) => ({ x: x * L, across: P, couple: 0 })),
          );
          const M = momentsWithEnds(one, endMomentsFromHinges(one, a * L, b * L));
          expect(valueAt(M, a * L)).toBeCloseTo(0, 9);
          expect(valueAt(M, b * L)).toBeCloseTo(0, 9);
          const found = hingesFromEndMoments(one, endMomentsFromHinges(one, a * L, b * L));
          for (const x of [a * L, b * L])
            if (x > 0.01 && x < L - 0.01)
              expect(Math.min(...found.map((y) => Math.abs(y - x)))).toBeLessThan(1e-6);
        },
      ),
      { seed: 5215, numRuns: 200 },
    );
  });

  test("refuses hinges at one place or off the span", () => {
    expect(() => endMomentsFromHinges(udl(6, 1), 2, 2)).toThrow("two different places");
    expect(() => endMomentsFromHinges(udl(6, 1), -1, 2)).toThrow("-1 m");
  });
});
