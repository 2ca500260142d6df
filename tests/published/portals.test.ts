// Single-bay portal frames, solved by statics with hinges at the true points of inflection.
//
// Source: A. Kleinlogel, Rigid Frame Formulas, rectangular two-hinged and fixed frames (from memory); the numbers were worked out
// from those formulas and agree with a slope-deflection solution of axially rigid members. kN, m; moments positive with tension
// inside, horizontal reactions to the right, vertical up. Printed to four decimals.

import { afterAll, describe, expect, it } from "vitest";
import { endFixity, endMoments } from "../../lib/inflection/index.ts";
import { type FreeBodySolution, valueAt } from "../../lib/results/index.ts";
import { freeBodies } from "../../lib/statics/index.ts";
import { atJoint, type Load, pointLoad, portal, uniform } from "../../lib/structure/index.ts";
import { udl } from "../inflection/spans.ts";
import { determinateChoices, zerosUnderForce, zerosUnderUniform } from "./true-hinges.ts";

type Case = "beam w=10" | "beam P=100 mid" | "beam P=100 at L/4" | "eave P=50" | "column w=6";
type Row = readonly [
  k: number,
  h: number,
  L: number,
  bases: "pinned" | "fixed",
  load: Case,
  MA: number,
  MB: number,
  MC: number,
  MD: number,
  HA: number,
  HD: number,
  VA: number,
];

const rows: readonly Row[] = [
  [0.5, 4, 8, "pinned", "beam w=10", 0, -40, -40, 0, 10, -10, 40],
  [0.5, 4, 8, "pinned", "beam P=100 mid", 0, -75, -75, 0, 18.75, -18.75, 50],
  [0.5, 4, 8, "pinned", "beam P=100 at L/4", 0, -56.25, -56.25, 0, 14.0625, -14.0625, 75],
  [0.5, 4, 8, "pinned", "eave P=50", 0, 100, -100, 0, -25, -25, -25],
  [0.5, 4, 8, "pinned", "column w=6", 0, 22.5, -25.5, 0, -17.625, -6.375, -6],
  [0.5, 4, 8, "fixed", "beam w=10", 21.3333, -42.6667, -42.6667, 21.3333, 16, -16, 40],
  [0.5, 4, 8, "fixed", "beam P=100 mid", 40, -80, -80, 40, 30, -30, 50],
  [0.5, 4, 8, "fixed", "beam P=100 at L/4", 20.625, -69.375, -50.625, 39.375, 22.5, -22.5, 77.3438],
  [0.5, 4, 8, "fixed", "eave P=50", -62.5, 37.5, -37.5, 62.5, -25, -25, -9.375],
  [0.5, 4, 8, "fixed", "column w=6", -23.6, 5.2, -6.8, 12.4, -19.2, -4.8, -1.5],
  [1.5, 5, 10, "pinned", "beam w=10", 0, -41.6667, -41.6667, 0, 8.3333, -8.3333, 50],
  [1.5, 5, 10, "pinned", "beam P=100 mid", 0, -62.5, -62.5, 0, 12.5, -12.5, 50],
  [1.5, 5, 10, "pinned", "beam P=100 at L/4", 0, -46.875, -46.875, 0, 9.375, -9.375, 75],
  [1.5, 5, 10, "pinned", "eave P=50", 0, 125, -125, 0, -25, -25, -25],
  [1.5, 5, 10, "pinned", "column w=6", 0, 32.8125, -42.1875, 0, -21.5625, -8.4375, -7.5],
  [1.5, 5, 10, "fixed", "beam w=10", 23.8095, -47.619, -47.619, 23.8095, 14.2857, -14.2857, 50],
  [1.5, 5, 10, "fixed", "beam P=100 mid", 35.7143, -71.4286, -71.4286, 35.7143, 21.4286, -21.4286, 50],
  [
    1.5,
    5,
    10,
    "fixed",
    "beam P=100 at L/4",
    22.0982,
    -58.2589,
    -48.8839,
    31.4732,
    16.0714,
    -16.0714,
    75.9375,
  ],
  [1.5, 5, 10, "fixed", "eave P=50", -68.75, 56.25, -56.25, 68.75, -25, -25, -11.25],
  [1.5, 5, 10, "fixed", "column w=6", -34.2857, 8.5714, -13.9286, 18.2143, -23.5714, -6.4286, -2.25],
];

const loads: Readonly<Record<Case, Load>> = {
  "beam w=10": uniform("BC", "10 kN/m"),
  "beam P=100 mid": pointLoad("BC", "100 kN", { at: "0.5 L" }),
  "beam P=100 at L/4": pointLoad("BC", "100 kN", { at: "0.25 L" }),
  "eave P=50": atJoint("B", { right: "50 kN" }),
  "column w=6": uniform("AB", "6 kN/m", { direction: "right" }),
};

/** Points of inflection from the printed end moments. */
function places([, h, L, , load, MA, MB, MC, MD]: Row): readonly (readonly [string, number])[] {
  const column = zerosUnderUniform(h, MA, MB, load === "column w=6" ? 6 : 0);
  const beam = load.startsWith("beam P")
    ? zerosUnderForce(L, MB, MC, 100, load === "beam P=100 mid" ? L / 2 : L / 4)
    : zerosUnderUniform(L, MB, MC, load === "beam w=10" ? 10 : 0);
  const other = zerosUnderUniform(h, MC, MD, 0);
  return [
    ...column.map((x) => ["AB", x] as const),
    ...beam.map((x) => ["BC", x] as const),
    ...other.map((x) => ["CD", x] as const),
  ];
}

/** MA, MB, MC, MD, HA, HD, VA of a solution, N and N·m. */
function valuesOf({ reactions, members }: FreeBodySolution, h: number, L: number): readonly number[] {
  const [AB, BC, CD] = members;
  const [A, D] = reactions;
  if (AB === undefined || BC === undefined || CD === undefined) throw new Error("a member is missing");
  const moments = [valueAt(AB.M, 0), valueAt(BC.M, 0), valueAt(BC.M, L), valueAt(CD.M, h)];
  return [...moments, A?.x ?? Number.NaN, D?.x ?? Number.NaN, A?.y ?? Number.NaN];
}

describe("portals: closed forms through statics", () => {
  let compared = 0;

  for (const row of rows) {
    const [k, h, L, bases, load, ...published] = row;
    it(`k = ${k}, h = ${h}, L = ${L}, ${bases} bases, ${load}`, () => {
      const choices = determinateChoices(portal({ span: `${L} m`, height: `${h} m`, bases }), places(row));
      expect(choices.length).toBeGreaterThan(0);
      choices.forEach((hinged, choice) => {
        const found = valuesOf(freeBodies(hinged, [loads[load]]), h, L);
        for (const [i, value] of published.entries()) {
          // half the last printed digit, carried through the hinges' places: up to a few units of it
          expect(Math.abs((found[i] ?? Number.NaN) / 1000 - value)).toBeLessThanOrEqual(5e-4);
          if (choice === 0) compared += 1;
        }
      });
    });
  }

  it("end fixity from stiffness gives the gravity moments of both frames: wL²/(4N), wL²/(6N1)", () => {
    for (const k of [0.5, 1.5])
      for (const [m, M] of [
        [3, 1 / (4 * (2 * k + 3))],
        [4, 1 / (6 * (k + 2))],
      ] as const) {
        const r = endFixity(m / k); // column stiffness m EIc/h over EIb/L
        expect(-endMoments(udl(1, 1), { left: r, right: r }).left).toBeCloseTo(M, 12);
      }
  });

  afterAll(() => {
    expect(compared).toBe(20 * 7);
  });
});
