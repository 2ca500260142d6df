import { describe, expect, it } from "vitest";
import { leastSquares } from "../../lib/drawing/least-squares.ts";

describe("leastSquares", () => {
  it("leastSquares(straight line through four points) is the line of the usual formulas", () => {
    // y = a + b x through (0, 1), (1, 3), (2, 4), (3, 4): b = (4*23 - 6*12)/(4*14 - 36) = 1, a = (12 - 6)/4 = 1.5.
    const points = [
      [0, 1],
      [1, 3],
      [2, 4],
      [3, 4],
    ] as const;
    const rows = points.map(([x, y]) => ({
      terms: [
        [0, 1],
        [1, x],
      ] as const,
      value: y,
      weight: 1,
    }));
    const [a, b] = leastSquares(2, rows);
    expect(a).toBeCloseTo(1.5, 12);
    expect(b).toBeCloseTo(1, 12);
  });

  it("leastSquares weighs rows by the square of their weight", () => {
    const row = (value: number, weight: number) => ({ terms: [[0, 1]] as const, value, weight });
    expect(leastSquares(1, [row(0, 1), row(5, 2)])[0]).toBeCloseTo(4, 12);
  });

  it("leastSquares(unknown in no row) is refused", () => {
    expect(() => leastSquares(2, [{ terms: [[0, 1]], value: 1, weight: 1 }])).toThrow(
      "unknown 1 is in no equation",
    );
  });
});
