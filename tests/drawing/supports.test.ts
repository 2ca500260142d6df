import { describe, expect, it } from "vitest";
import type { Scale } from "../../lib/drawing/scale.ts";
import { supports } from "../../lib/drawing/supports.ts";
import { beam, type Structure, type SupportChoice, support } from "../../lib/structure/index.ts";

const scale: Scale = { k: 20, width: 120, page: (x, y) => [x * 20, -y * 20] };

/** A beam whose right end is supported as said. */
const ending = (choice: SupportChoice): Structure => {
  const plain = beam({ spans: ["6 m"], supports: ["free", "pinned"] });
  return { ...plain, supports: [support("B", choice)] };
};
const drawnAs = (choice: SupportChoice): string =>
  supports(ending(choice), scale)
    .shapes.map((s) => s.svg)
    .join("");

const choices: readonly (readonly [string, SupportChoice])[] = [
  ["fixed", "fixed"],
  ["pinned", "pinned"],
  ["roller", "roller"],
  ["guided", "guided"],
  ["guided the other way", { y: true, rotation: true }],
  ["held against turning only", { rotation: true }],
  ["roller on a slope", { y: true, angle: "30 deg" }],
  ["roller on a wall", { x: true }],
  ["spring up", { y: "4000 kN/m" }],
  ["spring sideways", { x: "4000 kN/m" }],
  ["pinned with a turning spring", { x: true, y: true, rotation: "900 kN m/rad" }],
];

describe("supports", () => {
  it("supports: every kind has an outline of its own", () => {
    const outlines = choices.map(([, choice]) => drawnAs(choice));
    expect(new Set(outlines).size).toBe(choices.length);
    expect(Math.min(...outlines.map((o) => o.length))).toBeGreaterThan(200);
  });

  it("supports: a roller turned by 90 degrees at a right-hand end is a roller on the wall", () => {
    expect(drawnAs({ y: true, angle: "90 deg" })).toBe(drawnAs({ x: true }));
  });

  it("supports(roller on a slope of 30 degrees) puts its wheels square to the slope", () => {
    const centres = [...drawnAs({ y: true, angle: "30 deg" }).matchAll(/cx="([-\d.]+)" cy="([-\d.]+)"/g)].map(
      ([, x, y]) => [Number(x) - 120, Number(y)] as const,
    );
    expect(centres).toHaveLength(2);
    const [[x1, y1], [x2, y2]] = centres as [readonly [number, number], readonly [number, number]];
    // Counter-clockwise by 30 degrees: the ground rises to the right, which is up the page.
    expect((Math.atan2(-(x2 > x1 ? y2 - y1 : y1 - y2), Math.abs(x2 - x1)) * 180) / Math.PI).toBeCloseTo(
      30,
      -0.5,
    );
    expect(((x1 + x2) / 2) * Math.cos(Math.PI / 6) - ((y1 + y2) / 2) * Math.sin(Math.PI / 6)).toBeCloseTo(
      0,
      0,
    );
  });

  it("supports(free) draws nothing", () => {
    expect(supports({ ...ending("pinned"), supports: [] }, scale).shapes).toEqual([]);
  });
});
