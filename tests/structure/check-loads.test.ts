import { describe, expect, it } from "vitest";
import {
  atJoint,
  checkLoads,
  coupleLoad,
  type Load,
  pointLoad,
  portal,
  structure,
  uniform,
  withHinges,
} from "../../lib/structure/index.ts";

const frame = withHinges(portal({ span: "14 m", height: "5.5 m", bases: "pinned" }), [
  { member: "BC", from: "B", at: "2 m" },
]);

describe("checkLoads", () => {
  it("lets good loads pass", () => {
    const loads = [
      uniform("BC", "5 kN/m"),
      pointLoad("BC", "3 kN", { at: "14 m" }),
      atJoint("B", { right: "2 kN" }),
    ];
    expect(() => checkLoads(frame, loads)).not.toThrow();
  });

  it("a load that misses the end by rounding passes", () => {
    expect(() => checkLoads(frame, [pointLoad("BC", "3 kN", { at: "14.000000000001 m" })])).not.toThrow();
  });

  const bad: readonly (readonly [string, Load, string])[] = [
    [
      "an unknown member",
      uniform("XY", "5 kN/m"),
      'load 1 (5 kN/m) is on member "XY", which is not defined; members are AB, BC, CD',
    ],
    [
      "an unknown joint",
      atJoint("E", { up: "5 kN" }),
      'joint "E", which is not defined; joints are A, B, C, D',
    ],
    [
      "a point load beyond its member",
      pointLoad("BC", "5 kN", { at: "15 m" }),
      "is at 15 m on member BC, outside it; from 0 to 14 m is wanted",
    ],
    [
      "a point load before its member",
      { ...pointLoad("AB", "5 kN", { at: "0.5 m" }), at: { metres: -0.5 } },
      "is at -0.5 m on member AB",
    ],
    ["a line load that ends beyond", uniform("BC", "5 kN/m", { to: "21 m" }), "is at 21 m on member BC"],
    [
      "a line load that ends before it begins",
      uniform("BC", "5 kN/m", { from: "8 m", to: "0.5 L" }),
      "on member BC runs from 8 m to 7 m; its end must lie beyond its beginning",
    ],
    ["a couple on a hinge", coupleLoad("BC", "5 kN m", { at: "2 m" }), "acts exactly at hinge h1"],
    [
      "a load that is not finite",
      { ...uniform("BC", "5 kN/m"), q2: Number.NaN },
      "is NaN; a finite number is wanted",
    ],
  ];
  it.each(bad)("refuses %s", (_, load, words) => {
    expect(() => checkLoads(frame, [load])).toThrow(words);
  });

  it("refuses a couple on a joint where nothing takes it", () => {
    const pinned = structure({
      joints: { A: ["0 m", "0 m"], B: ["2 m", "2 m"], C: ["4 m", "0 m"] },
      members: { AB: { ends: ["A", "B"], released: ["B"] }, BC: { ends: ["B", "C"], released: ["B"] } },
      supports: { A: "pinned", C: "pinned" },
    });
    expect(() => checkLoads(pinned, [atJoint("B", { couple: "1 kN m" })])).toThrow(
      "acts on joint B, where every member end is released",
    );
  });
});
