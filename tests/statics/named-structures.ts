// Named structures with what determinacy must say of them: the hand count, states of self-stress, mechanisms, and words.

import {
  beam,
  buildingFrame,
  type HingeAt,
  panelGirder,
  truss as panelTruss,
  portal,
  type Structure,
  structure,
  type TrussOptions,
  withHinges,
} from "../../lib/structure/index.ts";

export const hinge = (member: string, from: string, at: HingeAt["at"]): HingeAt => ({ member, from, at });
export const pinned: Structure = portal({ span: "14 m", height: "5.5 m", bases: "pinned" });
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

export interface Row {
  readonly name: string;
  readonly of: Structure;
  /** r, m, j, c */
  readonly count: readonly [number, number, number, number];
  readonly degree: number;
  readonly selfStress: number;
  readonly motions: number;
  readonly words: readonly string[];
}

type Short = readonly [
  name: string,
  of: Structure,
  count: Row["count"],
  selfStress: number,
  motions: number,
  ...words: string[],
];
const row = (...short: Short): Short => short;
/** The degree is 3m + r - 3j - c, worked out here from the hand count. */
const table = (...rows: readonly Short[]): readonly Row[] =>
  rows.map(([name, of, count, selfStress, motions, ...words]) => {
    const [r, m, j, c] = count;
    return { name, of, count, degree: 3 * m + r - 3 * j - c, selfStress, motions, words };
  });

const fixedBeam = beam({ spans: ["6 m"], supports: ["fixed", "fixed"] });
const threeSpans = beam({ spans: ["6 m", "6 m", "6 m"] });

/** Rollers whose reactions lean inwards at A and B and stand upright at C, `at` from A; the leaning ones meet at (2, 2). */
const slopes = (at: "1 m" | "2 m"): Structure =>
  structure({
    joints: { A: ["0 m", "0 m"], C: [at, "0 m"], B: ["4 m", "0 m"] },
    members: { AC: ["A", "C"], CB: ["C", "B"] },
    supports: { A: { y: true, angle: "-45 deg" }, C: { y: true }, B: { y: true, angle: "45 deg" } },
  });

const shearless = (left: "fixed" | "pinned"): Structure =>
  structure({
    joints: { A: ["0 m", "0 m"], B: ["3 m", "0 m"], C: ["8 m", "0 m"] },
    members: { AB: { ends: ["A", "B"], shearReleased: ["B"] }, BC: ["B", "C"] },
    supports: { A: left, C: "roller" },
  });

const frame = (
  supports: Parameters<typeof structure>[0]["supports"],
  beamEnds: { readonly released?: readonly string[] } = {},
  braced = false,
): Structure =>
  structure({
    joints: { A: ["0 m", "0 m"], B: ["0 m", "4 m"], C: ["6 m", "4 m"], D: ["6 m", "0 m"] },
    members: {
      AB: ["A", "B"],
      BC: { ends: ["B", "C"], ...beamEnds },
      CD: ["C", "D"],
      ...(braced ? { AC: { ends: ["A", "C"], ...pin("A", "C") } } : {}),
    },
    supports,
  });

const arch = (right: "pinned" | "roller", crown: boolean, tied = false): Structure =>
  structure({
    joints: {
      A: ["0 m", "0 m"],
      B: ["3 m", "3 m"],
      C: ["6 m", "4 m"],
      D: ["9 m", "3 m"],
      E: ["12 m", "0 m"],
    },
    members: {
      AB: ["A", "B"],
      BC: ["B", "C"],
      CD: crown ? { ends: ["C", "D"], ...pin("C") } : ["C", "D"],
      DE: ["D", "E"],
      ...(tied ? { AE: { ends: ["A", "E"], ...pin("A", "E") } } : {}),
    },
    supports: { A: "pinned", E: right },
  });

const ring = structure({
  joints: square,
  members: { AB: ["A", "B"], BC: ["B", "C"], CD: ["C", "D"], DA: ["D", "A"] },
  supports: twoPins,
});

const storeys = (bays: number): Structure =>
  buildingFrame({
    bays: Array.from({ length: bays }, () => "6 m" as const),
    storeys: ["4 m", "3.5 m"],
    bases: "fixed",
  });
const hinged = (of: Structure): Structure =>
  withHinges(
    of,
    of.members.map((m) => hinge(m.name, m.start, "0.5 L")),
  );

const fourPanels = (more: Partial<TrussOptions>): Structure =>
  panelTruss({ panels: ["3 m", "3 m", "3 m", "3 m"], depth: "2.5 m", diagonals: "falling", ...more });
const withoutBar = (of: Structure, name: string): Structure => ({
  ...of,
  members: of.members.filter((m) => m.name !== name),
});
const crossed = fourPanels({ diagonals: "crossed" });
const wrongPanel = ["L0U1", "L1U2", "U1L2", "L2U3"].reduce(withoutBar, crossed);

/** Triangle ABC held by the ground, DEF by three bars of which the upper one ends at `x`: 5 m makes all three parallel. */
const linked = (x: "5 m" | "6 m"): Structure =>
  truss(
    ["AB", "BC", "CA", "DE", "EF", "FD", "AD", "BE", "CF"],
    {
      A: ["0 m", "0 m"],
      B: ["0 m", "4 m"],
      C: ["1 m", "2 m"],
      D: ["5 m", "0 m"],
      E: [x, x === "5 m" ? "4 m" : "5 m"],
      F: ["6 m", "2 m"],
    },
    { A: "pinned", B: { x: true } },
  );

/** Every count in the table was made by hand. */
export const namedStructures: readonly Row[] = [
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

  ...table(
    row(
      "cantilever with a hinge",
      withHinges(beam({ spans: ["6 m"], supports: ["fixed", "free"] }), [hinge("AB", "A", "2 m")]),
      [3, 1, 2, 1],
      0,
      1,
      "B drops, the beam folds at h1",
    ),
    row(
      "propped cantilever with a hinge",
      withHinges(beam({ spans: ["6 m"], supports: ["fixed", "roller"] }), [hinge("AB", "A", "2 m")]),
      [4, 1, 2, 1],
      0,
      0,
      "determinate and stable",
    ),
    row(
      "beam fixed at both ends, two hinges",
      withHinges(fixedBeam, [hinge("AB", "A", "1 m"), hinge("AB", "B", "1 m")]),
      [6, 1, 2, 2],
      1,
      0,
      "only axial force along a straight line is redundant",
    ),
    row(
      "beam fixed at both ends, three hinges",
      withHinges(fixedBeam, [hinge("AB", "A", "1 m"), hinge("AB", "A", "3 m"), hinge("AB", "B", "1 m")]),
      [6, 1, 2, 3],
      1,
      1,
      "the count says determinate",
      "h2",
    ),
    row(
      "two spans fixed at both ends",
      beam({ spans: ["5 m", "6 m"], supports: ["fixed", "roller", "fixed"] }),
      [7, 2, 3, 0],
      4,
      0,
      "4th degree",
      "1 degree of it is axial force",
    ),
    row(
      "three spans, hinges in the middle one",
      withHinges(threeSpans, [hinge("BC", "B", "1 m"), hinge("BC", "C", "1 m")]),
      [5, 3, 4, 2],
      0,
      0,
      "determinate and stable",
    ),
    row(
      "three spans, a hinge in each end span",
      withHinges(threeSpans, [hinge("AB", "B", "1 m"), hinge("CD", "C", "1 m")]),
      [5, 3, 4, 2],
      0,
      0,
      "determinate and stable",
    ),
    row(
      "beam guided at one end, roller at the other",
      beam({ spans: ["6 m"], supports: ["guided", "roller"] }),
      [3, 1, 2, 0],
      0,
      0,
      "determinate",
    ),
    row(
      "beam guided at both ends",
      beam({ spans: ["6 m"], supports: ["guided", "guided"] }),
      [4, 1, 2, 0],
      2,
      1,
      "and rules: a mechanism",
      "moves up or down",
    ),
    row(
      "three rollers on slopes through one point",
      slopes("2 m"),
      [3, 2, 3, 0],
      1,
      1,
      "the whole structure turns about the point x = 2 m, y = 2 m",
    ),
    row("three rollers on slopes, not through one point", slopes("1 m"), [3, 2, 3, 0], 0, 0, "determinate"),
    row(
      "cantilever and roller, no shear between them",
      shearless("fixed"),
      [4, 2, 3, 1],
      0,
      0,
      "determinate",
    ),
    row(
      "simple beam, no shear at a joint",
      shearless("pinned"),
      [3, 2, 3, 1],
      0,
      1,
      "nothing resists 1 motion",
    ),
    row(
      "portal, one base fixed and one pinned",
      portal({ span: "8 m", height: "4 m", bases: { left: "fixed", right: "pinned" } }),
      [5, 3, 4, 0],
      2,
      0,
      "2nd degree",
    ),
    row(
      "portal on a pin and a roller",
      frame({ A: "pinned", D: "roller" }),
      [3, 3, 4, 0],
      0,
      0,
      "determinate",
    ),
    row(
      "portal on two rollers",
      frame({ A: "roller", D: "roller" }),
      [2, 3, 4, 0],
      0,
      1,
      "the whole structure slides sideways",
    ),
    row(
      "pinned portal with its beam pinned to the columns",
      frame({ A: "pinned", D: "pinned" }, pin("B", "C")),
      [4, 3, 4, 2],
      0,
      1,
      "sway",
    ),
    row(
      "the same braced by a bar across",
      frame({ A: "pinned", D: "pinned" }, pin("B", "C"), true),
      [4, 4, 4, 4],
      0,
      0,
      "determinate",
    ),
    row("three-hinged arch of straight pieces", arch("pinned", true), [4, 4, 5, 1], 0, 0, "determinate"),
    row("two-hinged arch of straight pieces", arch("pinned", false), [4, 4, 5, 0], 1, 0, "1st degree"),
    row("arch of straight pieces on a roller", arch("roller", false), [3, 4, 5, 0], 0, 0, "determinate"),
    row("tied arch", arch("roller", false, true), [3, 5, 5, 2], 1, 0, "1st degree"),
    row("tied arch with a hinge at its crown", arch("roller", true, true), [3, 5, 5, 3], 0, 0, "determinate"),
    row("square ring frame", ring, [3, 4, 4, 0], 3, 0, "3rd degree"),
    row(
      "square ring frame with three hinges",
      withHinges(ring, [hinge("AB", "A", "0.5 L"), hinge("BC", "B", "0.5 L"), hinge("CD", "C", "0.5 L")]),
      [3, 4, 4, 3],
      0,
      0,
      "determinate",
    ),
    row(
      "square ring frame with three hinges in one side",
      withHinges(ring, [hinge("CD", "C", "0.2 L"), hinge("CD", "C", "0.5 L"), hinge("CD", "C", "0.8 L")]),
      [3, 4, 4, 3],
      1,
      1,
      "the count says determinate",
      "h2",
    ),
    row(
      "girder of three panels without diagonals",
      panelGirder({ panels: ["3 m", "3 m", "3 m"], depth: "2 m" }),
      [3, 10, 8, 0],
      9,
      0,
      "9th degree",
    ),
    row(
      "girder of two panels with six hinges",
      withHinges(
        panelGirder({ panels: ["3 m", "3 m"], depth: "2 m" }),
        ["L0L1", "L1L2", "U0U1", "U1U2", "L0U0", "L2U2"].map((m) => hinge(m, m.slice(0, 2), "0.5 L")),
      ),
      [3, 7, 6, 6],
      0,
      0,
      "determinate",
    ),
    row("two storeys, one bay", storeys(1), [6, 6, 6, 0], 6, 0, "6th degree"),
    row(
      "two storeys, one bay, hinged at mid-height and midspan",
      hinged(storeys(1)),
      [6, 6, 6, 6],
      0,
      0,
      "determinate",
    ),
    row("two storeys, two bays, hinged likewise", hinged(storeys(2)), [9, 10, 9, 10], 2, 0, "2nd degree"),
    row(
      "two storeys, one bay, one hinge too many",
      withHinges(hinged(storeys(1)), [hinge("A1B1", "A1", "0.25 L")]),
      [6, 6, 6, 7],
      0,
      1,
      "a mechanism",
    ),
    row(
      "triangle of bars",
      truss(["AB", "BC", "CA"], { A: square.A, B: square.B, C: square.C }, twoPins),
      [3, 3, 3, 3],
      0,
      0,
      "determinate",
    ),
    row("truss of four panels", fourPanels({}), [3, 17, 10, 24], 0, 0, "determinate"),
    row(
      "truss of four panels on two pins",
      fourPanels({ supports: { L0: "pinned", L4: "pinned" } }),
      [4, 17, 10, 24],
      1,
      0,
      "1st degree",
    ),
    row(
      "truss of four panels with crossed diagonals",
      fourPanels({ diagonals: "crossed" }),
      [3, 21, 10, 32],
      4,
      0,
      "4th degree",
    ),
    row(
      "truss with a panel without its diagonal",
      withoutBar(fourPanels({}), "U1L2"),
      [3, 16, 10, 22],
      0,
      1,
      "nothing resists 1 motion",
    ),
    row(
      "truss with a panel without its diagonal and another with two",
      wrongPanel,
      [3, 17, 10, 24],
      1,
      1,
      "the count says determinate",
    ),
    row(
      "two triangles of bars joined by three parallel bars",
      linked("5 m"),
      [3, 9, 6, 12],
      1,
      1,
      "the count says determinate",
      "D, E and F",
    ),
    row(
      "two triangles of bars joined by three bars, one of them raking",
      linked("6 m"),
      [3, 9, 6, 12],
      0,
      0,
      "determinate",
    ),
  ),
];
