// What is checked of one solution: balance of every joint and of the whole, members moving with their joints, and sameness
// of two solutions.
import { expect } from "vitest";
import { exact } from "../../lib/exact/index.ts";
import { type ElasticMember, type ElasticSolution, valueAt } from "../../lib/results/index.ts";
import { axisOf, inGlobalAxes, type Model, metresAlong, type Structure } from "../../lib/structure/index.ts";
import { model, type Plain, type Plainload } from "./random.ts";

export const seed = 20270;

export const solved = (data: Plain): ElasticSolution => {
  const { structure, loads } = model(data);
  return exact(structure, loads);
};

const ends = (m: ElasticMember): Readonly<Record<"N" | "V" | "M", readonly [number, number]>> => ({
  N: [valueAt(m.N, 0), valueAt(m.N, m.length, "left")] as const,
  V: [valueAt(m.V, 0), valueAt(m.V, m.length, "left")] as const,
  M: [valueAt(m.M, 0), valueAt(m.M, m.length, "left")] as const,
});

/** Forces a member puts on its joints: x, y, moment at the start and at the end. */
function onJoints(
  structure: Structure,
  i: number,
  m: ElasticMember,
): readonly (readonly [number, number, number])[] {
  const member = structure.members[i];
  if (member === undefined) throw new Error("no such member");
  const { c, s } = axisOf(structure, member);
  const { N, V, M } = ends(m);
  return [
    [N[0] * c + V[0] * s, N[0] * s - V[0] * c, M[0]],
    [-N[1] * c - V[1] * s, -N[1] * s + V[1] * c, -M[1]],
  ];
}

/** Largest force (at least 100 N; loads are some kN) and moment, to judge zero by. */
export function scaleOf(
  solution: ElasticSolution,
  loads: readonly Plainload[],
): { force: number; moment: number } {
  const sizes = solution.members.map(ends);
  const force = Math.max(
    100,
    ...sizes.flatMap((e) => [...e.N, ...e.V].map(Math.abs)),
    ...loads.flatMap((l) => ("fx" in l ? [Math.abs(l.fx), Math.abs(l.fy)] : [])),
  );
  const length = Math.max(...solution.members.map((m) => m.length));
  const moment = Math.max(
    force * length,
    ...sizes.flatMap((e) => e.M.map(Math.abs)),
    ...loads.flatMap((l) => ("couple" in l ? [Math.abs(l.couple)] : [])),
  );
  return { force, moment };
}

/** Point loads at the very start or end of a member go into its end forces only on one side; the random ones are inside. */
export function expectJointsBalance({ structure, loads }: Model, solution: ElasticSolution): void {
  const sums = new Map(structure.joints.map((j) => [j.name, [0, 0, 0] as [number, number, number]]));
  const put = (joint: string, [x, y, m]: readonly [number, number, number]): void => {
    const sum = sums.get(joint);
    if (sum === undefined) throw new Error(`no joint ${joint}`);
    sum[0] += x;
    sum[1] += y;
    sum[2] += m;
  };
  structure.members.forEach((member, i) => {
    const found = solution.members[i];
    if (found === undefined) throw new Error("a member is missing");
    const [start = [0, 0, 0] as const, end = [0, 0, 0] as const] = onJoints(structure, i, found);
    put(member.start, start);
    put(member.end, end);
  });
  for (const load of loads) if (load.kind === "joint") put(load.joint, [load.fx, load.fy, load.couple]);
  for (const { joint, x = 0, y = 0, moment = 0 } of solution.reactions) put(joint, [x, y, moment]);
  const scale = scaleOf(solution, loads);
  for (const [joint, [x, y, m]] of sums) {
    expect(Math.abs(x), `sum x at ${joint}`).toBeLessThan(1e-9 * scale.force);
    expect(Math.abs(y), `sum y at ${joint}`).toBeLessThan(1e-9 * scale.force);
    expect(Math.abs(m), `sum M at ${joint}`).toBeLessThan(1e-9 * scale.moment);
  }
}

/** Loads as single forces: resultants of line loads at their centroids. */
export function expectWholeBalances({ structure, loads }: Model, solution: ElasticSolution): void {
  let [X, Y, M] = [0, 0, 0];
  const put = (x: number, y: number, fx: number, fy: number, couple = 0): void => {
    X += fx;
    Y += fy;
    M += x * fy - y * fx + couple;
  };
  const joint = (name: string) =>
    structure.joints.find((j) => j.name === name) ?? { x: Number.NaN, y: Number.NaN };
  for (const given of loads) {
    if (given.kind === "temperature" || given.kind === "settlement") continue;
    const load = inGlobalAxes(structure, given);
    if (load.kind === "joint") {
      put(joint(load.joint).x, joint(load.joint).y, load.fx, load.fy, load.couple);
      continue;
    }
    const member = structure.members.find((m) => m.name === load.member);
    if (member === undefined) throw new Error("no member");
    const axis = axisOf(structure, member);
    const at = (x: number): readonly [number, number] => [
      axis.start.x + axis.c * x,
      axis.start.y + axis.s * x,
    ];
    if (load.kind === "member point")
      put(...at(metresAlong(load.at, axis.length)), load.fx, load.fy, load.couple);
    else {
      const [a, b] = [metresAlong(load.begin, axis.length), metresAlong(load.end, axis.length)];
      const [first, second] = [(load.q1 * (b - a)) / 2, (load.q2 * (b - a)) / 2];
      const [dx, dy] = load.direction;
      put(...at(a + (b - a) / 3), first * dx, first * dy);
      put(...at(b - (b - a) / 3), second * dx, second * dy);
    }
  }
  for (const { joint: name, x = 0, y = 0, moment = 0 } of solution.reactions)
    put(joint(name).x, joint(name).y, x, y, moment);
  const scale = scaleOf(solution, loads);
  const reach = Math.max(...structure.joints.map((j) => Math.hypot(j.x, j.y)), 1);
  expect(Math.abs(X)).toBeLessThan(1e-9 * scale.force * structure.members.length);
  expect(Math.abs(Y)).toBeLessThan(1e-9 * scale.force * structure.members.length);
  expect(Math.abs(M)).toBeLessThan(1e-9 * (scale.moment + reach * scale.force) * structure.members.length);
}

/** Members move with their joints where they are connected to them, and bend as M/EI + curvature from temperature says. */
export function expectCompatible({ structure }: Model, solution: ElasticSolution): void {
  const moved = new Map(solution.joints.map((j) => [j.joint, j]));
  const size = Math.max(1e-12, ...solution.joints.map((j) => Math.hypot(j.x, j.y)));
  const turn = Math.max(
    1e-12,
    ...solution.members.flatMap((m) =>
      [0, 1].map((k) => Math.abs(valueAt(m.rotation, k * m.length, k === 0 ? "right" : "left"))),
    ),
  );
  structure.members.forEach((member, i) => {
    const m = solution.members[i];
    if (m === undefined) throw new Error("a member is missing");
    const { c, s, length } = axisOf(structure, member);
    for (const end of ["start", "end"] as const) {
      const joint = moved.get(member[end]);
      if (joint === undefined) throw new Error("a joint is missing");
      const { moment, shear, axial } = member.releases[end];
      const at = (f: ElasticMember["along"]): number =>
        end === "start" ? valueAt(f, 0) : valueAt(f, length, "left");
      const tolerance = 1e-9 * (size + turn * length);
      if (!axial) expect(Math.abs(at(m.along) - (joint.x * c + joint.y * s))).toBeLessThan(tolerance);
      if (!shear) expect(Math.abs(at(m.deflection) - (joint.y * c - joint.x * s))).toBeLessThan(tolerance);
      if (!moment)
        expect(Math.abs(at(m.rotation) - (joint.rotation ?? Number.NaN))).toBeLessThan(
          1e-9 * (turn + size / length),
        );
      const scale = scaleOf(solution, []);
      if (moment) expect(Math.abs(at(m.M))).toBeLessThan(1e-9 * scale.moment);
      if (shear) expect(Math.abs(at(m.V))).toBeLessThan(1e-9 * scale.force);
      if (axial) expect(Math.abs(at(m.N))).toBeLessThan(1e-9 * scale.force);
    }
  });
}

export const places: readonly number[] = [0.07, 0.31, 0.5, 0.83, 0.97];

export interface Change {
  readonly data: Plain;
  /** Member, place in it, and signs of N, V, M of the changed model for one of the given model. */
  readonly member: (name: string, x: number, length: number) => { readonly name: string; readonly x: number };
  readonly signs: readonly [N: number, V: number, M: number];
  readonly scale?: readonly [force: number, moment: number];
}

export function expectSame(
  data: Plain,
  { data: changed, member, signs, scale: [f, m] = [1, 1] }: Change,
): void {
  const [one, other] = [solved(data), solved(changed)];
  const found = new Map(other.members.map((x) => [x.member, x]));
  const scale = scaleOf(one, data.loads);
  for (const own of one.members)
    for (const place of places) {
      const x = place * own.length;
      const twin = member(own.member, x, own.length);
      const match = found.get(twin.name);
      if (match === undefined) throw new Error(`no member ${twin.name}`);
      (["N", "V", "M"] as const).forEach((key, k) => {
        const [unit, size] = key === "M" ? [m, scale.moment] : [f, scale.force];
        const gap = Math.abs(valueAt(own[key], x) * (signs[k] ?? 1) - valueAt(match[key], twin.x) / unit);
        expect(gap, `${key} of ${own.member} at ${place} L`).toBeLessThan(1e-8 * size);
      });
    }
}
