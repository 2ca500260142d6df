// Relations between the answers to two loads.
import fc from "fast-check";
import { describe, expect, test } from "vitest";
import { type ElasticSolution, valueAt } from "../../lib/results/index.ts";
import { axisOf, inGlobalAxes, metresAlong, type Structure } from "../../lib/structure/index.ts";
import { places, scaleOf, seed, solved } from "./checks.ts";
import { anyStructure, loadsOn, model, type Plain, type Plainload } from "./random.ts";

describe("exact: two loads", () => {
  test("superposition: a(P) + b(Q) = (aP + bQ)", () => {
    const two = anyStructure.chain((data) => fc.tuple(fc.constant(data), loadsOn(data), loadsOn(data)));
    fc.assert(
      fc.property(two, fc.double({ min: -3, max: 3, noNaN: true }), ([data, P, Q], b) => {
        const [p, q, both] = [
          solved({ ...data, loads: P }),
          solved({ ...data, loads: Q }),
          solved({ ...data, loads: [...P, ...Q.map((load) => times(load, b))] }),
        ];
        const [s1, s2] = [scaleOf(p, P), scaleOf(q, Q)];
        p.members.forEach((own, i) => {
          const [second, sum] = [q.members[i], both.members[i]];
          if (second === undefined || sum === undefined) throw new Error("a member is missing");
          for (const place of places)
            for (const key of ["N", "V", "M"] as const) {
              const x = place * own.length;
              const gap = valueAt(own[key], x) + b * valueAt(second[key], x) - valueAt(sum[key], x);
              const size = key === "M" ? s1.moment + 3 * s2.moment : s1.force + 3 * s2.force;
              expect(Math.abs(gap)).toBeLessThan(1e-9 * size);
            }
        });
      }),
      { seed, numRuns: 150 },
    );
  });

  test("reciprocity: the work of P on the displacements of Q is that of Q on those of P", () => {
    const forces = (data: Plain) =>
      loadsOn(data, false).map((loads) =>
        loads.filter((l) => l.kind === "joint" || l.kind === "member point"),
      );
    const two = anyStructure.chain((data) => fc.tuple(fc.constant(data), forces(data), forces(data)));
    fc.assert(
      fc.property(two, ([data, P, Q]) => {
        const [p, q] = [solved({ ...data, loads: P }), solved({ ...data, loads: Q })];
        const { structure } = model(data);
        const [a, b, own] = [work(structure, P, q), work(structure, Q, p), work(structure, P, p)];
        const size = Math.sqrt(Math.abs(own * work(structure, Q, q)));
        expect(Math.abs(a - b)).toBeLessThanOrEqual(1e-9 * size);
        expect(own).toBeGreaterThanOrEqual(0);
      }),
      { seed, numRuns: 200 },
    );
  });
});

function times(load: Plainload, b: number): Plainload {
  switch (load.kind) {
    case "distributed":
      return { ...load, q1: load.q1 * b, q2: load.q2 * b };
    case "temperature":
      return { ...load, uniform: load.uniform * b, difference: load.difference * b };
    case "settlement":
      return { ...load, x: load.x * b, y: load.y * b, rotation: load.rotation * b };
    default:
      return { ...load, fx: load.fx * b, fy: load.fy * b, couple: load.couple * b };
  }
}

/** Work of forces and couples at joints and on members on the displacements of a solution. */
function work(structure: Structure, loads: readonly Plainload[], solution: ElasticSolution): number {
  return loads.reduce((sum, given) => {
    if (given.kind === "joint") {
      const j = solution.joints.find((x) => x.joint === given.joint);
      return sum + given.fx * (j?.x ?? 0) + given.fy * (j?.y ?? 0) + given.couple * (j?.rotation ?? 0);
    }
    if (given.kind !== "member point") return sum;
    const load = inGlobalAxes(structure, given);
    const i = structure.members.findIndex((m) => m.name === load.member);
    const [member, found] = [structure.members[i], solution.members[i]];
    if (member === undefined || found === undefined) throw new Error("no member");
    const { c, s, length } = axisOf(structure, member);
    const x = metresAlong(load.at, length);
    const [u, v] = [valueAt(found.along, x), valueAt(found.deflection, x)];
    return (
      sum + load.fx * (u * c - v * s) + load.fy * (u * s + v * c) + load.couple * valueAt(found.rotation, x)
    );
  }, 0);
}
