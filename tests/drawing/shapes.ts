// Shapes, deflections, states of self-stress and mechanisms of invented structures.

import type {
  Bend,
  DeflectionFigure,
  MechanismFigure,
  SelfStressFigure,
  ShapeFigure,
} from "../../lib/drawing/index.ts";
import { exact } from "../../lib/exact/index.ts";
import type { MemberForces, Piecewise } from "../../lib/results/index.ts";
import { beam, buildingFrame, portal, truss, uniform, withHinges } from "../../lib/structure/index.ts";

const section = { all: { E: 1, I: 1, A: "stiff" } } as const;

const sag = (begin: number, end: number): Bend => ({ begin, end, sense: "sagging" });
const hog = (begin: number, end: number): Bend => ({ begin, end, sense: "hogging" });
const fixedBeam = [hog(0, 0.21), sag(0.21, 0.79), hog(0.79, 1)];

const twoSpans = beam({ spans: ["7 m", "5.5 m"] });
const portalFrame = portal({ span: "12 m", height: "5 m", bases: "pinned" });
const building = buildingFrame({ bays: ["6 m", "7 m"], storeys: ["4 m", "3.5 m", "3.5 m"], bases: "fixed" });

export const beamShape: ShapeFigure = {
  kind: "shape",
  title: "Two-span beam, qualitative shape",
  description: "Both spans sag and the beam hogs over the support between them.",
  structure: twoSpans,
  members: [
    { member: "AB", bends: [sag(0, 0.75), hog(0.75, 1)] },
    { member: "BC", bends: [hog(0, 0.25), sag(0.25, 1)] },
  ],
  loads: [uniform("AB", "10 kN/m"), uniform("BC", "10 kN/m")],
};

export const swayShape: ShapeFigure = {
  kind: "shape",
  title: "Portal pushed sideways, qualitative shape",
  description: "Knees move right; the beam bends double with a point of inflection at midspan.",
  structure: portalFrame,
  members: [
    { member: "AB", bends: [sag(0, 1)] },
    { member: "BC", bends: [sag(0, 0.5), hog(0.5, 1)] },
    { member: "CD", bends: [hog(0, 1)] },
  ],
  moves: [
    { joint: "B", x: 1, y: 0 },
    { joint: "C", x: 1, y: 0 },
  ],
};

export const buildingShape: ShapeFigure = {
  kind: "shape",
  title: "Three-storey frame, qualitative shape",
  description:
    "Every beam bends as if nearly fixed; columns bend double at the edges and stay straight inside.",
  structure: building,
  members: building.members.map(({ name, group }) => {
    if (group === "beams") return { member: name, bends: fixedBeam };
    const last = name.startsWith("C");
    const [first, second] = last ? [hog, sag] : [sag, hog];
    return name.startsWith("B")
      ? { member: name, bends: [] }
      : {
          member: name,
          bends: [second(0, name.includes("0") ? 0.33 : 0.5), first(name.includes("0") ? 0.33 : 0.5, 1)],
        };
  }),
};

const swaying = withHinges(portal({ span: "12 m", height: "5 m", bases: "fixed", sections: section }), [
  { member: "BC", from: "B", at: "4 m" },
]);
const solution = exact(swaying, [uniform("BC", "10 kN/m"), uniform("AB", "6 kN/m", { direction: "right" })]);

export const deflected: DeflectionFigure = {
  kind: "deflection",
  title: "Fixed portal with a hinge, deflected",
  description: "The frame sways right and the beam sinks most at its hinge.",
  structure: swaying,
  members: solution.members,
  marks: [{ member: "BC", at: 4, text: "31 mm" }],
};

const flat = (length: number, value: number): Piecewise => ({ breaks: [0, length], pieces: [[value]] });

const crossed = truss({ panels: ["4 m", "4 m"], depth: "3 m", diagonals: "crossed" });
/** Self-stress of the first panel: diagonals 1, chords -0.8, posts -0.6, by the equilibrium of its four joints. */
const panelStress: Readonly<Record<string, number>> = {
  L0L1: -0.8,
  U0U1: -0.8,
  L0U0: -0.6,
  L1U1: -0.6,
  L0U1: 1,
  U0L1: 1,
};

export const trussStress: SelfStressFigure = {
  kind: "self-stress",
  title: "Crossed panel, state of self-stress",
  description:
    "Diagonals of the first panel in tension, its chords and posts in compression; the second panel without force.",
  structure: crossed,
  forces: crossed.members.map(({ name, start, end }): MemberForces => {
    const of = (joint: string) => crossed.joints.find((j) => j.name === joint) ?? { x: 0, y: 0 };
    const length = Math.hypot(of(end).x - of(start).x, of(end).y - of(start).y);
    return {
      member: name,
      length,
      N: flat(length, panelStress[name] ?? 0),
      V: flat(length, 0),
      M: flat(length, 0),
      uses: [],
    };
  }),
};

/** The pinned portal's own: thrust 1 at the bases, moment growing to the knees and constant along the beam. */
export const portalStress: SelfStressFigure = {
  kind: "self-stress",
  title: "Pinned portal, state of self-stress",
  description: "Bases pushed together: moment grows to the knees and is constant along the beam.",
  structure: portalFrame,
  forces: [
    {
      member: "AB",
      length: 5,
      N: flat(5, 0),
      V: flat(5, 1),
      M: { breaks: [0, 5], pieces: [[0, 1]] },
      uses: [],
    },
    { member: "BC", length: 12, N: flat(12, 1), V: flat(12, 0), M: flat(12, 5), uses: [] },
    {
      member: "CD",
      length: 5,
      N: flat(5, 0),
      V: flat(5, -1),
      M: { breaks: [0, 5], pieces: [[5, -1]] },
      uses: [],
    },
  ],
};

const chain = withHinges(beam({ spans: ["4 m", "4 m", "4 m"] }), [
  { member: "AB", from: "B", at: "2 m" },
  { member: "BC", from: "B", at: "1 m" },
  { member: "CD", from: "C", at: "2 m" },
]);

/** Three bodies that turn: h1 sinks 1, so that the part over B turns by -1/3 about B ... and so on to the right. */
export const chainMechanism: MechanismFigure = {
  kind: "mechanism",
  title: "Beam of four bodies, one motion",
  description:
    "h1 moves down; the part over B turns with it and lifts h2; the part over C turns back and lowers h3.",
  structure: chain,
  mechanism: {
    points: [
      { name: "A", ux: 0, uy: 0 },
      { name: "B", ux: 0, uy: 0 },
      { name: "C", ux: 0, uy: 0 },
      { name: "D", ux: 0, uy: 0 },
      { name: "h1", ux: 0, uy: -1 },
      { name: "h2", ux: 0, uy: 0.5 },
      { name: "h3", ux: 0, uy: -1 / 3 },
    ],
    turns: [
      { member: "AB", begin: 0, end: 2, rotation: -0.5 },
      { member: "AB", begin: 2, end: 4, rotation: 0.5 },
      { member: "BC", begin: 0, end: 1, rotation: 0.5 },
      { member: "BC", begin: 1, end: 4, rotation: -1 / 6 },
      { member: "CD", begin: 0, end: 2, rotation: -1 / 6 },
      { member: "CD", begin: 2, end: 4, rotation: 1 / 6 },
    ],
    words: "h1 down, h2 up, h3 down",
  },
};
