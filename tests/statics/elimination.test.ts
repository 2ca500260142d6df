import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { eliminate, separated, transposed } from "../../lib/statics/elimination.ts";
import { seed } from "./frames.ts";

const matrix = (rows: readonly (readonly number[])[]): Float64Array[] =>
  rows.map((row) => Float64Array.from(row));

describe("eliminate", () => {
  const rows: readonly (readonly [string, readonly (readonly number[])[], number, number])[] = [
    [
      "the unit matrix",
      [
        [1, 0],
        [0, 1],
      ],
      2,
      2,
    ],
    [
      "two equal rows",
      [
        [1, 2],
        [1, 2],
      ],
      2,
      1,
    ],
    [
      "a zero matrix",
      [
        [0, 0],
        [0, 0],
      ],
      2,
      0,
    ],
    ["no rows at all", [], 3, 0],
    [
      "columns of very different size",
      [
        [1, 1e9],
        [1, -1e9],
      ],
      2,
      2,
    ],
    [
      "a column that is the sum of the others",
      [
        [1, 2, 3],
        [4, 5, 9],
        [7, 1, 8],
      ],
      3,
      2,
    ],
  ];
  it.each(rows)("rank of %s", (_, given, columns, rank) => {
    const { rank: found, nullSpace } = eliminate(matrix(given), columns);
    expect(found).toBe(rank);
    expect(nullSpace).toHaveLength(columns - rank);
    for (const x of nullSpace)
      for (const row of given) expect(row.reduce((sum, a, k) => sum + a * (x[k] ?? 0), 0)).toBeCloseTo(0, 9);
  });

  it(`solves what lies in the range (seed ${seed})`, () => {
    const entry = fc.integer({ min: -9, max: 9 });
    fc.assert(
      fc.property(
        fc.array(fc.array(entry, { minLength: 4, maxLength: 4 }), { minLength: 1, maxLength: 6 }),
        fc.array(entry, { minLength: 4, maxLength: 4 }),
        (A, x) => {
          const b = Float64Array.from(A, (row) => row.reduce((sum, a, k) => sum + a * (x[k] ?? 0), 0));
          const [solution] = eliminate(matrix(A), 4, [b]).solutions;
          for (const [i, row] of A.entries())
            expect(row.reduce((sum, a, k) => sum + a * (solution?.[k] ?? Number.NaN), 0)).toBeCloseTo(
              b[i] ?? Number.NaN,
              7,
            );
        },
      ),
      { seed },
    );
  });

  it("transposed exchanges rows and columns", () => {
    expect(transposed(matrix([[1, 2, 3]]), 3).map((row) => [...row])).toEqual([[1], [2], [3]]);
  });

  it("separated gives each vector a component of its own", () => {
    const [one, other] = separated(
      matrix([
        [1, 1, 0],
        [1, -1, 0],
      ]),
    );
    const support = [one, other].map((v) =>
      [...(v ?? [])].flatMap((c, k) => (Math.abs(c) > 1e-12 ? [k] : [])),
    );
    expect(support.flat().sort()).toEqual([0, 1]);
  });
});
