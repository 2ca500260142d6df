import { describe, expect, test } from "vitest";
import { portal, truss, withHinges, withNames } from "../../lib/structure/index.ts";

describe("withNames", () => {
  test("joints, the members named after them, supports and hinges follow", () => {
    const frame = withHinges(portal({ span: "8 m", height: "4 m", bases: "pinned" }), [
      { member: "BC", from: "B", at: "1 m" },
    ]);
    const renamed = withNames(frame, { B: "K1", C: "K2", D: "E" });
    expect(renamed.joints.map((j) => j.name)).toEqual(["A", "K1", "K2", "E"]);
    expect(renamed.members.map((m) => [m.name, m.start, m.end])).toEqual([
      ["AK1", "A", "K1"],
      ["K1K2", "K1", "K2"],
      ["K2E", "K2", "E"],
    ]);
    expect(renamed.supports.map((s) => s.joint)).toEqual(["A", "E"]);
    expect(renamed.hinges[0]).toMatchObject({ name: "h1", member: "K1K2", at: 1 });
    expect(Object.isFrozen(renamed.members[0])).toBe(true);
    expect(frame.joints.map((j) => j.name)).toEqual(["A", "B", "C", "D"]);
  });

  test("what is wrong is named", () => {
    const t = truss({ panels: ["3 m", "3 m"], depth: "2 m", diagonals: "rising" });
    expect(() => withNames(t, { X: "A" })).toThrow('what is renamed is joint "X", which is not defined');
    expect(() => withNames(t, { L0: "L1" })).toThrow('joint "L1" is defined twice');
    expect(() => withNames(t, { L0: "1" })).toThrow('joint name "1" is refused');
  });
});
