import { describe, expect, test } from "vitest";
import { loadFaults, mirrorOf, structureFaults } from "../../lib/guide/mirror.ts";
import {
  atJoint,
  beam,
  buildingFrame,
  coupleLoad,
  partial,
  pointLoad,
  portal,
  structure,
  uniform,
  varying,
  withHinges,
} from "../../lib/structure/index.ts";
import type { Load, Structure } from "../../lib/structure/types.ts";

const frame = portal({ span: "12 m", height: "5 m", bases: "pinned" });
const tower = buildingFrame({ bays: ["6 m", "4 m", "6 m"], storeys: ["4 m", "3 m"], bases: "fixed" });
const faultsOf = (one: Structure): readonly string[] => structureFaults(one, mirrorOf(one));

describe("structureFaults", () => {
  test.each<[string, Structure, readonly (string | RegExp)[]]>([
    ["portal", frame, []],
    ["tower whose columns all go up", tower, []],
    ["beam, pinned at one end only", beam({ spans: ["5 m", "5 m"] }), []],
    [
      "hinges at like distances",
      withHinges(frame, [
        { member: "BC", from: "B", at: "0.1 L" },
        { member: "BC", from: "C", at: "1.2 m" },
      ]),
      [],
    ],
    [
      "hinges in columns that both go up",
      withHinges(tower, [
        { member: "A0A1", from: "A0", at: "1 m" },
        { member: "D0D1", from: "D0", at: "1 m" },
      ]),
      [],
    ],
    [
      "hinges at unlike distances",
      withHinges(frame, [
        { member: "BC", from: "B", at: "0.1 L" },
        { member: "BC", from: "C", at: "0.2 L" },
      ]),
      [/hinge h1 in BC has no mirror image in BC/, /hinge h2/],
    ],
    ["uneven spans", beam({ spans: ["5 m", "6 m"] }), [/joint B has no mirror image/]],
    [
      "uneven bases",
      portal({ span: "8 m", height: "4 m", bases: { left: "pinned", right: "fixed" } }),
      [/support at A \(pinned\) is not the mirror image of that at D \(fixed\)/],
    ],
    [
      "a beam left out",
      buildingFrame({ bays: ["6 m", "6 m"], storeys: ["3 m", "3 m"], bases: "fixed", without: ["A1B1"] }),
      [/member B1C1 has no mirror image between B1 and A1/],
    ],
    [
      "a release at one end only",
      structure({
        joints: { A: ["0 m", "0 m"], B: ["0 m", "4 m"], C: ["6 m", "4 m"], D: ["6 m", "0 m"] },
        members: { AB: ["A", "B"], BC: { ends: ["B", "C"], released: ["C"] }, CD: ["C", "D"] },
        supports: { A: "fixed", D: "fixed" },
      }),
      [/end releases of BC and BC are not mirror images/],
    ],
  ])("%s", (_, one, wanted) => {
    const found = faultsOf(one);
    expect(found).toHaveLength(wanted.length);
    for (const [i, words] of wanted.entries()) expect(found[i]).toMatch(words);
  });
});

describe("loadFaults", () => {
  test.each<[string, Structure, readonly Load[], readonly RegExp[]]>([
    [
      "uniform, and in two halves",
      frame,
      [
        uniform("BC", "4 kN/m"),
        uniform("BC", "1 kN/m", { from: "0 L", to: "0.5 L" }),
        uniform("BC", "1 kN/m", { from: "0.5 L", to: "1 L" }),
      ],
      [],
    ],
    [
      "pushes inward on both columns",
      frame,
      [uniform("AB", "2 kN/m", { direction: "right" }), uniform("CD", "2 kN/m", { direction: "left" })],
      [],
    ],
    [
      "the same on columns that both go up",
      tower,
      [uniform("A0A1", "2 kN/m", { direction: "right" }), uniform("D0D1", "2 kN/m", { direction: "left" })],
      [],
    ],
    ["weight along columns", tower, [uniform("A0A1", "2 kN/m"), uniform("D0D1", "2 kN/m")], []],
    [
      "forces at joints",
      frame,
      [
        atJoint("B", { right: "3 kN", down: "2 kN", couple: "5 kN m" }),
        atJoint("C", { left: "3 kN", down: "2 kN", couple: "-5 kN m" }),
      ],
      [],
    ],
    [
      "two triangles",
      frame,
      [
        varying("BC", "0 kN/m", "6 kN/m", { from: "0 L", to: "0.5 L" }),
        varying("BC", "6 kN/m", "0 kN/m", { from: "0.5 L", to: "1 L" }),
      ],
      [],
    ],
    [
      "forces at like places, couples turned round",
      frame,
      [
        pointLoad("BC", "5 kN", { at: "0.25 L" }),
        pointLoad("BC", "5 kN", { at: "9 m" }),
        coupleLoad("BC", "3 kN m", { at: "2 m" }),
        coupleLoad("BC", "-3 kN m", { at: "10 m" }),
      ],
      [],
    ],
    [
      "couples turned alike",
      frame,
      [coupleLoad("BC", "3 kN m", { at: "2 m" }), coupleLoad("BC", "3 kN m", { at: "10 m" })],
      [/load on BC is not alike from both its ends/],
    ],
    [
      "wind from one side",
      frame,
      [uniform("AB", "2 kN/m", { direction: "right" })],
      [/load on AB is not the mirror image of that on CD/],
    ],
    ["half the beam", frame, [partial("BC", "2 kN/m", { from: "0 L", to: "0.5 L" })], [/load on BC/]],
    [
      "one bay of two alike",
      tower,
      [uniform("A1B1", "5 kN/m")],
      [/load on A1B1 is not the mirror image of that on C1D1/],
    ],
    [
      "a push at both joints",
      frame,
      [atJoint("B", { right: "3 kN" }), atJoint("C", { right: "3 kN" })],
      [/load at joint B is not the mirror image of that at C/],
    ],
    [
      "a push on the middle line",
      beam({ spans: ["5 m", "5 m"] }),
      [atJoint("B", { right: "3 kN" })],
      [/joint B, on the middle line, pushes sideways or turns it/],
    ],
  ])("%s", (_, one, loads, wanted) => {
    const found = loadFaults(one, loads, mirrorOf(one));
    expect(found).toHaveLength(wanted.length);
    for (const [i, words] of wanted.entries()) expect(found[i]).toMatch(words);
  });
});
