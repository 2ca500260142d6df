// Equal-span continuous beams under uniform load, solved by statics with hinges at the true points of inflection.
//
// Source of the table: T. G. Hicks, Civil Engineering Formulas, Table 2.1, two to five spans; read entries confirmed by the
// three-moment equation in rationals (two printed points of inflection are wrong in their last digit; the exact ones are used).
// Pattern loading: three and four equal spans from a published formula page of the AISC kind, read; the two-span and
// end-span rows and the worst patterns are handbook values (Reynolds & Steedman, from memory) confirmed the same way.

import { afterAll, describe, expect, it } from "vitest";
import { extremes, roots, valueAt } from "../../lib/results/index.ts";
import { freeBodies } from "../../lib/statics/index.ts";
import { beam, type Load, type Structure, uniform } from "../../lib/structure/index.ts";
import { determinateChoices, zerosUnderUniform } from "./true-hinges.ts";

const L = 1;
const w = 1;
let compared = 0;
const same = (value: number, published: number, tolerance: number): void => {
  expect(Math.abs(value - published)).toBeLessThanOrEqual(tolerance);
  compared += 1;
};

const spans = (n: number): Structure => beam({ spans: Array.from({ length: n }, () => `${L} m` as const) });
const loadsOn = (structure: Structure, pattern: string): readonly Load[] =>
  structure.members.flatMap((m, i) => (pattern[i] === "1" ? [uniform(m.name, `${w} N/m`)] : []));

/** All determinate choices of true hinges; `hogging` are the moments over the inner supports, as magnitudes. */
function hingedAt(structure: Structure, hogging: readonly number[], pattern: string): readonly Structure[] {
  const M = [0, ...hogging.map((m) => -m), 0];
  const places = structure.members.flatMap((m, i) =>
    zerosUnderUniform(L, M[i] ?? 0, M[i + 1] ?? 0, pattern[i] === "1" ? w : 0).map(
      (x) => [m.name, x] as const,
    ),
  );
  return determinateChoices(structure, places);
}

interface SpanRow {
  readonly V: readonly [number, number];
  readonly xmax: number;
  readonly Mmax: number;
  readonly points: readonly number[];
}

interface Table {
  readonly n: number;
  readonly hogging: readonly number[];
  readonly R: readonly number[];
  /** The left half of the spans. */
  readonly rows: readonly SpanRow[];
}

const tables: readonly Table[] = [
  {
    n: 2,
    hogging: [1 / 8],
    R: [3 / 8, 5 / 4, 3 / 8],
    rows: [{ V: [3 / 8, 5 / 8], xmax: 3 / 8, Mmax: 9 / 128, points: [0.75] }],
  },
  {
    n: 3,
    hogging: [1 / 10, 1 / 10],
    R: [2 / 5, 11 / 10, 11 / 10, 2 / 5],
    rows: [
      { V: [2 / 5, 3 / 5], xmax: 2 / 5, Mmax: 2 / 25, points: [0.8] },
      { V: [1 / 2, 1 / 2], xmax: 1 / 2, Mmax: 1 / 40, points: [0.276393, 0.723607] },
    ],
  },
  {
    n: 4,
    hogging: [3 / 28, 1 / 14, 3 / 28],
    R: [11 / 28, 8 / 7, 13 / 14, 8 / 7, 11 / 28],
    rows: [
      { V: [11 / 28, 17 / 28], xmax: 11 / 28, Mmax: 121 / 1568, points: [0.785714] },
      { V: [15 / 28, 13 / 28], xmax: 15 / 28, Mmax: 57 / 1568, points: [0.266077, 0.805351] },
    ],
  },
  {
    n: 5,
    hogging: [2 / 19, 3 / 38, 3 / 38, 2 / 19],
    R: [15 / 38, 43 / 38, 37 / 38, 37 / 38, 43 / 38, 15 / 38],
    rows: [
      { V: [15 / 38, 23 / 38], xmax: 15 / 38, Mmax: 225 / 2888, points: [0.789474] },
      { V: [10 / 19, 9 / 19], xmax: 10 / 19, Mmax: 12 / 361, points: [0.268475, 0.784157] },
      { V: [1 / 2, 1 / 2], xmax: 1 / 2, Mmax: 7 / 152, points: [0.196512, 0.803488] },
    ],
  },
];

describe("continuous beams, all spans loaded", () => {
  it.each(tables)(
    "$n equal spans: every determinate choice of true hinges gives the table",
    ({ n, hogging, R, rows }) => {
      const plain = spans(n);
      const pattern = "1".repeat(n);
      const choices = hingedAt(plain, hogging, pattern);
      expect(choices.length).toBeGreaterThanOrEqual(n === 2 ? 2 : 4);
      choices.forEach((hinged, choice) => {
        const { reactions, members } = freeBodies(hinged, loadsOn(hinged, pattern));
        const tell =
          choice === 0
            ? same
            : (value: number, published: number, t: number) =>
                expect(Math.abs(value - published)).toBeLessThanOrEqual(t);
        for (const [i, r] of R.entries()) tell(reactions[i]?.y ?? Number.NaN, r, 1e-9);
        for (const [i, row] of rows.entries()) {
          const forces = members[i];
          if (forces === undefined) throw new Error(`no member ${i}`);
          tell(valueAt(forces.V, 0), row.V[0], 1e-9);
          tell(-valueAt(forces.V, L), row.V[1], 1e-9);
          tell(extremes(forces.M).greatest.x, row.xmax, 1e-8);
          tell(extremes(forces.M).greatest.value, row.Mmax, 1e-9);
          if (i > 0) tell(-valueAt(forces.M, 0), hogging[i - 1] ?? Number.NaN, 1e-9);
          const zeros = roots(forces.M).filter((x) => x > 1e-6 && x < 1 - 1e-6);
          expect(zeros).toHaveLength(row.points.length);
          for (const [k, point] of row.points.entries()) tell(zeros[k] ?? Number.NaN, point, 5e-7); // half the last printed digit
        }
      });
    },
  );
});

interface PatternRow {
  readonly pattern: string;
  readonly hogging: readonly number[];
  readonly R: readonly number[];
  /** Half the last printed digit. */
  readonly print: number;
  /** Printed span moments: member index and value. */
  readonly sag: readonly (readonly [number, number, number?])[];
}

const patterns: readonly PatternRow[] = [
  { pattern: "10", hogging: [1 / 16], R: [7 / 16, 5 / 8, -1 / 16], print: 1e-9, sag: [[0, 49 / 512, 1e-9]] },
  { pattern: "101", hogging: [1 / 20, 1 / 20], R: [0.45, 0.55, 0.55, 0.45], print: 5e-4, sag: [[0, 0.1013]] },
  // the page prints 0.0534 for 77/1440 = 0.05347: cut, not rounded
  {
    pattern: "110",
    hogging: [7 / 60, 1 / 30],
    R: [0.383, 1.2, 0.45, -0.033],
    print: 5e-4,
    sag: [
      [0, 0.0735],
      [1, 0.0534, 1e-4],
    ],
  },
  {
    pattern: "1101",
    hogging: [27 / 224, 1 / 56, 13 / 224],
    R: [0.38, 1.223, 0.357, 0.598, 0.442],
    print: 5.5e-4,
    sag: [
      [0, 0.072, 5e-4],
      [1, 0.0611],
      [3, 0.0977],
    ],
  },
  {
    pattern: "1010",
    hogging: [3 / 56, 1 / 28, 3 / 56],
    R: [0.446, 0.572, 0.464, 0.572, -0.054],
    print: 6e-4,
    sag: [
      [0, 0.0996],
      [2, 0.0805],
    ],
  },
];

describe("continuous beams, some spans loaded", () => {
  it.each(patterns)("pattern $pattern", ({ pattern, hogging, R, print, sag }) => {
    const choices = hingedAt(spans(pattern.length), hogging, pattern);
    expect(choices.length).toBeGreaterThan(0);
    const [hinged = spans(1)] = choices;
    const { reactions, members } = freeBodies(hinged, loadsOn(hinged, pattern));
    for (const [i, r] of R.entries()) same(reactions[i]?.y ?? Number.NaN, r, print);
    for (const [i, moment, tolerance = 5e-5] of sag) {
      const M = members[i]?.M;
      same(M === undefined ? Number.NaN : extremes(M).greatest.value, moment, tolerance);
    }
  });
});

/** Pattern, inner support (from 2) or span (from 1), and its worst moment. */
const worst: readonly (readonly [pattern: string, "support" | "span", number, number])[] = [
  ["11", "support", 2, 1 / 8],
  ["10", "span", 1, 49 / 512],
  ["110", "support", 2, 7 / 60],
  ["101", "span", 1, 81 / 800],
  ["010", "span", 2, 3 / 40],
  ["1101", "support", 2, 27 / 224],
  ["0110", "support", 3, 3 / 28],
  ["1010", "span", 1, 625 / 6272],
  ["0101", "span", 2, 505 / 6272],
  ["11010", "support", 2, 25 / 209],
  ["01101", "support", 3, 93 / 836],
  ["10101", "span", 1, 289 / 2888],
  ["01010", "span", 2, 913 / 11552],
  ["10101", "span", 3, 13 / 152],
];

describe("continuous beams, the worst pattern for each support and span", () => {
  it.each(worst)("pattern %s: %s %i", (pattern, where, index, moment) => {
    const [hinged = spans(1)] = hingedAt(spans(pattern.length), threeMoments(pattern), pattern);
    const { members } = freeBodies(hinged, loadsOn(hinged, pattern));
    const M = members[index - 1]?.M;
    if (M === undefined) throw new Error(`no span ${index}`);
    same(where === "span" ? extremes(M).greatest.value : -valueAt(M, 0), moment, 1e-9);
  });

  afterAll(() => {
    // 18 reactions; 8 spans with 4 values, 4 of them with a support moment, 12 points; 30 pattern values; 14 worst patterns
    expect(compared).toBe(18 + 32 + 4 + 12 + 30 + 14);
  });
});

/** Hogging over the inner supports of equal spans by the three-moment equation: M(i-1) + 4 M(i) + M(i+1) = (w left + w right) L²/4. */
function threeMoments(pattern: string): readonly number[] {
  const on = [...pattern].map(Number);
  const n = on.length - 1;
  const d = Array.from({ length: n }, () => 4);
  const b = Array.from({ length: n }, (_, i) => ((on[i] ?? 0) + (on[i + 1] ?? 0)) / 4);
  for (let i = 1; i < n; i++) {
    const factor = 1 / (d[i - 1] ?? 1);
    d[i] = (d[i] ?? 0) - factor;
    b[i] = (b[i] ?? 0) - factor * (b[i - 1] ?? 0);
  }
  for (let i = n - 1; i >= 0; i--) b[i] = ((b[i] ?? 0) - (b[i + 1] ?? 0)) / (d[i] ?? 1);
  return b;
}
