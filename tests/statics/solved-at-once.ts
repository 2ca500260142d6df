// The whole structure solved at once, by plain Gauss elimination written here: what the sequence of free bodies must give.

import { type FreeBodySolution, valueAt } from "../../lib/results/index.ts";
import { equilibriumMatrix, loadVector } from "../../lib/statics/equilibrium-matrix.ts";
import type { Load, Structure } from "../../lib/structure/index.ts";

/** Unknowns of the equilibrium equations, moments over the size of the structure: row exchange, no library code. */
export function solvedAtOnce(structure: Structure, loads: readonly Load[]): readonly number[] {
  const equations = equilibriumMatrix(structure);
  const b = loadVector(equations, loads);
  const rows = equations.matrix.map((row, i) => [...row, -(b[i] ?? 0)]);
  const n = rows.length;
  for (let k = 0; k < n; k++) {
    const pivot = rows.reduce(
      (best, row, i) => (i >= k && Math.abs(row[k] ?? 0) > Math.abs(rows[best]?.[k] ?? 0) ? i : best),
      k,
    );
    [rows[k], rows[pivot]] = [rows[pivot] ?? [], rows[k] ?? []];
    const own = rows[k] ?? [];
    for (let i = k + 1; i < n; i++) {
      const row = rows[i] ?? [];
      const factor = (row[k] ?? 0) / (own[k] ?? Number.NaN);
      if (factor !== 0) for (let j = k; j <= n; j++) row[j] = (row[j] ?? 0) - factor * (own[j] ?? 0);
    }
  }
  const x = new Array<number>(n).fill(0);
  for (let k = n - 1; k >= 0; k--) {
    const row = rows[k] ?? [];
    let sum = row[n] ?? 0;
    for (let j = k + 1; j < n; j++) sum -= (row[j] ?? 0) * (x[j] ?? 0);
    x[k] = sum / (row[k] ?? Number.NaN);
  }
  return x;
}

/** The same unknowns in the same order, read from the free bodies. */
export function bySequence(structure: Structure, solution: FreeBodySolution): readonly number[] {
  const { unknowns, skeleton, size } = equilibriumMatrix(structure);
  return unknowns.map((unknown) => {
    if (unknown.kind === "reaction") {
      const found = solution.reactions.find((r) => r.joint === unknown.joint);
      if (unknown.component === "moment") return (found?.moment ?? Number.NaN) / size;
      const angle = structure.supports.find((s) => s.joint === unknown.joint)?.angle ?? 0;
      const [c, s] = [Math.cos(angle), Math.sin(angle)];
      const { x = 0, y = 0 } = found ?? {};
      return unknown.component === "x" ? c * x + s * y : c * y - s * x;
    }
    const segment = skeleton.segments[unknown.segment];
    const member = solution.members.find((m) => m.member === segment?.member);
    if (segment === undefined || member === undefined) return Number.NaN;
    if (unknown.kind === "M end") return valueAt(member.M, segment.end, "left") / size;
    if (unknown.kind !== "N") return valueAt(member.M, segment.begin) / size;
    return valueAt(member.N, segment.end, segment.end < member.length ? "right" : "left");
  });
}
