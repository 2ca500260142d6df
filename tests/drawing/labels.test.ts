import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { panelsOf } from "../../lib/drawing/draw.ts";
import { lengthInside, overlap } from "../../lib/drawing/geometry.ts";
import { placeLabels, placeWithin } from "../../lib/drawing/labels.ts";
import type { Label } from "../../lib/drawing/scene.ts";
import * as fixtures from "./fixtures.ts";

const label = (text: string, x: number, y: number): Label => ({ text, at: [x, y], prefer: [0, -1], gap: 4 });

describe("placeLabels", () => {
  it.each([
    ["portal", fixtures.portalFigure],
    ["beam", fixtures.beamFigure],
    ["frame", fixtures.crowdedFigure],
    ["sway", fixtures.sway],
    ["knee", fixtures.kneeFigure],
    ["joint", fixtures.jointFigure],
    ["diagrams", fixtures.portalDiagrams],
  ] as const)("placeLabels in the %s figure: no two labels share an area", (_, spec) => {
    const panels = panelsOf(spec);
    let pairs = 0;
    for (const { laid } of panels) {
      if (laid === undefined) continue;
      laid.placed.forEach((a, i) => {
        for (const b of laid.placed.slice(i + 1)) {
          pairs++;
          expect(overlap(a.box, b.box), `${a.label.text} over ${b.label.text}`).toBe(0);
        }
      });
    }
    expect(pairs).toBeGreaterThan(3);
  });

  it("placeLabels(six labels at one point) finds room for all", () => {
    const placed = placeLabels(
      Array.from({ length: 6 }, (_, i) => label(`${i}00 kN`, 0, 0)),
      [],
    );
    for (const [i, a] of placed.entries()) {
      for (const b of placed.slice(i + 1)) expect(overlap(a.box, b.box)).toBe(0);
    }
    expect(placed).toHaveLength(6);
  });

  it("placeLabels(line where the label would stand) moves it off the line", () => {
    const wall = [
      [-100, -12],
      [100, -12],
    ] as const;
    const [free] = placeLabels([label("12.0 kN", 0, 0)], []);
    const [moved] = placeLabels([label("12.0 kN", 0, 0)], [wall]);
    expect(lengthInside(wall, free?.box ?? { left: 0, right: 0, top: 0, bottom: 0 })).toBeGreaterThan(0);
    expect(lengthInside(wall, moved?.box ?? { left: 0, right: 0, top: 0, bottom: 0 })).toBe(0);
  });

  it("placeLabels: spread labels never collide, wherever they are", () => {
    const places = fc.uniqueArray(fc.tuple(fc.integer({ min: 0, max: 5 }), fc.integer({ min: 0, max: 5 })), {
      minLength: 2,
      maxLength: 14,
      selector: ([x, y]) => `${x} ${y}`,
    });
    fc.assert(
      fc.property(places, (list) => {
        const placed = placeLabels(
          list.map(([x, y], i) => label(`${i} kN`, x * 40, y * 30)),
          [],
        );
        for (const [i, a] of placed.entries()) {
          for (const b of placed.slice(i + 1)) if (overlap(a.box, b.box) > 0) return false;
        }
        return placed.length === list.length;
      }),
      { seed: 20310, numRuns: 60 },
    );
  });

  it("placeLabels(empty text) leaves it out", () => {
    expect(placeLabels([label("", 0, 0)], [])).toEqual([]);
  });
});

describe("placeWithin", () => {
  const ranked = (n: number): Label[] =>
    Array.from({ length: n }, (_, i) => ({
      ...label(`${100 + i}.0 kN`, (i % 9) * 14, Math.floor(i / 9) * 9),
      rank: i / n,
    }));

  it("placeWithin(more labels than there is room for) keeps them apart, those without rank and the highest first", () => {
    const name = { ...label("A", 20, 20), bold: true };
    const placed = placeWithin([name, ...ranked(80)], []);
    for (const [i, a] of placed.entries())
      for (const b of placed.slice(i + 1)) expect(overlap(a.box, b.box)).toBe(0);
    const kept = placed.map((p) => p.label);
    expect(kept).toContain(name);
    expect(kept.map((l) => l.text)).toContain("179.0 kN");
    expect(kept.length).toBeGreaterThan(8);
    expect(kept.length).toBeLessThan(81);
  });

  it("placeWithin(a few labels) leaves none out", () => {
    expect(placeWithin(ranked(9), [])).toHaveLength(9);
  });
});
