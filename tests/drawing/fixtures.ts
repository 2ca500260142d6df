// An invented store roof frame and beam, by hand: pinned portal of 14 m span and 5.5 m height under 12.8 kN/m with
// beam hinges 1.75 m from each knee, and a two-span beam with a hinge.
//
// Portal statics: hinge shear 12.8*10.5/2 = 67.2 kN; base 12.8*14/2 = 89.6 kN;
// knee moment 67.2*1.75 + 12.8*1.75^2/2 = 137.2 kN·m; thrust 137.2/5.5 = 24.945 kN.

import type {
  DiagramMark,
  DiagramsFigure,
  FreeBodyFigure,
  LineChartFigure,
  MechanismFigure,
  StructureFigure,
} from "../../lib/drawing/index.ts";
import type { FreeBody, MemberForces, Piecewise } from "../../lib/results/types.ts";
import type { Load, Member, Structure, Support } from "../../lib/structure/types.ts";

const member = (name: string, start: string, end: string): Member => ({
  name,
  start,
  end,
  releases: { start: { moment: false }, end: { moment: false } },
  from: [],
});

const support = (joint: string, kind: Support["kind"]): Support => ({
  joint,
  kind,
  holds: { x: kind === "pinned" || kind === "fixed", y: kind !== "free", rotation: kind === "fixed" },
  from: [],
});

export const portal: Structure = {
  family: "portal",
  joints: [
    { name: "A", x: 0, y: 0, from: [] },
    { name: "B", x: 0, y: 5.5, from: ["h@1"] },
    { name: "C", x: 14, y: 5.5, from: ["L@1", "h@1"] },
    { name: "D", x: 14, y: 0, from: ["L@1"] },
  ],
  members: [member("AB", "A", "B"), member("BC", "B", "C"), member("CD", "C", "D")],
  supports: [support("A", "pinned"), support("D", "pinned")],
  hinges: [
    { name: "h1", member: "BC", at: 1.75, from: [] },
    { name: "h2", member: "BC", at: 12.25, from: [] },
  ],
};

export const udl = (name: string, q: number, label: string, from = 0, to = 1): Load => ({
  kind: "distributed",
  member: name,
  begin: { fraction: from },
  end: { fraction: to },
  q1: q,
  q2: q,
  direction: [0, -1],
  label,
  from: [],
});

export const eaveForce: Load = {
  kind: "joint",
  joint: "B",
  fx: 18000,
  fy: 0,
  couple: 0,
  label: "H = 18.0 kN",
  from: [],
};

const linear = (length: number, ...coefficients: number[]): Piecewise => ({
  breaks: [0, length],
  pieces: [coefficients],
});

const T = 137200 / 5.5;
export const portalForces: readonly MemberForces[] = [
  { member: "AB", length: 5.5, N: linear(5.5, -89600), V: linear(5.5, -T), M: linear(5.5, 0, -T), uses: [] },
  {
    member: "BC",
    length: 14,
    N: linear(14, -T),
    V: linear(14, 89600, -12800),
    M: linear(14, -137200, 89600, -6400),
    uses: [],
  },
  {
    member: "CD",
    length: 5.5,
    N: linear(5.5, -89600),
    V: linear(5.5, T),
    M: linear(5.5, -137200, T),
    uses: [],
  },
];

const mark = (
  quantity: DiagramMark["quantity"],
  name: string,
  at: number,
  value: number,
  kind: DiagramMark["kind"],
  text: string,
): DiagramMark => ({ quantity, member: name, at, value, kind, text });

const portalMarks: readonly DiagramMark[] = [
  mark("N", "AB", 2.75, -89600, "end", "−89.6 kN"),
  mark("N", "BC", 7, -T, "end", "−24.9 kN"),
  mark("N", "CD", 2.75, -89600, "end", "−89.6 kN"),
  mark("V", "AB", 2.75, -T, "end", "−24.9 kN"),
  mark("V", "BC", 0, 89600, "end", "89.6 kN"),
  mark("V", "BC", 14, -89600, "end", "−89.6 kN"),
  mark("V", "BC", 7, 0, "zero", "7.00 m"),
  mark("V", "CD", 2.75, T, "end", "24.9 kN"),
  mark("M", "AB", 5.5, -137200, "end", "−137 kN·m"),
  mark("M", "BC", 0, -137200, "end", "−137 kN·m"),
  mark("M", "BC", 7, 176400, "extreme", "176 kN·m"),
  mark("M", "BC", 1.75, 0, "zero", "1.75 m"),
  mark("M", "BC", 12.25, 0, "zero", "1.75 m"),
  mark("M", "BC", 14, -137200, "end", "−137 kN·m"),
  mark("M", "CD", 0, -137200, "end", "−137 kN·m"),
];

export const portalFigure: StructureFigure = {
  kind: "structure",
  title: "Pinned portal with its loads",
  description:
    "Portal A B C D, 14 m by 5.5 m, pinned at A and D, two hinges in the beam, roof load and eave force.",
  structure: portal,
  loads: [udl("BC", 5200, "g"), udl("BC", 7600, "s"), eaveForce],
  loadTexts: ["g = 5.20 kN/m", "s = 7.60 kN/m", "H = 18.0 kN"],
  dimensions: [
    { along: "x", from: [0, 0], to: [14, 0], text: "14.0 m" },
    { along: "x", from: [0, 5.5], to: [1.75, 5.5], text: "1.75 m" },
    { along: "x", from: [12.25, 5.5], to: [14, 5.5], text: "1.75 m" },
    { along: "y", from: [0, 0], to: [0, 5.5], text: "5.50 m" },
  ],
};

export const sway: MechanismFigure = {
  kind: "mechanism",
  title: "Sway mechanism",
  description: "B, C and both hinges move sideways together; the columns turn about A and D.",
  structure: portal,
  mechanism: {
    points: [
      { name: "A", ux: 0, uy: 0 },
      { name: "B", ux: 1, uy: 0 },
      { name: "C", ux: 1, uy: 0 },
      { name: "D", ux: 0, uy: 0 },
      { name: "h1", ux: 1, uy: -0.318 },
      { name: "h2", ux: 1, uy: 0.318 },
    ],
    turns: [],
    words: "sway: B and C move sideways together, columns AB and CD turn about A and D",
  },
};

export const kneeBody: FreeBody = {
  name: "column AB with beam to h1",
  pieces: [
    { member: "AB", begin: 0, end: 5.5 },
    { member: "BC", begin: 0, end: 1.75 },
  ],
  joints: ["A", "B"],
  actions: [
    { at: { name: "A", x: 0, y: 0 }, direction: [1, 0], turn: 0, source: { force: "A_x" } },
    { at: { name: "A", x: 0, y: 0 }, direction: [0, 1], turn: 0, source: { force: "A_y" }, value: 89600 },
    { at: { name: "h1", x: 1.75, y: 5.5 }, direction: [1, 0], turn: 0, source: { force: "h1_x" } },
    {
      at: { name: "h1", x: 1.75, y: 5.5 },
      direction: [0, 1],
      turn: 0,
      source: { force: "h1_y" },
      value: -67200,
    },
    { at: { name: "", x: 0.875, y: 5.5 }, direction: [0, -1], turn: 0, source: { load: 0 }, value: 22400 },
  ],
};

export const kneeFigure: FreeBodyFigure = {
  kind: "free body",
  title: "Free body: column AB with beam to h1",
  description: "Column and beam stub with base reactions, hinge forces and its part of the roof load.",
  structure: portal,
  loads: [udl("BC", 12800, "w")],
  body: kneeBody,
  texts: ["A_x", "89.6 kN", "X_{h1}", "67.2 kN", "w = 12.8 kN/m"],
  resultants: ["", "", "", "", "22.4 kN"],
  sought: ["A_x"],
  about: { name: "h1", x: 1.75, y: 5.5 },
  dimensions: [
    { along: "x", from: [0, 0], to: [1.75, 5.5], text: "1.75 m" },
    { along: "x", from: [0.875, 5.5], to: [1.75, 5.5], text: "0.875 m" },
    { along: "y", from: [0, 0], to: [1.75, 5.5], text: "5.50 m" },
  ],
};

/** The knee joint itself, with three couples and forces of two cuts. */
export const jointFigure: FreeBodyFigure = {
  kind: "free body",
  title: "Free body: joint B",
  description: "Joint B with the end forces of column and beam.",
  structure: portal,
  loads: [eaveForce],
  body: {
    name: "joint B",
    pieces: [],
    joints: ["B"],
    actions: [
      {
        at: { name: "B", x: 0, y: 5.5 },
        direction: [0, 1],
        turn: 0,
        source: { force: "AB_B_N" },
        value: 89600,
      },
      {
        at: { name: "B", x: 0, y: 5.5 },
        direction: [1, 0],
        turn: 0,
        source: { force: "AB_B_V" },
        value: 24945,
      },
      {
        at: { name: "B", x: 0, y: 5.5 },
        direction: [0, 0],
        turn: 1,
        source: { force: "AB_B_M" },
        value: 137200,
      },
      { at: { name: "B", x: 0, y: 5.5 }, direction: [1, 0], turn: 0, source: { force: "BC_B_N" } },
      { at: { name: "B", x: 0, y: 5.5 }, direction: [0, -1], turn: 0, source: { force: "BC_B_V" } },
      { at: { name: "B", x: 0, y: 5.5 }, direction: [0, 0], turn: -1, source: { force: "BC_B_M" } },
      { at: { name: "B", x: 0, y: 5.5 }, direction: [1, 0], turn: 0, source: { load: 0 }, value: 18000 },
    ],
  },
  texts: ["89.6 kN", "24.9 kN", "137 kN·m", "N_{BC,B}", "V_{BC,B}", "M_{BC,B}", "H = 18.0 kN"],
  sought: ["BC_B_M"],
};

export const portalDiagrams: DiagramsFigure = {
  kind: "diagrams",
  title: "N, V and M of the portal",
  description: "Axial force, shear and bending moment; knee moment 137 kN·m, midspan moment 176 kN·m.",
  structure: portal,
  forces: portalForces,
  quantities: ["N", "V", "M"],
  moments: "tension side",
  marks: portalMarks,
};

export const beam: Structure = {
  family: "beam",
  joints: [
    { name: "A", x: 0, y: 0, from: [] },
    { name: "B", x: 6.5, y: 0, from: [] },
    { name: "C", x: 11.5, y: 0, from: [] },
  ],
  members: [member("AB", "A", "B"), member("BC", "B", "C")],
  supports: [support("A", "fixed"), support("B", "roller"), support("C", "roller")],
  hinges: [{ name: "h1", member: "AB", at: 4.8, from: [] }],
};

export const beamFigure: StructureFigure = {
  kind: "structure",
  title: "Two-span beam",
  description: "Beam fixed at A, on rollers at B and C, with a hinge in AB and every kind of load.",
  structure: beam,
  loads: [
    udl("AB", 9000, "w"),
    udl("BC", 4000, "p", 0.4, 1),
    {
      kind: "member point",
      member: "BC",
      at: { metres: 1.5 },
      fx: 0,
      fy: -30000,
      couple: 0,
      label: "P",
      from: [],
    },
    { kind: "joint", joint: "C", fx: 0, fy: 0, couple: -8000, label: "M_0 = 8.00 kN·m", from: [] },
    {
      kind: "distributed",
      member: "AB",
      begin: { metres: 1 },
      end: { metres: 5 },
      q1: 0,
      q2: 6000,
      direction: [0, -1],
      label: "t = 0 to 6.00 kN/m",
      from: [],
    },
  ],
  loadTexts: ["w = 9.00 kN/m", "p = 4.00 kN/m", "P = 30.0 kN", "M_0 = 8.00 kN·m", "t = 0 to 6.00 kN/m"],
  dimensions: [
    { along: "x", from: [0, 0], to: [4.8, 0], text: "4.80 m" },
    { along: "x", from: [0, 0], to: [6.5, 0], text: "6.50 m" },
    { along: "x", from: [6.5, 0], to: [11.5, 0], text: "5.00 m" },
    { along: "x", from: [6.5, 0], to: [8, 0], text: "1.50 m" },
  ],
};

/** Two storeys, two bays, everything loaded: many labels in little room. */
export const crowdedFigure: StructureFigure = crowded();

function crowded(): StructureFigure {
  const names = ["A", "B", "C", "D", "E", "F", "G", "H", "I"];
  const joints = names.map((name, i) => ({ name, x: (i % 3) * 6, y: Math.floor(i / 3) * 3.6, from: [] }));
  const columns = names.slice(0, 6).map((a, i) => member(a + (names[i + 3] ?? ""), a, names[i + 3] ?? ""));
  const beams = [
    ["D", "E"],
    ["E", "F"],
    ["G", "H"],
    ["H", "I"],
  ].map(([a = "", b = ""]) => member(a + b, a, b));
  const force = (joint: string, fx: number, label: string): Load =>
    ({ ...eaveForce, joint, fx, label }) as Load;
  const hinges = beams.flatMap((b, i) => [
    { name: `h${2 * i + 1}`, member: b.name, at: 0.6, from: [] },
    { name: `h${2 * i + 2}`, member: b.name, at: 5.4, from: [] },
  ]);
  return {
    kind: "structure",
    title: "Two-storey frame",
    description: "Two bays and two storeys with floor loads and wind.",
    structure: {
      family: "general",
      joints,
      members: [...columns, ...beams],
      supports: ["A", "B", "C"].map((j) => support(j, "fixed")),
      hinges,
    },
    loads: [
      ...beams.map((b, i) => udl(b.name, 15000 + 2500 * i, `${(15 + 2.5 * i).toFixed(1)} kN/m`)),
      force("D", 12000, "12.0 kN"),
      force("G", 7000, "7.00 kN"),
    ],
    dimensions: [
      { along: "x", from: [0, 0], to: [6, 0], text: "6.00 m" },
      { along: "x", from: [6, 0], to: [12, 0], text: "6.00 m" },
      { along: "y", from: [0, 0], to: [0, 3.6], text: "3.60 m" },
      { along: "y", from: [0, 3.6], to: [0, 7.2], text: "3.60 m" },
      { along: "y", from: [0, 0], to: [0, 7.2], text: "7.20 m" },
    ],
  };
}

export const bandChart: LineChartFigure = {
  kind: "line chart",
  title: "Knee moment against beam stiffness",
  description: "The knee moment falls as the beam gets stiffer; the hand value lies between.",
  x: "I of beam / I of columns",
  y: "knee moment (kN·m)",
  series: [
    { name: "exact", points: [1, 1.5, 2, 3, 4].map((r) => [r, 209.1 / (1 + 0.26 * r)] as const) },
    { name: "by hand", points: [1, 4].map((r) => [r, 137.2] as const) },
  ],
};
