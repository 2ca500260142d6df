// Deflected shapes: the skeleton thin, the bent members over it; points of inflection as dots.

import { valueAt } from "../results/index.ts";
import type { Structure } from "../structure/index.ts";
import { bentCurves } from "./bent.ts";
import { extentOf, leastStorey } from "./extent.ts";
import { along, type Pt } from "./geometry.ts";
import { loads } from "./loads.ts";
import { hinges, jointNames, type MemberLine, memberLine, memberLines, worldPoints } from "./members.ts";
import { fitted, type Laid, type Scale } from "./scale.ts";
import { disc, type Label, merge, PENS, polyline, type Scene, scene } from "./scene.ts";
import type { Bend, DeflectionFigure, ShapeFigure } from "./spec.ts";
import { supports } from "./supports.ts";
import type { Panel } from "./svg.ts";

const TALLEST = 250;
/** Page length of the greatest displacement. */
const THROW = 34;
const STEPS = 28;
const BENT = { ...PENS.curve, name: "bent", width: 2.4 };

/** How a member moves at x metres from its start: along it, and across it towards the left of the walk. */
interface Moving {
  readonly member: string;
  readonly at: (x: number) => readonly [along: number, across: number];
  /** Places of points of inflection, metres. */
  readonly inflection: readonly number[];
}

const movedTo = (on: MemberLine, { at }: Moving, x: number, gain: number): Pt => {
  const [a, d] = at(x);
  const forward: Pt = [on.axis[0], -on.axis[1]];
  return along(along(on.page(x), forward, a * gain), on.fibre, -d * gain);
};

function gainOf(structure: Structure, moving: readonly Moving[], scale: Scale): number {
  const flat: Scale = { k: 1, width: 0, page: (x, y) => [x, y] };
  const sizes = moving.flatMap((m) => {
    const { length } = memberLine(structure, m.member, flat);
    return Array.from({ length: STEPS + 1 }, (_, i) => Math.hypot(...m.at((length * i) / STEPS)));
  });
  const greatest = Math.max(0, ...sizes);
  return greatest > 0 ? Math.min(THROW, leastStorey(structure, scale) * 0.24) / greatest : 0;
}

function bentMember(structure: Structure, moving: Moving, gain: number, scale: Scale): Scene {
  const on = memberLine(structure, moving.member, scale);
  // Hinges are corners: the curve stops at each of them.
  const corners = structure.hinges.filter((h) => h.member === moving.member).map((h) => h.at);
  const even = Array.from({ length: STEPS + 1 }, (_, i) => (on.length * i) / STEPS);
  const stops = [...even, ...corners].sort((a, b) => a - b);
  const dots = moving.inflection.map((x) =>
    disc(movedTo(on, moving, x, gain), 3.4, { ...PENS.sought, width: 1 }, true),
  );
  return scene([
    polyline(
      stops.map((x) => movedTo(on, moving, x, gain)),
      BENT,
    ),
    ...dots,
  ]);
}

/** Skeleton, bent members and dots of any deflected shape. */
function drawn(
  structure: Structure,
  moving: readonly Moving[],
  scale: Scale,
): { readonly scene: Scene; readonly gain: number } {
  const gain = gainOf(structure, moving, scale);
  return {
    gain,
    scene: merge(
      supports(structure, scale),
      memberLines(structure, scale, PENS.ghost),
      hinges({ ...structure, hinges: structure.hinges.map((h) => ({ ...h, name: "" })) }, scale),
      ...moving.map((m) => bentMember(structure, m, gain, scale)),
    ),
  };
}

/** Fractions at which the sense of bending changes from one side to the other. */
function inflections(bends: readonly Bend[]): readonly number[] {
  const curved = bends.filter(({ sense }) => sense !== "straight");
  return curved.slice(1).flatMap((bend, i) => (bend.sense === curved[i]?.sense ? [] : [bend.begin]));
}

function checkedBends(member: string, bends: readonly Bend[]): void {
  let last = 0;
  for (const { begin, end } of bends) {
    if (!(begin >= last - 1e-9 && end > begin && end <= 1 + 1e-9))
      throw new Error(
        `shape: a bend of member "${member}" goes from ${begin} to ${end}; fractions of the length in rising order from 0 to 1 are wanted`,
      );
    last = end;
  }
}

/** Layout of a qualitative shape. */
export function shapePanel(spec: ShapeFigure): Panel {
  const { structure } = spec;
  for (const { member, bends } of spec.members) checkedBends(member, bends);
  const curves = bentCurves(spec);
  const lengthOf = (member: string): number =>
    memberLine(structure, member, { k: 1, width: 0, page: (x, y) => [x, y] }).length;
  const bendsOf = (member: string): readonly Bend[] =>
    spec.members.find((m) => m.member === member)?.bends ?? [];
  for (const { member } of spec.members) lengthOf(member);
  const moving = structure.members.map(({ name }): Moving => {
    const length = lengthOf(name);
    return {
      member: name,
      at: (x) => {
        const curve = curves.get(name);
        return [curve?.along(x) ?? 0, curve?.across(x) ?? 0];
      },
      inflection: inflections(bendsOf(name)).map((fraction) => fraction * length),
    };
  });
  const extent = extentOf(structure);
  const laid = fitted(
    worldPoints(structure),
    (scale) => {
      const shape = drawn(structure, moving, scale).scene;
      const acting = loads(structure, spec.loads ?? [], [], scale, shape);
      const quiet = { shapes: acting.shapes, labels: [] };
      return merge(shape, quiet, jointNames(structure, scale, extent.size));
    },
    extent.tallest(TALLEST),
    extent.page,
  );
  return { heading: "qualitative, to no scale; dots: probable points of inflection", laid };
}

function deflected(spec: DeflectionFigure, scale: Scale): Scene {
  const moving = spec.members.map(
    (m): Moving => ({
      member: m.member,
      at: (x) => [valueAt(m.along, x), valueAt(m.deflection, x)],
      inflection: m.inflection,
    }),
  );
  const { scene: shape, gain } = drawn(spec.structure, moving, scale);
  const labels = (spec.marks ?? []).flatMap(({ member, at, text }): Label[] => {
    const own = moving.find((m) => m.member === member);
    if (own === undefined)
      throw new Error(
        `deflection: a mark names member "${member}", which has no curve; members are ${moving.map((m) => m.member).join(", ")}`,
      );
    const on = memberLine(spec.structure, member, scale);
    return [{ text, at: movedTo(on, own, at, gain), prefer: on.fibre, gap: 6, rank: 1 }];
  });
  return merge(shape, scene([], labels), jointNames(spec.structure, scale, extentOf(spec.structure).size));
}

/** Layout of the deflected shape of a solution. */
export function deflectionPanel(spec: DeflectionFigure): Panel {
  const extent = extentOf(spec.structure);
  const laid: Laid = fitted(
    worldPoints(spec.structure),
    (scale) => deflected(spec, scale),
    extent.tallest(TALLEST),
    extent.page,
  );
  return { heading: spec.scaleText ?? "displacements enlarged; dots: points of inflection", laid };
}
