import fc from "fast-check";
import { describe, expect, test } from "vitest";
import { exact } from "../../lib/exact/index.ts";
import { twoSpanHinge } from "../../lib/inflection/index.ts";
import { quantity } from "../../lib/quantity/index.ts";
import { beam, uniform } from "../../lib/structure/index.ts";

const w = (q: number) => quantity(q, "force per length");

describe("twoSpanHinge", () => {
  test("equal spans: 0.25 L, so that M = wL²/8 (handbook tables, e.g. Hicks, Civil Engineering Formulas, table 2.1)", () => {
    expect(twoSpanHinge({ spans: 1 })).toBe(0.25);
  });

  test("is where exact has the moment zero, for any ratio of spans, loads and EI", () => {
    const ratio = (min: number, max: number) => fc.double({ min, max, noNaN: true });
    fc.assert(
      fc.property(ratio(0.4, 1), ratio(0, 2), ratio(0.3, 3), (spans, loads, rigidity) => {
        const alpha = twoSpanHinge({ spans, loads, rigidity });
        fc.pre(alpha < 0.95);
        const structure = beam({
          spans: [quantity(8 * spans, "length"), "8 m"],
          sections: { AB: { E: 1, I: 1, A: 1 }, BC: { E: 1, I: rigidity, A: 1 } },
        });
        const on = [uniform("BC", w(1000)), ...(loads > 0 ? [uniform("AB", w(1000 * loads))] : [])];
        const found = exact(structure, on).members[1]?.inflection[0];
        expect(found).toBeCloseTo(alpha * 8, 8);
      }),
      { seed: 5212, numRuns: 200 },
    );
  });

  test.each([
    [{ spans: 0 }, "shorter span over longer span is 0"],
    [{ spans: 1, loads: -1 }, "load of the shorter span"],
    [{ spans: 1, rigidity: Number.NaN }, "is NaN"],
  ])("refuses %o", (ratios, words) => {
    expect(() => twoSpanHinge(ratios)).toThrow(words);
  });
});
