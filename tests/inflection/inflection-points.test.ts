import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { inflectionPoints, inflectionRange, isolatedRange } from "../../lib/inflection/index.ts";
import { bare, forces, span, trapezoid, udl } from "./spans.ts";

const seed = 20310;
const third = Math.sqrt(3) / 6;

describe("inflectionRange", () => {
  const rows: readonly (readonly [string, ReturnType<typeof udl>, number, number])[] = [
    ["uniform load, far end fixed", udl(10, 5), 1, 0.5 - third],
    ["uniform load, far end free to turn", udl(10, 5), 0, 0.25],
    ["force at mid-span, far end fixed", forces(10, 5, 0.5), 1, 0.25],
    ["force at mid-span, far end free to turn", forces(10, 5, 0.5), 0, 3 / 11],
  ];
  it.each(rows)("%s: from 0 to its closed form", (_, s, far, most) => {
    for (const end of ["left", "right"] as const) {
      const range = inflectionRange(s, end, far);
      expect(range.least).toBe(0);
      expect(range.most / 10).toBeCloseTo(most, 12);
    }
  });

  it("isolatedRange spans both: 0 to L/4 under a uniform load, 0 to 3L/11 under a force at mid-span", () => {
    expect(isolatedRange(udl(8, 3), "left").most).toBeCloseTo(2, 12);
    expect(isolatedRange(forces(11, 3, 0.5), "right").most).toBeCloseTo(3, 12);
  });

  it("where a couple makes the far end sag when fixed, the fixed far end gives the wider range", () => {
    const s = { ...udl(10, 1), points: [{ x: 4, across: 0, couple: 60 }] };
    const [free, fixed] = [inflectionRange(s, "left", 0).most, inflectionRange(s, "left", 1).most];
    expect(fixed).toBeGreaterThan(free + 0.1);
    expect(isolatedRange(s, "left").most).toBe(fixed);
    const other = { ...udl(10, 1), points: [{ x: 6, across: 0, couple: -60 }] };
    expect(isolatedRange(other, "right").most).toBeCloseTo(fixed, 9);
  });

  it(`no fixities give a point outside the isolated range (seed ${seed})`, () => {
    const r = fc.double({ min: 0.01, max: 1, noNaN: true });
    const c = fc.integer({ min: 1, max: 9 }).map((n) => n / 10);
    fc.assert(
      fc.property(
        r,
        r,
        c,
        fc.integer({ min: 0, max: 9 }),
        fc.integer({ min: 1, max: 9 }),
        (near, far, at, w, P) => {
          const s = { ...trapezoid(10, 0, 1, w, 2 * w), points: [{ x: at * 10, across: P, couple: 0 }] };
          const [first] = inflectionPoints(s, { left: near, right: far });
          const { least, most } = isolatedRange(s, "left");
          expect(first).toBeGreaterThanOrEqual(least);
          expect(first).toBeLessThanOrEqual(most + 1e-9);
        },
      ),
      { seed },
    );
  });

  it(`the range at the right end is that of the mirrored span at the left (seed ${seed})`, () => {
    const w = fc.integer({ min: 1, max: 9 });
    fc.assert(
      fc.property(w, w, w, (w1, w2, c) => {
        const one = { ...trapezoid(10, 0, 1, w1, w2), points: [{ x: c, across: 3, couple: 0 }] };
        const other = { ...trapezoid(10, 0, 1, w2, w1), points: [{ x: 10 - c, across: 3, couple: 0 }] };
        expect(isolatedRange(one, "right").most).toBeCloseTo(isolatedRange(other, "left").most, 9);
      }),
      { seed },
    );
  });

  const refused: readonly (readonly [string, () => unknown, string])[] = [
    ["an unloaded span", () => inflectionRange(span(5, bare(5)), "left", 1), "no load acts across the span"],
    [
      "uplift, which does not make the end hog",
      () => inflectionRange(udl(5, -1), "left", 1),
      "gives no point of inflection",
    ],
    ["a far fixity of 2", () => inflectionRange(udl(5, 1), "left", 2), "the end fixity at the far end is 2"],
  ];
  it.each(refused)("refuses %s", (_, make, words) => {
    expect(make).toThrow(words);
  });
});
