import { describe, expect, it } from "vitest";
import { equilibrium, freeBodies } from "../../lib/statics/index.ts";
import { solvableWhole } from "../../lib/statics/solvable.ts";
import { verifyAgainstWhole } from "../../lib/statics/verify.ts";
import { atJoint, portal, uniform, varying, withHinges } from "../../lib/structure/index.ts";

const frame = withHinges(portal({ span: "10 m", height: "4 m", bases: "pinned" }), [
  { member: "BC", from: "B", at: "0.5 L" },
]);
const loads = [
  uniform("BC", "6 kN/m"),
  varying("AB", "0 kN/m", "3 kN/m", { direction: "right" }),
  atJoint("C", { right: "5 kN", couple: "2 kN m" }),
];

describe("equilibrium", () => {
  it("closes with the reactions found", () => {
    expect(equilibrium(frame, loads, freeBodies(frame, loads).reactions).closes).toBe(true);
  });

  it("does not close with a reaction that is off by one part in a million", () => {
    const { reactions } = freeBodies(frame, loads);
    const wrong = reactions.map((r, i) => (i === 0 ? { ...r, y: (r.y ?? 0) * (1 + 1e-6) } : r));
    const found = equilibrium(frame, loads, wrong);
    expect(found.closes).toBe(false);
    expect(found.sumFy).toBeCloseTo((reactions[0]?.y ?? 0) * 1e-6, 9);
  });

  it("without reactions the sums are those of the loads", () => {
    const { sumFx, sumFy, sumM, about } = equilibrium(frame, loads, []);
    expect([sumFx, sumFy, about]).toEqual([11000, -60000, "A"]);
    // triangle 6 kN at 2/3 of 4 m, 60 kN at 5 m, 5 kN at 4 m, couple 2 kN·m
    expect(sumM).toBeCloseTo(-6000 * (8 / 3) - 60000 * 5 - 5000 * 4 + 2000, 6);
  });
});

describe("verifyAgainstWhole", () => {
  const { members, reactions } = freeBodies(frame, loads);
  const { equilibrium: equations, whole, largest } = solvableWhole(frame, loads);

  it("passes what free bodies found", () => {
    expect(() => verifyAgainstWhole(equations, whole, largest, members, reactions)).not.toThrow();
  });

  it("throws on a reaction or a member force that differs, naming it", () => {
    const off = reactions.map((r) => (r.joint === "D" ? { ...r, x: (r.x ?? 0) + 0.01 } : r));
    expect(() => verifyAgainstWhole(equations, whole, largest, members, off)).toThrow(
      "internal check failed: the reaction at D is",
    );
    const bent = members.map((m) => (m.member === "AB" ? { ...m, M: m.N } : m));
    expect(() => verifyAgainstWhole(equations, whole, largest, bent, reactions)).toThrow("of AB is");
  });
});
