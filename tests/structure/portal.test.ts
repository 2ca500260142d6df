import { describe, expect, it } from "vitest";
import { portal } from "../../lib/structure/index.ts";

describe("portal", () => {
  const frame = portal({ span: "14 m", height: "5.5 m", bases: "pinned" });

  it("portal(14 m, 5.5 m) has joints A, B, C, D round the frame", () => {
    expect(frame.joints.map(({ name, x, y }) => [name, x, y])).toEqual([
      ["A", 0, 0],
      ["B", 0, 5.5],
      ["C", 14, 5.5],
      ["D", 14, 0],
    ]);
  });

  it("the right side of every member, walked from start to end, is the inside of the frame", () => {
    for (const member of frame.members) {
      const [a, b] = [member.start, member.end].map((name) => frame.joints.find((j) => j.name === name));
      const [dx, dy] = [(b?.x ?? 0) - (a?.x ?? 0), (b?.y ?? 0) - (a?.y ?? 0)];
      const [mx, my] = [((a?.x ?? 0) + (b?.x ?? 0)) / 2, ((a?.y ?? 0) + (b?.y ?? 0)) / 2];
      const right = [dy, -dx] as const;
      expect((7 - mx) * right[0] + (2.75 - my) * right[1]).toBeGreaterThan(0);
    }
  });

  it("bases may differ", () => {
    const mixed = portal({ span: "14 m", height: "5.5 m", bases: { left: "fixed", right: "pinned" } });
    expect(mixed.supports.map((s) => [s.joint, s.kind])).toEqual([
      ["A", "fixed"],
      ["D", "pinned"],
    ]);
  });

  const refused: readonly (readonly [string, () => unknown, string])[] = [
    ["no height", () => portal({ span: "14 m", height: "0 m", bases: "pinned" }), "height is 0 m"],
    ["a roller base", () => portal({ span: "14 m", height: "5 m", bases: "roller" as "pinned" }), '"roller"'],
    [
      "three names",
      () => portal({ span: "14 m", height: "5 m", bases: "pinned", names: ["A", "B", "C"] }),
      "3 given, 4 wanted",
    ],
  ];
  it.each(refused)("refuses %s", (_, make, words) => {
    expect(make).toThrow(words);
  });
});
