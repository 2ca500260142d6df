import { describe, expect, it } from "vitest";
import { beam, portal, structure, withHinges } from "../../lib/structure/index.ts";

const frame = portal({ span: "14 m", height: "5.5 m", bases: "pinned" });

describe("withHinges", () => {
  it("names hinges h1, h2 in order and measures them from the member's start", () => {
    const hinged = withHinges(frame, [
      { member: "BC", from: "B", at: "0.125 L" },
      { member: "BC", from: "C", at: "1.75 m" },
    ]);
    expect(hinged.hinges.map(({ name, member, at }) => [name, member, at])).toEqual([
      ["h1", "BC", 1.75],
      ["h2", "BC", 12.25],
    ]);
  });

  it("leaves the structure it was given as it was", () => {
    withHinges(frame, [{ member: "BC", from: "B", at: "1 m" }]);
    expect(frame.hinges).toEqual([]);
  });

  it("goes on counting when hinges are added later", () => {
    const one = withHinges(frame, [{ member: "BC", from: "B", at: "1 m" }]);
    expect(withHinges(one, [{ member: "AB", from: "A", at: "1 m" }]).hinges.map((h) => h.name)).toEqual([
      "h1",
      "h2",
    ]);
  });

  it("a joint called h1 does not collide", () => {
    const odd = beam({ spans: ["6 m"], names: ["h1", "B"] });
    expect(withHinges(odd, [{ member: "h1B", from: "B", at: "1 m" }]).hinges[0]?.name).toBe("h2");
  });

  it("a hinge carries the sources it was given", () => {
    const hinged = withHinges(frame, [{ member: "BC", from: "B", at: "1 m", sources: ["hinge 1@1"] }]);
    expect(hinged.hinges[0]?.from).toEqual(["hinge 1@1"]);
  });

  const BC = (at: string): readonly { member: string; from: string; at: "1 m" }[] => [
    { member: "BC", from: "B", at: at as "1 m" },
  ];
  const refused: readonly (readonly [string, () => unknown, string])[] = [
    [
      "a hinge beyond the member",
      () => withHinges(frame, BC("15 m")),
      "hinge h1 is at 15 m on member BC, outside it; between 0 and 14 m is wanted",
    ],
    [
      "a hinge before the member",
      () => withHinges(frame, BC("-0.1 L")),
      "hinge h1 is at -1.4 m on member BC, outside it",
    ],
    ["a hinge at its start", () => withHinges(frame, BC("0 L")), "hinge h1 on member BC is at joint B"],
    ["a hinge at its end", () => withHinges(frame, BC("14 m")), "hinge h1 on member BC is at joint C"],
    [
      "an unknown member",
      () => withHinges(frame, [{ member: "XY", from: "B", at: "1 m" }]),
      'hinge h1 is on member "XY", which is not defined; members are AB, BC, CD',
    ],
    [
      "a joint that is not its end",
      () => withHinges(frame, [{ member: "BC", from: "A", at: "1 m" }]),
      'hinge h1 is measured from "A", which is not an end of member BC; its ends are B and C',
    ],
    [
      "two at one place",
      () => withHinges(frame, [...BC("7 m"), ...BC("0.5 L")]),
      "hinges h1 and h2 are at the same place, 7 m along member BC",
    ],
    [
      "a name taken",
      () => withHinges(frame, [{ member: "BC", from: "B", at: "1 m", name: "A" }]),
      '"A" is defined twice',
    ],
    ["a place that is no number", () => withHinges(frame, BC("half L")), '"half L" is no place on a member'],
    ["a force", () => withHinges(frame, BC("3 kN")), '"3 kN" is a force; a length is wanted'],
  ];
  it.each(refused)("refuses %s", (_, make, words) => {
    expect(make).toThrow(words);
  });

  it("refuses a hinge at a pin: a released end is at a joint too", () => {
    const pinned = structure({
      joints: { A: ["0 m", "0 m"], B: ["4 m", "0 m"] },
      members: { AB: { ends: ["A", "B"], released: ["B"] } },
      supports: { A: "fixed", B: "pinned" },
    });
    expect(() => withHinges(pinned, [{ member: "AB", from: "B", at: "0 m" }])).toThrow("at joint B");
  });
});
