import fc from "fast-check";
import { describe, expect, test } from "vitest";
import { footing, quantity } from "../../lib/quantity/index.ts";

/** A printed number of thousandths or coarser as a whole number of its last place, so that sums are exact. */
function units(printed: string, places: number): number {
  const number = printed.replace(" kN", "").replace("−", "-").replaceAll("\u202f", "");
  return Math.round(Number(number) * 10 ** places);
}

describe("footing", () => {
  test("three equal parts of 10 kN foot: 3.34 + 3.33 + 3.33", () => {
    const third = quantity(10000 / 3, "force");
    expect(footing([third, third, third], 4)).toEqual({
      parts: ["3.34 kN", "3.33 kN", "3.33 kN"],
      total: "10.00 kN",
      decimals: 2,
    });
  });

  test("printed parts add up to the printed total, and each lies within one unit of its value", () => {
    const values = fc.array(
      fc.integer({ min: -1e12, max: 1e12 }).map((micro) => micro / 1e6),
      { minLength: 1, maxLength: 12 },
    );
    fc.assert(
      fc.property(values, (numbers) => {
        const { parts, total, decimals } = footing(numbers.map((number) => quantity(number * 1000, "force")));
        const printed = parts.map((part) => units(part, decimals));
        expect(printed.reduce((sum, part) => sum + part, 0)).toBe(units(total, decimals));
        printed.forEach((part, index) => {
          expect(Math.abs(part - (numbers[index] ?? 0) * 10 ** decimals)).toBeLessThan(1.001);
        });
      }),
      { seed: 813, numRuns: 500 },
    );
  });

  test("a value that needs no rounding is left as it is", () => {
    const parts = [2, 1.26, 1.26, 0.5].map((number) => quantity(number * 1000, "force"));
    expect(footing(parts, 2).parts).toEqual(["2.0 kN", "1.3 kN", "1.2 kN", "0.5 kN"]);
  });

  test("unlike values are refused by name", () => {
    const unlike = [
      quantity(6, "length", { unit: "m" }),
      quantity(12000, "force", { unit: "kN" }),
    ] as never[];
    expect(() => footing(unlike)).toThrow("cannot add 6 m (length) and 12 kN (force)");
    expect(() => footing([])).toThrow("there is no value to add up");
  });
});
