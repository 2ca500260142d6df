// Single-bay rectangular portals, axially stiff members. Formulas: A. Kleinlogel, Rigid Frame Formulas, two-hinged and fixed
// frames (from memory), checked for the notes of this project by a slope-deflection solution of its own; the numbers of
// the second table come from that solution, to four decimals.
import { describe, expect, test } from "vitest";
import { exact } from "../../lib/exact/index.ts";
import { quantity } from "../../lib/quantity/index.ts";
import { type ElasticSolution, valueAt } from "../../lib/results/index.ts";
import { atJoint, type Load, pointLoad, portal, type Structure, uniform } from "../../lib/structure/index.ts";

type Bases = "pinned" | "fixed";
const length = (x: number) => quantity(x, "length"); // typed by its use
const force = (x: number) => quantity(x, "force");
const line = (x: number) => quantity(x, "force per length");
const Ic = 3;

function frame(h: number, L: number, ratio: number, bases: Bases): Structure {
  return portal({
    span: length(L),
    height: length(h),
    bases,
    sections: { columns: { E: 1, I: Ic, A: "stiff" }, beams: { E: 1, I: ratio * Ic, A: "stiff" } },
  });
}

interface Ends {
  readonly MA: number;
  readonly MB: number;
  readonly MC: number;
  readonly MD: number;
  readonly HA: number;
  readonly HD: number;
  readonly VA: number;
}

function endsOf({ members, reactions }: ElasticSolution): Ends {
  const at = (i: number, side: "start" | "end"): number => {
    const m = members[i];
    if (m === undefined) throw new Error(`there is no member ${i}`);
    return side === "start" ? valueAt(m.M, 0) : valueAt(m.M, m.length, "left");
  };
  const [A, D] = reactions;
  const known = (value: number | undefined): number => value ?? Number.NaN;
  return {
    MA: at(0, "start"),
    MB: at(0, "end"),
    MC: at(1, "end"),
    MD: at(2, "end"),
    HA: known(A?.x),
    HD: known(D?.x),
    VA: known(A?.y),
  };
}

function expectEnds(got: Ends, wanted: Ends, by: number): void {
  for (const key of Object.keys(wanted) as (keyof Ends)[])
    expect(Math.abs(got[key] - wanted[key]), `${key} ${got[key]} against ${wanted[key]}`).toBeLessThanOrEqual(
      by,
    );
}

// --- closed forms: N = 2k+3, N1 = k+2, N2 = 6k+1
type Formula = (g: { h: number; L: number; k: number }) => { readonly load: Load; readonly ends: Ends };
const w = 11;
const P = 37;
const formulas: readonly (readonly [string, Bases, Formula])[] = [
  [
    "uniform on the beam",
    "pinned",
    ({ h, L, k }) => {
      const [N, wL2] = [2 * k + 3, w * L * L];
      const H = wL2 / (4 * h * N);
      const M = -wL2 / (4 * N);
      return {
        load: uniform("BC", line(w)),
        ends: { MA: 0, MB: M, MC: M, MD: 0, HA: H, HD: -H, VA: (w * L) / 2 },
      };
    },
  ],
  [
    "P at 0.3 L of the beam",
    "pinned",
    ({ h, L, k }) => {
      const N = 2 * k + 3;
      const [a, b] = [0.3 * L, 0.7 * L];
      const M = (-3 * P * a * b) / (2 * L * N);
      const H = (3 * P * a * b) / (2 * h * L * N);
      return {
        load: pointLoad("BC", force(P), { at: "0.3 L" }),
        ends: { MA: 0, MB: M, MC: M, MD: 0, HA: H, HD: -H, VA: (P * b) / L },
      };
    },
  ],
  [
    "P at the eave",
    "pinned",
    ({ h, L }) => ({
      load: atJoint("B", { right: force(P) }),
      ends: { MA: 0, MB: (P * h) / 2, MC: (-P * h) / 2, MD: 0, HA: -P / 2, HD: -P / 2, VA: (-P * h) / L },
    }),
  ],
  [
    "uniform on the left column",
    "pinned",
    ({ h, L, k }) => {
      const [N, q] = [2 * k + 3, (w * h * h) / 4];
      const HD = (-w * h * (5 * k + 6)) / (8 * N);
      return {
        load: uniform("AB", line(w), { direction: "right" }),
        ends: {
          MA: 0,
          MB: q * (1 - k / (2 * N)),
          MC: -q * (1 + k / (2 * N)),
          MD: 0,
          HA: -(w * h + HD),
          HD,
          VA: (-w * h * h) / (2 * L),
        },
      };
    },
  ],
  [
    "uniform on the beam",
    "fixed",
    ({ h, L, k }) => {
      const [N1, wL2] = [k + 2, w * L * L];
      const H = wL2 / (4 * h * N1);
      const [base, knee] = [wL2 / (12 * N1), -wL2 / (6 * N1)];
      return {
        load: uniform("BC", line(w)),
        ends: { MA: base, MB: knee, MC: knee, MD: base, HA: H, HD: -H, VA: (w * L) / 2 },
      };
    },
  ],
  [
    "P at 0.3 L of the beam",
    "fixed",
    ({ h, L, k }) => {
      const [N1, N2, a, b] = [k + 2, 6 * k + 1, 0.3 * L, 0.7 * L];
      const s = (b - a) / (2 * L * N2);
      const m = (P * a * b) / L;
      const H = (3 * P * a * b) / (2 * L * h * N1);
      return {
        load: pointLoad("BC", force(P), { at: "0.3 L" }),
        ends: {
          MA: m * (1 / (2 * N1) - s),
          MB: -m * (1 / N1 + s),
          MC: -m * (1 / N1 - s),
          MD: m * (1 / (2 * N1) + s),
          HA: H,
          HD: -H,
          VA: ((P * b) / L) * (1 + (a * (b - a)) / (L * L * N2)),
        },
      };
    },
  ],
  [
    "P at the eave",
    "fixed",
    ({ h, L, k }) => {
      const N2 = 6 * k + 1;
      const [base, knee] = [((P * h) / 2) * ((3 * k + 1) / N2), ((P * h) / 2) * ((3 * k) / N2)];
      return {
        load: atJoint("B", { right: force(P) }),
        ends: {
          MA: -base,
          MB: knee,
          MC: -knee,
          MD: base,
          HA: -P / 2,
          HD: -P / 2,
          VA: (-3 * P * h * k) / (L * N2),
        },
      };
    },
  ],
  [
    "uniform on the left column",
    "fixed",
    ({ h, L, k }) => {
      const [N1, N2, q] = [k + 2, 6 * k + 1, (w * h * h) / 4];
      const HD = (-w * h * (2 * k + 3)) / (8 * N1);
      return {
        load: uniform("AB", line(w), { direction: "right" }),
        ends: {
          MA: -q * ((k + 3) / (6 * N1) + (4 * k + 1) / N2),
          MB: q * ((2 * k) / N2 - k / (6 * N1)),
          MC: -q * ((2 * k) / N2 + k / (6 * N1)),
          MD: q * ((4 * k + 1) / N2 - (k + 3) / (6 * N1)),
          HA: -(w * h + HD),
          HD,
          VA: (-w * h * h * k) / (L * N2),
        },
      };
    },
  ],
];
const shapes = [
  { h: 4, L: 8, k: 0.5 },
  { h: 5, L: 10, k: 1.5 },
  { h: 3.7, L: 9.1, k: 2.5 },
];

// --- numbers to four decimals
type Numbers = readonly [
  k: 0.5 | 1.5,
  bases: Bases,
  load: keyof typeof loads,
  MA: number,
  MB: number,
  MC: number,
  MD: number,
  HA: number,
  HD: number,
  VA: number,
];
const loads = {
  "beam w=10": uniform("BC", line(10)),
  "beam P=100 mid": pointLoad("BC", force(100), { at: "0.5 L" }),
  "beam P=100 at L/4": pointLoad("BC", force(100), { at: "0.25 L" }),
  "eave P=50": atJoint("B", { right: force(50) }),
  "column w=6": uniform("AB", line(6), { direction: "right" }),
};
const numbers: readonly Numbers[] = [
  [0.5, "pinned", "beam w=10", 0, -40, -40, 0, 10, -10, 40],
  [0.5, "pinned", "beam P=100 mid", 0, -75, -75, 0, 18.75, -18.75, 50],
  [0.5, "pinned", "beam P=100 at L/4", 0, -56.25, -56.25, 0, 14.0625, -14.0625, 75],
  [0.5, "pinned", "eave P=50", 0, 100, -100, 0, -25, -25, -25],
  [0.5, "pinned", "column w=6", 0, 22.5, -25.5, 0, -17.625, -6.375, -6],
  [0.5, "fixed", "beam w=10", 21.3333, -42.6667, -42.6667, 21.3333, 16, -16, 40],
  [0.5, "fixed", "beam P=100 mid", 40, -80, -80, 40, 30, -30, 50],
  [0.5, "fixed", "beam P=100 at L/4", 20.625, -69.375, -50.625, 39.375, 22.5, -22.5, 77.3438],
  [0.5, "fixed", "eave P=50", -62.5, 37.5, -37.5, 62.5, -25, -25, -9.375],
  [0.5, "fixed", "column w=6", -23.6, 5.2, -6.8, 12.4, -19.2, -4.8, -1.5],
  [1.5, "pinned", "beam w=10", 0, -41.6667, -41.6667, 0, 8.3333, -8.3333, 50],
  [1.5, "pinned", "beam P=100 mid", 0, -62.5, -62.5, 0, 12.5, -12.5, 50],
  [1.5, "pinned", "beam P=100 at L/4", 0, -46.875, -46.875, 0, 9.375, -9.375, 75],
  [1.5, "pinned", "eave P=50", 0, 125, -125, 0, -25, -25, -25],
  [1.5, "pinned", "column w=6", 0, 32.8125, -42.1875, 0, -21.5625, -8.4375, -7.5],
  [1.5, "fixed", "beam w=10", 23.8095, -47.619, -47.619, 23.8095, 14.2857, -14.2857, 50],
  [1.5, "fixed", "beam P=100 mid", 35.7143, -71.4286, -71.4286, 35.7143, 21.4286, -21.4286, 50],
  [1.5, "fixed", "beam P=100 at L/4", 22.0982, -58.2589, -48.8839, 31.4732, 16.0714, -16.0714, 75.9375],
  [1.5, "fixed", "eave P=50", -68.75, 56.25, -56.25, 68.75, -25, -25, -11.25],
  [1.5, "fixed", "column w=6", -34.2857, 8.5714, -13.9286, 18.2143, -23.5714, -6.4286, -2.25],
];

describe("exact(portal): closed forms", () => {
  for (const shape of shapes)
    test.each(formulas)(`k = ${shape.k}, %s, bases %s`, (_, bases, formula) => {
      const { load, ends } = formula(shape);
      const { h, L, k } = shape;
      const scale = Math.max(...Object.values(ends).map(Math.abs));
      // The members are stiff, not rigid: EA L² = 10⁸ EI.
      expectEnds(endsOf(exact(frame(h, L, (k * L) / h, bases), [load])), ends, 2e-6 * scale);
    });

  test.each(shapes)("sway under a force at the eave, h = $h, L = $L, k = $k", ({ h, L, k }) => {
    const sway = (bases: Bases): number =>
      exact(frame(h, L, (k * L) / h, bases), [atJoint("B", { right: force(P) })]).joints[1]?.x ?? Number.NaN;
    const unit = (P * h ** 3) / (12 * Ic);
    expect(sway("fixed") / unit / ((3 * k + 2) / (6 * k + 1))).toBeCloseTo(1, 5);
    expect(sway("pinned") / unit / ((2 * k + 1) / k)).toBeCloseTo(1, 5);
  });

  test.each([
    [0.5, 0.625],
    [1.5, 0.55],
    [2.5, 0.53125],
  ])("column inflection under a force at the eave, fixed bases, k = %f: %f h", (k, share) => {
    const [h, L] = [4, 8];
    const { members } = exact(frame(h, L, (k * L) / h, "fixed"), [atJoint("B", { right: force(P) })]);
    expect(members[0]?.inflection).toHaveLength(1);
    expect((members[0]?.inflection[0] ?? 0) / h).toBeCloseTo(share, 6);
    expect((3 * k + 1) / (6 * k + 1)).toBeCloseTo(share, 12);
  });
});

describe("exact(portal): numbers", () => {
  test.each(numbers.map((row) => [`k = ${row[0]}, bases ${row[1]}, ${row[2]}`, row] as const))(
    "%s",
    (_, [k, bases, load, MA, MB, MC, MD, HA, HD, VA]) => {
      const [h, L, ratio] = k === 0.5 ? [4, 8, 1] : [5, 10, 3];
      const got = endsOf(exact(frame(h, L, ratio, bases), [loads[load]]));
      expectEnds(got, { MA, MB, MC, MD, HA, HD, VA }, 5e-5 + 1e-5); // half the last digit, and stiff members
    },
  );

  test("the numbers of rows compared", () => {
    expect([formulas.length * shapes.length, numbers.length]).toEqual([24, 20]);
  });
});
