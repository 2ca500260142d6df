import { describe, expect, it } from "vitest";
import { balance } from "../../lib/statics/index.ts";
import {
  atJoint,
  beam,
  type Load,
  pointLoad,
  portal,
  type Structure,
  uniform,
  withHinges,
} from "../../lib/structure/index.ts";

const frame = portal({ span: "14 m", height: "5.5 m", bases: "pinned" });
const hinged = withHinges(frame, [
  { member: "BC", from: "B", at: "0.125 L" },
  { member: "BC", from: "C", at: "0.125 L" },
]);
const folding = withHinges(beam({ spans: ["6 m", "6 m"] }), [
  { member: "AB", from: "A", at: "2 m" },
  { member: "AB", from: "B", at: "2 m" },
]);
const sliding = beam({ spans: ["4 m", "4 m"], supports: ["roller", "roller", "roller"] });

const only = "a mechanism; balances this load only; would sway under any other";
const sway = "nothing resists sway: B and C move sideways together, columns AB and CD turn about A and D";

const rows: readonly (readonly [string, Structure, readonly Load[], boolean, string])[] = [
  [
    "a stable frame, any load",
    frame,
    [atJoint("B", { right: "5 kN" })],
    true,
    "stable: this load and any other is balanced",
  ],
  ["two hinges, symmetric gravity", hinged, [uniform("BC", "12 kN/m")], true, only],
  [
    "two hinges, symmetric pair of forces",
    hinged,
    [pointLoad("BC", "5 kN", { at: "2 m" }), pointLoad("BC", "5 kN", { at: "12 m" })],
    true,
    only,
  ],
  ["two hinges, half the span loaded", hinged, [uniform("BC", "12 kN/m", { to: "0.5 L" })], false, sway],
  ["two hinges, force at the eave", hinged, [atJoint("B", { right: "1 kN" })], false, sway],
  [
    "two hinges, gravity and a small eave force",
    hinged,
    [uniform("BC", "12 kN/m"), atJoint("B", { right: "10 N" })],
    false,
    sway,
  ],
  [
    "two hinges, two opposite eave forces",
    hinged,
    [atJoint("B", { right: "7 kN" }), atJoint("C", { left: "7 kN" })],
    true,
    only,
  ],
  [
    "folding span, load on the other span",
    folding,
    [uniform("BC", "5 kN/m")],
    true,
    "a mechanism; balances this load only; would move",
  ],
  ["folding span, loaded", folding, [uniform("AB", "5 kN/m")], false, "nothing resists this motion: h1"],
  [
    "three rollers, gravity",
    sliding,
    [uniform("AB", "5 kN/m")],
    true,
    "would move (the whole structure slides sideways) under any other",
  ],
  [
    "three rollers, a sideways force",
    sliding,
    [atJoint("B", { left: "1 kN" })],
    false,
    "nothing resists this motion: the whole structure slides sideways",
  ],
];

describe("balance", () => {
  it.each(rows)("balance(%s)", (_, structure, loads, balanced, words) => {
    const found = balance(structure, loads);
    expect(found.balanced).toBe(balanced);
    expect(found.words).toContain(words);
    expect(found.driven).toHaveLength(balanced ? 0 : 1);
    expect(/\bstable/.test(found.words)).toBe(structure === frame);
  });

  it("the motion named goes the way the load drives it", () => {
    const [left] = balance(hinged, [atJoint("B", { left: "1 kN" })]).driven;
    expect(left?.points.find((p) => p.name === "B")?.ux).toBeLessThan(0);
    const [half] = balance(hinged, [uniform("BC", "12 kN/m", { to: "0.5 L" })]).driven;
    expect(half?.points.find((p) => p.name === "h1")?.uy).toBeLessThan(0);
  });

  it("refuses a load that does not fit the structure", () => {
    expect(() => balance(frame, [uniform("XY", "5 kN/m")])).toThrow('"XY"');
  });
});
