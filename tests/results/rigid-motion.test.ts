// A whole structure moving as one body, in words; a part of it moving by itself is not that.

import { describe, expect, test } from "vitest";
import { rigidMotionWords } from "../../lib/results/index.ts";
import { determinacy } from "../../lib/statics/index.ts";
import { type Structure, skeleton, structure } from "../../lib/structure/index.ts";

const line = (supports: Parameters<typeof structure>[0]["supports"], more: object = {}): Structure =>
  structure({
    joints: { A: ["0 m", "0 m"], B: ["4 m", "0 m"], C: ["8 m", "0 m"] },
    members: { AB: { ends: ["A", "B"], ...more }, BC: ["B", "C"] },
    supports,
  });

/** Motion of joints by dx, dy and a turn about the first. */
function moved(of: Structure, dx: number, dy: number, rotation: number): string | undefined {
  const cut = skeleton(of);
  const [first] = cut.nodes;
  const points = cut.nodes.map(({ name, x, y }) => ({
    name,
    ux: dx - rotation * (y - (first?.y ?? 0)),
    uy: dy + rotation * (x - (first?.x ?? 0)),
  }));
  const turns = cut.segments.map(({ member, begin, end }) => ({ member, begin, end, rotation }));
  return rigidMotionWords(cut, points, turns);
}

describe("rigidMotionWords", () => {
  test.each<[string, readonly [number, number, number]]>([
    ["the whole structure slides sideways", [1, 0, 0]],
    ["the whole structure moves up or down", [0, -1, 0]],
    ["the whole structure slides at a slope", [0.6, 0.8, 0]],
    ["the whole structure turns about A", [0, 0, 0.125]],
    ["the whole structure turns about C", [0, -1, 0.125]],
    ["the whole structure turns about the point x = 2 m, y = 0 m", [0, -0.25, 0.125]],
    ["the whole structure turns about the point x = 0 m, y = 8 m", [1, 0, 0.125]],
  ])("%s", (words, [dx, dy, rotation]) => {
    expect(moved(line({ A: "roller" }), dx, dy, rotation)).toBe(words);
  });

  test("says nothing of a part that moves by itself, though nothing turns", () => {
    expect(
      determinacy(line({ A: "fixed" }, { axialReleased: ["A"] })).mechanisms.map((m) => m.words),
    ).toEqual(["B and C move sideways together"]);
    expect(
      determinacy(line({ A: "fixed" }, { shearReleased: ["A"] })).mechanisms.map((m) => m.words),
    ).toEqual(["B and C drop"]);
  });
});
