import fc from "fast-check";
import { Matrix, solve } from "ml-matrix";
import { describe, expect, test } from "vitest";
import { condition } from "../../lib/exact/condition.ts";
import { type Envelope, envelopeOf, factorize, nullVector, solveFactored } from "../../lib/exact/envelope.ts";

/** A symmetric matrix with a given envelope: BᵀB + shift, entries outside the envelope zero by construction of B. */
interface Case {
  readonly first: readonly number[];
  readonly entries: readonly number[];
}

const cases: fc.Arbitrary<Case> = fc.array(fc.nat(4), { minLength: 1, maxLength: 14 }).chain((bands) =>
  fc.record({
    first: fc.constant(bands.map((band, i) => Math.max(0, i - band))),
    entries: fc.array(fc.double({ min: -1, max: 1, noNaN: true }), { minLength: 80, maxLength: 80 }),
  }),
);

/** Lower triangle in the envelope; diagonally dominant, hence positive definite. */
function matrixOf({ first, entries }: Case): { envelope: Envelope; a: Float64Array; full: Matrix } {
  const envelope = envelopeOf(Int32Array.from(first));
  const a = new Float64Array(envelope.size);
  const full = Matrix.zeros(envelope.n, envelope.n);
  let used = 0;
  for (let i = 0; i < envelope.n; i++)
    for (let k = first[i] ?? i; k <= i; k++) {
      const value = k === i ? 10 + i : (entries[used++ % entries.length] ?? 0);
      a[(envelope.shift[i] ?? 0) + k] = value;
      full.set(i, k, value).set(k, i, value);
    }
  return { envelope, a, full };
}
const never = (row: number): void => {
  throw new Error(`pivot ${row} was suspected`);
};

describe("factorize and solveFactored", () => {
  test("solve as a matrix library does", () => {
    fc.assert(
      fc.property(cases, (one) => {
        const { envelope, a, full } = matrixOf(one);
        const b = Float64Array.from({ length: envelope.n }, (_, i) => Math.sin(i + 1));
        const wanted = solve(full, Matrix.columnVector([...b])).to1DArray();
        factorize(envelope, a, never);
        solveFactored(envelope, a, b);
        wanted.forEach((value, i) => {
          expect(Math.abs((b[i] ?? Number.NaN) - value)).toBeLessThan(1e-12);
        });
      }),
      { seed: 7, numRuns: 300 },
    );
  });

  test("a chain of springs held nowhere: the last pivot is suspected, its null vector is the motion of all", () => {
    const n = 6;
    const envelope = envelopeOf(Int32Array.from({ length: n }, (_, i) => Math.max(0, i - 1)));
    const a = new Float64Array(envelope.size);
    const put = (i: number, k: number, value: number): void => {
      const at = (envelope.shift[i] ?? 0) + k;
      a[at] = (a[at] ?? 0) + value;
    };
    for (let i = 1; i < n; i++) {
      put(i, i, 3 + i);
      put(i - 1, i - 1, 3 + i);
      put(i, i - 1, -3 - i);
    }
    const suspects: number[] = [];
    factorize(envelope, a, (row) => suspects.push(row));
    expect(suspects).toEqual([n - 1]);
    for (const u of nullVector(envelope, a, n - 1)) expect(u).toBeCloseTo(1, 12);
  });
});

describe("condition", () => {
  test("of a scaled matrix within a factor of the true 1-norm condition, never above it", () => {
    fc.assert(
      fc.property(cases, (one) => {
        const { envelope, a, full } = matrixOf(one);
        const scale = full.diagonal().map((d) => 1 / Math.sqrt(d));
        const S = Matrix.diag(scale).mmul(full).mmul(Matrix.diag(scale));
        const inverse = solve(S, Matrix.eye(envelope.n));
        const norm = (m: Matrix): number =>
          Math.max(
            ...Array.from({ length: m.columns }, (_, k) =>
              m.getColumn(k).reduce((s, v) => s + Math.abs(v), 0),
            ),
          );
        const truth = norm(S) * norm(inverse);
        const factors = a.slice();
        factorize(envelope, factors, never);
        const found = condition(envelope, a, factors);
        expect(found).toBeLessThanOrEqual(truth * (1 + 1e-9));
        expect(found).toBeGreaterThanOrEqual(truth / 3);
      }),
      { seed: 8, numRuns: 200 },
    );
  });

  test("does not depend on units", () => {
    const { envelope, a } = matrixOf({
      first: [0, 0, 1, 1],
      entries: Array.from({ length: 80 }, (_, i) => Math.cos(i)),
    });
    const unit = [1, 1e3, 1e-4, 20];
    const b = a.slice();
    for (let i = 0; i < 4; i++)
      for (let k = [0, 0, 1, 1][i] ?? 0; k <= i; k++) {
        const at = (envelope.shift[i] ?? 0) + k;
        b[at] = (b[at] ?? 0) * (unit[i] ?? 1) * (unit[k] ?? 1);
      }
    const of = (m: Float64Array): number => {
      const factors = m.slice();
      factorize(envelope, factors, never);
      return condition(envelope, m, factors);
    };
    expect(of(b)).toBeCloseTo(of(a), 9);
  });
});
