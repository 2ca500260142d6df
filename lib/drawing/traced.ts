import { type Piecewise, valueAt } from "../results/index.ts";

/** Points of a function in order of x, both limits at a jump; straight pieces by their ends only. */
export function traced(f: Piecewise): readonly (readonly [number, number])[] {
  return f.pieces.flatMap((coefficients, i) => {
    const a = f.breaks[i] ?? 0;
    const b = f.breaks[i + 1] ?? a;
    const count = coefficients.slice(2).some((c) => c !== 0) ? 24 : 1;
    return Array.from({ length: count + 1 }, (_, j): readonly [number, number] => {
      const x = a + ((b - a) * j) / count;
      return [x, valueAt(f, x, j === 0 ? "right" : "left")];
    });
  });
}
