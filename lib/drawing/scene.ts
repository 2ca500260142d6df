// A scene is what a figure consists of before its labels are placed: shapes already written as SVG, each with its
// box and the segments a label should keep clear of, and the labels still to be placed.

import { type Box, boxOf, type Pt, plus, type Segment } from "./geometry.ts";

export const INK = "#1c1b19";
export const ACCENT = "#0b5a6b";
export const PAPER = "#ffffff";

export interface Shape {
  readonly svg: string;
  readonly box: Box;
  readonly blocks: readonly Segment[];
}

/** A text to be placed near `at`, on the side `prefer` points to if there is room. */
export interface Label {
  readonly text: string;
  readonly at: Pt;
  readonly prefer: Pt;
  /** Distance kept from `at`. */
  readonly gap: number;
  readonly size?: number;
  readonly bold?: boolean;
  readonly accent?: boolean;
  /** Other places that say the same, taken where they are clearer. */
  readonly instead?: readonly { readonly at: Pt; readonly prefer: Pt }[];
  /** How much clearer each of those must be to be taken. */
  readonly reluctance?: number;
  /** Keeps to these places and sides, never farther out. */
  readonly fixed?: boolean;
  /** A label with a rank is left out where it finds no room; of two that collide, the one of lower rank. */
  readonly rank?: number;
}

export interface Scene {
  readonly shapes: readonly Shape[];
  readonly labels: readonly Label[];
}

export const EMPTY: Scene = { shapes: [], labels: [] };

/** Scenes drawn one over the other, in order. */
export function merge(...scenes: readonly Scene[]): Scene {
  return { shapes: scenes.flatMap((s) => s.shapes), labels: scenes.flatMap((s) => s.labels) };
}

export const scene = (shapes: readonly Shape[], labels: readonly Label[] = []): Scene => ({ shapes, labels });

/** A line style. `name` becomes the class, so that a page can restyle it. */
export interface Pen {
  readonly name: string;
  readonly width: number;
  readonly colour?: string;
  readonly dash?: string;
  /** Labels need not keep clear of it. */
  readonly light?: boolean;
}

type PenName =
  | "member"
  | "bar"
  | "ghost"
  | "load"
  | "sought"
  | "motion"
  | "resultant"
  | "ground"
  | "dimension"
  | "fibre"
  | "hatch"
  | "curve"
  | "band"
  | "leader";

export const PENS: Readonly<Record<PenName, Pen>> = {
  member: { name: "member", width: 3.2 },
  bar: { name: "bar", width: 1.9 },
  ghost: { name: "ghost", width: 1.2 },
  load: { name: "load", width: 1.3 },
  sought: { name: "sought", width: 2.2, colour: ACCENT },
  motion: { name: "motion", width: 1.8, colour: ACCENT, dash: "7 4" },
  resultant: { name: "resultant", width: 1.2, dash: "4 3" },
  ground: { name: "ground", width: 1.1 },
  dimension: { name: "dimension", width: 0.8 },
  fibre: { name: "fibre", width: 0.9, dash: "4 3", light: true },
  hatch: { name: "hatch", width: 0.7, light: true },
  curve: { name: "curve", width: 1.7, colour: ACCENT },
  band: { name: "band", width: 1, colour: ACCENT, dash: "2 3", light: true },
  leader: { name: "leader", width: 0.6, light: true },
};

/** A page coordinate as written: one decimal, never "-0"; refuses what is not a finite number. */
export function at(value: number): string {
  if (!Number.isFinite(value))
    throw new Error(`figure: a coordinate came out as ${value}; check lengths and loads`);
  const text = value.toFixed(1).replace(/\.0$/, "");
  return text === "-0" ? "0" : text;
}

const pairs = (points: readonly Pt[]): string => points.map((p) => `${at(p[0])},${at(p[1])}`).join(" ");

const strokeOf = (pen: Pen): string =>
  `class="fig-${pen.name}" stroke="${pen.colour ?? INK}" stroke-width="${pen.width}"` +
  (pen.dash ? ` stroke-dasharray="${pen.dash}"` : "");

const chain = (points: readonly Pt[]): Segment[] =>
  points.slice(1).map((p, i): Segment => [points[i] ?? p, p]);

export function line(a: Pt, b: Pt, pen: Pen): Shape {
  return {
    svg: `<line x1="${at(a[0])}" y1="${at(a[1])}" x2="${at(b[0])}" y2="${at(b[1])}" ${strokeOf(pen)}/>`,
    box: boxOf([a, b], pen.width / 2),
    blocks: pen.light ? [] : [[a, b]],
  };
}

export function polyline(points: readonly Pt[], pen: Pen): Shape {
  return {
    svg: `<polyline points="${pairs(points)}" fill="none" stroke-linejoin="round" ${strokeOf(pen)}/>`,
    box: boxOf(points, pen.width / 2),
    blocks: pen.light ? [] : chain(points),
  };
}

/** Many separate strokes as one path. */
export function strokes(segments: readonly Segment[], pen: Pen): Shape {
  const d = segments.map(([a, b]) => `M${at(a[0])},${at(a[1])}L${at(b[0])},${at(b[1])}`).join("");
  return {
    svg: `<path d="${d}" fill="none" ${strokeOf(pen)}/>`,
    box: boxOf(segments.flat(), pen.width / 2),
    blocks: pen.light ? [] : segments,
  };
}

/** A filled outline: ink (`solid`) or paper with an ink edge. */
export function polygon(points: readonly Pt[], pen: Pen, solid: boolean): Shape {
  return {
    svg: `<polygon points="${pairs(points)}" fill="${solid ? (pen.colour ?? INK) : PAPER}" ${strokeOf(pen)}/>`,
    box: boxOf(points, pen.width / 2),
    blocks: chain([...points, ...points.slice(0, 1)]),
  };
}

/** A disc: ink (`solid`) or paper with an ink edge, as hinges are drawn. */
export function disc(centre: Pt, radius: number, pen: Pen, solid: boolean): Shape {
  const r = radius * 0.7;
  return {
    svg:
      `<circle cx="${at(centre[0])}" cy="${at(centre[1])}" r="${radius}" ` +
      `fill="${solid ? (pen.colour ?? INK) : PAPER}" ${strokeOf(pen)}/>`,
    box: boxOf([centre], radius + pen.width / 2),
    blocks: [
      [plus(centre, [-r, -r]), plus(centre, [r, r])],
      [plus(centre, [-r, r]), plus(centre, [r, -r])],
    ],
  };
}

/** Every segment labels should keep clear of. */
export const blocksOf = (drawn: Scene): Segment[] => drawn.shapes.flatMap((shape) => [...shape.blocks]);
