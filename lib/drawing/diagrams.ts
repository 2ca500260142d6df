// N, V and M drawn on the members, hatched in ink: N along the member, V diagonally, M across it.

import type { MemberForces } from "../results/index.ts";
import { along, distance, type Pt, times } from "./geometry.ts";
import { hatch } from "./hatch.ts";
import { hinges, jointNames, type MemberLine, memberLine, memberLines, worldPoints } from "./members.ts";
import { fitted, type Scale } from "./scale.ts";
import { disc, type Label, line, merge, PENS, polyline, type Scene, scene, strokes } from "./scene.ts";
import type { DiagramMark, DiagramsFigure, ForceQuantity } from "./spec.ts";
import { supports } from "./supports.ts";
import type { Panel } from "./svg.ts";
import { traced } from "./traced.ts";

const TALLEST = 215;
const ORDINATE = 42;
const FIBRE_GAP = 5;
const SLOPE: Record<ForceQuantity, number> = { N: 0, V: Math.PI / 4, M: Math.PI / 2 };

const greatestOf = (forces: readonly MemberForces[], quantity: ForceQuantity): number =>
  Math.max(0, ...forces.flatMap((f) => traced(f[quantity]).map(([, v]) => Math.abs(v))));

/** Which way a positive value is drawn: +1 towards the reference fibre. N and V stand away from the fibre. */
const sideOf = (spec: DiagramsFigure, quantity: ForceQuantity): 1 | -1 =>
  quantity === "M" && spec.moments === "tension side" ? 1 : -1;

interface Drawing {
  readonly spec: DiagramsFigure;
  readonly quantity: ForceQuantity;
  readonly scale: Scale;
  /** Page units per N or N·m, signed towards the fibre; 0 where the quantity is nothing beside the others. */
  readonly gain: number;
}

function fibre(on: MemberLine): Scene {
  const inset = Math.min(8, distance(on.page(0), on.page(on.length)) / 6);
  const [a, b] = [along(on.page(0), on.fibre, FIBRE_GAP), along(on.page(on.length), on.fibre, FIBRE_GAP)];
  const way = times([b[0] - a[0], b[1] - a[1]], inset / Math.max(distance(a, b), 1e-9));
  return scene([line(along(a, way, 1), along(b, way, -1), PENS.fibre)]);
}

function ofMember(drawing: Drawing, forces: MemberForces): Scene {
  const { spec, quantity, scale, gain } = drawing;
  const on = memberLine(spec.structure, forces.member, scale);
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

function marks(drawing: Drawing): Scene {
  const { spec, quantity, scale, gain } = drawing;
  const shown: { readonly base: Pt; readonly text: string }[] = [];
  return merge(
    ...spec.marks
      .filter((mark) => mark.quantity === quantity)
      .map((mark) => {
        const on = memberLine(spec.structure, mark.member, scale);
        const base = on.page(mark.at);
        // Two members give the same moment at the corner they share: printed once.
        if (shown.some((s) => s.text === mark.text && distance(s.base, base) < 3)) return scene([]);
        shown.push({ base, text: mark.text });
        return markScene(mark, on, gain);
      }),
  );
}

function markScene(mark: DiagramMark, on: MemberLine, gain: number): Scene {
  const base = on.page(mark.at);
  if (mark.kind === "zero") {
    const label: Label = { text: mark.text, at: base, prefer: times(on.fibre, -1), gap: 5, size: 13 };
    return scene([disc(base, 2.6, PENS.load, true)], [label]);
  }
  const offset = mark.value * gain;
  const label: Label = {
    text: mark.text,
    at: along(base, on.fibre, offset),
    prefer: times(on.fibre, offset < 0 ? -1 : 1),
    gap: 5,
  };
  return scene([], [label]);
}

function headingOf(spec: DiagramsFigure, quantity: ForceQuantity, nothing: boolean): string {
  const words = {
    N: "N  axial force",
    V: "V  shear",
    M: `M  bending moment, drawn on the ${spec.moments}`,
  };
  return (spec.headings?.[quantity] ?? words[quantity]) + (nothing ? ": zero throughout" : "");
}

/** Layouts of a diagrams figure, one panel per quantity. */
export function diagramPanels(spec: DiagramsFigure): readonly Panel[] {
  const all = Math.max(...(["N", "V", "M"] as const).map((q) => greatestOf(spec.forces, q)));
  return spec.quantities.map((quantity) => {
    const greatest = greatestOf(spec.forces, quantity);
    // Rounding leaves crumbs where a force is zero; drawn to scale they would fill the panel.
    const nothing = !(greatest > 1e-9 * all);
    const gain = nothing ? 0 : (sideOf(spec, quantity) * ORDINATE) / greatest;
    const laid = fitted(
      worldPoints(spec.structure),
      (scale) => {
        const drawing: Drawing = { spec, quantity, scale, gain };
        return merge(
          supports(spec.structure, scale),
          ...spec.forces.map((f) => ofMember(drawing, f)),
          memberLines(spec.structure, scale, { ...PENS.member, width: 2 }),
          hinges(
            { ...spec.structure, hinges: spec.structure.hinges.map((h) => ({ ...h, name: "" })) },
            scale,
          ),
          nothing ? scene([]) : marks(drawing),
          jointNames(spec.structure, scale),
        );
      },
      TALLEST,
    );
    return { heading: headingOf(spec, quantity, nothing), laid };
  });
}
