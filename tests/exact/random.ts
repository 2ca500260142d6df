// Random structures and loads for the invariants, as models in the exchanged form (plain data, easily mirrored and turned).

import fc from "fast-check";
import { quantity } from "../../lib/quantity/index.ts";
import {
  beam,
  buildingFrame,
  type Imposed,
  type Load,
  type Model,
  panelGirder,
  portal,
  type Section,
  type Structure,
  structureFromJson,
  structureToJson,
  truss,
  trussPortal,
} from "../../lib/structure/index.ts";

export interface Plain {
  joints: { name: string; x: number; y: number }[];
  members: {
    name: string;
    start: string;
    end: string;
    releases: { start: Ends; end: Ends };
    section: Section;
    group?: string;
  }[];
  supports: {
    joint: string;
    holds: { x: boolean; y: boolean; rotation: boolean };
    springs?: { x?: number; y?: number; rotation?: number };
    angle?: number;
  }[];
  hinges: { name: string; member: string; at: number }[];
  loads: Plainload[];
  [other: string]: unknown;
}
export interface Ends {
  moment: boolean;
  shear?: boolean;
  axial?: boolean;
}
type Mutable<T> = { -readonly [K in keyof T]: T[K] };
export type Plainload = Mutable<Load> | Mutable<Imposed>;

/** The model as plain data that may be changed. */
export const plain = (structure: Structure, loads: readonly (Load | Imposed)[] = []): Plain =>
  JSON.parse(structureToJson(structure, loads)) as Plain;
export const model = (data: Plain): Model => structureFromJson(data);

const between = (min: number, max: number): fc.Arbitrary<number> =>
  fc
    .double({ min, max, noNaN: true, noDefaultInfinity: true })
    .map((x) => (Math.abs(x) < 1e-9 * Math.abs(max) ? 0 : Number(x.toPrecision(6))));
const log = (min: number, max: number): fc.Arbitrary<number> =>
  between(Math.log(min), Math.log(max)).map((x) => Number(Math.exp(x).toPrecision(6)));
const m = (x: number) => quantity(x, "length");

export const section: fc.Arbitrary<Section> = fc.record({
  E: log(1e10, 2.1e11),
  I: log(1e-5, 5e-3),
  A: log(2e-3, 0.2),
  alpha: between(8e-6, 1.4e-5),
  depth: between(0.2, 1.2),
});

const beams = fc
  .record({
    spans: fc.array(between(2, 9), { minLength: 1, maxLength: 5 }),
    ends: fc.tuple(
      fc.constantFrom("fixed", "pinned", "guided" as const),
      fc.constantFrom("fixed", "roller", "free" as const),
    ),
    spring: fc.boolean(),
  })
  .filter(
    ({ spans, ends: [a, b] }) =>
      !(a === "pinned" && b === "free" && spans.length === 1) && !(a === "guided" && b === "free"),
  )
  .map(({ spans, ends: [a, b], spring }) =>
    beam({
      spans: spans.map(m),
      supports: spans.concat(0).map((_, i) => {
        if (i === 0) return a;
        if (i === spans.length) return b;
        return spring && i % 2 === 0 ? { y: "9000 kN/m", rotation: "4000 kN m/rad" } : "roller";
      }),
    }),
  );

const bases = fc.constantFrom("pinned", "fixed" as const);
const portals = fc
  .record({
    span: between(4, 16),
    left: between(3, 7),
    right: between(3, 7),
    step: between(-1, 1),
    rise: fc.option(between(0.5, 3), { nil: undefined }),
    a: bases,
    b: bases,
  })
  .map(({ span, left, right, step, rise, a, b }) =>
    portal({
      span: m(span),
      height: { left: m(left), right: m(right) },
      rightBase: m(step),
      bases: { left: a, right: b },
      ...(rise === undefined ? {} : { rise: m(rise) }),
    }),
  );

const frames = fc
  .record({
    bays: fc.array(between(3, 9), { minLength: 1, maxLength: 4 }),
    storeys: fc.array(between(2.8, 5), { minLength: 1, maxLength: 5 }),
    bases,
    setBack: fc.nat(3),
    missing: fc.boolean(),
  })
  .map(({ bays, storeys, bases: base, setBack, missing }) =>
    buildingFrame({
      bays: bays.map(m),
      storeys: storeys.map(m),
      bases: base,
      storeysOf: bays.map((_, i) =>
        i === bays.length - 1 && i > 0 ? Math.max(1, storeys.length - setBack) : storeys.length,
      ),
      without: missing && storeys.length > 1 && bays.length > 1 ? ["A1B1"] : [],
    }),
  );

const panels = fc.array(between(1.5, 4), { minLength: 2, maxLength: 6 });
const diagonals = fc.constantFrom(
  "rising",
  "falling",
  "falling to midspan",
  "rising to midspan",
  "zigzag",
  "crossed" as const,
);
const trusses = fc
  .record({ panels, depth: between(1, 3), diagonals })
  .map((t) => truss({ panels: t.panels.map(m), depth: m(t.depth), diagonals: t.diagonals }));
const girders = fc
  .record({ panels, depth: between(1, 3) })
  .map((t) => panelGirder({ panels: t.panels.map(m), depth: m(t.depth) }));
const trussPortals = fc
  .record({ panels, depth: between(1, 3), diagonals, height: between(3, 7), bases })
  .map((t) =>
    trussPortal({
      panels: t.panels.map(m),
      depth: m(t.depth),
      diagonals: t.diagonals,
      height: m(t.height),
      bases: t.bases,
    }),
  );

/** A tree of rigid members on random points, one fixed support and some others, some more members. */
const trees = fc
  .record({
    points: fc.uniqueArray(fc.tuple(fc.nat(6), fc.nat(5)), {
      minLength: 2,
      maxLength: 8,
      selector: ([x, y]) => 10 * x + y,
    }),
    choices: fc.array(fc.nat(1000), { minLength: 80, maxLength: 80 }),
    shift: between(0, 0.4),
  })
  .map(({ points, choices, shift }): Plain => {
    let used = 0;
    const next = (n: number): number => (choices[used++] ?? 0) % n;
    const joints = points.map(([x, y], i) => ({
      name: `J${i}`,
      x: 2.5 * x + shift * next(3),
      y: 2 * y + shift * next(3),
    }));
    const pairs = new Map<string, [number, number]>();
    const put = (a: number, b: number): void => {
      if (a !== b) pairs.set(`${Math.min(a, b)} ${Math.max(a, b)}`, [a, b]);
    };
    for (let i = 1; i < joints.length; i++) put(next(i), i);
    for (let k = next(4); k > 0; k--) put(next(joints.length), next(joints.length));
    const members = [...pairs.values()].map(([a, b], i) => ({
      name: `M${i}`,
      start: `J${a}`,
      end: `J${b}`,
      releases: { start: { moment: false }, end: { moment: false } },
      section: { E: 1, I: 1, A: 1 },
    }));
    const supports: Plain["supports"] = [{ joint: "J0", holds: { x: true, y: true, rotation: true } }];
    if (next(2) === 0 && joints.length > 2)
      supports.push({ joint: "J1", holds: { x: false, y: true, rotation: false }, angle: 0.1 * next(30) });
    if (next(2) === 0 && joints.length > 3)
      supports.push({
        joint: "J2",
        holds: { x: false, y: false, rotation: false },
        springs: { x: 1e6 * next(9), rotation: 1e6 },
      });
    return { format: "hingebook model", version: 1, joints, members, supports, hinges: [], loads: [] };
  });

const structures: fc.Arbitrary<Plain> = fc.oneof(
  beams.map((s) => plain(s)),
  portals.map((s) => plain(s)),
  frames.map((s) => plain(s)),
  trusses.map((s) => plain(s)),
  girders.map((s) => plain(s)),
  trussPortals.map((s) => plain(s)),
  trees,
);

/** A structure of any kind with sections of its own in every member. */
export const anyStructure: fc.Arbitrary<Plain> = fc
  .tuple(structures, fc.array(section, { minLength: 3, maxLength: 3 }))
  .map(([data, sections]) => ({
    ...data,
    members: data.members.map((member, i) => ({
      ...member,
      section: sections[i % 3] ?? { E: 1, I: 1, A: 1 },
    })),
  }));

/** The same with a few hinges and releases put in, which may make it a mechanism. */
export const weakened: fc.Arbitrary<Plain> = fc
  .tuple(anyStructure, fc.array(fc.tuple(fc.nat(1000), fc.nat(5), between(0.1, 0.9)), { maxLength: 3 }))
  .map(([whole, cuts]) => {
    const data = structuredClone(whole);
    for (const [pick, kind, at] of cuts) {
      const member = data.members[pick % data.members.length];
      if (member === undefined) continue;
      const [a, b] = [
        data.joints.find((j) => j.name === member.start),
        data.joints.find((j) => j.name === member.end),
      ];
      const length = Math.hypot((a?.x ?? 0) - (b?.x ?? 0), (a?.y ?? 0) - (b?.y ?? 0));
      const { start, end } = member.releases;
      if (kind === 0 && data.hinges.every((h) => h.member !== member.name))
        data.hinges.push({ name: `h${data.hinges.length + 1}`, member: member.name, at: at * length });
      if (kind === 1 && !(end.moment && end.shear)) start.moment = true;
      if (kind === 2) end.moment = true;
      if (kind === 3 && !end.shear && !end.moment) start.shear = true;
      if (kind === 4 && !start.axial) end.axial = true;
      if (kind === 5 && !start.shear && !start.moment) end.shear = true;
    }
    const bad = (e: { start: Ends; end: Ends }): boolean =>
      e.start.moment && e.end.moment && (e.start.shear === true || e.end.shear === true);
    for (const member of data.members)
      if (bad(member.releases)) member.releases = { start: { moment: false }, end: { moment: false } };
    const spins = (joint: string): boolean =>
      data.members.every(
        (x) => (x.start !== joint || x.releases.start.moment) && (x.end !== joint || x.releases.end.moment),
      );
    for (const s of data.supports) if (spins(s.joint)) s.holds.rotation = false;
    return data;
  });

const size = between(-4e4, 4e4);
const words = { label: "", from: [] };

/** Loads on a structure: every kind, on members and joints picked by number. */
export function loadsOn(data: Plain, imposed = true): fc.Arbitrary<Plainload[]> {
  const lengthOf = (name: string): number => {
    const member = data.members.find((x) => x.name === name);
    const [a, b] = [
      data.joints.find((j) => j.name === member?.start),
      data.joints.find((j) => j.name === member?.end),
    ];
    return Math.hypot((a?.x ?? 0) - (b?.x ?? 0), (a?.y ?? 0) - (b?.y ?? 0));
  };
  const member = fc.constantFrom(...data.members.map((x) => x.name));
  const takesCouple = data.joints
    .map((j) => j.name)
    .filter((j) =>
      data.members.some(
        (x) => (x.start === j && !x.releases.start.moment) || (x.end === j && !x.releases.end.moment),
      ),
    );
  const distributed = fc
    .record({
      member,
      places: fc.tuple(between(0, 0.45), between(0.5, 1)),
      q1: size,
      q2: size,
      turn: between(0, 6.28),
      own: fc.boolean(),
    })
    .map(
      ({ member: on, places: [a, b], q1, q2, turn, own }): Plainload => ({
        kind: "distributed",
        member: on,
        begin: { fraction: a },
        end: { metres: b * lengthOf(on) },
        q1,
        q2,
        direction: [Math.cos(turn), Math.sin(turn)],
        ...(own ? { axes: "member" as const } : {}),
        ...words,
      }),
    );
  const point = fc
    .record({ member, at: between(0.01, 0.99), fx: size, fy: size, couple: size, own: fc.boolean() })
    .map(
      ({ member: on, at, own, ...forces }): Plainload => ({
        kind: "member point",
        member: on,
        at: { fraction: at },
        ...forces,
        ...(own ? { axes: "member" as const } : {}),
        ...words,
      }),
    );
  const joint = fc
    .record({ joint: fc.constantFrom(...data.joints.map((j) => j.name)), fx: size, fy: size, couple: size })
    .map(
      (load): Plainload => ({
        kind: "joint",
        ...load,
        couple: takesCouple.includes(load.joint) ? load.couple : 0,
        ...words,
      }),
    );
  const warm = fc
    .record({ member, uniform: between(-40, 40), difference: between(-30, 30) })
    .map((load): Plainload => ({ kind: "temperature", ...load, ...words }));
  const held = data.supports.filter((s) => s.holds.x || s.holds.y);
  const settles = fc
    .record({
      support: fc.constantFrom(...(held.length > 0 ? held : data.supports)),
      x: between(-0.02, 0.02),
      y: between(-0.02, 0.02),
    })
    .map(
      ({ support, x, y }): Plainload => ({
        kind: "settlement",
        joint: support.joint,
        x: support.holds.x ? x : 0,
        y: support.holds.y ? y : 0,
        rotation: support.holds.rotation ? x / 3 : 0,
        ...words,
      }),
    );
  const kinds = imposed ? [distributed, point, joint, warm, settles] : [distributed, point, joint];
  return fc.array(fc.oneof(...kinds), { minLength: 1, maxLength: 4 });
}

/** A model of any kind. */
export const anyModel = (from: fc.Arbitrary<Plain> = anyStructure, imposed = true): fc.Arbitrary<Plain> =>
  from.chain((data) => loadsOn(data, imposed).map((loads) => ({ ...data, loads })));

/** Frames, girders and trees whose members are all rigidly connected and whose supports hold along global axes. */
export const rigidFrame: fc.Arbitrary<Plain> = anyStructure.filter(
  (data) =>
    data.members.every((m) => !m.releases.start.moment && !m.releases.end.moment) &&
    data.supports.every((s) => s.springs === undefined && s.angle === undefined),
);
