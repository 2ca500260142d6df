import { describe, expect, it } from "vitest";
import { determinacy } from "../../lib/statics/index.ts";
import {
  beam,
  type HingeAt,
  portal,
  type Structure,
  structure,
  withHinges,
} from "../../lib/structure/index.ts";

const hinge = (member: string, from: string, at: HingeAt["at"]): HingeAt => ({ member, from, at });
const pinned = portal({ span: "14 m", height: "5.5 m", bases: "pinned" });
const fixed = portal({ span: "14 m", height: "5.5 m", bases: "fixed" });
const pin = (...names: readonly string[]): { readonly released: readonly string[] } => ({ released: names });

/** Members pinned at all their joints. */
const truss = (
  bars: readonly string[],
  joints: Parameters<typeof structure>[0]["joints"],
  supports: Parameters<typeof structure>[0]["supports"],
): Structure =>
  structure({
    joints,
    supports,
    members: Object.fromEntries(
      bars.map((b) => [b, { ends: [b[0] ?? "", b[1] ?? ""], released: [...b] } as const]),
    ),
  });

const square = { A: ["0 m", "0 m"], B: ["4 m", "0 m"], C: ["4 m", "4 m"], D: ["0 m", "4 m"] } as const;
const twoPins = { A: "pinned", B: "roller" } as const;

interface Row {
  readonly name: string;
  readonly of: Structure;
  /** r, m, j, c */
  readonly count: readonly [number, number, number, number];
  readonly degree: number;
  readonly selfStress: number;
  readonly motions: number;
  readonly words: readonly string[];
}

const rows: readonly Row[] = [
  {
    name: "simple beam",
    of: beam({ spans: ["6 m"] }),
    count: [3, 1, 2, 0],
    degree: 0,
    selfStress: 0,
    motions: 0,
    words: ["determinate and stable", "3m + r - 3j - c = 3 + 3 - 6 - 0 = 0"],
  },
  {
    name: "cantilever",
    of: beam({ spans: ["6 m"], supports: ["fixed", "free"] }),
    count: [3, 1, 2, 0],
    degree: 0,
    selfStress: 0,
    motions: 0,
    words: ["determinate"],
  },
  {
    name: "propped cantilever",
    of: beam({ spans: ["6 m"], supports: ["fixed", "roller"] }),
    count: [4, 1, 2, 0],
    degree: 1,
    selfStress: 1,
    motions: 0,
    words: ["indeterminate to the 1st degree"],
  },
  {
    name: "beam fixed at both ends",
    of: beam({ spans: ["6 m"], supports: ["fixed", "fixed"] }),
    count: [6, 1, 2, 0],
    degree: 3,
    selfStress: 3,
    motions: 0,
    words: ["3rd degree"],
  },
  {
    name: "beam with two pins",
    of: beam({ spans: ["6 m"], supports: ["pinned", "pinned"] }),
    count: [4, 1, 2, 0],
    degree: 1,
    selfStress: 1,
    motions: 0,
    words: ["only axial force along a straight line is redundant"],
  },
  {
    name: "four-span beam",
    of: beam({ spans: ["5 m", "6 m", "6 m", "5 m"] }),
    count: [6, 4, 5, 0],
    degree: 3,
    selfStress: 3,
    motions: 0,
    words: ["3rd degree"],
  },
  {
    name: "two-span beam with a hinge",
    of: withHinges(beam({ spans: ["6 m", "6 m"] }), [hinge("BC", "B", "0.2 L")]),
    count: [4, 2, 3, 1],
    degree: 0,
    selfStress: 0,
    motions: 0,
    words: ["determinate and stable"],
  },
  {
    name: "simple beam with a hinge",
    of: withHinges(beam({ spans: ["6 m"] }), [hinge("AB", "A", "2 m")]),
    count: [3, 1, 2, 1],
    degree: -1,
    selfStress: 0,
    motions: 1,
    words: ["nothing resists 1 motion", "h1 drops, the beam folds there"],
  },
  {
    name: "two hinges in one end span, one too few elsewhere",
    of: withHinges(beam({ spans: ["6 m", "6 m", "6 m"] }), [
      hinge("AB", "A", "2 m"),
      hinge("AB", "A", "4 m"),
    ]),
    count: [5, 3, 4, 2],
    degree: 0,
    selfStress: 1,
    motions: 1,
    words: ["the count says determinate", "and rules: a mechanism", "h1 drops"],
  },
  {
    name: "pinned portal",
    of: pinned,
    count: [4, 3, 4, 0],
    degree: 1,
    selfStress: 1,
    motions: 0,
    words: ["1st degree"],
  },
  {
    name: "fixed portal",
    of: fixed,
    count: [6, 3, 4, 0],
    degree: 3,
    selfStress: 3,
    motions: 0,
    words: ["3rd degree"],
  },
  {
    name: "pinned portal with one hinge",
    of: withHinges(pinned, [hinge("BC", "B", "0.5 L")]),
    count: [4, 3, 4, 1],
    degree: 0,
    selfStress: 0,
    motions: 0,
    words: ["determinate"],
  },
  {
    name: "pinned portal with two beam hinges",
    of: withHinges(pinned, [hinge("BC", "B", "0.125 L"), hinge("BC", "C", "0.125 L")]),
    count: [4, 3, 4, 2],
    degree: -1,
    selfStress: 0,
    motions: 1,
    words: ["sway: B and C move sideways together, columns AB and CD turn about A and D"],
  },
  {
    name: "fixed portal with three hinges",
    of: withHinges(fixed, [hinge("AB", "A", "0.5 L"), hinge("BC", "B", "0.5 L"), hinge("CD", "D", "0.5 L")]),
    count: [6, 3, 4, 3],
    degree: 0,
    selfStress: 0,
    motions: 0,
    words: ["determinate"],
  },
  {
    name: "portal pinned at its knees, fixed bases",
    of: structure({
      joints: { A: ["0 m", "0 m"], B: ["0 m", "4 m"], C: ["6 m", "4 m"], D: ["6 m", "0 m"] },
      members: { AB: ["A", "B"], BC: { ends: ["B", "C"], ...pin("B", "C") }, CD: ["C", "D"] },
      supports: { A: "fixed", D: "fixed" },
    }),
    count: [6, 3, 4, 2],
    degree: 1,
    selfStress: 1,
    motions: 0,
    words: ["1st degree"],
  },
  {
    name: "three parallel rollers",
    of: beam({ spans: ["4 m", "4 m"], supports: ["roller", "roller", "roller"] }),
    count: [3, 2, 3, 0],
    degree: 0,
    selfStress: 1,
    motions: 1,
    words: [
      "the count says determinate",
      "rank of the equilibrium equations is 8 of 9",
      "the whole structure slides sideways",
    ],
  },
  {
    name: "reactions through one point",
    of: structure({
      joints: { A: ["0 m", "0 m"], B: ["4 m", "0 m"], C: ["2 m", "2 m"] },
      members: { AC: ["A", "C"], CB: ["C", "B"] },
      supports: { A: { x: true, y: true }, B: { x: true } },
    }),
    count: [3, 2, 3, 0],
    degree: 0,
    selfStress: 1,
    motions: 1,
    words: ["the whole structure turns about A"],
  },
  {
    name: "reactions through a point that is no joint",
    of: structure({
      joints: { A: ["0 m", "0 m"], B: ["4 m", "0 m"], C: ["0 m", "3 m"] },
      members: { AB: ["A", "B"], AC: ["A", "C"] },
      supports: { A: { y: true }, B: { y: true }, C: { y: true } },
    }),
    count: [3, 2, 3, 0],
    degree: 0,
    selfStress: 1,
    motions: 1,
    words: ["the whole structure slides sideways"],
  },
  {
    name: "hinge on the line between two pins",
    of: withHinges(beam({ spans: ["6 m"], supports: ["pinned", "pinned"] }), [hinge("AB", "A", "2.5 m")]),
    count: [4, 1, 2, 1],
    degree: 0,
    selfStress: 1,
    motions: 1,
    words: [
      "the count says determinate",
      "h1 drops, the beam folds there",
      "1 restraint elsewhere is redundant",
    ],
  },
  {
    name: "three-hinged frame with its hinge on the line of the pins",
    of: withHinges(
      structure({
        joints: {
          A: ["0 m", "0 m"],
          B: ["3 m", "4 m"],
          C: ["6 m", "0 m"],
          D: ["9 m", "4 m"],
          E: ["12 m", "0 m"],
        },
        members: { AB: ["A", "B"], BC: ["B", "C"], CD: { ends: ["C", "D"], ...pin("C") }, DE: ["D", "E"] },
        supports: { A: "pinned", E: "pinned" },
      }),
      [],
    ),
    count: [4, 4, 5, 1],
    degree: 0,
    selfStress: 1,
    motions: 1,
    words: ["B, C and D drop"],
  },
  {
    name: "square of pinned bars",
    of: truss(["AB", "BC", "CD", "DA"], square, twoPins),
    count: [3, 4, 4, 4],
    degree: -1,
    selfStress: 0,
    motions: 1,
    words: ["sway"],
  },
  {
    name: "square with one diagonal",
    of: truss(["AB", "BC", "CD", "DA", "AC"], square, twoPins),
    count: [3, 5, 4, 6],
    degree: 0,
    selfStress: 0,
    motions: 0,
    words: ["determinate"],
  },
  {
    name: "square with two diagonals",
    of: truss(["AB", "BC", "CD", "DA", "AC", "BD"], square, twoPins),
    count: [3, 6, 4, 8],
    degree: 1,
    selfStress: 1,
    motions: 0,
    words: ["1st degree"],
  },
  {
    name: "two squares, one braced twice and one not at all",
    of: truss(
      ["AB", "BC", "CD", "DA", "AC", "BD", "BE", "EF", "FC"],
      { ...square, E: ["8 m", "0 m"], F: ["8 m", "4 m"] },
      twoPins,
    ),
    count: [3, 9, 6, 12],
    degree: 0,
    selfStress: 1,
    motions: 1,
    words: ["the count says determinate", "rules: a mechanism"],
  },
];

describe("determinacy", () => {
  it.each(rows)(
    "determinacy($name): degree $degree, $motions motions, $selfStress states of self-stress",
    (row) => {
      const found = determinacy(row.of);
      const { reactions, members, joints, conditions, degree } = found.count;
      expect([reactions, members, joints, conditions]).toEqual(row.count);
      expect(degree).toBe(row.degree);
      expect(found.selfStress).toBe(row.selfStress);
      expect(found.mechanisms).toHaveLength(row.motions);
      for (const words of row.words) expect(found.words).toContain(words);
      expect(found.rank).toBe(found.unknowns - found.selfStress);
      expect(found.unknowns - found.equations).toBe(degree);
    },
  );

  it("the verdict does not depend on the size of the structure", () => {
    for (const factor of [1e-3, 1, 1e3]) {
      const sized = portal({ span: `${14 * factor} m`, height: `${5.5 * factor} m`, bases: "fixed" });
      expect(determinacy(sized).selfStress).toBe(3);
    }
  });

  it("a hinge very near a joint does not spoil the rank", () => {
    const near = withHinges(pinned, [hinge("BC", "B", "0.00001 L")]);
    expect(determinacy(near).verdict).toBe("determinate");
  });

  it("a motion leaves every member's length as it was and its supports still", () => {
    const swaying = rows.find((r) => r.name === "pinned portal with two beam hinges")?.of ?? pinned;
    const [motion] = determinacy(swaying).mechanisms;
    const at = (name: string): { ux: number; uy: number } =>
      motion?.points.find((p) => p.name === name) ?? { ux: Number.NaN, uy: Number.NaN };
    expect([at("A"), at("D")].map(({ ux, uy }) => [ux, uy])).toEqual([
      [0, 0],
      [0, 0],
    ]);
    expect(at("B").ux).toBeCloseTo(at("C").ux, 12);
    expect(Math.max(...(motion?.points ?? []).flatMap((p) => [Math.abs(p.ux), Math.abs(p.uy)]))).toBeCloseTo(
      1,
      12,
    );
    // column AB turns clockwise by ux/h, and the beam as far as h1 with it
    const [column, arm] = motion?.turns ?? [];
    expect(column?.rotation).toBeCloseTo(-1 / 5.5, 12);
    expect(arm?.rotation).toBeCloseTo(-1 / 5.5, 12);
    expect(at("h1").uy).toBeCloseTo(-1.75 / 5.5, 12);
  });

  it("the answer is frozen", () => {
    expect(Object.isFrozen(determinacy(pinned).count)).toBe(true);
  });
});
