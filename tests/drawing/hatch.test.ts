import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { distance, type Pt } from "../../lib/drawing/geometry.ts";
import { hatch } from "../../lib/drawing/hatch.ts";

const square: Pt[] = [
  [0, 0],
  [100, 0],
  [100, 60],
  [0, 60],
];
const total = (outline: readonly Pt[], angle: number, spacing: number): number =>
  hatch(outline, angle, spacing).reduce((sum, [a, b]) => sum + distance(a, b), 0);

describe("hatch", () => {
  it("hatch(rectangle, along) is one stroke per spacing, as long as the rectangle", () => {
    const strokes = hatch(square, 0, 6);
    expect(strokes).toHaveLength(10);
    for (const [a, b] of strokes) expect(distance(a, b)).toBeCloseTo(100, 6);
  });

  // Strokes of spacing s covering an area A have total length A/s (Cavalieri); the outline's ends blur it by a stroke.
  it("hatch: length of the strokes times their spacing is the area", () => {
    fc.assert(
      fc.property(fc.double({ min: -3, max: 3, noNaN: true }), (angle) => {
        return Math.abs(total(square, angle, 0.5) * 0.5 - 6000) < 60;
      }),
      { seed: 20310, numRuns: 50 },
    );
  });

  it("hatch(bow tie) fills both wings and leaves what is outside", () => {
    const bow: Pt[] = [
      [0, 0],
      [0, 20],
      [100, -20],
      [100, 0],
    ];
    const strokes = hatch(bow, Math.PI / 2, 5);
    expect(strokes.length).toBeGreaterThan(14);
    for (const [a, b] of strokes) {
      for (const [x, y] of [a, b]) {
        const edge = 20 - 0.4 * x;
        expect(y * Math.sign(edge)).toBeGreaterThan(-0.01);
        expect(Math.abs(y)).toBeLessThanOrEqual(Math.abs(edge) + 0.01);
      }
    }
  });
});
