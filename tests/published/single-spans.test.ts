// Fixed-end moments and points of inflection of single spans, against closed forms.
//
// Source of the fixed-fixed uniform load: T. G. Hicks, Civil Engineering Formulas, beam case 5; of its points of inflection at
// 0.211 L: V. E. Saouma, Structural Engineering, sec. 14.3.1. The other rows are the classical entries of
// AISC Manual Table 3-23, Roark, and the fixed-end moment tables of Hibbeler, Kassimali and Norris-Wilbur (from memory);
// each was derived again from elastic theory in rationals. Closed forms are compared to 1e-12, printed decimals to half their last digit.

import { afterAll, describe, expect, it } from "vitest";
import {
  endMoments,
  type Fixities,
  fixedEndMoments,
  inflectionPoints,
  momentsBetween,
  type Span,
  simpleMoments,
} from "../../lib/inflection/index.ts";
import { extremes, valueAt } from "../../lib/results/index.ts";
import { forces, gable, parabola, trapezoid, udl } from "../inflection/spans.ts";

const L = 6;
const w = 7;
const P = 11;
const wL2 = w * L * L;
const PL = P * L;
const both: Fixities = { left: 1, right: 1 };
const propped: Fixities = { left: 1, right: 0 };

interface Row {
  readonly name: string;
  readonly span: Span;
  readonly ends: Fixities;
  /** Hogging moments at the ends, as magnitudes. */
  readonly MA: number;
  readonly MB: number;
  /** x/L, with the tolerance of print where they are decimals. */
  readonly points?: readonly number[];
  readonly print?: number;
  /** Reaction at the left end. */
  readonly RA?: number;
  /** Largest sagging moment. */
  readonly sag?: number;
  readonly sagPrint?: number;
}

const c = { "1/4": 1 / 4, "1/3": 1 / 3, "2/5": 2 / 5 } as const;
const a = 0.3;

const rows: readonly Row[] = [
  {
    name: "fixed, uniform load",
    span: udl(L, w),
    ends: both,
    MA: wL2 / 12,
    MB: wL2 / 12,
    points: [1 / 2 - Math.sqrt(3) / 6, 1 / 2 + Math.sqrt(3) / 6],
    RA: (w * L) / 2,
    sag: wL2 / 24,
  },
  {
    name: "fixed, force at mid-span",
    span: forces(L, P, 1 / 2),
    ends: both,
    MA: PL / 8,
    MB: PL / 8,
    points: [1 / 4, 3 / 4],
    RA: P / 2,
    sag: PL / 8,
  },
  {
    name: "fixed, force at L/4",
    span: forces(L, P, c["1/4"]),
    ends: both,
    MA: (9 * PL) / 64,
    MB: (3 * PL) / 64,
    points: [1 / 6, 7 / 10],
    RA: (27 * P) / 32,
    sag: (9 * PL) / 128,
  },
  {
    name: "fixed, force at L/3",
    span: forces(L, P, c["1/3"]),
    ends: both,
    MA: (4 * PL) / 27,
    MB: (2 * PL) / 27,
    points: [1 / 5, 5 / 7],
    RA: (20 * P) / 27,
    sag: (8 * PL) / 81,
  },
  {
    name: "fixed, force at 2L/5",
    span: forces(L, P, c["2/5"]),
    ends: both,
    MA: (18 * PL) / 125,
    MB: (12 * PL) / 125,
    points: [2 / 9, 8 / 11],
    RA: (81 * P) / 125,
    sag: (72 * PL) / 625,
  },
  {
    name: "fixed, forces at the third points",
    span: forces(L, P, 1 / 3, 2 / 3),
    ends: both,
    MA: (2 * PL) / 9,
    MB: (2 * PL) / 9,
    points: [2 / 9, 7 / 9],
    RA: P,
    sag: PL / 9,
  },
  {
    name: "fixed, forces at the quarter points",
    span: forces(L, P, 1 / 4, 1 / 2, 3 / 4),
    ends: both,
    MA: (5 * PL) / 16,
    MB: (5 * PL) / 16,
    points: [5 / 24, 19 / 24],
    RA: (3 * P) / 2,
    sag: (3 * PL) / 16,
  },
  {
    name: "fixed, triangle rising to B",
    span: trapezoid(L, 0, 1, 0, w),
    ends: both,
    MA: wL2 / 30,
    MB: wL2 / 20,
    points: [0.237016, 0.807703],
    print: 5e-7,
    RA: (3 * w * L) / 20,
    sag: 0.0214389 * wL2,
    sagPrint: 5e-8 * wL2,
  },
  {
    name: "fixed, symmetric triangle",
    span: gable(L, w),
    ends: both,
    MA: (5 * wL2) / 96,
    MB: (5 * wL2) / 96,
    points: [0.223149, 0.776851],
    print: 5e-7,
    RA: (w * L) / 4,
    sag: wL2 / 32,
  },
  { name: "fixed, parabola", span: parabola(L, w), ends: both, MA: wL2 / 15, MB: wL2 / 15, RA: (w * L) / 3 },
  {
    name: "fixed, uniform load on the left half",
    span: trapezoid(L, 0, 0.5, w, w),
    ends: both,
    MA: (11 * wL2) / 192,
    MB: (5 * wL2) / 192,
  },
  {
    name: "fixed, uniform load over 0.3 L from A",
    span: trapezoid(L, 0, a, w, w),
    ends: both,
    MA: (wL2 * a ** 2 * (6 - 8 * a + 3 * a ** 2)) / 12,
    MB: (wL2 * a ** 3 * (4 - 3 * a)) / 12,
  },
  {
    name: "propped, uniform load",
    span: udl(L, w),
    ends: propped,
    MA: wL2 / 8,
    MB: 0,
    points: [1 / 4],
    RA: (5 * w * L) / 8,
    sag: (9 * wL2) / 128,
  },
  {
    name: "propped, force at mid-span",
    span: forces(L, P, 1 / 2),
    ends: propped,
    MA: (3 * PL) / 16,
    MB: 0,
    points: [3 / 11],
    RA: (11 * P) / 16,
    sag: (5 * PL) / 32,
  },
  {
    name: "propped, force at L/3",
    span: forces(L, P, 1 / 3),
    ends: propped,
    MA: (5 * PL) / 27,
    MB: 0,
    points: [5 / 23],
    RA: (23 * P) / 27,
    sag: (8 * PL) / 81,
  },
  {
    name: "propped, force at 2L/3",
    span: forces(L, P, 2 / 3),
    ends: propped,
    MA: (4 * PL) / 27,
    MB: 0,
    points: [4 / 13],
    RA: (13 * P) / 27,
    sag: (14 * PL) / 81,
  },
  {
    name: "propped, forces at the third points",
    span: forces(L, P, 1 / 3, 2 / 3),
    ends: propped,
    MA: PL / 3,
    MB: 0,
    points: [1 / 4],
    RA: (4 * P) / 3,
    sag: (2 * PL) / 9,
  },
  {
    name: "propped, triangle, w at the fixed end",
    span: trapezoid(L, 0, 1, w, 0),
    ends: propped,
    MA: wL2 / 15,
    MB: 0,
    points: [0.2254],
    print: 5e-5,
    RA: (2 * w * L) / 5,
    sag: 0.0298142 * wL2,
    sagPrint: 5e-8 * wL2,
  },
  {
    name: "propped, triangle, w at the pin",
    span: trapezoid(L, 0, 1, 0, w),
    ends: propped,
    MA: (7 * wL2) / 120,
    MB: 0,
    points: [0.2746],
    print: 5e-6,
    RA: (9 * w * L) / 40,
  },
];

describe("single spans: published fixed-end moments and points of inflection", () => {
  let compared = 0;
  const same = (value: number, published: number, tolerance: number): void => {
    expect(Math.abs(value - published)).toBeLessThanOrEqual(tolerance);
    compared += 1;
  };

  it.each(rows)("$name", (row) => {
    const M = endMoments(row.span, row.ends);
    same(-M.left, row.MA, 1e-12 * (wL2 + PL));
    same(-M.right, row.MB, 1e-12 * (wL2 + PL));
    if (row.ends === both) expect(fixedEndMoments(row.span)).toEqual(M);
    const found = inflectionPoints(row.span, row.ends);
    if (row.points !== undefined) expect(found).toHaveLength(row.points.length);
    for (const [i, point] of (row.points ?? []).entries())
      same((found[i] ?? Number.NaN) / L, point, row.print ?? 1e-12);
    const along = momentsBetween(row.span, row.ends);
    if (row.sag !== undefined)
      same(extremes(along).greatest.value, row.sag, row.sagPrint ?? 1e-12 * (wL2 + PL));
    if (row.RA !== undefined) {
      const simple = valueAt(simpleMoments(row.span), 1e-7 * L) / (1e-7 * L); // slope at the support
      same(simple + (M.right - M.left) / L, row.RA, 1e-5 * row.RA);
    }
  });

  it("force anywhere: closed forms in c, at nine places", () => {
    for (let n = 1; n <= 9; n++) {
      const x = n / 10;
      const s = forces(L, P, x);
      const { left, right } = fixedEndMoments(s);
      same(-left, PL * x * (1 - x) ** 2, 1e-12 * PL);
      same(-right, PL * x ** 2 * (1 - x), 1e-12 * PL);
      const [first = Number.NaN, last = Number.NaN] = inflectionPoints(s, both);
      same(first / L, x / (1 + 2 * x), 1e-12);
      same(1 - last / L, (1 - x) / (3 - 2 * x), 1e-12);
      same(-endMoments(s, propped).left, (PL * x * (1 - x) * (2 - x)) / 2, 1e-12 * PL);
      same((inflectionPoints(s, propped)[0] ?? Number.NaN) / L, (x * (2 - x)) / (2 + 2 * x - x ** 2), 1e-12);
    }
  });

  it("hinges at 0.1 L of a fixed span under uniform load: 0.08 wL² at mid-span and 0.045 wL² at the ends", () => {
    // Saouma, Structural Engineering, eq. 14.29-14.30
    const middle = (0.8 ** 2 * wL2) / 8;
    const M = simpleMoments(udl(L, w));
    same(valueAt(M, L / 2) - valueAt(M, 0.1 * L), middle, 1e-12 * wL2);
    same(middle, 0.08 * wL2, 1e-12 * wL2);
    same(valueAt(M, 0.1 * L), 0.045 * wL2, 1e-12 * wL2);
  });

  afterAll(() => {
    // 19 spans: 38 end moments, 25 points, 17 reactions, 15 sagging moments; 54 of the force anywhere; 3 of the rule
    expect(compared).toBe(152);
  });
});
