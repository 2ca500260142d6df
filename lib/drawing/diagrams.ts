// N, V and M drawn on the members, hatched in ink: N along the member, V diagonally, M across it.

import { type MemberForces, valueAt } from "../results/index.ts";
import type { Structure } from "../structure/index.ts";
import { type DrawnForce, isTruss } from "./drawn-force.ts";
import { extentOf, leastStorey } from "./extent.ts";
import { along, distance, times } from "./geometry.ts";
import { hatch } from "./hatch.ts";
import {
  hinges,
  isBar,
  jointNames,
  type MemberLine,
  memberLine,
  memberLines,
  worldPoints,
} from "./members.ts";
import { fittedTogether, type Laid, type Scale } from "./scale.ts";
import { type Label, line, merge, PENS, polyline, type Scene, type Shape, scene, strokes } from "./scene.ts";
import type { DiagramsFigure, ForceQuantity } from "./spec.ts";
import { supports } from "./supports.ts";
import type { Panel } from "./svg.ts";
import { traced } from "./traced.ts";
import { values } from "./values.ts";

const TALLEST = 215;
const ORDINATE = 42;
const LEAST_ORDINATE = 14;
const FIBRE_GAP = 5;
const SLOPE: Record<ForceQuantity, number> = { N: 0, V: Math.PI / 4, M: Math.PI / 2 };

const greatestOf = (forces: readonly MemberForces[], quantity: ForceQuantity): number =>
  Math.max(0, ...forces.flatMap((f) => traced(f[quantity]).map(([, v]) => Math.abs(v))));

/** Which way a positive value is drawn: +1 towards the reference fibre. N and V stand away from the fibre. */
const sideOf = (spec: DiagramsFigure, quantity: ForceQuantity): 1 | -1 =>
  quantity === "M" && spec.moments === "tension side" ? 1 : -1;

function fibre(on: MemberLine): Scene {
  const inset = Math.min(8, distance(on.page(0), on.page(on.length)) / 6);
  const [a, b] = [along(on.page(0), on.fibre, FIBRE_GAP), along(on.page(on.length), on.fibre, FIBRE_GAP)];
  const way = times([b[0] - a[0], b[1] - a[1]], inset / Math.max(distance(a, b), 1e-9));
  return scene([line(along(a, way, 1), along(b, way, -1), PENS.fibre)]);
}

/** A bar in compression is thick, in tension thin and accented, without force dashed. */
function barLine(on: MemberLine, force: number, gain: number): Scene {
  const pen =
    Math.abs(force * gain) < 1e-6
      ? { ...PENS.bar, dash: "3 4", width: 1.4 }
      : force < 0
        ? { ...PENS.bar, width: 4.6 }
        : { ...PENS.curve, name: "tension", width: 1.7 };
  return scene([line(on.page(0), on.page(on.length), pen)]);
}

function ofMember(drawing: DrawnForce, forces: MemberForces): Scene {
  const { spec, quantity, scale, gain } = drawing;
  const on = memberLine(spec.structure, forces.member, scale);
  if (isTruss(drawing, forces)) return barLine(on, valueAt(forces.N, on.length / 2), gain);
  const curve = traced(forces[quantity]).map(([x, v]) => along(on.page(x), on.fibre, v * gain));
  if (gain === 0 || curve.length === 0) return fibre(on);
  const outline = [on.page(0), ...curve, on.page(on.length)];
  const slant = Math.atan2(-on.axis[1], on.axis[0]) + SLOPE[quantity];
  const hatching = hatch(outline, slant, quantity === "N" ? 4 : 6);
  return merge(
    scene([...(hatching.length > 0 ? [strokes(hatching, PENS.hatch)] : []), polyline(outline, PENS.curve)]),
    fibre(on),
  );
}

/** Where the true values of a member lie: two thin lines beside its diagram. */
function bandLines({ spec, quantity, scale, gain }: DrawnForce): Scene {
  const own = (spec.bands ?? []).filter((band) => band.quantity === quantity && gain !== 0);
  return scene(
    own.flatMap(({ member, at, low, high }) => {
      const on = memberLine(spec.structure, member, scale);
      const edge = (values: readonly number[]): Shape =>
        polyline(
          at.map((x, i) => along(on.page(x), on.fibre, (values[i] ?? 0) * gain)),
          PENS.band,
        );
      return [edge(low), edge(high)];
    }),
  );
}

function headingOf(spec: DiagramsFigure, quantity: ForceQuantity, nothing: boolean): string {
  const words = {
    N: "N  axial force",
    V: "V  shear",
    M: `M  bending moment, drawn on the ${spec.moments}`,
  };
  return (spec.headings?.[quantity] ?? words[quantity]) + (nothing ? ": zero throughout" : "");
}

/** The structure without the bars that are drawn by their force. */
function withoutBars(drawing: DrawnForce): Structure {
  const { structure, forces } = drawing.spec;
  const bars = new Set(forces.filter((f) => isTruss(drawing, f)).map((f) => f.member));
  return { ...structure, members: structure.members.filter(({ name }) => !bars.has(name)) };
}

interface Sheet {
  readonly quantity: ForceQuantity;
  readonly greatest: number;
  /** Nothing beside the others; rounding leaves crumbs that would fill the panel if drawn to scale. */
  readonly isNothing: boolean;
}

function sceneOf(spec: DiagramsFigure, { quantity, greatest, isNothing }: Sheet, scale: Scale): Scene {
  const { structure } = spec;
  const { size } = extentOf(structure);
  const ordinate = Math.min(ORDINATE, Math.max(LEAST_ORDINATE, leastStorey(structure, scale) * 0.34));
  const gain = isNothing ? 0 : (sideOf(spec, quantity) * ordinate) / greatest;
  const drawing: DrawnForce = { spec, quantity, scale, gain };
  const unnamed = { ...structure, hinges: structure.hinges.map((h) => ({ ...h, name: "" })) };
  return merge(
    supports(structure, scale),
    ...spec.forces.map((f) => ofMember(drawing, f)),
    bandLines(drawing),
    memberLines(withoutBars(drawing), scale, { ...PENS.member, width: 2 }),
    hinges(unnamed, scale),
    isNothing ? scene([]) : values(drawing),
    jointNames(structure, scale, size),
  );
}

/** "12 of 30 values printed ...", where there was no room for all. */
function printedWords({ placed, scene: drawn }: Laid): string {
  const isValue = ({ rank, text }: Label): boolean => rank !== undefined && rank >= 1 && text !== "";
  const all = drawn.labels.filter(isValue).length;
  const printed = placed.filter(({ label }) => isValue(label)).length;
  return printed === all ? "" : `${printed} of ${all} values printed, the governing ones first`;
}

/** Layouts of a diagrams figure, one panel per quantity, all at one scale. */
export function diagramPanels(spec: DiagramsFigure): readonly Panel[] {
  const all = Math.max(...(["N", "V", "M"] as const).map((q) => greatestOf(spec.forces, q)));
  const sheets = spec.quantities.map((quantity): Sheet => {
    const greatest = greatestOf(spec.forces, quantity);
    return { quantity, greatest, isNothing: !(greatest > 1e-9 * all) };
  });
  const extent = extentOf(spec.structure);
  const laid = fittedTogether(
    worldPoints(spec.structure),
    sheets.map((sheet) => (scale: Scale) => sceneOf(spec, sheet, scale)),
    extent.tallest(TALLEST),
    extent.page,
  );
  return laid.map((one, i): Panel => {
    const { quantity, isNothing } = sheets[i] ?? { quantity: "M", isNothing: false };
    const heading = headingOf(spec, quantity, isNothing);
    // Nothing is said in words where there are other panels to see the structure in.
    if (isNothing && sheets.some((s) => !s.isNothing)) return { heading };
    const bars = quantity === "N" && !isNothing && spec.structure.members.some(isBar) ? BARS : "";
    const note = [bars, printedWords(one)].filter((words) => words !== "").join("; ");
    return note === "" ? { heading, laid: one } : { heading, note, laid: one };
  });
}

const BARS = "bars: compression thick, tension thin, without force dashed";
