import fc from "fast-check";
import { describe, expect, it } from "vitest";
import {
  add,
  crossings,
  derivative,
  extremes,
  integral,
  integralOver,
  jumps,
  magnitude,
  type Piecewise,
  piecewise,
  polynomialRoots,
  product,
  ramp,
  restrict,
  roots,
  scale,
  stepAt,
  turningPoints,
  valueAt,
  zeros,
} from "../../lib/results/index.ts";

const seed = 20310;

const anyPiecewise: fc.Arbitrary<Piecewise> = fc
  .array(
    fc.record({
      width: fc.double({ min: 0.05, max: 5, noNaN: true }),
      piece: fc.array(fc.double({ min: -10, max: 10, noNaN: true }), { minLength: 1, maxLength: 5 }),
    }),
    { minLength: 1, maxLength: 4 },
  )
  .map((parts) => {
    const breaks = [0];
    for (const { width } of parts) breaks.push((breaks[breaks.length - 1] ?? 0) + width);
    return piecewise(
      breaks,
      parts.map((p) => p.piece),
    );
  });

describe("piecewise", () => {
  it("valueAt takes the limit asked for where the function jumps", () => {
    const f = stepAt(0, 4, 1, 3);
    expect([valueAt(f, 1, "left"), valueAt(f, 1, "right"), valueAt(f, 0), valueAt(f, 4)]).toEqual([
      0,
      3,
      3 - 3,
      3,
    ]);
    expect(jumps(f)).toEqual([{ x: 1, left: 0, right: 3 }]);
  });

  it("ramp is a trapezoid with zero outside", () => {
    const f = ramp(0, 10, 2, 6, 1, 3);
    expect([1, 2, 4, 6].map((x) => valueAt(f, x))).toEqual([0, 1, 2, 0]);
    expect(integralOver(f)).toBeCloseTo(8, 12);
  });

  const refused: readonly (readonly [string, () => unknown, string])[] = [
    ["breaks that fall", () => piecewise([0, 2, 1], [[1], [1]]), "2 is followed by 1"],
    ["equal breaks", () => piecewise([0, 0], [[1]]), "must rise"],
    ["too few breaks", () => piecewise([0, 1], [[1], [2]]), "2 pieces needs 3 breaks"],
    ["a coefficient that is not finite", () => piecewise([0, 1], [[Number.NaN]]), "the coefficient NaN"],
    ["a break that is not finite", () => piecewise([0, Number.POSITIVE_INFINITY], [[1]]), "break 2"],
    ["a value outside", () => valueAt(piecewise([0, 1], [[1]]), 1.5), "known from 0 to 1, not at 1.5"],
    ["a value at NaN", () => valueAt(piecewise([0, 1], [[1]]), Number.NaN), "not at NaN"],
    [
      "a sum over two intervals",
      () => add(piecewise([0, 1], [[1]]), piecewise([0, 2], [[1]])),
      "cannot be added",
    ],
    ["a part beyond the interval", () => restrict(piecewise([0, 1], [[1]]), 0, 2), "cannot be cut to [0, 2]"],
  ];
  it.each(refused)("refuses %s", (_, make, words) => {
    expect(make).toThrow(words);
  });

  it(`add, scale and product agree with their values (seed ${seed})`, () => {
    fc.assert(
      fc.property(
        anyPiecewise,
        anyPiecewise,
        fc.double({ min: 0.01, max: 0.99, noNaN: true }),
        (f, g0, t) => {
          const length = f.breaks[f.breaks.length - 1] ?? 1;
          const stretch = length / (g0.breaks[g0.breaks.length - 1] ?? 1);
          const g = piecewise(
            g0.breaks.map((x, i) => (i === g0.breaks.length - 1 ? length : x * stretch)),
            g0.pieces,
          );
          const x = t * length;
          const [a, b] = [valueAt(f, x), valueAt(g, x)];
          const tolerance = 1e-11 * (1 + magnitude(f)) * (1 + magnitude(g));
          expect(Math.abs(valueAt(add(f, g), x) - (a + b))).toBeLessThan(tolerance);
          expect(Math.abs(valueAt(scale(f, -2), x) + 2 * a)).toBeLessThan(tolerance);
          expect(Math.abs(valueAt(product(f, g), x) - a * b)).toBeLessThan(tolerance);
        },
      ),
      { seed },
    );
  });

  it(`derivative(integral(f)) is f, and integralOver is the difference of the integral (seed ${seed})`, () => {
    fc.assert(
      fc.property(anyPiecewise, fc.double({ min: 0, max: 1, noNaN: true }), (f, t) => {
        const end = f.breaks[f.breaks.length - 1] ?? 1;
        const F = integral(f, 7);
        const back = derivative(F);
        for (const [i, piece] of f.pieces.entries())
          for (const [k, c] of piece.entries()) expect(back.pieces[i]?.[k] ?? 0).toBeCloseTo(c, 9);
        expect(jumps(F)).toEqual([]);
        expect(
          Math.abs(integralOver(f, t * end, end) - (valueAt(F, end) - valueAt(F, t * end))),
        ).toBeLessThan(1e-11 * (1 + magnitude(F)));
      }),
      { seed },
    );
  });

  it(`restrict keeps values (seed ${seed})`, () => {
    fc.assert(
      fc.property(anyPiecewise, fc.double({ min: 0.1, max: 0.4, noNaN: true }), (f, t) => {
        const end = f.breaks[f.breaks.length - 1] ?? 1;
        const cut = restrict(f, t * end, 0.9 * end);
        const x = 0.5 * end;
        expect(valueAt(cut, x)).toBeCloseTo(valueAt(f, x), 7);
      }),
      { seed },
    );
  });
});

describe("roots", () => {
  it("finds every root of a product of linear factors, however close", () => {
    // (t - 0.2)(t - 0.200001)(t - 0.9) expanded
    const [a, b, c] = [0.2, 0.200001, 0.9];
    const found = polynomialRoots([-a * b * c, a * b + a * c + b * c, -(a + b + c), 1], 1);
    expect(found).toHaveLength(3);
    for (const [i, root] of [a, b, c].entries()) expect(found[i]).toBeCloseTo(root, 9);
  });

  it("finds a root that only touches zero, and crossings leaves it out", () => {
    const f = piecewise([0, 2], [[1, -2, 1]]); // (x - 1)²
    expect(roots(f).map((x) => Number(x.toFixed(6)))).toEqual([1]);
    expect(crossings(f)).toEqual([]);
  });

  it("a sharp peak between samples is not missed", () => {
    const narrow = piecewise([0, 1], [[-0.25 + 1e-9, 1, -1]]); // -(x - 0.5)² + 1e-9
    expect(roots(narrow)).toHaveLength(2);
  });

  it("a stretch of zero is named as such, and counts as one crossing between opposite signs", () => {
    const f = piecewise([0, 1, 2, 3], [[-1, 1], [0], [0, 1]]);
    expect(zeros(f)).toEqual({ points: [], stretches: [[1, 2]] });
    expect(crossings(f)).toEqual([1.5]);
  });

  it("a jump across zero is a crossing but no root", () => {
    const f = add(piecewise([0, 4], [[-1]]), stepAt(0, 4, 1, 3));
    expect(roots(f)).toEqual([]);
    expect(crossings(f)).toEqual([1]);
  });

  it("rounding noise beside a large piece is zero", () => {
    expect(zeros(piecewise([0, 1, 2], [[1e6], [1e-9]])).stretches).toEqual([[1, 2]]);
  });

  it(`roots of polynomials made from their roots are found (seed ${seed})`, () => {
    fc.assert(
      fc.property(
        fc.uniqueArray(fc.integer({ min: 1, max: 99 }), { minLength: 1, maxLength: 4 }),
        (marks) => {
          const expected = marks.map((m) => m / 100).sort((a, b) => a - b);
          let polynomial = [1];
          for (const r of expected)
            polynomial = [0, ...polynomial].map((c, k) => c - r * (polynomial[k] ?? 0));
          const found = roots(piecewise([0, 1], [polynomial]));
          expect(found).toHaveLength(expected.length);
          for (const [i, root] of expected.entries()) expect(found[i]).toBeCloseTo(root, 7);
        },
      ),
      { seed },
    );
  });
});

describe("extremes", () => {
  it("extremes of a parabola are at its top and its lower end", () => {
    const f = piecewise([0, 10], [[-16, 10, -1]]);
    expect(extremes(f)).toEqual({
      greatest: { x: 5, value: 9 },
      least: { x: 0, value: -16 },
      governing: { x: 0, value: -16 },
    });
    expect(turningPoints(f)).toEqual([5]);
  });

  it("a value reached only on one side of a jump counts", () => {
    expect(extremes(piecewise([0, 1, 2], [[0, 5], [-1]])).greatest).toEqual({ x: 1, value: 5 });
  });

  it(`no sample lies beyond the extremes (seed ${seed})`, () => {
    fc.assert(
      fc.property(anyPiecewise, fc.double({ min: 0, max: 1, noNaN: true }), (f, t) => {
        const { greatest, least } = extremes(f);
        const value = valueAt(f, t * (f.breaks[f.breaks.length - 1] ?? 1));
        const slack = 1e-9 * (Math.abs(greatest.value) + Math.abs(least.value));
        expect(value).toBeLessThanOrEqual(greatest.value + slack);
        expect(value).toBeGreaterThanOrEqual(least.value - slack);
      }),
      { seed },
    );
  });
});
