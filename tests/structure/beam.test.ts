import { describe, expect, it } from "vitest";
import { quantity } from "../../lib/quantity/index.ts";
import { beam } from "../../lib/structure/index.ts";

describe("beam", () => {
  it("beam({ spans: 6 m, 8 m }) has joints A, B, C at 0, 6, 14 m and members AB, BC", () => {
    const two = beam({ spans: ["6 m", "8 m"] });
    expect(two.joints.map(({ name, x, y }) => [name, x, y])).toEqual([
      ["A", 0, 0],
      ["B", 6, 0],
      ["C", 14, 0],
    ]);
    expect(two.members.map(({ name, start, end }) => [name, start, end])).toEqual([
      ["AB", "A", "B"],
      ["BC", "B", "C"],
    ]);
    expect(two.family).toBe("beam");
  });

  it("supports are pinned at A and rollers elsewhere", () => {
    expect(beam({ spans: ["6 m", "8 m"] }).supports.map((s) => s.kind)).toEqual([
      "pinned",
      "roller",
      "roller",
    ]);
  });

  it("a free end has no support", () => {
    const cantilever = beam({ spans: ["3 m"], supports: ["fixed", "free"] });
    expect(cantilever.supports.map((s) => [s.joint, s.kind, s.holds.rotation])).toEqual([
      ["A", "fixed", true],
    ]);
  });

  it("names are taken in order", () => {
    const named = beam({ spans: ["3 m"], names: ["P", "Q"] });
    expect(named.members[0]?.name).toBe("PQ");
  });

  it("spans in feet are read", () => {
    expect(beam({ spans: ["20 ft"] }).joints[1]?.x).toBeCloseTo(6.096, 12);
  });

  it("a joint carries the sources of all spans to its left", () => {
    const L = quantity(6, "length", { from: ["L@2"] });
    const M = quantity(8, "length", { from: ["M@1"] });
    const two = beam({ spans: [L, M] });
    expect(two.joints.map((j) => j.from)).toEqual([[], ["L@2"], ["L@2", "M@1"]]);
  });

  it("the result is frozen all the way down", () => {
    const one = beam({ spans: ["6 m"] });
    const parts = [
      one,
      one.joints,
      one.joints[0],
      one.members[0],
      one.members[0]?.releases.start,
      one.supports[0]?.holds,
    ];
    expect(parts.every((part) => Object.isFrozen(part))).toBe(true);
  });

  const refused: readonly (readonly [string, () => unknown, string])[] = [
    ["no spans", () => beam({ spans: [] }), "spans: 0 given, 1 wanted"],
    ["a zero span", () => beam({ spans: ["6 m", "0 m"] }), "span 2 is 0 m; more than zero is wanted"],
    ["a negative span", () => beam({ spans: ["-6 m"] }), "span is -6 m; more than zero is wanted"],
    [
      "a force as span",
      () => beam({ spans: ["6 kN" as "6 m"] }),
      'span: "6 kN" is a force; a length is wanted',
    ],
    [
      "too few supports",
      () => beam({ spans: ["6 m"], supports: ["pinned"] }),
      "supports: 1 given, 2 wanted, one per joint",
    ],
    [
      "no support at all",
      () => beam({ spans: ["6 m"], supports: ["free", "free"] }),
      "the structure has no supports",
    ],
    [
      "an unknown support",
      () => beam({ spans: ["6 m"], supports: ["pined" as "pinned", "roller"] }),
      '"pined"',
    ],
    ["a name twice", () => beam({ spans: ["6 m"], names: ["A", "A"] }), 'joint "A" is defined twice'],
    [
      "a name with a space",
      () => beam({ spans: ["6 m"], names: ["A", "B 2"] }),
      'joint name "B 2" is refused',
    ],
    [
      "too few names",
      () => beam({ spans: ["6 m"], names: ["A"] }),
      "names: 1 given, 2 wanted, one per joint",
    ],
  ];
  it.each(refused)("refuses %s", (_, make, words) => {
    expect(make).toThrow(words);
  });
});
