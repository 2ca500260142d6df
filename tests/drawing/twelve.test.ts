import { describe, expect, it } from "vitest";
import { panelsOf } from "../../lib/drawing/draw.ts";
import { overlap } from "../../lib/drawing/geometry.ts";
import { drawSketch, type SketchSpec } from "../../lib/drawing/index.ts";
import { expectGolden } from "./golden.ts";
import { twelve } from "./twelve.ts";

const figures = twelve.flatMap(({ name, loads, body, diagrams }) =>
  Object.entries({ loads, body, diagrams }).map(
    ([what, spec]) => [`${name.replaceAll(" ", "-")}-${what}`, spec as SketchSpec] as const,
  ),
);

describe("twelve structures with loads, a body cut free and diagrams", () => {
  it("there are twelve, of three figures each", () => {
    expect(twelve).toHaveLength(12);
    expect(figures).toHaveLength(36);
  });

  it.each(figures)("drawSketch(%s) is the kept drawing, its labels apart", (name, spec) => {
    for (const { laid } of panelsOf(spec)) {
      const placed = laid?.placed ?? [];
      placed.forEach((a, i) => {
        for (const b of placed.slice(i + 1))
          expect(overlap(a.box, b.box), `${a.label.text} over ${b.label.text}`).toBe(0);
      });
    }
    expectGolden(import.meta.url, `twelve/${name}.svg`, drawSketch(spec, "fig"));
  });

  it.each(twelve.map((one) => [one.name, one.body.body] as const))(
    "the body of %s is in equilibrium",
    (_, body) => {
      let [fx, fy, m, size] = [0, 0, 0, 0];
      for (const { at, direction, turn, value = Number.NaN } of body.actions) {
        fx += direction[0] * value;
        fy += direction[1] * value;
        m += turn * value + at.x * direction[1] * value - at.y * direction[0] * value;
        size = Math.max(size, Math.abs(value));
      }
      expect(body.actions.length).toBeGreaterThan(2);
      for (const sum of [fx, fy, m]) expect(Math.abs(sum) / size).toBeLessThan(1e-6);
    },
  );

  it("the six-storey frame prints its greatest and least value of every quantity, and says how many are left out", () => {
    const six = twelve[11];
    const svg = six ? drawSketch(six.diagrams, "f") : "";
    for (const quantity of ["N", "V", "M"] as const) {
      const marks =
        six?.diagrams.marks.filter((mark) => mark.quantity === quantity && mark.text !== "") ?? [];
      const sorted = [...marks].sort((a, b) => a.value - b.value);
      for (const mark of [sorted[0], sorted.at(-1)]) expect(svg).toContain(`>${mark?.text}</text>`);
    }
    const said = [...svg.matchAll(/>(\d+) of (\d+) values printed/g)].map((match) =>
      match.slice(1).map(Number),
    );
    expect(said).toHaveLength(2);
    for (const [printed = 0, all = 0] of said) {
      expect(printed).toBeGreaterThan(30);
      expect(printed).toBeLessThan(all);
    }
  });
});
