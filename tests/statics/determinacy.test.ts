import { describe, expect, it } from "vitest";
import { type SelfStress, valueAt } from "../../lib/results/index.ts";
import { determinacy } from "../../lib/statics/index.ts";
import { axisOf, beam, portal, type Structure, withHinges } from "../../lib/structure/index.ts";
import { hinge, namedStructures, pinned } from "./named-structures.ts";

/** By redundant restraints (no, yes) and free motions (no, yes). */
const verdicts = [
  ["determinate", "mechanism"],
  ["indeterminate", "mechanism with self-stress"],
] as const;

/** Forces of a state of self-stress on every joint, added up by hand, are zero; so is the moment at every hinge. */
function expectBalanced(structure: Structure, { members, reactions }: SelfStress): void {
  const sums = new Map(structure.joints.map((j) => [j.name, [0, 0, 0]]));
  const put = (joint: string, forces: readonly number[]): void => {
    const sum = sums.get(joint) ?? [];
    forces.forEach((f, i) => {
      sum[i] = (sum[i] ?? 0) + f;
    });
  };
  let largest = 0;
  const [xs, ys] = [structure.joints.map((j) => j.x), structure.joints.map((j) => j.y)];
  const size = Math.hypot(Math.max(...xs) - Math.min(...xs), Math.max(...ys) - Math.min(...ys));
  for (const { member: name, length, N, V, M } of members) {
    const member = structure.members.find((m) => m.name === name);
    if (member === undefined) throw new Error(`no member ${name}`);
    const { c, s } = axisOf(structure, member);
    const at = (x: number, side: "left" | "right"): readonly number[] =>
      [N, V, M].map((f) => valueAt(f, x, side));
    for (const [joint, sign, [n = 0, v = 0, m = 0]] of [
      [member.start, 1, at(0, "right")],
      [member.end, -1, at(length, "left")],
    ] as const) {
      put(joint, [sign * (n * c + v * s), sign * (n * s - v * c), sign * m]);
      largest = Math.max(largest, Math.abs(n), Math.abs(v), Math.abs(m) / size);
    }
    for (const h of structure.hinges.filter((one) => one.member === name))
      expect(Math.abs(valueAt(M, h.at))).toBeLessThanOrEqual(1e-8 * size);
  }
  for (const { joint, x = 0, y = 0, moment = 0 } of reactions) {
    put(joint, [x, y, moment]);
    largest = Math.max(largest, Math.abs(x), Math.abs(y), Math.abs(moment) / size);
  }
  for (const [joint, sum] of sums)
    for (const part of sum) expect(Math.abs(part), `sum at ${joint}`).toBeLessThanOrEqual(1e-8 * size);
  expect(largest).toBeLessThanOrEqual(1 + 1e-9);
  expect(largest).toBeGreaterThan(0);
}

describe("determinacy", () => {
  it.each(namedStructures)(
    "determinacy($name): degree $degree, $motions motions, $selfStress states of self-stress",
    (row) => {
      const found = determinacy(row.of);
      const { reactions, members, joints, conditions, degree } = found.count;
      expect([reactions, members, joints, conditions]).toEqual(row.count);
      expect(degree).toBe(row.degree);
      expect(found.selfStress).toBe(row.selfStress);
      expect(found.mechanisms).toHaveLength(row.motions);
      for (const words of row.words) expect(found.words).toContain(words);
      expect(found.rank).toBe(found.unknowns - found.selfStress);
      expect(found.unknowns - found.equations).toBe(degree);
      expect(found.verdict).toBe(verdicts[row.selfStress > 0 ? 1 : 0]?.[row.motions > 0 ? 1 : 0]);
      expect(found.hidden).toBe(Math.min(row.selfStress, row.motions));
      expect(found.selfStresses).toHaveLength(row.selfStress);
      for (const state of found.selfStresses) expectBalanced(row.of, state);
    },
  );

  it("there are at least 40 named structures, ten of them unstable though the count says determinate", () => {
    expect(namedStructures.length).toBeGreaterThanOrEqual(40);
    const deceived = namedStructures.filter((r) => r.degree === 0 && r.motions > 0);
    expect(deceived.length).toBeGreaterThanOrEqual(10);
  });

  it("axial force along a line is told apart from bars and from bending", () => {
    const kinds = (of: Structure): readonly string[] => determinacy(of).selfStresses.map((s) => s.kind);
    expect(kinds(beam({ spans: ["6 m"], supports: ["pinned", "pinned"] }))).toEqual(["line"]);
    expect(kinds(beam({ spans: ["6 m"], supports: ["fixed", "fixed"] }))).toEqual([
      "line",
      "bending",
      "bending",
    ]);
    const braced = namedStructures.find((r) => r.name === "square with two diagonals")?.of ?? pinned;
    expect(kinds(braced)).toEqual(["bars"]);
  });

  it("the verdict does not depend on the size of the structure", () => {
    for (const factor of [1e-3, 1, 1e3]) {
      const sized = portal({ span: `${14 * factor} m`, height: `${5.5 * factor} m`, bases: "fixed" });
      expect(determinacy(sized).selfStress).toBe(3);
    }
  });

  it("a hinge very near a joint does not spoil the rank", () => {
    const near = withHinges(pinned, [hinge("BC", "B", "0.00001 L")]);
    expect(determinacy(near).verdict).toBe("determinate");
  });

  it("a motion leaves every member's length as it was and its supports still", () => {
    const swaying =
      namedStructures.find((r) => r.name === "pinned portal with two beam hinges")?.of ?? pinned;
    const [motion] = determinacy(swaying).mechanisms;
    const at = (name: string): { ux: number; uy: number } =>
      motion?.points.find((p) => p.name === name) ?? { ux: Number.NaN, uy: Number.NaN };
    expect([at("A"), at("D")].map(({ ux, uy }) => [ux, uy])).toEqual([
      [0, 0],
      [0, 0],
    ]);
    expect(at("B").ux).toBeCloseTo(at("C").ux, 12);
    expect(Math.max(...(motion?.points ?? []).flatMap((p) => [Math.abs(p.ux), Math.abs(p.uy)]))).toBeCloseTo(
      1,
      12,
    );
    // column AB turns clockwise by ux/h, and the beam as far as h1 with it
    const [column, arm] = motion?.turns ?? [];
    expect(column?.rotation).toBeCloseTo(-1 / 5.5, 12);
    expect(arm?.rotation).toBeCloseTo(-1 / 5.5, 12);
    expect(at("h1").uy).toBeCloseTo(-1.75 / 5.5, 12);
  });

  it("the answer is frozen", () => {
    expect(Object.isFrozen(determinacy(pinned).count)).toBe(true);
  });
});
