// The structures whose free bodies are kept as golden files and read by eye.

import {
  atJoint,
  beam,
  buildingFrame,
  type Load,
  pointLoad,
  portal,
  type Structure,
  structure,
  truss,
  uniform,
  withHinges,
} from "../../lib/structure/index.ts";

export interface GoldenFrame {
  readonly file: string;
  readonly title: string;
  readonly of: Structure;
  readonly loads: readonly Load[];
}

const twoStoreys = buildingFrame({ bays: ["6 m"], storeys: ["4 m", "3.2 m"], bases: "fixed" });
const warren = truss({
  panels: ["3 m", "3 m", "3 m", "3 m"],
  depth: "2.5 m",
  diagonals: "falling to midspan",
});

export const goldenFrames: readonly GoldenFrame[] = [
  {
    file: "a-two-spans.txt",
    title: "(a) two spans 8 m and 6 m, a hinge 1.6 m left of B, 10 kN/m on both",
    of: withHinges(beam({ spans: ["8 m", "6 m"] }), [{ member: "AB", from: "B", at: "1.6 m" }]),
    loads: [uniform("AB", "10 kN/m"), uniform("BC", "10 kN/m")],
  },
  {
    file: "b-pinned-portal.txt",
    title: "(b) pinned portal 12 m x 5 m, hinges 0.12 L from both knees, 14 kN/m on the beam",
    of: withHinges(portal({ span: "12 m", height: "5 m", bases: "pinned" }), [
      { member: "BC", from: "B", at: "0.12 L" },
      { member: "BC", from: "C", at: "0.12 L" },
    ]),
    loads: [uniform("BC", "14 kN/m")],
  },
  {
    file: "c-three-hinged-pitched-portal.txt",
    title:
      "(c) three-hinged pitched portal 16 m x 5 m with 2 m rise, hinge at the ridge, 6 kN/m of plan on both rafters, 12 kN at the left knee",
    of: structure({
      joints: {
        A: ["0 m", "0 m"],
        B: ["0 m", "5 m"],
        C: ["8 m", "7 m"],
        D: ["16 m", "5 m"],
        E: ["16 m", "0 m"],
      },
      members: { AB: ["A", "B"], BC: { ends: ["B", "C"], released: ["C"] }, CD: ["C", "D"], DE: ["D", "E"] },
      supports: { A: "pinned", E: "pinned" },
    }),
    loads: [
      uniform("BC", "6 kN/m", { per: "horizontal" }),
      uniform("CD", "6 kN/m", { per: "horizontal" }),
      atJoint("B", { right: "12 kN" }),
    ],
  },
  {
    file: "d-four-spans.txt",
    title:
      "(d) four spans 6, 8, 8, 6 m with hinges 1.6 m inside BC from B and C and 1.6 m left of D, 9 kN/m on all",
    of: withHinges(beam({ spans: ["6 m", "8 m", "8 m", "6 m"] }), [
      { member: "BC", from: "B", at: "1.6 m" },
      { member: "BC", from: "C", at: "1.6 m" },
      { member: "CD", from: "D", at: "1.6 m" },
    ]),
    loads: ["AB", "BC", "CD", "DE"].map((m) => uniform(m, "9 kN/m")),
  },
  {
    file: "e-two-storeys.txt",
    title:
      "(e) two storeys 4 m and 3.2 m, one bay of 6 m, fixed bases, hinges at mid-height and midspan, 20 kN at level 1 and 12 kN at level 2",
    of: withHinges(
      twoStoreys,
      twoStoreys.members.map((m) => ({ member: m.name, from: m.start, at: "0.5 L" as const })),
    ),
    loads: [atJoint("A1", { right: "20 kN" }), atJoint("A2", { right: "12 kN" })],
  },
  {
    file: "f-truss.txt",
    title: "(f) truss of four panels of 3 m, 2.5 m deep, 40 kN at the three inner lower joints",
    of: warren,
    loads: ["L1", "L2", "L3"].map((j) => atJoint(j, { down: "40 kN" })),
  },
  {
    file: "g-propped-beam.txt",
    title: "(g) beam on a pin with a raking strut, 8 kN/m, 5 kN at its free end",
    of: structure({
      joints: { A: ["0 m", "0 m"], B: ["4 m", "0 m"], C: ["7 m", "0 m"], D: ["1 m", "-3 m"] },
      members: { AB: ["A", "B"], BC: ["B", "C"], DB: { ends: ["D", "B"], released: ["D", "B"] } },
      supports: { A: "pinned", D: "pinned" },
    }),
    loads: [uniform("AB", "8 kN/m"), uniform("BC", "8 kN/m"), pointLoad("BC", "5 kN", { at: "1 L" })],
  },
  {
    file: "h-roller-on-a-slope.txt",
    title:
      "(h) rafter 5 m long in plan rising 3 m, roller on a slope of 40 degrees at its top, 4 kN/m of its length",
    of: structure({
      joints: { A: ["0 m", "0 m"], B: ["5 m", "3 m"] },
      members: { AB: ["A", "B"] },
      supports: { A: "pinned", B: { y: true, angle: "40 deg" } },
    }),
    loads: [uniform("AB", "4 kN/m")],
  },
  {
    file: "i-three-bars.txt",
    title: "(i) beam on three raking bars, 6 kN/m and 9 kN sideways",
    of: structure({
      joints: {
        A: ["0 m", "4 m"],
        B: ["3 m", "4 m"],
        C: ["7 m", "4 m"],
        D: ["-1 m", "0 m"],
        E: ["5 m", "0 m"],
        F: ["5.5 m", "0 m"],
      },
      members: {
        AB: ["A", "B"],
        BC: ["B", "C"],
        AD: { ends: ["A", "D"], released: ["A", "D"] },
        BE: { ends: ["B", "E"], released: ["B", "E"] },
        CF: { ends: ["C", "F"], released: ["C", "F"] },
      },
      supports: { D: "pinned", E: "pinned", F: "pinned" },
    }),
    loads: [uniform("AB", "6 kN/m"), uniform("BC", "6 kN/m"), atJoint("A", { right: "9 kN" })],
  },
  {
    file: "j-two-levels.txt",
    title: "(j) three-hinged frame with its feet on two levels, 2 kN/m on AB and 10 kN on BC",
    of: structure({
      joints: { A: ["0 m", "0 m"], B: ["4 m", "3 m"], C: ["8 m", "-1 m"] },
      members: { AB: { ends: ["A", "B"], released: ["B"] }, BC: { ends: ["B", "C"], released: ["B"] } },
      supports: { A: "pinned", C: "pinned" },
    }),
    loads: [uniform("AB", "2 kN/m"), pointLoad("BC", "10 kN", { at: "0.3 L" })],
  },
];
