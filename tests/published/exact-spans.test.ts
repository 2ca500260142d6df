// Single spans: fixed-end moments, span moments, points of inflection and reactions against closed forms.
// Derived from elastic theory and equal to the classical handbook entries; fixed ends under a uniform load (wL²/12, wL²/24)
// as printed in T. G. Hicks, Civil Engineering Formulas, beam case 5; inflection at 0.211 L of that case in V. E. Saouma,
// Structural Engineering, 14.3.1. The other entries (also in the AISC Manual, Table 3-23) from memory.
import { describe, expect, test } from "vitest";
import { exact } from "../../lib/exact/index.ts";
import { quantity } from "../../lib/quantity/index.ts";
import { extremes, valueAt } from "../../lib/results/index.ts";
import {
  beam,
  type Imposed,
  type Load,
  pointLoad,
  type SupportChoice,
  settlement,
  uniform,
  varying,
} from "../../lib/structure/index.ts";

const L = 7;
const w = 3;
const P = 5;
const D = 0.011;
const EI = 2.5;
const W = quantity(w, "force per length");

const span = (fraction: number): `${number} L` => `${fraction} L`;
const point = (c: number, part = 1): Load => pointLoad("AB", quantity(P * part, "force"), { at: span(c) });
const full = uniform("AB", W);
const rising = varying("AB", quantity(0, "force per length"), W);
const falling = varying("AB", W, quantity(0, "force per length"));

// A parabola times a cubic influence line is of degree 5, for which three Gauss points are exact: the end forces of a
// parabolic load are those of three forces.
const gauss = [
  [0.5 - Math.sqrt(0.15), 5 / 18],
  [0.5, 8 / 18],
  [0.5 + Math.sqrt(0.15), 5 / 18],
] as const;
const parabola = gauss.map(([c, weight]) =>
  pointLoad("AB", quantity(4 * w * c * (1 - c) * L * weight, "force"), { at: span(c) }),
);

interface Row {
  readonly name: string;
  readonly ends: readonly [SupportChoice, SupportChoice];
  readonly loads: readonly (Load | Imposed)[];
  /** Hogging moments at A and B. */
  readonly MA: number;
  readonly MB: number;
  readonly RA?: number;
  /** Moment at a place (fraction of L), and the largest sagging moment with its place. */
  readonly at?: readonly (readonly [number, number])[];
  readonly most?: readonly [place: number, value: number, tolerance: number];
  readonly inflection?: readonly number[];
  /** Half the last printed digit of the decimals above. */
  readonly printed?: number;
}

const fixed = ["fixed", "fixed"] as const;
const propped = ["fixed", "roller"] as const;
const wL2 = w * L * L;
const PL = P * L;

function fixedPoint(c: number): Row {
  const b = 1 - c;
  return {
    name: `fixed-fixed, P at ${c.toFixed(3)} L`,
    ends: fixed,
    loads: [point(c)],
    MA: PL * c * b * b,
    MB: PL * c * c * b,
    at: [[c, 2 * PL * c * c * b * b]],
    inflection: [c / (1 + 2 * c), 1 - b / (3 - 2 * c)],
    RA: P * b * b * (1 + 2 * c),
  };
}

function proppedPoint(c: number): Row {
  return {
    name: `propped, P at ${c.toFixed(3)} L`,
    ends: propped,
    loads: [point(c)],
    MA: (PL * c * (1 - c) * (2 - c)) / 2,
    MB: 0,
    inflection: [(c * (2 - c)) / (2 + 2 * c - c * c)],
    RA: P * (1 - c + (c * (1 - c) * (2 - c)) / 2),
  };
}

function partUniform(a: number): Row {
  return {
    name: `fixed-fixed, uniform from A over ${a} L`,
    ends: fixed,
    loads: [uniform("AB", W, { to: span(a) })],
    MA: (wL2 * a * a * (6 - 8 * a + 3 * a * a)) / 12,
    MB: (wL2 * a ** 3 * (4 - 3 * a)) / 12,
  };
}

const third = 1 / 3;
const rows: readonly Row[] = [
  {
    name: "fixed-fixed, uniform",
    ends: fixed,
    loads: [full],
    MA: wL2 / 12,
    MB: wL2 / 12,
    at: [[0.5, wL2 / 24]],
    inflection: [0.5 - Math.sqrt(3) / 6, 0.5 + Math.sqrt(3) / 6],
    RA: (w * L) / 2,
  },
  {
    name: "fixed-fixed, P at midspan",
    ends: fixed,
    loads: [point(0.5)],
    MA: PL / 8,
    MB: PL / 8,
    at: [[0.5, PL / 8]],
    inflection: [1 / 4, 3 / 4],
    RA: P / 2,
  },
  fixedPoint(0.37),
  {
    ...fixedPoint(1 / 4),
    MA: (9 * PL) / 64,
    MB: (3 * PL) / 64,
    at: [[1 / 4, (9 * PL) / 128]],
    inflection: [1 / 6, 7 / 10],
    RA: (27 * P) / 32,
  },
  {
    ...fixedPoint(third),
    MA: (4 * PL) / 27,
    MB: (2 * PL) / 27,
    at: [[third, (8 * PL) / 81]],
    inflection: [1 / 5, 5 / 7],
    RA: (20 * P) / 27,
  },
  {
    ...fixedPoint(2 / 5),
    MA: (18 * PL) / 125,
    MB: (12 * PL) / 125,
    at: [[2 / 5, (72 * PL) / 625]],
    inflection: [2 / 9, 8 / 11],
    RA: (81 * P) / 125,
  },
  {
    name: "fixed-fixed, P at both third points",
    ends: fixed,
    loads: [point(third), point(2 * third)],
    MA: (2 * PL) / 9,
    MB: (2 * PL) / 9,
    at: [
      [third, PL / 9],
      [0.5, PL / 9],
    ],
    inflection: [2 / 9, 7 / 9],
    RA: P,
  },
  {
    name: "fixed-fixed, P at the quarter points",
    ends: fixed,
    loads: [point(0.25), point(0.5), point(0.75)],
    MA: (5 * PL) / 16,
    MB: (5 * PL) / 16,
    at: [[0.5, (3 * PL) / 16]],
    inflection: [5 / 24, 19 / 24],
    RA: (3 * P) / 2,
  },
  {
    name: "fixed-fixed, triangle 0 at A, w at B",
    ends: fixed,
    loads: [rising],
    MA: wL2 / 30,
    MB: wL2 / 20,
    at: [[0.5, wL2 / 48]],
    most: [0.547723, 0.0214389 * wL2, 5e-8 * wL2],
    inflection: [0.237016, 0.807703],
    printed: 5e-7,
    RA: (3 * w * L) / 20,
  },
  {
    name: "fixed-fixed, symmetric triangle",
    ends: fixed,
    loads: [
      varying("AB", quantity(0, "force per length"), W, { to: "0.5 L" }),
      varying("AB", W, quantity(0, "force per length"), { from: "0.5 L" }),
    ],
    MA: (5 * wL2) / 96,
    MB: (5 * wL2) / 96,
    at: [[0.5, wL2 / 32]],
    inflection: [0.223149, 0.776851],
    printed: 5e-7,
    RA: (w * L) / 4,
  },
  {
    name: "fixed-fixed, parabola",
    ends: fixed,
    loads: parabola,
    MA: wL2 / 15,
    MB: wL2 / 15,
    RA: (w * L) / 3,
  },
  {
    name: "fixed-fixed, uniform on the left half",
    ends: fixed,
    loads: [uniform("AB", W, { to: "0.5 L" })],
    MA: (11 * wL2) / 192,
    MB: (5 * wL2) / 192,
  },
  partUniform(0.3),
  {
    name: "propped, uniform",
    ends: propped,
    loads: [full],
    MA: wL2 / 8,
    MB: 0,
    most: [5 / 8, (9 * wL2) / 128, 1e-9 * wL2],
    inflection: [1 / 4],
    RA: (5 * w * L) / 8,
  },
  {
    name: "propped, P at midspan",
    ends: propped,
    loads: [point(0.5)],
    MA: (3 * PL) / 16,
    MB: 0,
    at: [[0.5, (5 * PL) / 32]],
    inflection: [3 / 11],
    RA: (11 * P) / 16,
  },
  proppedPoint(0.41),
  {
    ...proppedPoint(third),
    MA: (5 * PL) / 27,
    at: [[third, (8 * PL) / 81]],
    inflection: [5 / 23],
    RA: (23 * P) / 27,
  },
  {
    ...proppedPoint(2 / 3),
    MA: (4 * PL) / 27,
    at: [[2 / 3, (14 * PL) / 81]],
    inflection: [4 / 13],
    RA: (13 * P) / 27,
  },
  {
    name: "propped, P at both third points",
    ends: propped,
    loads: [point(third), point(2 * third)],
    MA: PL / 3,
    MB: 0,
    at: [
      [third, PL / 9],
      [2 * third, (2 * PL) / 9],
    ],
    inflection: [1 / 4],
    RA: (4 * P) / 3,
  },
  {
    name: "propped, triangle w at the fixed end",
    ends: propped,
    loads: [falling],
    MA: wL2 / 15,
    MB: 0,
    most: [1 - 0.4472, 0.0298142 * wL2, 5e-8 * wL2],
    inflection: [1 - 0.7746],
    printed: 5e-5,
    RA: (2 * w * L) / 5,
  },
  {
    name: "propped, triangle w at the pin",
    ends: propped,
    loads: [rising],
    MA: (7 * wL2) / 120,
    MB: 0,
    most: [1 - 0.3292, Number.NaN, Number.NaN],
    inflection: [0.2746],
    printed: 5e-5,
    RA: (9 * w * L) / 40,
  },
  {
    name: "fixed-fixed, end B settles",
    ends: fixed,
    loads: [settlement("B", { down: quantity(D, "length") })],
    MA: (6 * EI * D) / L ** 2,
    MB: (-6 * EI * D) / L ** 2,
    inflection: [1 / 2],
  },
  {
    name: "propped, end B settles",
    ends: propped,
    loads: [settlement("B", { down: quantity(D, "length") })],
    MA: (3 * EI * D) / L ** 2,
    MB: 0,
  },
];

describe("exact(single span)", () => {
  test.each(rows.map((row) => [row.name, row] as const))("%s", (_, row) => {
    const one = beam({
      spans: [quantity(L, "length")],
      supports: row.ends,
      sections: { all: { E: EI, I: 1, A: 1.7 } },
    });
    const solution = exact(one, row.loads);
    const [member] = solution.members;
    if (member === undefined) throw new Error("the beam has no member");
    const { M, inflection } = member;
    const near = 1e-12 * (wL2 + PL);
    const close = (got: number, wanted: number, by = near): void =>
      expect(Math.abs(got - wanted), `${got} against ${wanted}`).toBeLessThanOrEqual(by);
    close(valueAt(M, 0), -row.MA);
    close(valueAt(M, L, "left"), -row.MB);
    for (const [place, value] of row.at ?? []) close(valueAt(M, place * L), value);
    if (row.RA !== undefined) close(solution.reactions[0]?.y ?? Number.NaN, row.RA, 1e-12 * (w * L + P));
    if (row.inflection !== undefined) {
      expect(inflection).toHaveLength(row.inflection.length);
      row.inflection.forEach((place, i) => {
        close((inflection[i] ?? 0) / L, place, row.printed ?? 1e-9);
      });
    }
    if (row.most !== undefined) {
      const [place, value, tolerance] = row.most;
      const { greatest } = extremes(M);
      close(greatest.x / L, place, row.printed ?? 1e-6);
      if (!Number.isNaN(value)) close(greatest.value, value, tolerance);
    }
  });

  test("all 23 rows of the table are compared", () => {
    expect(rows).toHaveLength(23);
  });
});
