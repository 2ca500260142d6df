// Over-hinged structures under loads they balance: a mechanism solved all the same, and refused under any other load.

import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { balance, determinacy, freeBodies } from "../../lib/statics/index.ts";
import {
  atJoint,
  type Load,
  pointLoad,
  portal,
  type Structure,
  uniform,
  withHinges,
} from "../../lib/structure/index.ts";
import { forceScale, seed, sumsOf } from "./frames.ts";

const part = fc.integer({ min: 5, max: 35 }).map((n) => n / 100);
const length = fc.integer({ min: 30, max: 150 }).map((n) => n / 10);
const size = fc.integer({ min: 1, max: 40 });
const cases = fc.record({
  span: length,
  height: length,
  part,
  column: part,
  fixed: fc.boolean(),
  w: size,
  P: size,
  at: part,
});

/** Symmetric portals with two hinges in the beam, and where the bases are fixed one in each column besides. */
function symmetric(given: typeof cases extends fc.Arbitrary<infer T> ? T : never): {
  readonly of: Structure;
  readonly loads: readonly Load[];
} {
  const { span, height, part: beam, column, fixed, w, P, at } = given;
  const plain = portal({ span: `${span} m`, height: `${height} m`, bases: fixed ? "fixed" : "pinned" });
  const columns = [
    { member: "AB", from: "A", at: `${column} L` },
    { member: "CD", from: "D", at: `${column} L` },
  ] as const;
  const of = withHinges(plain, [
    { member: "BC", from: "B", at: `${beam} L` },
    { member: "BC", from: "C", at: `${beam} L` },
    ...(fixed ? columns : []),
  ]);
  const loads = [
    uniform("BC", `${w} kN/m`),
    pointLoad("BC", `${P} kN`, { at: `${at} L` }),
    pointLoad("BC", `${P} kN`, { at: `${1 - at} L` }),
  ];
  return { of, loads };
}

describe(`over-hinged symmetric portals (seed ${seed})`, () => {
  it("are mechanisms, solved under symmetric load with every body in balance and every equation left over closed", () => {
    fc.assert(
      fc.property(cases.map(symmetric), ({ of, loads }) => {
        expect(determinacy(of).verdict).toBe("mechanism");
        expect(balance(of, loads).words).toContain("balances this load only");
        const solution = freeBodies(of, loads);
        const scale = forceScale(solution);
        for (const body of solution.bodies)
          for (const sum of sumsOf(body).sums) expect(Math.abs(sum)).toBeLessThanOrEqual(1e-9 * scale * 20);
        expect(solution.closures.length).toBeGreaterThan(0);
        for (const { sum, scale: own } of solution.closures)
          expect(Math.abs(sum)).toBeLessThanOrEqual(1e-9 * Math.max(own, scale));
        const [A, D] = [solution.reactions[0], solution.reactions[1]];
        expect(Math.abs((A?.x ?? 0) + (D?.x ?? 0))).toBeLessThanOrEqual(1e-9 * scale);
        expect(Math.abs((A?.y ?? 0) - (D?.y ?? 0))).toBeLessThanOrEqual(1e-9 * scale);
      }),
      { seed, numRuns: 80 },
    );
  });

  it("are refused under a push, with the sway named", () => {
    fc.assert(
      fc.property(cases.map(symmetric), ({ of, loads }) => {
        expect(() => freeBodies(of, [...loads, atJoint("B", { right: "1 kN" })])).toThrow(/sway/);
      }),
      { seed, numRuns: 40 },
    );
  });
});
