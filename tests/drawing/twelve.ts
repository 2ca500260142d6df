// Twelve invented structures with their loads, a body cut free of each, and their diagrams. Internal forces come from the
// elastic solution, only so that there is something true to draw.

import {
  type DiagramsFigure,
  type DimensionLine,
  diagramMarks,
  type ForceQuantity,
  type FreeBodyFigure,
  type StructureFigure,
} from "../../lib/drawing/index.ts";
import { exact } from "../../lib/exact/index.ts";
import { type Action, type ElasticSolution, type FreeBody, valueAt } from "../../lib/results/index.ts";
import {
  atJoint,
  axisOf,
  beam,
  buildingFrame,
  coupleLoad,
  type Imposed,
  inGlobalAxes,
  jointNamed,
  type Load,
  memberNamed,
  metresAlong,
  panelGirder,
  partial,
  pointLoad,
  pointOn,
  portal,
  type Structure,
  settlement,
  structure,
  temperature,
  truss,
  uniform,
  varying,
  withHinges,
} from "../../lib/structure/index.ts";

/** Printed to three figures in kN or kN·m. */
export const printed = (si: number, unit: "kN" | "kN·m"): string => {
  const value = si / 1000;
  const digits = Math.abs(value) >= 99.95 ? 0 : Math.abs(value) >= 9.995 ? 1 : 2;
  return `${value.toFixed(digits).replace("-", "−")} ${unit}`;
};
const valueText = (si: number, quantity: ForceQuantity): string =>
  printed(si, quantity === "M" ? "kN·m" : "kN");

export interface Drawn {
  readonly name: string;
  readonly loads: StructureFigure;
  readonly body: FreeBodyFigure;
  readonly diagrams: DiagramsFigure;
  readonly solution: ElasticSolution;
}

interface Choice {
  readonly name: string;
  readonly structure: Structure;
  readonly loads: readonly Load[];
  readonly imposed?: readonly Imposed[];
  /** The joint or the stretch of a member that is cut free. */
  readonly cut:
    | { readonly joint: string }
    | { readonly member: string; readonly begin: number; readonly end: number };
}

const section = {
  all: { E: "210 GPa", I: "8000 cm^4", A: "80 cm^2", alpha: "0.000012 1/K", depth: "300 mm" },
} as const;

/** Chains of dimensions between the joints. */
function dimensions({ joints }: Structure): readonly DimensionLine[] {
  const chain = (along: "x" | "y"): DimensionLine[] => {
    const sorted = [...joints].sort((a, b) => a[along] - b[along]);
    const stops = sorted.filter((j, i) => i === 0 || j[along] - (sorted[i - 1]?.[along] ?? 0) > 1e-6);
    return stops.slice(1).map((to, i): DimensionLine => {
      const from = stops[i] ?? to;
      return {
        along,
        from: [from.x, from.y],
        to: [to.x, to.y],
        text: `${(to[along] - from[along]).toFixed(2)} m`,
      };
    });
  };
  return [...chain("x"), ...chain("y")];
}

/** What a member does to the part beyond its cut at x, seen from the piece kept: `side` +1 where the piece lies towards
 *  the start. Signs as in results/types.ts. */
function cutActions(
  of: Structure,
  solution: ElasticSolution,
  member: string,
  x: number,
  side: 1 | -1,
  joint = "cut",
): Action[] {
  const forces = solution.members.find((m) => m.member === member);
  if (forces === undefined) throw new Error(`no member ${member}`);
  const on = axisOf(of, memberNamed(of, member, "cut"));
  const [px, py] = pointOn(on, x);
  const at = { name: `${member} at ${x}`, x: px, y: py };
  const look = side > 0 ? "left" : "right";
  const [N, V, M] = [valueAt(forces.N, x, look), valueAt(forces.V, x, look), valueAt(forces.M, x, look)];
  const named = (letter: string): { force: string } => ({ force: `${member}_${joint}_${letter}` });
  const list: Action[] = [
    { at, direction: [on.c * side, on.s * side], turn: 0, source: named("N"), value: N },
    { at, direction: [on.s * side, -on.c * side], turn: 0, source: named("V"), value: V },
    { at, direction: [0, 0], turn: side, source: named("M"), value: M },
  ];
  const size = Math.max(
    ...solution.members.map((m) => Math.abs(valueAt(m.N, 0)) + Math.abs(valueAt(m.V, 0))),
  );
  return list.filter((a) => Math.abs(a.value ?? 0) > 1e-6 * size);
}

function bodyOf({ structure: of, loads, cut }: Choice, solution: ElasticSolution): FreeBody {
  if ("joint" in cut) {
    const meeting = of.members.filter((m) => m.start === cut.joint || m.end === cut.joint);
    const { x, y } = jointNamed(of, cut.joint, "cut");
    const at = { name: cut.joint, x, y };
    const actions = meeting.flatMap((m) => {
      const { length } = axisOf(of, m);
      const start = m.start === cut.joint;
      return cutActions(of, solution, m.name, start ? 0 : length, start ? 1 : -1, cut.joint).map((a) => ({
        ...a,
        at,
      }));
    });
    const acting = loads.flatMap((load, i): Action[] => {
      if (load.kind !== "joint" || load.joint !== cut.joint) return [];
      const size = Math.hypot(load.fx, load.fy);
      return [{ at, direction: [load.fx / size, load.fy / size], turn: 0, source: { load: i }, value: size }];
    });
    const reaction = solution.reactions.find((r) => r.joint === cut.joint);
    const held = (["x", "y"] as const).flatMap((axis): Action[] => {
      const value = reaction?.[axis] ?? 0;
      if (value === 0) return [];
      const direction = axis === "x" ? ([1, 0] as const) : ([0, 1] as const);
      return [{ at, direction, turn: 0, source: { force: `${cut.joint}_${axis}` }, value }];
    });
    return {
      name: `joint ${cut.joint}`,
      pieces: [],
      joints: [cut.joint],
      actions: [...actions, ...held, ...acting],
    };
  }
  const { member, begin, end } = cut;
  const on = axisOf(of, memberNamed(of, member, "cut"));
  const acting = loads.flatMap((given, i): Action[] => {
    const load = inGlobalAxes(of, given);
    if (load.kind === "joint" || load.member !== member) return [];
    if (load.kind === "member point") {
      const x = metresAlong(load.at, on.length);
      if (x < begin || x > end) return [];
      const [px, py] = pointOn(on, x);
      const at = { name: "P", x: px, y: py };
      if (load.couple !== 0)
        return [
          {
            at,
            direction: [0, 0],
            turn: load.couple > 0 ? 1 : -1,
            source: { load: i },
            value: Math.abs(load.couple),
          },
        ];
      const size = Math.hypot(load.fx, load.fy);
      return [{ at, direction: [load.fx / size, load.fy / size], turn: 0, source: { load: i }, value: size }];
    }
    const a = Math.max(begin, metresAlong(load.begin, on.length));
    const b = Math.min(end, metresAlong(load.end, on.length));
    if (!(b > a)) return [];
    const slope =
      (load.q2 - load.q1) / (metresAlong(load.end, on.length) - metresAlong(load.begin, on.length));
    const q = (x: number): number => load.q1 + slope * (x - metresAlong(load.begin, on.length));
    const total = ((q(a) + q(b)) / 2) * (b - a);
    const centre = a + ((b - a) * (q(a) + 2 * q(b))) / (3 * (q(a) + q(b)));
    const [px, py] = pointOn(on, centre);
    return [
      {
        at: { name: "Q", x: px, y: py },
        direction: load.direction,
        turn: 0,
        source: { load: i },
        value: total,
      },
    ];
  });
  const ends = [...cutActions(of, solution, member, begin, -1), ...cutActions(of, solution, member, end, 1)];
  return {
    name: `${member} from ${begin} m to ${end} m`,
    pieces: [{ member, begin, end }],
    joints: [],
    actions: [...ends, ...acting],
  };
}

function drawn(choice: Choice): Drawn {
  const { name, structure: of, loads, imposed = [] } = choice;
  const solution = exact(of, [...loads, ...imposed]);
  const body = bodyOf(choice, solution);
  const quantities: readonly ForceQuantity[] = of.form === "truss" ? ["N"] : ["N", "V", "M"];
  const texts = body.actions.map((action) => {
    if ("load" in action.source) {
      const load = loads[action.source.load];
      return load?.kind === "distributed"
        ? load.label
        : printed(action.value ?? 0, action.turn === 0 ? "kN" : "kN·m");
    }
    return printed(Math.abs(action.value ?? 0), action.turn === 0 ? "kN" : "kN·m");
  });
  const resultants = body.actions.map((action) => {
    const load = "load" in action.source ? loads[action.source.load] : undefined;
    return load?.kind === "distributed" ? `Q = ${printed(action.value ?? 0, "kN")}` : "";
  });
  return {
    name,
    solution,
    loads: {
      kind: "structure",
      title: `${name}, loads`,
      description: `${name} with ${of.members.length} members, its supports, loads and dimensions.`,
      structure: of,
      loads,
      imposed,
      dimensions: dimensions(of),
    },
    body: {
      kind: "free body",
      title: `${name}, ${body.name}`,
      description: `${body.name} cut free with ${body.actions.length} actions.`,
      structure: of,
      loads,
      body,
      texts,
      resultants,
    },
    diagrams: {
      kind: "diagrams",
      title: `${name}, internal forces`,
      description: `Internal forces of ${name}.`,
      structure: of,
      forces: solution.members,
      quantities,
      moments: "tension side",
      marks: diagramMarks(solution.members, quantities, { value: valueText }),
    },
  };
}

const tall = buildingFrame({
  bays: ["6 m", "7.5 m", "5 m", "6 m"],
  storeys: ["4.2 m", "3.5 m", "3.5 m", "3.5 m", "3.5 m", "3.5 m"],
  bases: "fixed",
  sections: section,
});

const choices: readonly Choice[] = [
  {
    name: "simple beam with overhang",
    structure: beam({ spans: ["6 m", "2 m"], supports: ["pinned", "roller", "free"], sections: section }),
    loads: [
      partial("AB", "8 kN/m", { from: "1 m", to: "4 m" }),
      pointLoad("AB", "25 kN", { at: "4.5 m" }),
      pointLoad("BC", "12 kN", { at: "2 m" }),
    ],
    cut: { member: "AB", begin: 0, end: 3 },
  },
  {
    name: "two-span beam",
    structure: beam({ spans: ["7 m", "5.5 m"], sections: section }),
    loads: [uniform("AB", "14 kN/m"), uniform("BC", "14 kN/m"), pointLoad("BC", "30 kN", { at: "0.4 L" })],
    imposed: [settlement("B", { down: "12 mm" })],
    cut: { joint: "B" },
  },
  {
    name: "four-span beam with three hinges",
    structure: withHinges(beam({ spans: ["6 m", "6 m", "6 m", "6 m"], sections: section }), [
      { member: "AB", from: "B", at: "1.2 m" },
      { member: "CD", from: "C", at: "1.2 m" },
      { member: "CD", from: "D", at: "1.2 m" },
    ]),
    loads: ["AB", "BC", "CD", "DE"].map((m) => uniform(m, "9 kN/m")),
    cut: { member: "CD", begin: 1.2, end: 4.8 },
  },
  {
    name: "cantilever",
    structure: beam({ spans: ["4 m"], supports: ["fixed", "free"], sections: section }),
    loads: [varying("AB", "12 kN/m", "0 kN/m"), coupleLoad("AB", "10 kN m", { at: "2.5 m" })],
    cut: { member: "AB", begin: 1.5, end: 4 },
  },
  {
    name: "pinned portal",
    structure: portal({ span: "12 m", height: "5 m", bases: "pinned", sections: section }),
    loads: [uniform("BC", "11 kN/m"), atJoint("B", { right: "20 kN" })],
    cut: { joint: "B" },
  },
  {
    name: "fixed portal",
    structure: portal({
      span: "9 m",
      height: { left: "5 m", right: "3.5 m" },
      rightBase: "1.5 m",
      bases: "fixed",
      sections: section,
    }),
    loads: [uniform("BC", "6 kN/m"), uniform("AB", "4 kN/m", { direction: "right" })],
    imposed: [
      temperature("BC", { uniform: "25 K" }),
      settlement("D", { down: "10 mm", rotation: "0.002 rad" }),
    ],
    cut: { member: "AB", begin: 0, end: 5 },
  },
  {
    name: "pitched portal",
    structure: withHinges(
      portal({ span: "16 m", height: "4 m", rise: "2.5 m", bases: "pinned", sections: section }),
      [{ member: "BC", from: "B", at: "4 m" }],
    ),
    loads: [
      uniform("BC", "5 kN/m", { per: "horizontal" }),
      uniform("CD", "5 kN/m", { per: "horizontal" }),
      uniform("BC", "1.5 kN/m", { direction: "across" }),
    ],
    cut: { joint: "C" },
  },
  {
    name: "leaning frame on a slope",
    structure: structure({
      joints: {
        A: ["0 m", "0 m"],
        B: ["2 m", "4 m"],
        C: ["7 m", "4 m"],
        D: ["9 m", "1 m"],
        E: ["7 m", "0 m"],
      },
      members: {
        AB: ["A", "B"],
        BC: ["B", "C"],
        CD: { ends: ["C", "D"], released: ["C"] },
        EC: { ends: ["E", "C"], shearReleased: ["E"] },
      },
      supports: {
        A: { y: true, x: true, rotation: "4000 kN m/rad" },
        D: { y: true, angle: "30 deg", x: "5000 kN/m" },
        E: { x: true, rotation: true, y: "9000 kN/m" },
      },
      sections: section,
    }),
    loads: [pointLoad("BC", "18 kN", { at: "2 m" }), uniform("AB", "3 kN/m", { direction: "across" })],
    imposed: [temperature("BC", { difference: "15 K" })],
    cut: { member: "BC", begin: 0, end: 5 },
  },
  {
    name: "truss",
    structure: truss({
      panels: Array.from({ length: 8 }, () => "3 m" as const),
      depth: "3 m",
      diagonals: "falling to midspan",
      sections: section,
    }),
    loads: ["U1", "U2", "U3", "U4", "U5", "U6", "U7"].map((j) => atJoint(j, { down: "40 kN" })),
    cut: { joint: "U2" },
  },
  {
    name: "panel girder",
    structure: panelGirder({ panels: ["3 m", "3 m", "3 m", "3 m"], depth: "2.4 m", sections: section }),
    loads: ["U1", "U2", "U3"].map((j) => atJoint(j, { down: "24 kN" })),
    cut: { joint: "U1" },
  },
  {
    name: "two-storey frame",
    structure: buildingFrame({
      bays: ["6 m", "4.5 m"],
      storeys: ["4 m", "3.5 m"],
      bases: ["fixed", "pinned", "guided"],
      sections: section,
    }),
    loads: [
      ...["A1B1", "B1C1", "A2B2", "B2C2"].map((m) => uniform(m, "18 kN/m", { label: "18 kN/m" })),
      atJoint("A1", { right: "12 kN" }),
      atJoint("A2", { right: "9 kN" }),
    ],
    cut: { joint: "B1" },
  },
  {
    name: "six-storey frame",
    structure: tall,
    loads: [
      ...tall.members
        .filter((m) => m.group === "beams")
        .map((m) => uniform(m.name, "22 kN/m", { label: "22 kN/m" })),
      ...[1, 2, 3, 4, 5, 6].map((i) => atJoint(`A${i}`, { right: "15 kN" })),
    ],
    cut: { joint: "B3" },
  },
];

export const twelve: readonly Drawn[] = choices.map(drawn);
