// A second opinion that is not ours: frames assembled here in the textbook way, full matrices of 6 × 6 beam elements and
// fixed-end forces from tables, and solved by a general-purpose matrix library.
import fc from "fast-check";
import { Matrix, solve as solveDense } from "ml-matrix";
import { describe, expect, test } from "vitest";
import { exact } from "../../lib/exact/index.ts";
import { valueAt } from "../../lib/results/index.ts";
import { axisOf, type Load, metresAlong, type Structure } from "../../lib/structure/index.ts";
import { benchFrame } from "./bench-frames.ts";
import { loadsOn, model, type Plain, plain, rigidFrame } from "./random.ts";

/** Element matrix in its own axes over (u1, v1, θ1, u2, v2, θ2). */
function element(EA: number, EI: number, L: number): number[][] {
  const [a, b, c, d] = [EA / L, (12 * EI) / L ** 3, (6 * EI) / L ** 2, (4 * EI) / L];
  return [
    [a, 0, 0, -a, 0, 0],
    [0, b, c, 0, -b, c],
    [0, c, d, 0, -c, d / 2],
    [-a, 0, 0, a, 0, 0],
    [0, -b, -c, 0, b, -c],
    [0, c, d / 2, 0, -c, d],
  ];
}

/** Equivalent joint forces of a full-length line load or a force, in member axes (W. McGuire et al., Matrix Structural
 *  Analysis, fixed-end forces; from memory). */
function equivalent(load: Load, L: number, c: number, s: number): number[] {
  if (load.kind === "distributed") {
    const [dx, dy] = load.direction;
    const [p, w] = [dx * c + dy * s, dy * c - dx * s];
    const [q1, q2] = [load.q1, load.q2];
    const [first, second] = [(2 * q1 + q2) / 6, (q1 + 2 * q2) / 6];
    return [
      p * L * first,
      ((7 * q1 + 3 * q2) / 20) * w * L,
      ((3 * q1 + 2 * q2) / 60) * w * L * L,
      p * L * second,
      ((3 * q1 + 7 * q2) / 20) * w * L,
      (-(2 * q1 + 3 * q2) / 60) * w * L * L,
    ];
  }
  if (load.kind !== "member point") return [0, 0, 0, 0, 0, 0];
  const a = metresAlong(load.at, L);
  const b = L - a;
  const [P, Q, C] = [load.fx * c + load.fy * s, load.fy * c - load.fx * s, load.couple];
  return [
    (P * b) / L,
    (Q * b * b * (3 * a + b)) / L ** 3 - (6 * C * a * b) / L ** 3,
    (Q * a * b * b) / L ** 2 - (C * b * (2 * a - b)) / L ** 2,
    (P * a) / L,
    (Q * a * a * (a + 3 * b)) / L ** 3 + (6 * C * a * b) / L ** 3,
    (-Q * a * a * b) / L ** 2 - (C * a * (2 * b - a)) / L ** 2,
  ];
}

/** Displacements of all joints, three each, and per member its end forces in its own axes. */
function dense(structure: Structure, loads: readonly Load[]): { u: number[]; ends: number[][] } {
  const index = new Map(structure.joints.map((j, i) => [j.name, i]));
  const n = 3 * structure.joints.length;
  const K = Matrix.zeros(n, n);
  const F = new Array<number>(n).fill(0);
  const parts = structure.members.map((member) => {
    const { c, s, length: L } = axisOf(structure, member);
    const { E, A, I } = member.section ?? { E: 0, A: 0, I: 0 };
    const T = Matrix.zeros(6, 6);
    for (const o of [0, 3]) {
      T.set(o, o, c)
        .set(o + 1, o + 1, c)
        .set(o + 2, o + 2, 1);
      T.set(o, o + 1, s).set(o + 1, o, -s);
    }
    const k = new Matrix(element(E * A, E * I, L));
    const fixed = Matrix.zeros(6, 1);
    for (const load of loads)
      if (load.kind !== "joint" && load.member === member.name)
        fixed.add(Matrix.columnVector(equivalent(load, L, c, s)));
    const places = [member.start, member.end].flatMap((name) =>
      [0, 1, 2].map((d) => 3 * (index.get(name) ?? 0) + d),
    );
    const global = T.transpose().mmul(k).mmul(T);
    const forces = T.transpose().mmul(fixed);
    places.forEach((row, i) => {
      F[row] = (F[row] ?? 0) + forces.get(i, 0);
      places.forEach((column, j) => {
        K.set(row, column, K.get(row, column) + global.get(i, j));
      });
    });
    return { T, k, fixed, places };
  });
  for (const load of loads)
    if (load.kind === "joint")
      [load.fx, load.fy, load.couple].forEach((value, d) => {
        const row = 3 * (index.get(load.joint) ?? 0) + d;
        F[row] = (F[row] ?? 0) + value;
      });
  const held = new Set(
    structure.supports.flatMap(({ joint, holds }) =>
      [holds.x, holds.y, holds.rotation].flatMap((h, d) => (h ? [3 * (index.get(joint) ?? 0) + d] : [])),
    ),
  );
  const free = Array.from({ length: n }, (_, i) => i).filter((i) => !held.has(i));
  const x = solveDense(K.selection(free, free), Matrix.columnVector(free.map((i) => F[i] ?? 0)));
  const u = new Array<number>(n).fill(0);
  free.forEach((i, k) => {
    u[i] = x.get(k, 0);
  });
  const ends = parts.map(({ T, k, fixed, places }) =>
    k
      .mmul(T)
      .mmul(Matrix.columnVector(places.map((p) => u[p] ?? 0)))
      .sub(fixed)
      .to1DArray(),
  );
  return { u, ends };
}

function expectAgreement(structure: Structure, loads: readonly Load[]): void {
  const { u, ends } = dense(structure, loads);
  const solution = exact(structure, loads);
  const [move, turn] = [
    Math.max(...u.filter((_, i) => i % 3 !== 2).map(Math.abs)),
    Math.max(...u.filter((_, i) => i % 3 === 2).map(Math.abs)),
  ];
  solution.joints.forEach((j, i) => {
    expect(Math.abs(j.x - (u[3 * i] ?? Number.NaN))).toBeLessThanOrEqual(1e-8 * move);
    expect(Math.abs(j.y - (u[3 * i + 1] ?? Number.NaN))).toBeLessThanOrEqual(1e-8 * move);
    expect(Math.abs((j.rotation ?? 0) - (u[3 * i + 2] ?? Number.NaN))).toBeLessThanOrEqual(1e-8 * turn);
  });
  const force = Math.max(...ends.flatMap((e) => [0, 1, 3, 4].map((k) => Math.abs(e[k] ?? 0))));
  const moment = Math.max(...ends.flatMap((e) => [2, 5].map((k) => Math.abs(e[k] ?? 0))));
  solution.members.forEach((m, i) => {
    const e = ends[i] ?? [];
    const pairs = [
      [valueAt(m.N, 0), -(e[0] ?? Number.NaN), force],
      [valueAt(m.V, 0), e[1] ?? Number.NaN, force],
      [valueAt(m.M, 0), -(e[2] ?? Number.NaN), moment],
      [valueAt(m.N, m.length, "left"), e[3] ?? Number.NaN, force],
      [valueAt(m.V, m.length, "left"), -(e[4] ?? Number.NaN), force],
      [valueAt(m.M, m.length, "left"), e[5] ?? Number.NaN, moment],
    ] as const;
    for (const [got, wanted, size] of pairs) expect(Math.abs(got - wanted)).toBeLessThanOrEqual(1e-8 * size);
  });
}

/** Only loads there are table entries for: line loads over the whole member, in global directions. */
function fullLength(data: Plain): Plain["loads"] {
  return data.loads.flatMap((load): Plain["loads"] => {
    if (load.kind === "temperature" || load.kind === "settlement") return [];
    if (load.kind === "joint") return [load];
    const { axes: _, ...rest } = load;
    return rest.kind === "distributed" ? [{ ...rest, begin: { fraction: 0 }, end: { fraction: 1 } }] : [rest];
  });
}

describe("exact(frame) against a dense solution by a matrix library", () => {
  test("40 random frames, girders and trees agree to 1e-8", () => {
    let solved = 0;
    fc.assert(
      fc.property(
        rigidFrame.chain((data) => loadsOn(data, false).map((loads) => ({ ...data, loads }))),
        (data) => {
          const { structure, loads } = model({ ...data, loads: fullLength(data) });
          expectAgreement(structure, loads as readonly Load[]);
          solved += 1;
        },
      ),
      { seed: 4, numRuns: 40 },
    );
    expect(solved).toBeGreaterThanOrEqual(40);
  });

  test("a building frame of 5 bays and 8 storeys agrees to 1e-8", () => {
    const { structure, loads } = benchFrame(5, 8);
    expectAgreement(structure, loads);
    expect(plain(structure).joints).toHaveLength(54);
  });
});
