// Single spans solved by statics, hinges at the published points of inflection: end moments, reactions and span moments follow.
//
// Sources as in single-spans.test.ts: T. G. Hicks, Civil Engineering Formulas, beam case 5 (fixed, uniform: read); V. E. Saouma,
// Structural Engineering, sec. 14.3.1 (0.211 L: read); the other rows are classical entries of AISC Manual
// Table 3-23, Roark, and fixed-end moment tables (from memory), each derived again from elastic theory in rationals.
// Not here: the parabolic load, which no load of the library describes, and settlements, which statics alone cannot see.

import { afterAll, describe, expect, it } from "vitest";
import { extremes, valueAt } from "../../lib/results/index.ts";
import { determinacy, freeBodies } from "../../lib/statics/index.ts";
import {
  beam,
  type Load,
  partial,
  pointLoad,
  uniform,
  varying,
  withHinges,
} from "../../lib/structure/index.ts";

// L = 1 m, w = 1 N/m, P = 1 N, so that values are coefficients of wL², PL, wL and P
const P = (...at: readonly number[]): readonly Load[] =>
  at.map((c) => pointLoad("AB", "1 N", { at: `${c} L` }));

interface Row {
  readonly name: string;
  readonly ends: "fixed" | "propped";
  readonly loads: readonly Load[];
  /** x/L; where the source prints none, they follow from its end moments (found below by halving). */
  readonly points: readonly number[] | ((x: number) => number);
  readonly MA: number;
  readonly MB: number;
  readonly RA?: number;
  readonly sag?: number;
  /** Half the last digit of printed points and moments; otherwise closed forms, 1e-9. */
  readonly print?: number;
}

const c = (at: number): Row => ({
  name: `fixed, force at ${at} L`,
  ends: "fixed",
  loads: P(at),
  points: [at / (1 + 2 * at), 1 - (1 - at) / (3 - 2 * at)],
  MA: at * (1 - at) ** 2,
  MB: at ** 2 * (1 - at),
  RA: (1 - at) ** 2 * (1 + 2 * at),
  sag: 2 * at ** 2 * (1 - at) ** 2,
});
const propped = (at: number): Row => ({
  name: `propped, force at ${at} L`,
  ends: "propped",
  loads: P(at),
  points: [(at * (2 - at)) / (2 + 2 * at - at ** 2)],
  MA: (at * (1 - at) * (2 - at)) / 2,
  MB: 0,
  RA: 1 - at + (at * (1 - at) * (2 - at)) / 2,
});
/** Fixed, uniform load from A over s = aL. */
const over = (a: number): Row => {
  const MA = (a ** 2 * (6 - 8 * a + 3 * a ** 2)) / 12;
  const MB = (a ** 3 * (4 - 3 * a)) / 12;
  const R = a * (1 - a / 2) + MA - MB;
  const M = (x: number): number => -MA + R * x - (x < a ? x ** 2 / 2 : a * (x - a / 2));
  return {
    name: `fixed, uniform load over ${a} L`,
    ends: "fixed",
    loads: [partial("AB", "1 N/m", { from: "0 L", to: `${a} L` })],
    points: M,
    MA,
    MB,
  };
};

const rows: readonly Row[] = [
  {
    name: "fixed, uniform load",
    ends: "fixed",
    loads: [uniform("AB", "1 N/m")],
    points: [1 / 2 - Math.sqrt(3) / 6, 1 / 2 + Math.sqrt(3) / 6],
    MA: 1 / 12,
    MB: 1 / 12,
    RA: 1 / 2,
    sag: 1 / 24,
  },
  {
    name: "fixed, uniform load, points as printed",
    ends: "fixed",
    loads: [uniform("AB", "1 N/m")],
    points: [0.211325, 0.788675],
    MA: 1 / 12,
    MB: 1 / 12,
    RA: 1 / 2,
    sag: 1 / 24,
    print: 5e-7,
  },
  {
    name: "fixed, force at midspan",
    ends: "fixed",
    loads: P(1 / 2),
    points: [1 / 4, 3 / 4],
    MA: 1 / 8,
    MB: 1 / 8,
    RA: 1 / 2,
    sag: 1 / 8,
  },
  c(1 / 4),
  c(1 / 3),
  c(2 / 5),
  {
    name: "fixed, forces at the third points",
    ends: "fixed",
    loads: P(1 / 3, 2 / 3),
    points: [2 / 9, 7 / 9],
    MA: 2 / 9,
    MB: 2 / 9,
    RA: 1,
    sag: 1 / 9,
  },
  {
    name: "fixed, forces at the quarter points",
    ends: "fixed",
    loads: P(1 / 4, 1 / 2, 3 / 4),
    points: [5 / 24, 19 / 24],
    MA: 5 / 16,
    MB: 5 / 16,
    RA: 3 / 2,
    sag: 3 / 16,
  },
  {
    name: "fixed, load rising from A to B",
    ends: "fixed",
    loads: [varying("AB", "0 N/m", "1 N/m")],
    points: [0.237016, 0.807703],
    MA: 1 / 30,
    MB: 1 / 20,
    RA: 3 / 20,
    sag: 0.0214389,
    print: 5e-7,
  },
  {
    name: "fixed, symmetric triangle",
    ends: "fixed",
    loads: [
      varying("AB", "0 N/m", "1 N/m", { to: "0.5 L" }),
      varying("AB", "1 N/m", "0 N/m", { from: "0.5 L" }),
    ],
    points: [0.223149, 0.776851],
    MA: 5 / 96,
    MB: 5 / 96,
    RA: 1 / 4,
    sag: 1 / 32,
    print: 5e-7,
  },
  { ...over(1 / 2), MA: 11 / 192, MB: 5 / 192 },
  over(0.3),
  over(0.8),
  {
    name: "propped, uniform load",
    ends: "propped",
    loads: [uniform("AB", "1 N/m")],
    points: [1 / 4],
    MA: 1 / 8,
    MB: 0,
    RA: 5 / 8,
    sag: 9 / 128,
  },
  {
    name: "propped, force at midspan",
    ends: "propped",
    loads: P(1 / 2),
    points: [3 / 11],
    MA: 3 / 16,
    MB: 0,
    RA: 11 / 16,
    sag: 5 / 32,
  },
  { ...propped(1 / 3), points: [5 / 23], sag: 8 / 81 },
  { ...propped(2 / 3), points: [4 / 13], sag: 14 / 81 },
  propped(0.4),
  {
    name: "propped, forces at the third points",
    ends: "propped",
    loads: P(1 / 3, 2 / 3),
    points: [1 / 4],
    MA: 1 / 3,
    MB: 0,
    RA: 4 / 3,
    sag: 2 / 9,
  },
  {
    name: "propped, load falling to the pin",
    ends: "propped",
    loads: [varying("AB", "1 N/m", "0 N/m")],
    points: [0.2254],
    MA: 1 / 15,
    MB: 0,
    RA: 2 / 5,
    sag: 0.0298142,
    print: 5e-5,
  },
  {
    name: "propped, load rising to the pin",
    ends: "propped",
    loads: [varying("AB", "0 N/m", "1 N/m")],
    points: [0.2746],
    MA: 7 / 120,
    MB: 0,
    RA: 9 / 40,
    print: 5e-5,
  },
];

/** Zeros of a moment that hogs at both ends and sags between, by halving. */
function zerosOf(M: (x: number) => number): readonly number[] {
  const best = Array.from({ length: 999 }, (_, i) => (i + 1) / 1000).reduce((a, x) => (M(x) > M(a) ? x : a));
  return [0, 1].map((end) => {
    let [out, inside] = [end, best];
    for (let k = 0; k < 60; k++) {
      const middle = (out + inside) / 2;
      if (M(middle) > 0) inside = middle;
      else out = middle;
    }
    return (out + inside) / 2;
  });
}

describe("single spans through statics, hinges at the points of inflection", () => {
  let compared = 0;
  it.each(rows)("$name", ({ ends, loads, points, MA, MB, RA, sag, print }) => {
    const plain = beam({ spans: ["1 m"], supports: ["fixed", ends === "fixed" ? "fixed" : "roller"] });
    const places = typeof points === "function" ? zerosOf(points) : points;
    const hinged = withHinges(
      plain,
      places.map((x) => ({ member: "AB", from: "A", at: `${x} m` as const })),
    );
    // what is left at most is axial force along the beam, which no load makes
    expect(determinacy(hinged).selfStresses.every((s) => s.kind === "line")).toBe(true);
    const { members, reactions } = freeBodies(hinged, loads);
    const M = members[0]?.M;
    if (M === undefined) throw new Error("no member");
    // a hinge off by half a digit moves a moment by the shear there, at most a few P or wL
    const tolerance = print === undefined ? 1e-9 : 4 * print;
    const same = (value: number, published: number): void => {
      expect(Math.abs(value - published)).toBeLessThanOrEqual(tolerance);
      compared += 1;
    };
    same(-valueAt(M, 0), MA);
    same(-valueAt(M, 1, "left"), MB);
    if (RA !== undefined) same(reactions[0]?.y ?? Number.NaN, RA);
    if (sag !== undefined) same(extremes(M).greatest.value, sag);
  });

  afterAll(() => {
    // 21 rows with two end moments, 18 reactions, 16 span moments
    expect(compared).toBe(21 * 2 + 18 + 16);
  });
});
