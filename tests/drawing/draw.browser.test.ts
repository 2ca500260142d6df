import type { Browser, Page } from "playwright-core";
import { afterAll, beforeAll, describe, expect, it } from "vitest";
import { drawLineChart, drawSketch, type SketchSpec } from "../../lib/drawing/index.ts";
import { hasBrowser, openBrowser } from "./browser.ts";
import * as fixtures from "./fixtures.ts";
import * as shapes from "./shapes.ts";
import { twelve } from "./twelve.ts";

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

/** Letters' boxes hold air above and below; a little of that may be shared. */
const isOver = (a: Measured, b: Measured): boolean =>
  Math.min(a.box[2], b.box[2]) - Math.max(a.box[0], b.box[0]) > 1 &&
  Math.min(a.box[3], b.box[3]) - Math.max(a.box[1], b.box[1]) > 2.5;

/** Root element and number of errors of a text read as SVG. */
const parsed = (page: Page, svg: string): Promise<readonly [string, number]> =>
  page.evaluate(`(() => {
    const made = new DOMParser().parseFromString(${JSON.stringify(svg)}, "image/svg+xml");
    return [made.documentElement.tagName, made.querySelectorAll("parsererror").length];
  })()`);

describe.skipIf(!hasBrowser)("figures in a browser", () => {
  let browser: Browser;
  let phone: Page;
  beforeAll(async () => {
    browser = await openBrowser();
    phone = await browser.newPage({ viewport: { width: 390, height: 800 } });
  });
  afterAll(() => browser?.close());

  it.each(sketches)(
    "drawSketch(%s) at 390 px: letters of 9 px and more, none over another, all inside",
    async (_, spec) => {
      await phone.setContent(`<style>svg{max-width:100%;height:auto}</style>${drawSketch(spec, "f")}`);
      const texts = await phone.evaluate<Measured[]>(MEASURE);
      const [left, right] = await phone.evaluate<[number, number]>(FRAME);
      expect(texts.length).toBeGreaterThan(5);
      for (const [i, a] of texts.entries()) {
        expect(a.pixels, a.text).toBeGreaterThan(9);
        expect(a.box[0], a.text).toBeGreaterThanOrEqual(left);
        expect(a.box[2], a.text).toBeLessThanOrEqual(right);
        for (const b of texts.slice(i + 1)) {
          expect(isOver(a, b), `${a.text} over ${b.text}`).toBe(false);
        }
      }
    },
  );

  it("drawLineChart is well-formed SVG that shows alone", async () => {
    const page = await browser.newPage();
    expect(await parsed(page, await drawLineChart(fixtures.bandChart, "f"))).toEqual(["svg", 0]);
    await page.close();
  });

  it("every sketch, the twelve structures' and the shapes' too, is well-formed XML", async () => {
    const page = await browser.newPage();
    const all = [
      ...sketches.map(([, spec]) => spec),
      ...twelve.flatMap((one) => [one.loads, one.body, one.diagrams]),
      ...Object.values(shapes),
    ];
    expect(all.length).toBeGreaterThan(45);
    for (const spec of all) expect(await parsed(page, drawSketch(spec, "f")), spec.title).toEqual(["svg", 0]);
    expect((await parsed(page, `${drawSketch(fixtures.sway, "f")}<`))[1]).toBeGreaterThan(0);
    await page.close();
  });

  it("the twelve structures at their own size: letters of 11 px and more, none over another", async () => {
    const page = await browser.newPage({ viewport: { width: 1280, height: 900 } });
    const sizes: number[] = [];
    for (const one of twelve) {
      for (const spec of [one.loads, one.body, one.diagrams]) {
        await page.setContent(drawSketch(spec, "f"));
        const texts = await page.evaluate<Measured[]>(MEASURE);
        sizes.push(...texts.map((t) => t.pixels));
        for (const [i, a] of texts.entries())
          for (const b of texts.slice(i + 1))
            expect(isOver(a, b), `${spec.title}: ${a.text} over ${b.text}`).toBe(false);
      }
    }
    expect(sizes.length).toBeGreaterThan(700);
    expect(Math.min(...sizes)).toBeGreaterThan(11);
    await page.close();
  });
});
