// Contract: what kernel/chart.ts leans on in vega and vega-lite.
import { describe, expect, test } from "vitest";
import { drawChart } from "../../kernel/chart.ts";

const spec = {
  $schema: "https://vega.github.io/schema/vega-lite/v6.json",
  title: "Drift",
  data: {
    values: [
      { x: 1, y: 2 },
      { x: 3, y: 4 },
    ],
  },
  mark: { type: "line", clip: true },
  encoding: { x: { field: "x", type: "quantitative" }, y: { field: "y", type: "quantitative" } },
};

describe("drawChart(spec)", () => {
  test("an SVG without a document, and words", async () => {
    const { svg, text } = await drawChart(spec);
    expect(svg).toMatch(/^<svg[\s\S]*Drift[\s\S]*<\/svg>$/);
    expect(text).toBe("chart: Drift");
  });
  test("two charts of one page share no id, and each finds its own", async () => {
    const idsOf = (svg: string): string[] =>
      [...svg.matchAll(/ id="([^"]+)"/g)].map((match) => match[1] ?? "");
    const [one, two] = [await drawChart(spec), await drawChart(spec)];
    expect(idsOf(one.svg).length).toBeGreaterThan(0);
    expect(idsOf(one.svg).filter((id) => idsOf(two.svg).includes(id))).toEqual([]);
    for (const { svg } of [one, two])
      for (const [, used] of svg.matchAll(/url\(#([^)]+)\)/g)) expect(idsOf(svg)).toContain(used);
  });
  test("what is no chart is refused", async () => {
    await expect(drawChart({ $schema: spec.$schema, encoding: {} })).rejects.toThrow();
  });
});
