import fc from "fast-check";
import { describe, expect, test } from "vitest";
import { countAbove, countBelow, holding, ranked } from "../../lib/accuracy/quantiles.ts";
import { seed } from "../exact/checks.ts";

const count = (n: number): Float64Array => Float64Array.from({ length: n }, (_, i) => i + 1);

describe("holding", () => {
  test("of 1 to 99 without ties nine in ten lie between ranks 5 and 95", () => {
    expect(holding(count(99), 0.9).map((x) => Number(x.toFixed(9)))).toEqual([5, 95]);
    expect(ranked(count(99), 0.5)).toBe(50);
  });

  test("ties that leave too little out: the end nearer to zero moves in, the other stays", () => {
    // 7 of 99 at 10, 7 at 90, the others between; no end can leave 7 out by itself, one of the two can
    const between = Float64Array.from({ length: 85 }, (_, i) => 11 + i * 0.9);
    const up = Float64Array.from([...new Array(7).fill(10), ...between, ...new Array(7).fill(90)]).sort();
    const [low, high] = holding(up, 0.9);
    expect(high).toBe(90);
    expect([countBelow(up, low), countAbove(up, high)]).toEqual([9, 0]);
    const down = up.map((x) => -x).sort();
    const mirrored = holding(down, 0.9);
    expect(mirrored[0]).toBe(-high);
    expect(mirrored[1]).toBeCloseTo(-low, 9);
  });

  test("leaves out at most a tenth in all, and at most a twentieth beyond the end greater in size", () => {
    fc.assert(
      fc.property(fc.array(fc.integer({ min: -20, max: 30 }), { minLength: 39, maxLength: 300 }), (list) => {
        const sorted = Float64Array.from(list).sort();
        const [low, high] = holding(sorted, 0.9);
        const [below, above] = [countBelow(sorted, low), countAbove(sorted, high)];
        const n = sorted.length + 1;
        expect(low).toBeLessThanOrEqual(high);
        expect(below + above).toBeLessThanOrEqual(0.1 * n + 1e-9);
        const beyond = Math.abs(ranked(sorted, 0.05)) < Math.abs(ranked(sorted, 0.95)) ? above : below;
        expect(beyond).toBeLessThanOrEqual(0.05 * n + 1e-9);
      }),
      { seed, numRuns: 2000 },
    );
  });
});
