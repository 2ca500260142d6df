import type { Browser, Page } from "playwright-core";
import { afterAll, beforeAll, describe, expect, it } from "vitest";
import { drawLineChart, drawSketch, type SketchSpec } from "../../lib/drawing/index.ts";
import { hasBrowser, openBrowser } from "./browser.ts";
import * as fixtures from "./fixtures.ts";

const sketches: readonly (readonly [string, SketchSpec])[] = [
  ["portal", fixtures.portalFigure],
  ["beam", fixtures.beamFigure],
  ["frame", fixtures.crowdedFigure],
  ["sway", fixtures.sway],
  ["knee", fixtures.kneeFigure],
  ["joint", fixtures.jointFigure],
  ["diagrams", fixtures.portalDiagrams],
];

interface Measured {
  readonly text: string;
  readonly box: readonly [number, number, number, number];
  readonly pixels: number;
}

// Run in the page, hence as text: the tests' own program knows no DOM.
const MEASURE = `[...document.querySelectorAll("svg text")].map((t) => {
  const r = t.getBoundingClientRect();
  const k = t.closest("svg").getScreenCTM().a;
  return { text: t.textContent, box: [r.left, r.top, r.right, r.bottom], pixels: Number(t.getAttribute("font-size")) * k };
})`;
const FRAME = `(() => { const r = document.querySelector("svg").getBoundingClientRect(); return [r.left, r.right]; })()`;

/** Root element and number of errors of a text read as SVG. */
const parsed = (page: Page, svg: string): Promise<readonly [string, number]> =>
  page.evaluate(`(() => {
    const made = new DOMParser().parseFromString(${JSON.stringify(svg)}, "image/svg+xml");
    return [made.documentElement.tagName, made.querySelectorAll("parsererror").length];
  })()`);

describe.skipIf(!hasBrowser)("figures in a browser", () => {
  let browser: Browser;
  beforeAll(async () => {
    browser = await openBrowser();
  });
  afterAll(() => browser?.close());

  it.each(sketches)(
    "drawSketch(%s) at 390 px: letters of 9 px and more, none over another, all inside",
    async (_, spec) => {
      const page = await browser.newPage({ viewport: { width: 390, height: 800 } });
      await page.setContent(`<style>svg{width:100%;height:auto}</style>${drawSketch(spec, "f")}`);
      const texts = await page.evaluate<Measured[]>(MEASURE);
      const [left, right] = await page.evaluate<[number, number]>(FRAME);
      await page.close();
      expect(texts.length).toBeGreaterThan(5);
      for (const [i, a] of texts.entries()) {
        expect(a.pixels, a.text).toBeGreaterThan(9);
        expect(a.box[0], a.text).toBeGreaterThanOrEqual(left);
        expect(a.box[2], a.text).toBeLessThanOrEqual(right);
        for (const b of texts.slice(i + 1)) {
          // Letters' boxes hold air above and below; a pixel of that may be shared.
          const width = Math.min(a.box[2], b.box[2]) - Math.max(a.box[0], b.box[0]);
          const height = Math.min(a.box[3], b.box[3]) - Math.max(a.box[1], b.box[1]);
          expect(width > 1 && height > 2.5, `${a.text} over ${b.text}`).toBe(false);
        }
      }
    },
  );

  it("drawLineChart is well-formed SVG that shows alone", async () => {
    const page = await browser.newPage();
    expect(await parsed(page, await drawLineChart(fixtures.bandChart, "f"))).toEqual(["svg", 0]);
    await page.close();
  });

  it.each(sketches)("drawSketch(%s) is well-formed XML", async (_, spec) => {
    const page = await browser.newPage();
    expect(await parsed(page, drawSketch(spec, "f"))).toEqual(["svg", 0]);
    expect((await parsed(page, `${drawSketch(spec, "f")}<`))[1]).toBeGreaterThan(0);
    await page.close();
  });
});
