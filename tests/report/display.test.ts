import { describe, expect, it } from "vitest";
import { drawFigureSpec, figureBundle, figureDisplay } from "../../lib/report/index.ts";
import { bandChart, portalFigure, sway } from "../drawing/fixtures.ts";

describe("figureBundle", () => {
  it("figureBundle(one figure) is SVG with words beside it", async () => {
    const bundle = await figureBundle(portalFigure, "c3");
    expect(Object.keys(bundle)).toEqual(["image/svg+xml", "text/plain"]);
    expect(bundle["image/svg+xml"]).toMatch(/^<svg xmlns="http:\/\/www\.w3\.org\/2000\/svg"/);
    expect(bundle["text/plain"]).toBe(`${portalFigure.title}\n${portalFigure.description}`);
  });

  it("figureBundle(two figures) is HTML whose ids do not clash", async () => {
    const bundle = await figureBundle([sway, bandChart], "c3");
    const ids = [...(bundle["text/html"] ?? "").matchAll(/ id="([^"]*)"/g)].map((m) => m[1]);
    expect(ids.length).toBeGreaterThan(3);
    expect(new Set(ids).size).toBe(ids.length);
    expect(bundle["text/plain"]).toContain(sway.title);
    expect(bundle["text/plain"]).toContain(bandChart.title);
  });

  it("figureDisplay draws when asked", async () => {
    const shown = figureDisplay(portalFigure, "c3");
    const display = shown[Symbol.for("Jupyter.display")];
    expect(await display?.()).toEqual(await figureBundle(portalFigure, "c3"));
  });
});

describe("drawFigureSpec", () => {
  it("drawFigureSpec(unknown kind) names the kinds there are", async () => {
    await expect(drawFigureSpec({ kind: "map" }, "f")).rejects.toThrow(
      'figure kind "map" is unknown; kinds are structure, mechanism, free body, diagrams, self-stress, shape, deflection, ranges, line chart',
    );
  });
});
