import fc from "fast-check";
import { describe, expect, test } from "vitest";
import { footing, quantity } from "../../lib/quantity/index.ts";

/** A printed number of thousandths or coarser as a whole number of its last place, so that sums are exact. */
function units(printed: string, places: number): number {
  const number = printed.replace(" kN", "").replace("−", "-").replaceAll("\u202f", "");
  return Math.round(Number(number) * 10 ** places);
}

describe("footing", () => {
  test("equal parts look equal and the total is that of what is printed", () => {
    const third = quantity(10000 / 3, "force");
    expect(footing([third, third, third])).toEqual({
      parts: ["3.33 kN", "3.33 kN", "3.33 kN"],
      total: "9.99 kN",
      decimals: 2,
    });
  });

  test("decimals are those of the largest part, not of the total", () => {
    const half = quantity(68670, "force");
    expect(footing([half, half])).toEqual({ parts: ["68.7 kN", "68.7 kN"], total: "137.4 kN", decimals: 1 });
  });

  test("printed parts add up to the printed total, and each is its value rounded", () => {
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
          expect(Math.abs(part - (numbers[index] ?? 0) * 10 ** decimals)).toBeLessThan(0.5001);
        });
      }),
      { seed: 813, numRuns: 500 },
    );
  });

  test.each<[string, readonly number[], readonly string[]]>([
    ["one part gives way, the nearest to the next figure", [12.34, -7.07, -5.27], ["12.4", "−7.1", "−5.3"]],
    ["equal values stay equal", [2.744, 2.744, -5.488], ["2.74", "2.74", "−5.48"]],
    [
      "equal values give way together",
      [1.1149, 1.1149, -0.7452, -0.7451, -0.7395],
      ["1.12", "1.12", "−0.75", "−0.75", "−0.74"],
    ],
    [
      "equal values part where nothing else is left",
      [1.1145, 1.1145, 1.1145, 1.1145, -4.458],
      ["1.12", "1.11", "1.11", "1.11", "−4.45"],
    ],
    ["nothing to do", [5, -3, -2], ["5.00", "−3.00", "−2.00"]],
    ["all nought", [0, 0], ["0", "0"]],
  ])("values that add up to nought print a total of nought: %s", (_, numbers, printed) => {
    const { parts, total } = footing(numbers.map((number) => quantity(number * 1000, "force")));
    expect(parts.map((part) => part.replace(" kN", ""))).toEqual(printed);
    expect(Number(total.replace(" kN", ""))).toBe(0);
  });

  test("values that add up to nought foot to nought, and none is off by a whole last unit", () => {
    const some = fc.array(fc.integer({ min: -1e9, max: 1e9 }), { minLength: 1, maxLength: 9 });
    fc.assert(
      fc.property(some, (micros) => {
        const numbers = [...micros, -micros.reduce((a, b) => a + b, 0)].map((micro) => micro / 1e6);
        const { parts, total, decimals } = footing(numbers.map((number) => quantity(number * 1000, "force")));
        const printed = parts.map((part) => units(part, decimals));
        expect(units(total, decimals) + 0).toBe(0);
        expect(printed.reduce((sum, part) => sum + part, 0) + 0).toBe(0);
        printed.forEach((part, i) => {
          expect(Math.abs(part - (numbers[i] ?? 0) * 10 ** decimals)).toBeLessThan(1.0001);
        });
      }),
      { seed: 814, numRuns: 500 },
    );
  });

  test("a value that needs no rounding keeps its figures", () => {
    const parts = [2, 1.26, 1.26, 0.5].map((number) => quantity(number * 1000, "force"));
    expect(footing(parts, 2)).toEqual({
      parts: ["2.0 kN", "1.3 kN", "1.3 kN", "0.5 kN"],
      total: "5.1 kN",
      decimals: 1,
    });
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
