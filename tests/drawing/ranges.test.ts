import { describe, expect, test } from "vitest";
import { drawSketch, type RangesFigure } from "../../lib/drawing/index.ts";

const figure: RangesFigure = {
  kind: "ranges",
  title: "How results move",
  description: "M_B by two causes.",
  panels: [
    {
      heading: "M_B, knee",
      chosen: -63e3,
      chosenText: "−63.0 kN·m as chosen",
      bars: [
        { kind: "hinge", label: "hinge h1", least: 0, greatest: -112e3, texts: ["−112 kN·m", "0 kN·m"] },
        {
          kind: "unknown",
          label: "I of <beam>",
          least: -75e3,
          greatest: -43e3,
          texts: ["−75.0 kN·m", "−43.0 kN·m"],
        },
        { kind: "unknown", label: "A", least: -60e3, greatest: -60e3, texts: ["−60.0 kN·m", "−60.0 kN·m"] },
      ],
    },
  ],
};

const xs = (svg: string, name: string): readonly number[] =>
  [...svg.matchAll(new RegExp(`<polyline points="([^"]+)"[^>]*class="fig-${name}"`, "g"))].flatMap(
    ([, points]) => (points ?? "").split(" ").map((point) => Number(point.split(",")[0])),
  );

describe("drawSketch(ranges)", () => {
  const svg = drawSketch(figure, "r");

  test("draws each bar to one scale between its values, with both texts, the still one as a stroke", () => {
    const [hinge, unknown] = [xs(svg, "curve"), xs(svg, "unknown")];
    const width = (list: readonly number[]): number => Math.max(...list) - Math.min(...list);
    expect(width(unknown) / width(hinge)).toBeCloseTo(32 / 112, 2);
    expect(Math.max(...hinge)).toBeGreaterThan(Math.max(...unknown));
    for (const text of ["−112 kN·m", "0 kN·m", "−75.0 kN·m", "−43.0 kN·m", "−63.0 kN·m as chosen"])
      expect(svg).toContain(`>${text}<`);
    expect(svg.match(/−60\.0 kN·m/g)?.length).toBe(1);
    expect(svg.match(/class="fig-chosen"/g)?.length).toBe(3);
  });

  test("is escaped, titled, and the same every time", () => {
    expect(svg).toContain("I of &lt;beam&gt;");
    expect(svg).toContain('<title id="r-title">How results move</title>');
    expect(drawSketch(figure, "r")).toBe(svg);
  });

  test("draws results that do not move at all", () => {
    const bars = [{ kind: "hinge", label: "h1", least: 5, greatest: 5, texts: ["5 N", "5 N"] }] as const;
    const still = drawSketch(
      { ...figure, panels: [{ heading: "N", chosen: 5, chosenText: "5 N", bars }] },
      "s",
    );
    expect(still).not.toMatch(/NaN|Infinity/);
    expect(still).toContain("h1");
  });

  test("refuses a number that is none, naming the result", () => {
    const [panel] = figure.panels;
    if (panel === undefined) throw new Error("a panel is wanted");
    expect(() => drawSketch({ ...figure, panels: [{ ...panel, chosen: Number.NaN }] }, "r")).toThrow(
      /ranges: M_B, knee has a value NaN; finite numbers are wanted/,
    );
  });
});
