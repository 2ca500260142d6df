// What a figure shows, as plain data for the record. Geometry and loads are SI (m, N, N·m); everything that is
// printed comes as text, because units and rounding are decided where the numbers are known.

import type { ElasticMember, FreeBody, Mechanism, MemberForces, Point } from "../results/index.ts";
import type { Imposed, Load, Structure } from "../structure/index.ts";

interface FigureWords {
  /** Short name of the figure, read out first. */
  readonly title: string;
  /** What the figure shows, in words, for readers who cannot see it. */
  readonly description: string;
}

/** A dimension line between two places, measured along x (drawn below the figure) or along y (drawn beside it). */
export interface DimensionLine {
  readonly along: "x" | "y";
  readonly from: readonly [number, number];
  readonly to: readonly [number, number];
  readonly text: string;
}

/** A text beside a place of the figure. */
export interface PlacedText {
  readonly at: readonly [number, number];
  readonly text: string;
}

/** The structure with supports, hinges and loads. `loadTexts` are printed beside the loads, in their order
 *  (default: each load's label). */
export interface StructureFigure extends FigureWords {
  readonly kind: "structure";
  readonly structure: Structure;
  readonly loads: readonly Load[];
  readonly loadTexts?: readonly string[];
  /** Deformations imposed from outside, with their texts in order (default: each one's label). */
  readonly imposed?: readonly Imposed[];
  readonly imposedTexts?: readonly string[];
  readonly dimensions?: readonly DimensionLine[];
  readonly labels?: readonly PlacedText[];
}

/** A motion the structure can make: its skeleton thin, the moved skeleton dashed, arrows at what moves. */
export interface MechanismFigure extends FigureWords {
  readonly kind: "mechanism";
  readonly structure: Structure;
  readonly mechanism: Mechanism;
}

/** One body cut free with everything that acts on it. `texts` go with `body.actions`, one each: the magnitude of a
 *  known action, the name of an unknown one. An action with a value is drawn in its true sense, one without along
 *  its positive sense. `sought` are the unknowns this body is to give. `resultants`, one per action, adds the
 *  resultant of a distributed load with this text; an empty text adds none. */
export interface FreeBodyFigure extends FigureWords {
  readonly kind: "free body";
  readonly structure: Structure;
  readonly loads: readonly Load[];
  readonly body: FreeBody;
  readonly texts: readonly string[];
  readonly resultants?: readonly string[];
  readonly sought?: readonly string[];
  /** The point moments are taken about. */
  readonly about?: Point;
  readonly dimensions?: readonly DimensionLine[];
}

export type ForceQuantity = "N" | "V" | "M";

/** A printed place of a diagram: `at` in m from the member's start, `value` in N or N·m as drawn there. */
export interface DiagramMark {
  readonly quantity: ForceQuantity;
  readonly member: string;
  readonly at: number;
  readonly value: number;
  readonly kind: "end" | "extreme" | "jump" | "zero";
  /** May be empty for a zero that is only marked. */
  readonly text: string;
}

/** N, V and M drawn on the members, one panel per quantity. `headings` replace the panels' own headings. */
export interface DiagramsFigure extends FigureWords {
  readonly kind: "diagrams";
  readonly structure: Structure;
  readonly forces: readonly MemberForces[];
  readonly quantities: readonly ForceQuantity[];
  readonly moments: "tension side" | "compression side";
  readonly marks: readonly DiagramMark[];
  readonly headings?: Readonly<Partial<Record<ForceQuantity, string>>>;
  /** Where the true values lie, drawn as two thin lines beside the diagram. */
  readonly bands?: readonly DiagramBand[];
}

/** Between what most true values of one quantity lie along a member: places in m from its start, in order (one twice where the
 *  quantity jumps), and the two values at each, N or N·m. */
export interface DiagramBand {
  readonly quantity: ForceQuantity;
  readonly member: string;
  readonly at: readonly number[];
  readonly low: readonly number[];
  readonly high: readonly number[];
}

/** A state of self-stress: forces in equilibrium with no load, known up to a factor. Members left out are at rest.
 *  Drawn as N, V and M are, the greatest force and the greatest moment taken as printed in `marks`; a quantity that is nothing throughout is left out. */
export interface SelfStressFigure extends FigureWords {
  readonly kind: "self-stress";
  readonly structure: Structure;
  readonly forces: readonly MemberForces[];
  readonly moments?: "tension side" | "compression side";
  readonly marks?: readonly DiagramMark[];
}

/** A stretch of a member bent one way, between fractions of its length. Sagging is tension on the reference fibre. */
export interface Bend {
  readonly begin: number;
  readonly end: number;
  readonly sense: "sagging" | "hogging" | "straight";
}

/** How a structure is expected to bend, drawn without numbers: every member bends as `bends` say, keeps its corners at
 *  rigid joints and its place at supports; where the sense changes a point of inflection is marked. `moves` are
 *  displacements of joints in parts of the greatest one, for a frame that sways. */
export interface ShapeFigure extends FigureWords {
  readonly kind: "shape";
  readonly structure: Structure;
  readonly members: readonly { readonly member: string; readonly bends: readonly Bend[] }[];
  readonly moves?: readonly { readonly joint: string; readonly x: number; readonly y: number }[];
  readonly loads?: readonly Load[];
}

/** The deflected shape of a solution, enlarged so that it can be seen; `scaleText` says how much. */
export interface DeflectionFigure extends FigureWords {
  readonly kind: "deflection";
  readonly structure: Structure;
  readonly members: readonly Pick<ElasticMember, "member" | "along" | "deflection" | "inflection">[];
  readonly scaleText?: string;
  /** Values printed at places of members, metres from the start. */
  readonly marks?: readonly { readonly member: string; readonly at: number; readonly text: string }[];
}

/** One line of a chart: points in the units of the axis titles. */
export interface ChartSeries {
  readonly name: string;
  readonly points: readonly (readonly [number, number])[];
}

/** An x-y chart; its lines are told apart by their dashes. */
export interface LineChartFigure extends FigureWords {
  readonly kind: "line chart";
  readonly x: string;
  readonly y: string;
  readonly series: readonly ChartSeries[];
}

/** One cause and what it makes of a result: `least` and `greatest` are the result's values at the two ends of the cause's own range,
 *  with their texts, the one for the smaller value first. */
export interface RangeBar {
  readonly kind: "hinge" | "unknown";
  readonly label: string;
  readonly least: number;
  readonly greatest: number;
  readonly texts: readonly [string, string];
}

/** One result with the value as chosen, and a bar for every cause. */
export interface RangePanel {
  readonly heading: string;
  readonly chosen: number;
  readonly chosenText: string;
  readonly bars: readonly RangeBar[];
}

/** How results move through the ranges of what they depend on. */
export interface RangesFigure extends FigureWords {
  readonly kind: "ranges";
  readonly panels: readonly RangePanel[];
}

/** Figures drawn at once, without loading anything. */
export type SketchSpec =
  | StructureFigure
  | MechanismFigure
  | FreeBodyFigure
  | DiagramsFigure
  | SelfStressFigure
  | ShapeFigure
  | DeflectionFigure
  | RangesFigure;

export type FigureSpec = SketchSpec | LineChartFigure;
